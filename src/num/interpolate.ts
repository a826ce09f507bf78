/**
 * Interpolants of tabulated values as piecewise cubic polynomials, so that their own derivatives are exact.
 *
 * Knots rise strictly (at least one). Outside the knots the end piece continues; whether a place outside may be asked for is
 * the caller's business. At an inner knot of a linear interpolant the derivative is that of the piece to the right.
 */
export interface Interpolant {
  readonly knots: Float64Array;
  /** c0, c1, c2, c3 per piece, in powers of (x - left knot of the piece). */
  readonly coefficients: Float64Array;
}

/** Thrown for tables no interpolant exists for. The message says what is wrong and what would be right. */
export class TableError extends Error {
  override readonly name = 'TableError';
}

function check(x: readonly number[], y: readonly number[], least: number): void {
  if (x.length !== y.length)
    throw new TableError(`a table needs one value per place: ${x.length} places, ${y.length} values`);
  if (x.length < least) throw new TableError(`a table needs at least ${least} rows, not ${x.length}`);
  for (let i = 0; i < x.length; i++) {
    if (!Number.isFinite(x[i]) || !Number.isFinite(y[i]))
      throw new TableError(`row ${i + 1} of the table is not a finite number`);
    if (i > 0 && (x[i] as number) <= (x[i - 1] as number))
      throw new TableError(`places of a table have to rise strictly: row ${i + 1} does not`);
  }
}

/** Straight lines between the rows; one row gives a constant. */
export function linear(x: readonly number[], y: readonly number[]): Interpolant {
  check(x, y, 1);
  const pieces = Math.max(1, x.length - 1);
  const coefficients = new Float64Array(4 * pieces);
  for (let i = 0; i < pieces; i++) {
    coefficients[4 * i] = y[i] as number;
    if (x.length > 1)
      coefficients[4 * i + 1] =
        ((y[i + 1] as number) - (y[i] as number)) / ((x[i + 1] as number) - (x[i] as number));
  }
  return { knots: Float64Array.from(x), coefficients };
}

/** The parabola through exactly three rows. */
export function quadratic(x: readonly number[], y: readonly number[]): Interpolant {
  check(x, y, 3);
  if (x.length > 3) throw new TableError(`a parabola passes through exactly 3 rows, not ${x.length}`);
  const [x0, x1, x2] = x as [number, number, number];
  const [y0, y1, y2] = y as [number, number, number];
  const d01 = (y1 - y0) / (x1 - x0);
  const d12 = (y2 - y1) / (x2 - x1);
  const c2 = (d12 - d01) / (x2 - x0);
  const c1 = d01 - c2 * (x1 - x0);
  return { knots: Float64Array.of(x0, x2), coefficients: Float64Array.of(y0, c1, c2, 0) };
}

/**
 * Cubic spline with not-a-knot ends (the third derivative is continuous at the second and the last but one row), which is
 * fourth-order accurate up to the ends, unlike the natural spline. Three rows give the parabola, two the line.
 * Source of the construction: C. de Boor, A Practical Guide to Splines, ch. IV.
 */
export function cubic(x: readonly number[], y: readonly number[]): Interpolant {
  const n = x.length;
  if (n < 3) return linear(x, y);
  if (n === 3) return quadratic(x, y);
  check(x, y, 4);
  const h = new Float64Array(n - 1);
  const d = new Float64Array(n - 1);
  for (let i = 0; i < n - 1; i++) {
    h[i] = (x[i + 1] as number) - (x[i] as number);
    d[i] = ((y[i + 1] as number) - (y[i] as number)) / (h[i] as number);
  }
  const s = slopes(h, d);
  const coefficients = new Float64Array(4 * (n - 1));
  for (let i = 0; i < n - 1; i++) {
    const hi = h[i] as number;
    const di = d[i] as number;
    const si = s[i] as number;
    const sj = s[i + 1] as number;
    coefficients[4 * i] = y[i] as number;
    coefficients[4 * i + 1] = si;
    coefficients[4 * i + 2] = (3 * di - 2 * si - sj) / hi;
    coefficients[4 * i + 3] = (si + sj - 2 * di) / (hi * hi);
  }
  return { knots: Float64Array.from(x), coefficients };
}

/** Slopes at the knots from the tridiagonal system of the not-a-knot spline, solved without pivoting (it is dominant inside). */
function slopes(h: Float64Array, d: Float64Array): Float64Array {
  const n = h.length + 1;
  const at = (a: Float64Array, i: number): number => a[i] as number;
  const diagonal = new Float64Array(n);
  const upper = new Float64Array(n);
  const right = new Float64Array(n);
  const h0 = at(h, 0);
  const h1 = at(h, 1);
  diagonal[0] = h1;
  upper[0] = h0 + h1;
  right[0] = ((h0 + 2 * (h0 + h1)) * h1 * at(d, 0) + h0 * h0 * at(d, 1)) / (h0 + h1);
  for (let i = 1; i < n - 1; i++) {
    const lower = at(h, i) / at(diagonal, i - 1);
    diagonal[i] = 2 * (at(h, i - 1) + at(h, i)) - lower * at(upper, i - 1);
    upper[i] = at(h, i - 1);
    right[i] = 3 * (at(h, i) * at(d, i - 1) + at(h, i - 1) * at(d, i)) - lower * at(right, i - 1);
  }
  const hl = at(h, n - 2);
  const hk = at(h, n - 3);
  const lower = (hk + hl) / at(diagonal, n - 2);
  diagonal[n - 1] = hk - lower * at(upper, n - 2);
  right[n - 1] =
    (hl * hl * at(d, n - 3) + (2 * (hk + hl) + hl) * hk * at(d, n - 2)) / (hk + hl) -
    lower * at(right, n - 2);
  const s = new Float64Array(n);
  s[n - 1] = at(right, n - 1) / at(diagonal, n - 1);
  for (let i = n - 2; i >= 0; i--) s[i] = (at(right, i) - at(upper, i) * at(s, i + 1)) / at(diagonal, i);
  return s;
}

/** Index of the piece that holds x (bisection). */
export function pieceAt(knots: Float64Array, x: number): number {
  let low = 0;
  let high = knots.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (x >= (knots[middle] as number)) low = middle;
    else high = middle;
  }
  return low;
}

/** Taylor coefficients of the interpolant at x: value, first derivative, half the second, a sixth of the third. */
export function taylorAt(f: Interpolant, x: number): [number, number, number, number] {
  const i = pieceAt(f.knots, x);
  const t = x - (f.knots[i] as number);
  const c = f.coefficients;
  const c0 = c[4 * i] as number;
  const c1 = c[4 * i + 1] as number;
  const c2 = c[4 * i + 2] as number;
  const c3 = c[4 * i + 3] as number;
  return [c0 + t * (c1 + t * (c2 + t * c3)), c1 + t * (2 * c2 + 3 * t * c3), c2 + 3 * t * c3, c3];
}
