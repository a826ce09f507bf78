/**
 * The Faddeeva function w(z) = exp(-z^2) erfc(-i z) and its derivatives.
 *
 * Near the origin: trapezoidal and midpoint sums of the integral representation, corrected by the residue of the pole that
 * comes close to the real axis. Sources: F. Matta, A. Reichel, Math. Comp. 25, 339 (1971); D. B. Hunter, T. Regan, Math. Comp.
 * 26, 539 (1972); choice of rule and step: M. Al Azah, S. N. Chandler-Wilde, SIAM J. Numer. Anal. 59, 2346 (2021), who prove
 * an error of a few 1e-15. Far out: the asymptotic series, whose derivatives do not cancel.
 *
 * In the lower half plane w(z) = 2 exp(-z^2) - w(-z), which overflows to infinite parts where exp(-z^2) does.
 */
import type { Complex } from './complex.ts';
import * as C from './complex.ts';
import type { ComplexJet } from './complex-jet.ts';
import { coefficient, compose } from './complex-jet.ts';

const TERMS = 11;
const STEP = Math.sqrt(Math.PI / (TERMS + 1));
const SQRT_PI = Math.sqrt(Math.PI);
/** From this modulus on the asymptotic series is exact to rounding: its smallest term is about exp(-|z|^2). */
const FAR = 6.5;
const FAR_TERMS = 36;

/** i/(pi) h [1/z +] 2 z sum exp(-t^2)/(z^2 - t^2), nodes at (k + offset) h. */
function sum(z: Complex, z2: Complex, midpoint: boolean): Complex {
  let re = 0;
  let im = 0;
  for (let k = midpoint ? 0 : 1; k <= TERMS; k++) {
    const t = (midpoint ? k + 0.5 : k) * STEP;
    const weight = Math.exp(-t * t);
    const q = C.div({ re: weight, im: 0 }, { re: z2.re - t * t, im: z2.im });
    re += q.re;
    im += q.im;
  }
  let total = C.scale(C.mul(z, { re, im }), 2);
  if (!midpoint) total = C.add(total, C.div(C.ONE, z));
  return { re: (-STEP / Math.PI) * total.im, im: (STEP / Math.PI) * total.re };
}

/** First quadrant, |z| < FAR. */
function near(z: Complex): Complex {
  const z2 = C.mul(z, z);
  if (z.im >= Math.max(z.re, Math.PI / STEP)) return sum(z, z2, true);
  const place = z.re / STEP - Math.floor(z.re / STEP);
  // Each rule loses digits close to its own nodes: take the one whose nodes are farther.
  const midpoint = place < 0.25 || place > 0.75;
  // 2 exp(-z^2)/(1 +- exp(-2 i pi z/h)); exp(2 i pi z/h) is bounded here, its inverse is not.
  const bounded = C.exp({ re: (-2 * Math.PI * z.im) / STEP, im: (2 * Math.PI * z.re) / STEP });
  const gauss = C.exp(C.neg(z2));
  const numerator = C.scale(C.mul(gauss, bounded), 2);
  const denominator = midpoint ? C.add(bounded, C.ONE) : C.sub(bounded, C.ONE);
  return C.add(sum(z, z2, midpoint), C.div(numerator, denominator));
}

/** Taylor coefficients w, w', w''/2, w'''/6 from (i/sqrt pi) sum (2m-1)!!/2^m z^-(2m+1), upper half plane, |z| >= FAR. */
function farSeries(z: Complex): [Complex, Complex, Complex, Complex] {
  const r = C.div(C.ONE, z);
  const r2 = C.mul(r, r);
  let term: Complex = { re: -r.im / SQRT_PI, im: r.re / SQRT_PI };
  let w0 = C.ZERO;
  let w1 = C.ZERO;
  let w2 = C.ZERO;
  let w3 = C.ZERO;
  for (let m = 0; m < FAR_TERMS; m++) {
    const p = 2 * m + 1;
    w0 = C.add(w0, term);
    w1 = C.add(w1, C.scale(term, -p));
    w2 = C.add(w2, C.scale(term, (p * (p + 1)) / 2));
    w3 = C.add(w3, C.scale(term, (-p * (p + 1) * (p + 2)) / 6));
    if (C.abs2(term) * p ** 6 < 1e-36 * C.abs2(w0)) break;
    term = C.scale(C.mul(term, r2), p / 2);
  }
  return [w0, C.mul(w1, r), C.mul(w2, r2), C.mul(w3, C.mul(r2, r))];
}

/** w(z) for any complex z; relative error about 1e-14 in the upper half plane. */
export function faddeeva(z: Complex): Complex {
  if (z.im < 0) {
    const reflected = faddeeva(C.neg(z));
    return C.sub(C.scale(C.exp(C.neg(C.mul(z, z))), 2), reflected);
  }
  if (z.re === 0 && z.im === 0) return C.ONE;
  if (C.abs(z) >= FAR) {
    // On the real axis the real part is exp(-x^2), which the series does not contain.
    const far = farSeries(z)[0];
    return z.im === 0 ? { re: Math.exp(-z.re * z.re), im: far.im } : far;
  }
  // w(-conj z) = conj w(z)
  const quadrant = near({ re: Math.abs(z.re), im: z.im });
  return z.re < 0 ? C.conj(quadrant) : quadrant;
}

/** w of a complex jet. Derivatives: w' = -2 z w + 2 i/sqrt(pi) near the origin, the differentiated series far out. */
export function faddeevaJet(a: ComplexJet): ComplexJet {
  const z = coefficient(a, 0);
  if (z.im >= 0 && C.abs(z) >= FAR) {
    const [w0, w1, w2, w3] = farSeries(z);
    return compose(w0, w1, w2, w3, a);
  }
  const w0 = faddeeva(z);
  const w1 = C.add(C.scale(C.mul(z, w0), -2), { re: 0, im: 2 / SQRT_PI });
  const w2 = C.scale(C.add(w0, C.mul(z, w1)), -2);
  const w3 = C.scale(C.add(C.scale(w1, 2), C.mul(z, w2)), -2);
  return compose(w0, w1, C.scale(w2, 0.5), C.scale(w3, 1 / 6), a);
}
