/**
 * Air as an optical medium, from temperature, pressure, humidity and CO2 content. Relative to vacuum, vacuum wavelength.
 *
 * `ciddor-1996`: the algorithm and its limits are in `ciddor.ts`; standard state (15 C, 101325 Pa, dry, 450 ppm) by default.
 *
 * `edlen`: the shorter form in use in length metrology,
 *   1e8 (n - 1)_N = a0 + a1/(a2 - s^2) + a3/(a4 - s^2)
 *   (n - 1)_x     = (n - 1)_N [1 + slope (x - x0)]                                   x the CO2 fraction
 *   (n - 1)_tp    = (n - 1)_x p/d0 [1 + 1e-8 (d1 - d2 t) p]/(1 + d3 t)
 *   n - 1         = (n - 1)_tp - f (w0 - w1 s^2) 1e-10
 * with t in C, p and the vapour pressure f in Pa, s = 1/L in um^-1. Sources: B. Edlen, Metrologia 2, 71 (1966); K. P. Birch,
 * M. J. Downs, Metrologia 30, 155 (1993) and 31, 315 (1994); G. Boensch, E. Potulski, Metrologia 35, 133 (1998). The vapour
 * pressure follows from the humidity by `water-vapour.ts`.
 * Special case: below 0.185 um the index keeps its value there and the derivatives are zero.
 */
import * as J from '../num/jet.ts';
import { airState } from './air-index.ts';
import { densityFactors, SHORTEST_um, standardAirRefractivity, waterVapourRefractivity } from './ciddor.ts';
import type { BoundModel, Conditions } from './evaluator.ts';
import type { MoistAirParameters } from './parameters.ts';
import { vapourPressure_Pa } from './water-vapour.ts';
import { writeReal } from './write-index.ts';

type Edlen = Extract<MoistAirParameters, { form: 'edlen' }>;

export function bindMoistAir(p: MoistAirParameters, conditions: Conditions): BoundModel {
  return p.form === 'edlen' ? bindEdlen(p, conditions) : bindCiddor(conditions);
}

const common = { hasDerivative: true, derivativeOrder: 3, complex: false } as const;

function bindCiddor(conditions: Conditions): BoundModel {
  const state = airState(conditions);
  const { dry, water } = densityFactors(state);
  return {
    ...common,
    used: state,
    evaluate(wavelength_um, out) {
      const n = J.scale(standardAirRefractivity(wavelength_um), dry);
      const all = water === 0 ? n : J.add(n, J.scale(waterVapourRefractivity(wavelength_um), water));
      writeReal(out, J.shift(all, 1));
    },
  };
}

function bindEdlen(p: Edlen, conditions: Conditions): BoundModel {
  const temperature_K = conditions.temperature_K ?? p.default_K;
  const pressure_Pa = conditions.pressure_Pa ?? p.default_Pa;
  const humidity = conditions.humidity ?? 0;
  const co2_ppm = p.co2 ? (conditions.co2_ppm ?? p.co2.reference * 1e6) : undefined;
  const t = temperature_K - 273.15;
  const [d0, d1, d2, d3] = p.density;
  const density = ((pressure_Pa / d0) * (1 + 1e-8 * (d1 - d2 * t) * pressure_Pa)) / (1 + d3 * t);
  const co2 = p.co2 && co2_ppm !== undefined ? 1 + p.co2.slope * (co2_ppm * 1e-6 - p.co2.reference) : 1;
  const f_Pa = humidity === 0 ? 0 : vapourPressure_Pa(temperature_K, pressure_Pa, humidity);
  const [a0, a1, a2, a3, a4] = p.dispersion;
  const [w0, w1] = p.water;
  return {
    ...common,
    used: { temperature_K, pressure_Pa, humidity, ...(co2_ppm === undefined ? {} : { co2_ppm }) },
    evaluate(wavelength_um, out) {
      const L = wavelength_um < SHORTEST_um ? J.constant(SHORTEST_um) : J.variable(wavelength_um);
      const s2 = J.pow(L, -2);
      const first = J.div(J.constant(a1), J.shift(J.neg(s2), a2));
      const second = J.div(J.constant(a3), J.shift(J.neg(s2), a4));
      const dry = J.scale(J.shift(J.add(first, second), a0), 1e-8 * co2 * density);
      const vapour = J.scale(J.shift(J.scale(s2, -w1), w0), f_Pa * 1e-10);
      writeReal(out, J.shift(J.sub(dry, vapour), 1));
    },
  };
}
