/**
 * From jets (Taylor coefficients, see `num/jet.ts`) to the array an evaluator writes (derivatives). The relation
 * n + ik = sqrt(eps mu) takes the branch of a passive medium, k >= 0.
 */
import type { ComplexJet } from '../num/complex-jet.ts';
import { mul, sqrtDecaying } from '../num/complex-jet.ts';
import type { Jet } from '../num/jet.ts';
import type { IndexJet } from './evaluator.ts';

/** n real, k = 0. */
export function writeReal(out: IndexJet, n: Jet): void {
  out[0] = n[0];
  out[1] = n[1];
  out[2] = 2 * n[2];
  out[3] = 6 * n[3];
  out[4] = 0;
  out[5] = 0;
  out[6] = 0;
  out[7] = 0;
}

export function writeComplex(out: IndexJet, n: Jet, k: Jet): void {
  writeReal(out, n);
  out[4] = k[0];
  out[5] = k[1];
  out[6] = 2 * k[2];
  out[7] = 6 * k[3];
}

/** n + ik = sqrt(eps mu); mu = 1 where absent. */
export function writePermittivity(out: IndexJet, eps: ComplexJet, mu?: ComplexJet): void {
  const index = sqrtDecaying(mu ? mul(eps, mu) : eps);
  writeComplex(out, index.re, index.im);
}

/** Every part NaN: the fit has no index there. */
export function writeNothing(out: IndexJet): void {
  out.fill(Number.NaN);
}
