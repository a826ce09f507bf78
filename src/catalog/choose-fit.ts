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

const ROUNDING = 1e-9;

/** Wavelength in the reference the fit is printed in. */
export const fitWavelength_um = (fit: Fit, wave: FitWave): number =>
  fit.reference === 'air' ? wave.air_um : wave.vacuum_um;

export const inRange = (fit: Fit, wave: FitWave): boolean => reaches(fit.range_um, wave);

function reaches([lo, hi]: readonly [number, number], wave: FitWave): boolean {
  const within = (l: number): boolean => l >= lo * (1 - ROUNDING) && l <= hi * (1 + ROUNDING);
  return within(wave.vacuum_um) || within(wave.air_um);
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
  const sorted = [...reaching].sort((a, b) => compareRanks(rank(b), rank(a)));
  const best = sorted[0];
  if (best) return { fit: best, inRange: true, others: sorted.slice(1) };
  const distance = (f: Fit): number => {
    const l = fitWavelength_um(f, wave);
    return l < f.range_um[0] ? Math.log(f.range_um[0] / l) : Math.log(l / f.range_um[1]);
  };
  const nearest = [...fits].sort((a, b) => distance(a) - distance(b) || compareRanks(rank(b), rank(a)))[0];
  return nearest ? { fit: nearest, inRange: false, others: [] } : undefined;
}

function compareRanks(a: readonly number[], b: readonly number[]): number {
  for (const [i, x] of a.entries()) {
    const y = b[i] ?? 0;
    if (x !== y) return x < y ? -1 : 1;
  }
  return 0;
}
