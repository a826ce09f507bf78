/**
 * Standard uncertainty of results from independent, normally distributed inputs.
 *
 *   u^2 = sum_i [ (df/dx_i)^2 u_i^2 + (1/2) (d2f/dx_i^2)^2 u_i^4 ]
 *
 * Source: JCGM 100:2008 (GUM) 5.1.2 with the second-order term of its note, which carries the case of a reflectance near a
 * zero, where the first order vanishes. Both derivatives come from f at x_i +- u_i, so they are those over the very interval
 * that matters. Where f is no parabola there (the fringes of a thick etalon), which two further points tell, the distribution
 * is propagated instead, by even sampling of all inputs that matter together (JCGM 101:2008): u is its standard deviation.
 */
import { normalQuantile } from '../num/normal-quantile.ts';
import { spreadSequence } from '../num/spread-sequence.ts';

export interface UncertainInput {
  /** In words, e.g. "index of N-BK7"; inputs of one name count together when the greatest is named. */
  readonly name: string;
  readonly standardUncertainty: number;
}

export interface Spread {
  readonly standardUncertainty: number;
  /** Name of the input that contributes most. */
  readonly dominant: string;
  readonly method: 'expansion' | 'sampled';
  /** Of the result over the distribution of its inputs, where it was sampled. */
  readonly mean: number | null;
}

/** Where the parabola through -1, 0 and 1 standard uncertainties is tried; no multiples of one another. */
const PROBES = [0.618, -0.382];
/** Greatest misfit of the parabola, over the standard uncertainty it gives. */
const MISFIT = 0.015;
/** Below this a misfit is rounding. */
const ROUNDING = 1e-11;
const SAMPLES = 512;
/** Of one input alone, for its share. */
const OWN_SAMPLES = 128;
/** An input that adds less than this share of the variance, and follows its parabola, is not sampled. */
const NEGLIGIBLE = 1e-4;
/** A standard uncertainty below this is not worth sampling for: powers are fractions of 1. */
const WORTH_SAMPLING = 1e-5;
/** More dimensions are not filled evenly by the samples. */
const MOST_SAMPLED = 8;

interface Part {
  readonly variance: number;
  readonly bends: boolean;
}

/**
 * Spreads of several results of the same inputs, in the order of `values`; null where there are no inputs. `at` gives the
 * results with every input moved by its own shift, in the order of the inputs.
 */
export function propagateAll(
  values: readonly number[],
  inputs: readonly UncertainInput[],
  at: (shifts: readonly number[]) => readonly number[],
): readonly (Spread | null)[] {
  if (inputs.length === 0) return values.map(() => null);
  const alone = (i: number, shift: number): readonly number[] =>
    at(inputs.map((_, j) => (j === i ? shift : 0)));
  const parts = inputs.map(({ standardUncertainty: u }, i) => {
    const up = alone(i, u);
    const down = alone(i, -u);
    const probed = PROBES.map((z) => alone(i, z * u));
    return values.map((value, k) => partOf(value, k, up, down, probed));
  });
  const totals = values.map((_, k) => sum(parts.map((p) => (p[k] as Part).variance)));
  const bending = values.map(
    (_, k) =>
      Math.sqrt(totals[k] as number) > WORTH_SAMPLING &&
      parts.some((p) => bends(p[k] as Part, totals[k] as number)),
  );
  const mattering = mostMattering(parts, totals, bending);
  const together = mattering.length > 0 ? sampleTogether(mattering, inputs, at) : [];
  const apart = mattering.map((i) =>
    parts[i]?.some((p, k) => bending[k] && p.bends)
      ? sampleOne((inputs[i] as UncertainInput).standardUncertainty, (x) => alone(i, x))
      : null,
  );
  return values.map((_, k) => {
    const own = parts.map((p) => (p[k] as Part).variance);
    if (!bending[k]) return spreadOf(inputs, own, totals[k] as number, null);
    const { mean, variance } = moments(together.map((r) => r[k] as number));
    const rest = sum(own.map((v, i) => (mattering.includes(i) ? 0 : v)));
    const shares = own.map((v, i) => {
      const single = apart[mattering.indexOf(i)];
      return single ? moments(single.map((r) => r[k] as number)).variance : v;
    });
    return spreadOf(inputs, shares, variance + rest, mean);
  });
}

const bends = (part: Part, total: number): boolean => part.bends && part.variance > NEGLIGIBLE * total;

/** Inputs to be sampled together for the results that bend, most important first. */
function mostMattering(
  parts: readonly (readonly Part[])[],
  totals: readonly number[],
  bending: readonly boolean[],
): readonly number[] {
  const share = (p: readonly Part[]): number =>
    Math.max(...p.map((part, k) => (bending[k] ? part.variance / (totals[k] as number) : 0)));
  return parts
    .map((p, i) => ({ i, share: share(p) }))
    .filter((p) => p.share > NEGLIGIBLE)
    .sort((a, b) => b.share - a.share)
    .slice(0, MOST_SAMPLED)
    .map((p) => p.i);
}

function partOf(
  value: number,
  k: number,
  up: readonly number[],
  down: readonly number[],
  probed: readonly (readonly number[])[],
): Part {
  const first = ((up[k] as number) - (down[k] as number)) / 2;
  const second = (up[k] as number) + (down[k] as number) - 2 * value;
  const variance = first * first + (second * second) / 2;
  const misfit = PROBES.map((z, i) => {
    const parabola = value + first * z + (second / 2) * z * z;
    return Math.abs((probed[i]?.[k] as number) - parabola);
  });
  const worst = Math.max(...misfit);
  const bends = worst > ROUNDING && worst > MISFIT * Math.sqrt(variance);
  // What the parabola misses counts too: a fringe may bring f back to where it was at both ends.
  return { variance: bends ? Math.max(variance, worst * worst) : variance, bends };
}

function sampleTogether(
  mattering: readonly number[],
  inputs: readonly UncertainInput[],
  at: (shifts: readonly number[]) => readonly number[],
): readonly (readonly number[])[] {
  const point = spreadSequence(mattering.length);
  return Array.from({ length: SAMPLES }, (_, n) => {
    const place = point(n);
    const shifts = new Array<number>(inputs.length).fill(0);
    for (const [d, i] of mattering.entries()) {
      shifts[i] = normalQuantile(place[d] as number) * (inputs[i] as UncertainInput).standardUncertainty;
    }
    return at(shifts);
  });
}

/** One input alone, at evenly spaced quantiles. */
function sampleOne(u: number, at: (shift: number) => readonly number[]): readonly (readonly number[])[] {
  return Array.from({ length: OWN_SAMPLES }, (_, n) => at(u * normalQuantile((n + 0.5) / OWN_SAMPLES)));
}

/** `mean`: null for an expansion. */
function spreadOf(
  inputs: readonly UncertainInput[],
  variances: readonly number[],
  total: number,
  mean: number | null,
): Spread {
  return {
    standardUncertainty: Math.sqrt(total),
    dominant: dominantName(inputs, variances),
    method: mean === null ? 'expansion' : 'sampled',
    mean,
  };
}

function moments(values: readonly number[]): { readonly mean: number; readonly variance: number } {
  const mean = sum(values) / values.length;
  return { mean, variance: sum(values.map((x) => (x - mean) ** 2)) / values.length };
}

const sum = (values: readonly number[]): number => values.reduce((total, x) => total + x, 0);

function dominantName(inputs: readonly UncertainInput[], variances: readonly number[]): string {
  const byName = new Map<string, number>();
  inputs.forEach(({ name }, i) => {
    byName.set(name, (byName.get(name) ?? 0) + (variances[i] as number));
  });
  return [...byName].reduce((best, next) => (next[1] > best[1] ? next : best), ['', -1] as const)[0];
}
