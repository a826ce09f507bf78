/**
 * Complex numbers for code that is not hot: plain `{ re, im }` records and pure functions.
 * Hot loops (batch, stacks over many wavelengths) work on bare numbers instead.
 * All functions are total: they return NaN parts for NaN input and never throw.
 */
export interface Complex {
  readonly re: number;
  readonly im: number;
}

export const ZERO: Complex = { re: 0, im: 0 };
export const ONE: Complex = { re: 1, im: 0 };

export const complex = (re: number, im = 0): Complex => ({ re, im });
export const add = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });
export const sub = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im });
export const mul = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
});
export const scale = (a: Complex, s: number): Complex => ({ re: a.re * s, im: a.im * s });
export const neg = (a: Complex): Complex => ({ re: -a.re, im: -a.im });
export const conj = (a: Complex): Complex => ({ re: a.re, im: -a.im });
export const abs = (a: Complex): number => Math.hypot(a.re, a.im);
export const abs2 = (a: Complex): number => a.re * a.re + a.im * a.im;
export const arg = (a: Complex): number => Math.atan2(a.im, a.re);

/** Quotient by Smith's scaling (Comm. ACM 5, 435 (1962)): no overflow for large or tiny divisors. */
export function div(a: Complex, b: Complex): Complex {
  if (Math.abs(b.re) >= Math.abs(b.im)) {
    const r = b.im / b.re;
    const d = b.re + b.im * r;
    return { re: (a.re + a.im * r) / d, im: (a.im - a.re * r) / d };
  }
  const r = b.re / b.im;
  const d = b.re * r + b.im;
  return { re: (a.re * r + a.im) / d, im: (a.im * r - a.re) / d };
}

/** Principal square root (Re >= 0; on the negative real axis Im >= 0, whatever the sign of a zero Im). */
export function sqrt(a: Complex): Complex {
  if (a.im === 0) return a.re >= 0 ? { re: Math.sqrt(a.re), im: 0 } : { re: 0, im: Math.sqrt(-a.re) };
  const m = Math.hypot(a.re, a.im);
  // The larger part first, the other by division: no cancellation when |im| << |re|.
  if (a.re >= 0) {
    const re = Math.sqrt((m + a.re) / 2);
    return { re, im: a.im / (2 * re) };
  }
  const im = Math.sqrt((m - a.re) / 2);
  return a.im >= 0 ? { re: a.im / (2 * im), im } : { re: -a.im / (2 * im), im: -im };
}

/** Square root on the branch that decays: Im >= 0, and Re > 0 where Im = 0. */
export function sqrtDecaying(a: Complex): Complex {
  const r = sqrt(a);
  return r.im < 0 ? neg(r) : r;
}

export function exp(a: Complex): Complex {
  const m = Math.exp(a.re);
  return { re: m * Math.cos(a.im), im: m * Math.sin(a.im) };
}

export const log = (a: Complex): Complex => ({
  re: Math.log(Math.hypot(a.re, a.im)),
  im: Math.atan2(a.im, a.re),
});
