/**
 * Antireflection coatings of one and two layers on a transparent or absorbing material: design at normal incidence,
 * residual reflectance, and the band it is good for.
 *
 * Sources: Hecht, Optics, 9.7 (quarter-wave film); J. T. Cox and G. Hass, Physics of Thin Films 2 (1964), after Catalan
 * (1962), in the form of Macleod, Thin-Film Optical Filters, 4.3 (two layers).
 */
import type { Complex } from '../num/complex.ts';
import { coherentStack } from './coherent-stack.ts';
import { type Polarization, substanceFromIndex } from './layered-path.ts';
import { StackRefusal } from './stack-refusal.ts';

/** The film index that removes the reflection at its quarter wave: sqrt(n0 ns). */
export function idealFilmIndex(outsideIndex: number, substrateIndex: number): number {
  checkIndices(outsideIndex, substrateIndex);
  return Math.sqrt(outsideIndex * substrateIndex);
}

/** Quarter-wave thickness lambda/(4 n cos), for a tangential wave vector q = n0 sin(theta) over k0. */
export function quarterWaveThickness_m(vacuumWavelength_m: number, n: number, tangentialIndex = 0): number {
  checkIndices(n);
  if (!(Math.abs(tangentialIndex) < n)) {
    throw new StackRefusal(
      'angle-out-of-range',
      'the wave does not enter the film at this angle, so no thickness is a quarter wave',
      'take a smaller angle of incidence',
    );
  }
  return vacuumWavelength_m / (4 * Math.sqrt((n - tangentialIndex) * (n + tangentialIndex)));
}

/** Residual reflectance of a quarter-wave film at its wavelength, normal incidence: ((n0 ns - nf^2)/(n0 ns + nf^2))^2. */
export function quarterWaveFilmReflectance(
  outsideIndex: number,
  filmIndex: number,
  substrateIndex: number,
): number {
  checkIndices(outsideIndex, filmIndex, substrateIndex);
  const [wanted, has] = [outsideIndex * substrateIndex, filmIndex * filmIndex];
  return ((wanted - has) / (wanted + has)) ** 2;
}

/** One film between two media whose indices (n + ik) are functions of the vacuum wavelength. */
export interface DispersiveFilm {
  readonly outside: (vacuumWavelength_m: number) => number;
  readonly film: (vacuumWavelength_m: number) => Complex;
  readonly substrate: (vacuumWavelength_m: number) => Complex;
  readonly thickness_m: number;
}

/** Reflectance of the film at any wavelength and angle; the mean of s and p without a polarization. */
export function filmReflectance(
  { outside, film, substrate, thickness_m }: DispersiveFilm,
  vacuumWavelength_m: number,
  incidenceAngle_rad = 0,
  polarization?: Polarization,
): number {
  const inside = film(vacuumWavelength_m);
  const beyond = substrate(vacuumWavelength_m);
  const result = coherentStack(
    {
      incidence: substanceFromIndex(outside(vacuumWavelength_m)),
      layers: [{ ...substanceFromIndex(inside.re, inside.im), thickness_m }],
      exit: substanceFromIndex(beyond.re, beyond.im),
    },
    vacuumWavelength_m,
    incidenceAngle_rad,
  );
  return (polarization ? result[polarization] : result.unpolarized).R;
}

export interface LowReflectanceBand {
  readonly from_m: number;
  readonly to_m: number;
  /** True where the end of the range searched was reached before the limit: the band may go on. */
  readonly openBelow: boolean;
  readonly openAbove: boolean;
}

/** Points per octave at which the reflectance is looked at before an edge is narrowed down. */
const SEARCH_STEPS = 64;

/**
 * The band around a wavelength in which a reflectance stays at or below a limit, searched outwards within a range; null
 * where it is above the limit at that wavelength already.
 */
export function lowReflectanceBand(
  reflectance: (vacuumWavelength_m: number) => number,
  around_m: number,
  limit: number,
  searched: { readonly from_m: number; readonly to_m: number },
): LowReflectanceBand | null {
  if (!(searched.from_m > 0 && searched.from_m <= around_m && around_m <= searched.to_m)) {
    throw new StackRefusal(
      'out-of-range',
      'the wavelength lies outside the range to be searched',
      'give a range that holds it, from above zero on',
    );
  }
  if (!(reflectance(around_m) <= limit)) return null;
  const below = edge(reflectance, around_m, limit, searched.from_m);
  const above = edge(reflectance, around_m, limit, searched.to_m);
  return { from_m: below.at_m, to_m: above.at_m, openBelow: below.open, openAbove: above.open };
}

function edge(
  reflectance: (vacuumWavelength_m: number) => number,
  start_m: number,
  limit: number,
  end_m: number,
): { at_m: number; open: boolean } {
  const steps = Math.max(1, Math.ceil(SEARCH_STEPS * Math.abs(Math.log2(end_m / start_m))));
  let inside_m = start_m;
  for (let i = 1; i <= steps; i++) {
    const next_m = i === steps ? end_m : start_m * (end_m / start_m) ** (i / steps);
    if (!(reflectance(next_m) <= limit)) {
      return { at_m: crossing_m((l) => reflectance(l) - limit, inside_m, next_m), open: false };
    }
    inside_m = next_m;
  }
  return { at_m: end_m, open: true };
}

/** Ten digits of an edge are more than any index gives. */
const EDGE_WIDTH = 1e-10;

/**
 * The last wavelength found at which `excess` is not above zero, between one where it is not and one where it is, or where there
 * are no data (NaN). False position, the value of an end that stays put twice halved (the Illinois rule); halving where data end.
 */
function crossing_m(
  excess: (vacuumWavelength_m: number) => number,
  inside_m: number,
  outside_m: number,
): number {
  const width_m = EDGE_WIDTH * inside_m;
  let inside = inside_m;
  let outside = outside_m;
  let below = excess(inside);
  let above = excess(outside);
  let stayed: 'inside' | 'outside' | undefined;
  while (Math.abs(outside - inside) > width_m) {
    const whole = outside - inside;
    // Off both ends by a little, so that the bracket closes around an end that is the crossing.
    const least = Math.min(0.5, width_m / 4 / Math.abs(whole));
    const share = Number.isFinite(above) ? below / (below - above) : 0.5;
    const at = inside + whole * Math.min(1 - least, Math.max(least, share));
    const value = excess(at);
    if (value <= 0) {
      inside = at;
      below = value;
      if (stayed === 'outside') above /= 2;
      stayed = 'outside';
    } else {
      outside = at;
      above = value;
      if (stayed === 'inside') below /= 2;
      stayed = 'inside';
    }
  }
  return inside;
}

export interface TwoLayerCoating {
  /** The layer next to the medium of incidence, and the one on the substrate. */
  readonly outerThickness_m: number;
  readonly innerThickness_m: number;
  /** Optical thickness n d/lambda. */
  readonly outerWaves: number;
  readonly innerWaves: number;
}

/**
 * The two pairs of thicknesses that make R zero at one wavelength with two given transparent materials (V-coat), thinner
 * pair first. With D = ns - n0 and C = n1^2 ns - n0 n2^2:
 *   tan^2 d1 = D (n2^2 - n0 ns) n1^2/(C (n0 ns - n1^2)),  tan^2 d2 = D (n0 ns - n1^2) n2^2/(C (n2^2 - n0 ns)),
 *   tan d1 tan d2 = n1 n2 D/C,  d = 2 pi n t/lambda.
 * C = 0 is the pair of quarter waves. Refuses where a right-hand side is negative: no thicknesses of these two do it.
 */
export function twoLayerCoating(
  outsideIndex: number,
  outerIndex: number,
  innerIndex: number,
  substrateIndex: number,
  vacuumWavelength_m: number,
): readonly [TwoLayerCoating, TwoLayerCoating] {
  checkIndices(outsideIndex, outerIndex, innerIndex, substrateIndex);
  const step = substrateIndex - outsideIndex;
  const wanted = outsideIndex * substrateIndex;
  const cross = difference(outerIndex ** 2 * substrateIndex, outsideIndex * innerIndex ** 2);
  const outer = difference(wanted, outerIndex ** 2);
  const inner = difference(innerIndex ** 2, wanted);
  if (step * cross * outer * inner < 0) {
    const bounds = [outerIndex * Math.sqrt(substrateIndex / outsideIndex), Math.sqrt(wanted)];
    const [low, high] = [Math.min(...bounds).toFixed(3), Math.max(...bounds).toFixed(3)];
    throw new StackRefusal(
      'no-two-layer-coating',
      `no thicknesses of ${outerIndex} on ${innerIndex} remove the reflection of ${substrateIndex}`,
      step * outer > 0
        ? `take an inner index between ${low} and ${high}`
        : `take an inner index below ${low} or above ${high}`,
    );
  }
  // tan d1 = sqrt(num/den) in the first quadrant, a vanishing factor included.
  const tangent = (a: number, b: number): number =>
    Math.atan2(Math.sqrt(Math.abs(step * a)), Math.sqrt(Math.abs(cross * b)));
  // An outer layer that is ideal by itself needs no inner one, and the other way round.
  const first = outer === 0 ? Math.PI / 2 : tangent(inner * outerIndex ** 2, outer);
  const sharp = outer === 0 ? 0 : tangent(outer * innerIndex ** 2, inner);
  const second = step * cross < 0 ? Math.PI - sharp : sharp;
  const solution = (d1: number, d2: number): TwoLayerCoating => ({
    outerThickness_m: (d1 * vacuumWavelength_m) / (2 * Math.PI * outerIndex),
    innerThickness_m: (d2 * vacuumWavelength_m) / (2 * Math.PI * innerIndex),
    outerWaves: d1 / (2 * Math.PI),
    innerWaves: d2 / (2 * Math.PI),
  });
  const a = solution(first, second);
  const b = solution(Math.PI - first, Math.PI - second);
  const total = (x: TwoLayerCoating): number => x.outerThickness_m + x.innerThickness_m;
  return total(a) <= total(b) ? [a, b] : [b, a];
}

/** a - b, zero where they agree to rounding: there the sign would be chance. */
const difference = (a: number, b: number): number => (Math.abs(a - b) < 1e-13 * a ? 0 : a - b);

function checkIndices(...indices: number[]): void {
  for (const n of indices) {
    if (!(n > 0 && Number.isFinite(n))) {
      throw new StackRefusal(
        'not-transparent',
        `a refractive index of ${n} is not that of a transparent medium`,
        'give real indices above zero',
      );
    }
  }
}
