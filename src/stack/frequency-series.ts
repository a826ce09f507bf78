/**
 * Complex functions of the angular frequency carried with their first two derivatives (truncated Taylor series), so that
 * derivatives of long products come out exact to rounding instead of by differences. Pure rules of calculus; all
 * functions are total and give NaN where the derivative does not exist.
 */
import { type Complex, div, mul, scale, sqrt, sub } from '../num/complex.ts';

/** Value, first and second derivative by the angular frequency; flat, because long stacks make many of them. */
export interface FrequencySeries {
  readonly re: number;
  readonly im: number;
  readonly re1: number;
  readonly im1: number;
  readonly re2: number;
  readonly im2: number;
}

export const fromDerivatives = (f: Complex, f1: Complex, f2: Complex): FrequencySeries => ({
  re: f.re,
  im: f.im,
  re1: f1.re,
  im1: f1.im,
  re2: f2.re,
  im2: f2.im,
});

export const atCentre = (a: FrequencySeries): Complex => ({ re: a.re, im: a.im });
export const firstOf = (a: FrequencySeries): Complex => ({ re: a.re1, im: a.im1 });
export const secondOf = (a: FrequencySeries): Complex => ({ re: a.re2, im: a.im2 });

export const constant = (c: Complex): FrequencySeries => ({
  re: c.re,
  im: c.im,
  re1: 0,
  im1: 0,
  re2: 0,
  im2: 0,
});

/** The angular frequency itself, times a factor. */
export const linear = (omega_rad_per_s: number, factor: number): FrequencySeries => ({
  re: omega_rad_per_s * factor,
  im: 0,
  re1: factor,
  im1: 0,
  re2: 0,
  im2: 0,
});

export const plus = (a: FrequencySeries, b: FrequencySeries): FrequencySeries => ({
  re: a.re + b.re,
  im: a.im + b.im,
  re1: a.re1 + b.re1,
  im1: a.im1 + b.im1,
  re2: a.re2 + b.re2,
  im2: a.im2 + b.im2,
});

/** Product with a constant real number. */
export const scaled = (a: FrequencySeries, by: number): FrequencySeries => ({
  re: a.re * by,
  im: a.im * by,
  re1: a.re1 * by,
  im1: a.im1 * by,
  re2: a.re2 * by,
  im2: a.im2 * by,
});

export const negative = (a: FrequencySeries): FrequencySeries => scaled(a, -1);
export const minus = (a: FrequencySeries, b: FrequencySeries): FrequencySeries => plus(a, negative(b));

/** Product with the constant -i. */
export const timesMinusI = (a: FrequencySeries): FrequencySeries => ({
  re: a.im,
  im: -a.re,
  re1: a.im1,
  im1: -a.re1,
  re2: a.im2,
  im2: -a.re2,
});

export const times = (a: FrequencySeries, b: FrequencySeries): FrequencySeries => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
  re1: a.re1 * b.re - a.im1 * b.im + a.re * b.re1 - a.im * b.im1,
  im1: a.re1 * b.im + a.im1 * b.re + a.re * b.im1 + a.im * b.re1,
  re2: a.re2 * b.re - a.im2 * b.im + 2 * (a.re1 * b.re1 - a.im1 * b.im1) + a.re * b.re2 - a.im * b.im2,
  im2: a.re2 * b.im + a.im2 * b.re + 2 * (a.re1 * b.im1 + a.im1 * b.re1) + a.re * b.im2 + a.im * b.re2,
});

/** From a = q b: q' = (a' - q b')/b, q'' = (a'' - 2 q' b' - q b'')/b. */
export function over(a: FrequencySeries, b: FrequencySeries): FrequencySeries {
  const by = atCentre(b);
  const q = div(atCentre(a), by);
  const q1 = div(sub(firstOf(a), mul(q, firstOf(b))), by);
  const rest = sub(sub(secondOf(a), scale(mul(q1, firstOf(b)), 2)), mul(q, secondOf(b)));
  return fromDerivatives(q, q1, div(rest, by));
}

/** Square root on the principal branch: s' = w'/(2 s), s'' = (w'' - 2 s'^2)/(2 s). */
export function squareRoot(w: FrequencySeries): FrequencySeries {
  const s = sqrt(atCentre(w));
  const twice = scale(s, 2);
  const s1 = div(firstOf(w), twice);
  return fromDerivatives(s, s1, div(sub(secondOf(w), scale(mul(s1, s1), 2)), twice));
}

/** f(w) from f and its derivatives by w at the value of w: f' w', f'' w'^2 + f' w''. */
export function compose(w: FrequencySeries, f: Complex, df: Complex, d2f: Complex): FrequencySeries {
  const squareRe = w.re1 * w.re1 - w.im1 * w.im1;
  const squareIm = 2 * w.re1 * w.im1;
  return {
    re: f.re,
    im: f.im,
    re1: df.re * w.re1 - df.im * w.im1,
    im1: df.re * w.im1 + df.im * w.re1,
    re2: d2f.re * squareRe - d2f.im * squareIm + df.re * w.re2 - df.im * w.im2,
    im2: d2f.re * squareIm + d2f.im * squareRe + df.re * w.im2 + df.im * w.re2,
  };
}
