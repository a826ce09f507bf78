/**
 * Powers over the wavelength in vacuum, at the angle of the question, and where the data of the media end. Outside of them a
 * curve has no values, unless the question insists on extrapolation.
 */
import { INSIDE } from '../medium/bound-medium.ts';
import { type CurveMedium, type CurvePath, isCovered } from './curve-path.ts';
import { MOST_POINTS, type PointLimits, pointCount, spacedPoints, withPoints } from './curve-points.ts';
import { powerOf } from './interface-answer.ts';

export type Span_m = readonly [number, number];

export interface OutsideRange {
  /** Of the medium whose data end. */
  readonly name: string;
  readonly from_m: number;
  readonly to_m: number;
}

export interface WaveCurve {
  readonly kind: 'wave';
  readonly span_m: Span_m;
  /** Points at equal ratios, for a logarithmic axis. */
  readonly byRatio: boolean;
  readonly wavelength_m: readonly number[];
  /** For the polarization asked; NaN where there is no value. */
  readonly R: readonly number[];
  readonly T: readonly number[];
  readonly outside: readonly OutsideRange[];
  readonly isTooFine: boolean;
}

const LIMITS: PointLimits = { least: 481, most: MOST_POINTS };
/** Two octaves to either side of the octave that the wave is in: the span stays while the wave is stepped. */
const OCTAVES = 2;
/** Wider spans are shown by equal ratios. */
export const LINEAR_UP_TO = 4;
const REACH_POINTS = 400;
const HALVINGS = 60;

export function waveCurve(path: CurvePath, span_m: Span_m = usualSpan(path), limits = LIMITS): WaveCurve {
  const [low, high] = span_m;
  const { polarization, incidenceAngle_rad } = path.question;
  const byRatio = high / low > LINEAR_UP_TO;
  const fringes = 2 * path.coherentLength_m * (1 / low - 1 / high);
  const { count, isTooFine } = pointCount(fringes, limits);
  const outside = path.media.flatMap((medium) => outsideRanges(medium, span_m));
  const ends = outside.flatMap(({ from_m, to_m }) => [from_m, to_m]);
  const wavelength_m = withPoints(spacedPoints(low, high, count, byRatio), [path.wavelength_m, ...ends]);
  const powers = wavelength_m.map((at_m) => path.powersAt(at_m, incidenceAngle_rad));
  const R = powers.map((p) => (p ? powerOf(polarization, p.Rs, p.Rp) : Number.NaN));
  const T = powers.map((p) =>
    p && p.Ts !== null && p.Tp !== null ? powerOf(polarization, p.Ts, p.Tp) : Number.NaN,
  );
  return { kind: 'wave', span_m, byRatio, wavelength_m, R, T, outside, isTooFine };
}

/** Around the wave of the question as far as all media have data; the whole window where they have none at that wave. */
export function usualSpan({ wavelength_m, media }: Pick<CurvePath, 'wavelength_m' | 'media'>): Span_m {
  const octave = 2 ** Math.round(Math.log2(wavelength_m));
  const window: Span_m = [octave / 2 ** OCTAVES, octave * 2 ** OCTAVES];
  if (!isCovered(media, wavelength_m)) return window;
  const covered = (at_m: number): boolean => isCovered(media, at_m);
  const low = furthest(covered, wavelength_m, window[0]);
  const high = furthest(covered, wavelength_m, window[1]);
  return high > low * 1.001 ? [low, high] : [wavelength_m * 0.99, wavelength_m * 1.01];
}

/** Runs of a span in which a medium has no data of its own. */
function outsideRanges(medium: CurveMedium, [low, high]: Span_m): readonly OutsideRange[] {
  const isInside = (at_m: number): boolean => medium.reachAt(at_m) === INSIDE;
  const points = spacedPoints(low, high, REACH_POINTS, true);
  const ranges: { name: string; from_m: number; to_m: number }[] = [];
  let before: number | undefined;
  for (const at of points) {
    const last = ranges.at(-1);
    if (isInside(at)) {
      if (last && before !== undefined && last.to_m === before) last.to_m = edge(isInside, at, before);
    } else if (last && last.to_m === before) last.to_m = at;
    else
      ranges.push({
        name: medium.name,
        from_m: before === undefined ? at : edge(isInside, before, at),
        to_m: at,
      });
    before = at;
  }
  return ranges;
}

/** The last wave that is inside, on the way from one that is to an end of the window. */
function furthest(isInside: (at_m: number) => boolean, from_m: number, end_m: number): number {
  let inside = from_m;
  for (const at of spacedPoints(from_m, end_m, REACH_POINTS, true)) {
    if (!isInside(at)) return edge(isInside, inside, at);
    inside = at;
  }
  return end_m;
}

/** Halves the way from inside to outside; the last wave found inside. */
function edge(isInside: (at_m: number) => boolean, inside_m: number, outside_m: number): number {
  let [inside, outside] = [inside_m, outside_m];
  for (let i = 0; i < HALVINGS; i++) {
    const middle = (inside + outside) / 2;
    if (middle === inside || middle === outside) break;
    if (isInside(middle)) inside = middle;
    else outside = middle;
  }
  return inside;
}
