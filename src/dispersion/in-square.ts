/**
 * The forms that are rational in x = L^2, on plain numbers: the path that batches and curves run through.
 *
 *   f(x) = offset + sum (b x + a)/(x - C) + sum p_m x^m + sum q_m x^-m
 *
 * With the residue D = a + b C, the Taylor coefficients of a pole in x are (b x + a) r, -D r^2, D r^3, -D r^4, r = 1/(x - C):
 * one division a pole. Derivatives by L follow from x = L^2: g' = 2 L x1, g'' = 2 x1 + 8 L^2 x2, g''' = 24 L x2 + 48 L^3 x3
 * where x1, x2, x3 are Taylor coefficients in x.
 */
import type { PowerTerm } from './parameters.ts';

export interface SquareForm {
  readonly offset: number;
  /** Per pole: b, a, C, D. */
  readonly poles: Float64Array;
  /** p_1, p_2, ...; empty where there are none. */
  readonly rising: Float64Array;
  /** q_1, q_2, ... */
  readonly falling: Float64Array;
}

/** No published formula goes beyond 12; a list as long as any power typed would have no end. */
const HIGHEST_POWER = 40;

/**
 * Splits power terms in L into an offset, rising and falling powers of L^2; undefined where a power is odd, fractional or so
 * high that it is no polynomial of use.
 */
export function splitEven(
  terms: readonly PowerTerm[],
): Pick<SquareForm, 'offset' | 'rising' | 'falling'> | undefined {
  let offset = 0;
  const rising: number[] = [];
  const falling: number[] = [];
  for (const { c, power } of terms) {
    if (power % 2 !== 0 || Math.abs(power) > HIGHEST_POWER) return undefined;
    if (power === 0) offset += c;
    else {
      const list = power > 0 ? rising : falling;
      const at = Math.abs(power) / 2 - 1;
      while (list.length <= at) list.push(0);
      list[at] = (list[at] as number) + c;
    }
  }
  return { offset, rising: Float64Array.from(rising), falling: Float64Array.from(falling) };
}

/** The value alone. */
export function valueInSquare(form: SquareForm, x: number): number {
  const { poles, rising, falling } = form;
  let f = form.offset;
  for (let i = 0; i < poles.length; i += 4) {
    f += (poles[i]! * x + poles[i + 1]!) / (x - poles[i + 2]!);
  }
  if (rising.length > 0) {
    let p = 0;
    for (let i = rising.length - 1; i >= 0; i--) p = (p + rising[i]!) * x;
    f += p;
  }
  if (falling.length > 0) {
    const y = 1 / x;
    let q = 0;
    for (let i = falling.length - 1; i >= 0; i--) q = (q + falling[i]!) * y;
    f += q;
  }
  return f;
}

/** Writes the four Taylor coefficients in x. */
export function taylorInSquare(form: SquareForm, x: number, out: Float64Array): void {
  const { poles, rising, falling } = form;
  let f0 = form.offset;
  let f1 = 0;
  let f2 = 0;
  let f3 = 0;
  for (let i = 0; i < poles.length; i += 4) {
    const r = 1 / (x - poles[i + 2]!);
    f0 += (poles[i]! * x + poles[i + 1]!) * r;
    let q = poles[i + 3]! * r * r;
    f1 -= q;
    q *= r;
    f2 += q;
    f3 -= q * r;
  }
  if (rising.length > 0) {
    let p0 = 0;
    let p1 = 0;
    let p2 = 0;
    let p3 = 0;
    for (let i = rising.length - 1; i >= -1; i--) {
      p3 = p3 * x + p2;
      p2 = p2 * x + p1;
      p1 = p1 * x + p0;
      p0 = p0 * x + (i < 0 ? 0 : rising[i]!);
    }
    f0 += p0;
    f1 += p1;
    f2 += p2;
    f3 += p3;
  }
  if (falling.length > 0) {
    const y = 1 / x;
    let q0 = 0;
    let q1 = 0;
    let q2 = 0;
    let q3 = 0;
    for (let i = falling.length - 1; i >= -1; i--) {
      q3 = q3 * y + q2;
      q2 = q2 * y + q1;
      q1 = q1 * y + q0;
      q0 = q0 * y + (i < 0 ? 0 : falling[i]!);
    }
    // Taylor coefficients of y = 1/x in x: -y^2, y^3, -y^4.
    const y2 = y * y;
    const y3 = y2 * y;
    f0 += q0;
    f1 -= q1 * y2;
    f2 += q1 * y3 + q2 * y2 * y2;
    f3 -= q1 * y2 * y2 + 2 * q2 * y2 * y3 + q3 * y3 * y3;
  }
  out[0] = f0;
  out[1] = f1;
  out[2] = f2;
  out[3] = f3;
}
