/**
 * Truncated Taylor series of third order with complex coefficients, in a real variable: real and imaginary part are `Jet`s.
 * Analytic functions go through `compose`, which takes the complex Taylor coefficients of the function at the point.
 */
import type { Complex } from './complex.ts';
import * as C from './complex.ts';
import type { Jet } from './jet.ts';
import * as J from './jet.ts';

export interface ComplexJet {
  readonly re: Jet;
  readonly im: Jet;
}

const ZERO: Jet = [0, 0, 0, 0];

export const fromReal = (re: Jet): ComplexJet => ({ re, im: ZERO });
export const complexJet = (re: Jet, im: Jet): ComplexJet => ({ re, im });
export const constant = (z: Complex): ComplexJet => ({ re: J.constant(z.re), im: J.constant(z.im) });

export const add = (a: ComplexJet, b: ComplexJet): ComplexJet => ({
  re: J.add(a.re, b.re),
  im: J.add(a.im, b.im),
});
export const sub = (a: ComplexJet, b: ComplexJet): ComplexJet => ({
  re: J.sub(a.re, b.re),
  im: J.sub(a.im, b.im),
});
/** Times a real number. */
export const scale = (a: ComplexJet, s: number): ComplexJet => ({
  re: J.scale(a.re, s),
  im: J.scale(a.im, s),
});
/** Times i. */
export const timesI = (a: ComplexJet): ComplexJet => ({ re: J.neg(a.im), im: a.re });
/** Plus a real number. */
export const shift = (a: ComplexJet, s: number): ComplexJet => ({ re: J.shift(a.re, s), im: a.im });

export const mul = (a: ComplexJet, b: ComplexJet): ComplexJet => ({
  re: J.sub(J.mul(a.re, b.re), J.mul(a.im, b.im)),
  im: J.add(J.mul(a.re, b.im), J.mul(a.im, b.re)),
});

export const mulReal = (a: ComplexJet, b: Jet): ComplexJet => ({ re: J.mul(a.re, b), im: J.mul(a.im, b) });

/** Taylor coefficient number n as a complex number. */
export const coefficient = (a: ComplexJet, n: 0 | 1 | 2 | 3): Complex => ({ re: a.re[n], im: a.im[n] });

/** f(a) from the complex Taylor coefficients f, f', f''/2, f'''/6 of an analytic f at the point a[0]. */
export function compose(f0: Complex, f1: Complex, f2: Complex, f3: Complex, a: ComplexJet): ComplexJet {
  const a1 = coefficient(a, 1);
  const a2 = coefficient(a, 2);
  const a11 = C.mul(a1, a1);
  const c1 = C.mul(f1, a1);
  const c2 = C.add(C.mul(f1, a2), C.mul(f2, a11));
  const mixed = C.scale(C.mul(f2, C.mul(a1, a2)), 2);
  const c3 = C.add(C.mul(f1, coefficient(a, 3)), C.add(mixed, C.mul(f3, C.mul(a11, a1))));
  return { re: [f0.re, c1.re, c2.re, c3.re], im: [f0.im, c1.im, c2.im, c3.im] };
}

export function reciprocal(a: ComplexJet): ComplexJet {
  const r = C.div(C.ONE, coefficient(a, 0));
  const r2 = C.mul(r, r);
  return compose(r, C.neg(r2), C.mul(r2, r), C.neg(C.mul(r2, r2)), a);
}

export const div = (a: ComplexJet, b: ComplexJet): ComplexJet => mul(a, reciprocal(b));

/** Series of the square root whose value at the point is `s0` (either root). */
function root(a: ComplexJet, s0: Complex): ComplexJet {
  const half = C.div({ re: 0.5, im: 0 }, s0);
  const s1 = C.mul(coefficient(a, 1), half);
  const s2 = C.mul(C.sub(coefficient(a, 2), C.mul(s1, s1)), half);
  const s3 = C.mul(C.sub(coefficient(a, 3), C.scale(C.mul(s1, s2), 2)), half);
  return { re: [s0.re, s1.re, s2.re, s3.re], im: [s0.im, s1.im, s2.im, s3.im] };
}

/** Principal branch: Re >= 0. */
export const sqrt = (a: ComplexJet): ComplexJet => root(a, C.sqrt(coefficient(a, 0)));

/** Branch with Im >= 0, and Re > 0 where Im = 0: the index of a passive medium from eps mu. */
export const sqrtDecaying = (a: ComplexJet): ComplexJet => root(a, C.sqrtDecaying(coefficient(a, 0)));

export function exp(a: ComplexJet): ComplexJet {
  const e = C.exp(coefficient(a, 0));
  return compose(e, e, C.scale(e, 0.5), C.scale(e, 1 / 6), a);
}

/** Principal branch: Im in (-pi, pi]. */
export function log(a: ComplexJet): ComplexJet {
  const z = coefficient(a, 0);
  const r = C.div(C.ONE, z);
  const r2 = C.mul(r, r);
  return compose(C.log(z), r, C.scale(r2, -0.5), C.scale(C.mul(r2, r), 1 / 3), a);
}

/** a^p for a fixed real exponent, principal branch. */
export function pow(a: ComplexJet, p: number): ComplexJet {
  if (p === 0) return constant(C.ONE);
  if (p === 1) return a;
  if (p === 2) return mul(a, a);
  return exp(scale(log(a), p));
}
