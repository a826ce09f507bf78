/**
 * Linear least squares by Householder reflections (G. Golub, Numer. Math. 7, 206 (1965)): no normal equations, so nearly
 * dependent columns, as the poles of an index formula give, lose only half the digits. Columns are scaled first.
 */
export interface LeastSquares {
  readonly solution: readonly number[];
  /** (A^T A)^-1; multiply by the variance of the observations. */
  readonly inverseNormal: readonly (readonly number[])[];
}

/**
 * Minimises |A x - b|. `rows` are the rows of A, at least as many as columns.
 * @returns undefined where the columns are linearly dependent to rounding, or a number is not finite.
 */
export function solveLeastSquares(
  rows: readonly (readonly number[])[],
  b: readonly number[],
): LeastSquares | undefined {
  const m = rows.length;
  const n = rows[0]?.length ?? 0;
  if (n === 0 || m < n) return undefined;
  const scales = Array.from({ length: n }, (_, j) => Math.hypot(...rows.map((row) => row[j] ?? 0)));
  if (scales.some((s) => !(s > 0 && Number.isFinite(s)))) return undefined;
  const a = rows.map((row) => scales.map((s, j) => (row[j] ?? 0) / s));
  const c = [...b];
  const at = (i: number, j: number): number => a[i]?.[j] ?? 0;
  for (let k = 0; k < n; k++) {
    const norm = Math.hypot(...a.slice(k).map((row) => row[k] ?? 0));
    // Columns are of unit length, so what is left of this one tells how dependent it is on those before.
    if (!(norm > 1e-14)) return undefined;
    const alpha = at(k, k) > 0 ? -norm : norm;
    const v = a.slice(k).map((row, i) => (row[k] ?? 0) - (i === 0 ? alpha : 0));
    const vv = v.reduce((sum, x) => sum + x * x, 0);
    const reflect = (get: (i: number) => number, set: (i: number, value: number) => void): void => {
      const dot = v.reduce((sum, x, i) => sum + x * get(k + i), 0);
      for (const [i, x] of v.entries()) set(k + i, get(k + i) - ((2 * dot) / vv) * x);
    };
    for (let j = k; j < n; j++)
      reflect(
        (i) => at(i, j),
        (i, value) => {
          const row = a[i];
          if (row) row[j] = value;
        },
      );
    reflect(
      (i) => c[i] ?? 0,
      (i, value) => {
        c[i] = value;
      },
    );
  }
  /** R^-1, column by column, then everything follows from it. */
  const inverse = Array.from({ length: n }, (_, column) =>
    backSubstitute(at, n, (i) => (i === column ? 1 : 0)),
  );
  const solution = backSubstitute(at, n, (i) => c[i] ?? 0).map((x, j) => x / (scales[j] ?? 1));
  if (!solution.every(Number.isFinite)) return undefined;
  const inverseNormal = scales.map((si, i) =>
    scales.map((sj, j) => inverse.reduce((sum, col) => sum + (col[i] ?? 0) * (col[j] ?? 0), 0) / (si * sj)),
  );
  return { solution, inverseNormal };
}

/** Solves R x = b for the upper triangle R. */
function backSubstitute(
  at: (i: number, j: number) => number,
  n: number,
  b: (i: number) => number,
): readonly number[] {
  const x = new Array<number>(n).fill(0);
  for (let i = n - 1; i >= 0; i--) {
    let sum = b(i);
    for (let j = i + 1; j < n; j++) sum -= at(i, j) * (x[j] ?? 0);
    x[i] = sum / at(i, i);
  }
  return x;
}
