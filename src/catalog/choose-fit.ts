/**
 * Which fit of a material answers for a wave.
 *
 * Fits of one axis that do not overlap are bands of one material: the wave picks. Where they overlap, `recommended` wins and
 * the others are second opinions. Between several recommended ones the better stated accuracy wins, unless the question's
 * temperature is one that only a second opinion can honour. Between bands there is a gap, never an interpolation.
 */
import type { Axis, Fit, Material } from './types.ts';

/** The wave in both references: range limits are printed numbers, so a wave that lies on a limit in either one counts as inside. */
export interface FitWave {
  readonly vacuum_um: number;
  readonly air_um: number;
}

export const AXIS_ORDER: readonly Axis[] = ['isotropic', 'ordinary', 'extraordinary', 'x', 'y', 'z'];

/** A single value printed for a line holds for the names that line goes by: 589.3, 589.29 and 589.6 nm, and nearly for 587.6 nm. */
const LINE_WIDTH = 3e-3;
/** Limits often come from photon energies: 6.2 um for 0.2 eV, which is 6.199 um. */
const CONVERSION = 3e-4;
/** However few digits a limit is printed to, it is no further off than this. */
const WIDEST = 0.022;

/** Wavelength in the reference the fit is printed in. */
export const fitWavelength_um = (fit: Fit, wave: FitWave): number =>
  fit.reference === 'air' ? wave.air_um : wave.vacuum_um;

export const inRange = (fit: Fit, wave: FitWave): boolean => reaches(fit.range_um, wave);

/**
 * Limits are printed numbers: a wave within half a unit of a limit's last digit (at most 2.2 %) counts as inside, in either
 * reference. `atEdge` tells the answer to say so.
 */
function reaches(range_um: readonly [number, number], wave: FitWave): boolean {
  const [lo, hi] = range_um;
  // Well inside or well outside no margin matters; a pass over the whole catalogue lives by this.
  if (wave.vacuum_um >= lo && wave.vacuum_um <= hi) return true;
  if (wave.vacuum_um < lo * (1 - 2 * WIDEST) || wave.vacuum_um > hi * (1 + 2 * WIDEST)) return false;
  const [shortest, longest] = reachOf(range_um);
  const within = (l: number): boolean => l >= shortest && l <= longest;
  return within(wave.vacuum_um) || within(wave.air_um);
}

/** The wavelengths that count as inside printed limits, in either reference. */
export function reachOf([lo, hi]: readonly [number, number]): readonly [number, number] {
  const [low, high] = lo === hi ? [LINE_WIDTH, LINE_WIDTH] : [margin(lo), margin(hi)];
  return [lo * (1 - low), hi * (1 + high)];
}

function margin(limit_um: number): number {
  const decimals = /\.(\d+)$/.exec(String(limit_um))?.[1]?.length ?? 0;
  return Math.max(CONVERSION, Math.min(WIDEST, (0.5 * 10 ** -decimals) / limit_um));
}

/** True where the wave lies outside the printed limits, though not by more than they are rounded. */
export function atEdge(fit: Fit, wave: FitWave): boolean {
  const l = fitWavelength_um(fit, wave);
  const [lo, hi] = fit.range_um;
  return lo !== hi && inRange(fit, wave) && (l < lo * (1 - CONVERSION) || l > hi * (1 + CONVERSION));
}

/** A fit may be the recommended one over a part of its range only. */
export const isRecommended = (fit: Fit, wave: FitWave): boolean =>
  fit.recommendedRange_um ? reaches(fit.recommendedRange_um, wave) : fit.recommended;

/** Axes a material is described for, in the usual order. */
export function axesOf(material: Material): readonly Axis[] {
  return AXIS_ORDER.filter((axis) => material.fits.some((f) => f.axis === axis));
}

/** Axis meant when none is named: the first in the usual order that has a fit reaching the wave, else the first at all. */
export function defaultAxis(material: Material, wave: FitWave): Axis | undefined {
  const reached = AXIS_ORDER.find((axis) => material.fits.some((f) => f.axis === axis && inRange(f, wave)));
  return reached ?? axesOf(material)[0];
}

export interface FitChoice {
  readonly fit: Fit;
  readonly inRange: boolean;
  /** Other fits that reach the wave, best first. */
  readonly others: readonly Fit[];
}

/** `prefers` may lift a fit above its equals (complex data where the medium absorbs, a model that takes the temperature asked). */
export function chooseFit(
  material: Material,
  axis: Axis,
  wave: FitWave,
  prefers: (fit: Fit) => number = () => 0,
): FitChoice | undefined {
  const fits = material.fits.filter((f) => f.axis === axis);
  const reaching = fits.filter((f) => inRange(f, wave));
  const rank = (f: Fit): readonly number[] => [
    prefers(f),
    isRecommended(f, wave) ? 1 : 0,
    -(f.accuracy_n ?? Number.POSITIVE_INFINITY),
    f.grade === 'A' ? 2 : f.grade === 'B' ? 1 : 0,
  ];
  const [best, ...others] = bestFirst(reaching, rank);
  if (best) return { fit: best, inRange: true, others };
  const distance = (f: Fit): number => {
    const l = fitWavelength_um(f, wave);
    return l < f.range_um[0] ? Math.log(f.range_um[0] / l) : Math.log(l / f.range_um[1]);
  };
  // Sorting keeps the order of equals.
  const nearest = [...bestFirst(fits, rank)].sort((a, b) => distance(a) - distance(b))[0];
  return nearest ? { fit: nearest, inRange: false, others: [] } : undefined;
}

/** A rank may take a while to find: each is found once, and none where there is nothing to choose. */
function bestFirst(fits: readonly Fit[], rank: (fit: Fit) => readonly number[]): readonly Fit[] {
  if (fits.length < 2) return fits;
  return fits
    .map((fit) => ({ fit, rank: rank(fit) }))
    .sort((a, b) => compareRanks(b.rank, a.rank))
    .map(({ fit }) => fit);
}

function compareRanks(a: readonly number[], b: readonly number[]): number {
  for (const [i, x] of a.entries()) {
    const y = b[i] ?? 0;
    if (x !== y) return x < y ? -1 : 1;
  }
  return 0;
}
