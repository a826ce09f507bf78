/**
 * Saturation vapour pressure of water over liquid, and what air does to it.
 *
 *   svp = exp(A T^2 + B T + C + D/T) Pa, T in K;   f = alpha + beta p + gamma t^2;   partial pressure = h f svp.
 *
 * Source: R. S. Davis, Metrologia 29, 67 (1992) (after Giacomo 1982), as used by Ciddor 1996. Valid about -40 to 100 C.
 */
const SVP = [1.2378847e-5, -1.9121316e-2, 33.93711047, -6.3431645e3] as const;
const ENHANCEMENT = [1.00062, 3.14e-8, 5.6e-7] as const;

/** Pa over a flat surface of liquid water. */
export function saturationPressure_Pa(temperature_K: number): number {
  const T = temperature_K;
  return Math.exp((SVP[0] * T + SVP[1]) * T + SVP[2] + SVP[3] / T);
}

/** Factor by which the presence of air raises the saturation pressure. */
export function enhancement(temperature_K: number, pressure_Pa: number): number {
  const t = temperature_K - 273.15;
  return ENHANCEMENT[0] + ENHANCEMENT[1] * pressure_Pa + ENHANCEMENT[2] * t * t;
}

/** Partial pressure of water vapour in air of the relative humidity `humidity` (0 to 1). */
export function vapourPressure_Pa(temperature_K: number, pressure_Pa: number, humidity: number): number {
  return humidity * enhancement(temperature_K, pressure_Pa) * saturationPressure_Pa(temperature_K);
}
