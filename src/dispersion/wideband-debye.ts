/**
 * Wideband Debye model of laminates: nearly constant loss tangent over decades of frequency, causal.
 *
 *   eps = epsInfinity + deltaEps/(m2 - m1) log10[(10^m2 - i w)/(10^m1 - i w)] + i sigma/(w eps0),  w = 2 pi f in rad/s
 *
 * Relative to vacuum, L the vacuum wavelength in um.
 * Source: A. R. Djordjevic, R. M. Biljic, V. D. Likar-Smiljanic, T. K. Sarkar, IEEE Trans. Electromagn. Compat. 43, 662 (2001).
 */
import * as C from '../num/complex-jet.ts';
import * as J from '../num/jet.ts';
import type { BoundModel } from './evaluator.ts';
import { conduction } from './ionic-conduction.ts';
import type { WidebandDebyeParameters } from './parameters.ts';
import { angularFrequency_rad_per_s } from './spectral-variable.ts';
import { writePermittivity } from './write-index.ts';

export function bindWidebandDebye(p: WidebandDebyeParameters): BoundModel {
  const factor = p.deltaEps / ((p.m2 - p.m1) * Math.LN10);
  return {
    used: {},
    hasDerivative: true,
    derivativeOrder: 3,
    complex: true,
    evaluate(wavelength_um, out) {
      const minusW = J.neg(angularFrequency_rad_per_s(wavelength_um));
      const logAt = (m: number): C.ComplexJet => C.log(C.complexJet(J.constant(10 ** m), minusW));
      const relaxing = C.scale(C.sub(logAt(p.m2), logAt(p.m1)), factor);
      writePermittivity(
        out,
        C.add(C.shift(relaxing, p.epsInfinity), conduction(p.sigma_S_per_m, wavelength_um)),
      );
    },
  };
}
