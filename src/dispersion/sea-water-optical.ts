/**
 * Sea water in the visible at atmospheric pressure.
 *
 *   n = n0 + (n1 + n2 t + n3 t^2) S + n4 t^2 + (n5 + n6 S + n7 t)/l + n8/l^2 + n9/l^3
 *
 * S the salinity in g/kg, t in C, l the wavelength in nm; relative to air. Source: X. Quan, E. S. Fry, Appl. Opt. 34, 3477 (1995).
 */
import * as J from '../num/jet.ts';
import type { BoundModel, Conditions } from './evaluator.ts';
import type { SeaWaterOpticalParameters } from './parameters.ts';
import { inverse } from './spectral-variable.ts';
import { writeReal } from './write-index.ts';

export function bindSeaWaterOptical(p: SeaWaterOpticalParameters, conditions: Conditions): BoundModel {
  const temperature_K = conditions.temperature_K ?? p.default_K;
  const S = conditions.salinity_g_per_kg ?? p.default_g_per_kg;
  const t = temperature_K - 273.15;
  const n = (i: number): number => p.n[i]!;
  const inInverse = [
    n(0) + (n(1) + (n(2) + n(3) * t) * t) * S + n(4) * t * t,
    n(5) + n(6) * S + n(7) * t,
    n(8),
    n(9),
  ];
  return {
    used: { temperature_K, salinity_g_per_kg: S },
    hasDerivative: true,
    derivativeOrder: 3,
    complex: false,
    evaluate(wavelength_um, out) {
      writeReal(out, J.polynomial(inInverse, inverse(1e-3, wavelength_um)));
    },
  };
}
