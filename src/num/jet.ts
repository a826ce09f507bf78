/**
 * Truncated Taylor series of third order: `[a0, a1, a2, a3]` stands for a0 + a1 h + a2 h^2 + a3 h^3 of a function of x + h.
 * Arithmetic on jets is exact differentiation: no step width, no cancellation. Derivatives are a1, 2 a2, 6 a3.
 *
 * Jets are immutable tuples and all functions are pure. Where a function has no value (log of 0, division by 0) the parts are
 * NaN or infinite, as with bare numbers; nothing throws.
 */
export type Jet = readonly [number, number, number, number];

export const constant = (value: number): Jet => [value, 0, 0, 0];
/** The independent variable itself, at `x`. */
export const variable = (x: number): Jet => [x, 1, 0, 0];

export const add = (a: Jet, b: Jet): Jet => [a[0] + b[0], a[1] + b[1], a[2] + b[2], a[3] + b[3]];
export const sub = (a: Jet, b: Jet): Jet => [a[0] - b[0], a[1] - b[1], a[2] - b[2], a[3] - b[3]];
export const scale = (a: Jet, s: number): Jet => [a[0] * s, a[1] * s, a[2] * s, a[3] * s];
export const neg = (a: Jet): Jet => [-a[0], -a[1], -a[2], -a[3]];
/** a + s with a bare number s. */
export const shift = (a: Jet, s: number): Jet => [a[0] + s, a[1], a[2], a[3]];

export const mul = (a: Jet, b: Jet): Jet => [
  a[0] * b[0],
  a[0] * b[1] + a[1] * b[0],
  a[0] * b[2] + a[1] * b[1] + a[2] * b[0],
  a[0] * b[3] + a[1] * b[2] + a[2] * b[1] + a[3] * b[0],
];

export function div(a: Jet, b: Jet): Jet {
  const r = 1 / b[0];
  const q0 = a[0] * r;
  const q1 = (a[1] - q0 * b[1]) * r;
  const q2 = (a[2] - q0 * b[2] - q1 * b[1]) * r;
  return [q0, q1, q2, (a[3] - q0 * b[3] - q1 * b[2] - q2 * b[1]) * r];
}

export const reciprocal = (a: Jet): Jet => div([1, 0, 0, 0], a);

/** f(a) from the Taylor coefficients of f at the point a[0]: f, f', f''/2, f'''/6. */
export function compose(f0: number, f1: number, f2: number, f3: number, a: Jet): Jet {
  const a1 = a[1];
  const a11 = a1 * a1;
  return [f0, f1 * a1, f1 * a[2] + f2 * a11, f1 * a[3] + 2 * f2 * a1 * a[2] + f3 * a11 * a1];
}

export function sqrt(a: Jet): Jet {
  const s0 = Math.sqrt(a[0]);
  const r = 0.5 / s0;
  const s1 = a[1] * r;
  const s2 = (a[2] - s1 * s1) * r;
  return [s0, s1, s2, (a[3] - 2 * s1 * s2) * r];
}

export function exp(a: Jet): Jet {
  const e = Math.exp(a[0]);
  return compose(e, e, e / 2, e / 6, a);
}

export function log(a: Jet): Jet {
  const r = 1 / a[0];
  return compose(Math.log(a[0]), r, -0.5 * r * r, (r * r * r) / 3, a);
}

/** a^p for a fixed real exponent; for a negative base the exponent has to be whole. */
export function pow(a: Jet, p: number): Jet {
  if (p === 0) return [1, 0, 0, 0];
  if (p === 1) return a;
  if (p === 2) return mul(a, a);
  const x = a[0];
  // Falling powers one by one: right at x = 0 too, where x^(p-1) is finite but x^p / x is not.
  const f2 = p * (p - 1);
  const f3 = f2 * (p - 2);
  return compose(
    x ** p,
    p * x ** (p - 1),
    f2 === 0 ? 0 : (f2 / 2) * x ** (p - 2),
    f3 === 0 ? 0 : (f3 / 6) * x ** (p - 3),
    a,
  );
}

/** c0 + c1 a + c2 a^2 + ... (constant term first) by Horner's rule. */
export function polynomial(coefficients: readonly number[], a: Jet): Jet {
  let p = 0;
  let d1 = 0;
  let d2 = 0;
  let d3 = 0;
  const x = a[0];
  for (let i = coefficients.length - 1; i >= 0; i--) {
    d3 = d3 * x + d2;
    d2 = d2 * x + d1;
    d1 = d1 * x + p;
    p = p * x + (coefficients[i] as number);
  }
  return compose(p, d1, d2, d3, a);
}

/** The n-th derivative a jet stands for, n = 0 to 3. */
export function derivative(a: Jet, order: 0 | 1 | 2 | 3): number {
  const factor = order === 2 ? 2 : order === 3 ? 6 : 1;
  return a[order] * factor;
}
