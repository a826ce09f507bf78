/**
 * One side of an interface: what the laws of this folder need to know about a medium at one wave.
 * Convention: exp(i(k r - w t)); eps = eps' + i eps'' with eps'' >= 0, mu likewise, n = sqrt(eps mu) with Im n >= 0.
 */
import { type Complex, div, mul, sqrtDecaying } from '../num/complex.ts';

export interface Optics {
  readonly n: Complex;
  /** Relative permittivity. */
  readonly eps: Complex;
  /** Relative permeability. */
  readonly mu: Complex;
}

/**
 * Refractive index from relative permittivity and permeability: the branch of sqrt(eps mu) that does not grow (Im n >= 0).
 * Special case: real eps < 0 and mu < 0 together give Re n < 0 (backward wave; Veselago 1968).
 */
export function refractiveIndex(eps: Complex, mu: Complex): Complex {
  const n = sqrtDecaying(mul(eps, mu));
  return n.im === 0 && eps.re < 0 && mu.re < 0 ? { re: -n.re, im: 0 } : n;
}

export const opticsFromPermittivity = (eps: Complex, mu: Complex): Optics => ({
  n: refractiveIndex(eps, mu),
  eps,
  mu,
});

export const opticsFromIndex = (n: Complex, mu: Complex): Optics => ({ n, eps: div(mul(n, n), mu), mu });

/** True where neither side of the material absorbs at all. */
export const isLossless = (o: Optics): boolean => o.eps.im === 0 && o.mu.im === 0 && o.n.im === 0;
