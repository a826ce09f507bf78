/**
 * Herzberger: n = A + B Q + C Q^2 + sum c L^e with Q = 1/(L^2 - pole), pole 0.028 um^2 as a rule; L in um.
 * Source: M. Herzberger, C. D. Salzberg, J. Opt. Soc. Am. 52, 420 (1962); the coefficients' source is the fit's.
 * Special case: absorption is not described, k = 0.
 */
import * as J from '../num/jet.ts';
import type { BoundModel } from './evaluator.ts';
import type { HerzbergerParameters } from './parameters.ts';
import { writeReal } from './write-index.ts';

export function bindHerzberger(p: HerzbergerParameters): BoundModel {
  const inQ = [p.A, p.B, p.C];
  return {
    used: {},
    hasDerivative: true,
    derivativeOrder: 3,
    complex: false,
    evaluate(wavelength_um, out) {
      const L = J.variable(wavelength_um);
      const Q = J.reciprocal(J.shift(J.mul(L, L), -p.pole_um2));
      let n = J.polynomial(inQ, Q);
      for (const { c, power } of p.terms ?? []) n = J.add(n, J.scale(J.pow(L, power), c));
      writeReal(out, n);
    },
    index(wavelength_um) {
      const Q = 1 / (wavelength_um * wavelength_um - p.pole_um2);
      let n = p.A + Q * (p.B + Q * p.C);
      for (const { c, power } of p.terms ?? []) n += c * wavelength_um ** power;
      return n;
    },
  };
}
