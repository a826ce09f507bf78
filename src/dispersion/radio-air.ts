/**
 * Air at radio frequencies: n = 1 + 1e-6 N, N = k1 Pd/T + k2 e/T + k3 e/T^2, the same at every frequency.
 * Pd and e are the partial pressures of dry air and of water vapour in hPa, T in K. Relative to vacuum.
 * Source: ITU-R Recommendation P.453; better than 0.5 % of N up to 100 GHz. The vapour pressure follows from the humidity by
 * `water-vapour.ts`. Special case: where no humidity is stated the vapour pressure is that of the reference atmosphere.
 */
import type { BoundModel, Conditions } from './evaluator.ts';
import type { RadioAirParameters } from './parameters.ts';
import { vapourPressure_Pa } from './water-vapour.ts';

export function bindRadioAir(p: RadioAirParameters, conditions: Conditions): BoundModel {
  const T = conditions.temperature_K ?? p.default_K;
  const pressure_Pa = conditions.pressure_Pa ?? (p.defaultDry_hPa + p.defaultVapour_hPa) * 100;
  const saturated_Pa = vapourPressure_Pa(T, pressure_Pa, 1);
  const vapour_Pa =
    conditions.humidity === undefined ? p.defaultVapour_hPa * 100 : conditions.humidity * saturated_Pa;
  const e_hPa = Math.min(vapour_Pa, saturated_Pa, pressure_Pa) / 100;
  const dry_hPa = pressure_Pa / 100 - e_hPa;
  const n = 1 + 1e-6 * ((p.k1 * dry_hPa) / T + (p.k2 * e_hPa) / T + (p.k3 * e_hPa) / (T * T));
  return {
    used: { temperature_K: T, pressure_Pa, humidity: (100 * e_hPa) / saturated_Pa },
    hasDerivative: true,
    derivativeOrder: 3,
    complex: false,
    evaluate(_, out) {
      out.fill(0);
      out[0] = n;
    },
    index: () => n,
  };
}
