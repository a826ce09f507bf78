/**
 * The non-linear part of a Sellmeier fit. Parameters stand as B1, C1, B2, C2 ... (C in um, ascending), the form
 * n^2 = 1 + sum B L^2/(L^2 - C^2).
 *
 * The strengths are linear in n^2, so for poles on a coarse grid below and above the range they follow directly; the best
 * few sets start a Levenberg-Marquardt search in B and ln C, and Gauss-Newton steps by orthogonal reflections bring its
 * result to the last digits, which the search's normal equations cannot.
 */
import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import type { IndexPoint } from './fit-points.ts';
import { solveLeastSquares } from './linear-least-squares.ts';

/** NaN where n^2 is not positive. */
export function sellmeierIndex(values: readonly number[], wavelength_um: number): number {
  return Math.sqrt(squareOf(values, wavelength_um));
}

/** dn/dB1, dn/dC1, dn/dB2 ... */
export function sellmeierGradient(values: readonly number[], wavelength_um: number): readonly number[] {
  const x = wavelength_um * wavelength_um;
  const n = sellmeierIndex(values, wavelength_um);
  return values.map((_, i) => {
    const B = values[i - (i % 2)] ?? 0;
    const C = values[i - (i % 2) + 1] ?? 0;
    const d = x - C * C;
    return i % 2 === 0 ? x / d / (2 * n) : (B * x * C) / (d * d * n);
  });
}

function squareOf(values: readonly number[], wavelength_um: number): number {
  const x = wavelength_um * wavelength_um;
  let square = 1;
  for (let i = 0; i + 1 < values.length; i += 2) {
    const C = values[i + 1] ?? 0;
    square += ((values[i] ?? 0) * x) / (x - C * C);
  }
  return square;
}

/** Starts tried in full; the grid is fine enough that one of the first few leads to the least sum. */
const STARTS = 6;

export function fitSellmeier(
  points: readonly IndexPoint[],
  sigma: readonly number[],
  terms: number,
): readonly number[] | undefined {
  const few = thinned(points.length);
  const somePoints = few.flatMap((i) => points[i] ?? []);
  const someSigma = few.map((i) => sigma[i] ?? 1);
  const candidates = startPoles(points, terms)
    .flatMap((poles) => {
      const values = strengthsFor(somePoints, someSigma, poles);
      return values ? [{ values, sum: sumOfSquares(somePoints, someSigma, values) }] : [];
    })
    .filter((c) => Number.isFinite(c.sum))
    .sort((a, b) => a.sum - b.sum);
  const physical = candidates.filter((c) => c.values.every((v) => v > 0));
  let best: { readonly values: readonly number[]; readonly sum: number } | undefined;
  for (const { values } of (physical.length > 0 ? physical : candidates).slice(0, STARTS)) {
    const refined = polish(points, sigma, search(points, sigma, values));
    const sum = sumOfSquares(points, sigma, refined);
    // Strictly better by more than rounding, so that ties go to the earlier start on every machine.
    if (Number.isFinite(sum) && (!best || sum < best.sum * (1 - 1e-9))) best = { values: refined, sum };
  }
  return best && byPole(best.values);
}

/** Indices of enough points, evenly chosen, to rank the starts by. */
function thinned(count: number): readonly number[] {
  const most = 60;
  if (count <= most) return Array.from({ length: count }, (_, i) => i);
  return Array.from({ length: most }, (_, i) => Math.round((i * (count - 1)) / (most - 1)));
}

/** All sets of poles on the grid, at least one below the range. */
function startPoles(points: readonly IndexPoint[], terms: number): readonly (readonly number[])[] {
  const shortest = points[0]?.wavelength_um ?? 1;
  const longest = points.at(-1)?.wavelength_um ?? 1;
  const below = [0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9].map((f) => f * shortest);
  const above = [1.3, 1.8, 2.7, 4, 6, 10, 20].map((f) => f * longest);
  const out: (readonly number[])[] = [];
  for (let low = Math.min(terms, 3); low >= 1; low--)
    for (const a of choices(below, low)) for (const b of choices(above, terms - low)) out.push([...a, ...b]);
  return out;
}

function choices(items: readonly number[], count: number): readonly (readonly number[])[] {
  if (count === 0) return [[]];
  return items.flatMap((item, i) => choices(items.slice(i + 1), count - 1).map((rest) => [item, ...rest]));
}

/** B for given poles by linear least squares of n^2 - 1, weighted so that the errors are those of n. */
function strengthsFor(
  points: readonly IndexPoint[],
  sigma: readonly number[],
  poles: readonly number[],
): readonly number[] | undefined {
  const weight = (p: IndexPoint, i: number): number => 1 / (2 * p.n * (sigma[i] ?? 1));
  const rows = points.map((p, i) => {
    const x = p.wavelength_um ** 2;
    return poles.map((C) => (x / (x - C * C)) * weight(p, i));
  });
  const strengths = solveLeastSquares(
    rows,
    points.map((p, i) => (p.n ** 2 - 1) * weight(p, i)),
  )?.solution;
  return strengths && poles.flatMap((C, i) => [strengths[i] ?? 0, C]);
}

/** Levenberg-Marquardt in B and ln C, residuals in units of the points' uncertainty (or of 1e-5). */
function search(
  points: readonly IndexPoint[],
  sigma: readonly number[],
  start: readonly number[],
): readonly number[] {
  const unit = sigma.every((s) => s === 1) ? 1e-5 : 1;
  const scale = points.map((_, i) => (sigma[i] ?? 1) * unit);
  const fromLog = (p: readonly number[]): number[] => p.map((v, i) => (i % 2 === 0 ? v : Math.exp(v)));
  try {
    // The number of the point stands in for x, so that each may have its own uncertainty.
    const data = { x: points.map((_, i) => i), y: points.map((p, i) => p.n / (scale[i] ?? 1)) };
    const { parameterValues } = levenbergMarquardt(
      data,
      (p) => {
        const values = fromLog(p);
        return (i) => finite(sellmeierIndex(values, points[i]?.wavelength_um ?? 1)) / (scale[i] ?? 1);
      },
      {
        initialValues: start.map((v, i) => (i % 2 === 0 ? v : Math.log(v))),
        jacobianFunction: (p) => {
          const values = fromLog(p);
          return (i) =>
            sellmeierGradient(values, points[i]?.wavelength_um ?? 1).map(
              (g, j) => finite(j % 2 === 0 ? g : g * (values[j] ?? 1)) / (scale[i] ?? 1),
            );
        },
        damping: 1e-2,
        maxIterations: 200,
        errorTolerance: 1e-12,
      },
    );
    return fromLog(parameterValues);
  } catch {
    // The search may step where its matrix has no inverse; the start is then as good as its result.
    return start;
  }
}

/** Where the formula has no index the fit is far from the points: any number far from them will do. */
const finite = (x: number): number => (Number.isFinite(x) ? x : 0);

const MAX_STEPS = 60;

/** Gauss-Newton with step halving until the sum of squares no longer falls. */
function polish(
  points: readonly IndexPoint[],
  sigma: readonly number[],
  start: readonly number[],
): readonly number[] {
  let values = start;
  let sum = sumOfSquares(points, sigma, values);
  for (let step = 0; step < MAX_STEPS && Number.isFinite(sum); step++) {
    const rows = points.map((p, i) =>
      sellmeierGradient(values, p.wavelength_um).map((g) => g / (sigma[i] ?? 1)),
    );
    const rest = points.map((p, i) => (p.n - sellmeierIndex(values, p.wavelength_um)) / (sigma[i] ?? 1));
    const move = solveLeastSquares(rows, rest)?.solution;
    if (!move) break;
    const next = shortened(points, sigma, values, move, sum);
    if (!next) break;
    values = next.values;
    const gained = sum - next.sum;
    sum = next.sum;
    if (gained <= 1e-14 * sum) break;
  }
  return values;
}

function shortened(
  points: readonly IndexPoint[],
  sigma: readonly number[],
  values: readonly number[],
  move: readonly number[],
  sum: number,
): { readonly values: readonly number[]; readonly sum: number } | undefined {
  for (let share = 1; share > 1e-6; share /= 2) {
    const trial = values.map((v, i) => v + share * (move[i] ?? 0));
    const trialSum = sumOfSquares(points, sigma, trial);
    const ordered = trial.every((v, i) => i % 2 === 0 || v > 0);
    if (ordered && trialSum < sum) return { values: trial, sum: trialSum };
  }
  return undefined;
}

function sumOfSquares(
  points: readonly IndexPoint[],
  sigma: readonly number[],
  values: readonly number[],
): number {
  let sum = 0;
  for (const [i, p] of points.entries())
    sum += ((p.n - sellmeierIndex(values, p.wavelength_um)) / (sigma[i] ?? 1)) ** 2;
  return sum;
}

/** Terms in ascending order of their poles. */
function byPole(values: readonly number[]): readonly number[] {
  const terms = values.flatMap((B, i) => (i % 2 === 0 ? [[B, values[i + 1] ?? 0] as const] : []));
  return terms.sort((a, b) => a[1] - b[1]).flat();
}
