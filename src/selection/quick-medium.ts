/**
 * A material at one wave with no more work than a search needs. The same fit answers as in `mediumAtWave` at the fit's own
 * conditions, and n, k, group index and dispersion are its values to rounding; cautions and second opinions are left to it. At a
 * temperature asked for `mediumAtWave` itself answers.
 */
import { chooseFit, type FitWave, fitWavelength_um } from '../catalog/choose-fit.ts';
import type { Axis, Fit, Material } from '../catalog/types.ts';
import { type BoundModel, type IndexJet, JET_LENGTH, K, N } from '../dispersion/evaluator.ts';
import { type Optics, opticsFromIndex } from '../interface/optics.ts';
import { fitPreference } from '../medium/fit-preference.ts';
import { type MediumAtWave, mediumAtWave } from '../medium/optics-at.ts';
import { isRefusal } from '../medium/refusal.ts';
import { ONE } from '../num/complex.ts';
import { SPEED_OF_LIGHT_m_per_s as c } from '../units/constants.ts';
import type { Survey } from './survey.ts';

export interface QuickMedium {
  readonly material: Material;
  readonly axis: Axis;
  readonly wave: FitWave;
  readonly fit: Fit;
  readonly bound: BoundModel;
  /** Relative to vacuum. */
  readonly n: number;
  /** Where a temperature was asked for. */
  readonly atTemperature?: MediumAtWave;
}

/** Undefined where no fit of the axis reaches the wave, or the one that does has no index there. */
export function quickMedium(
  survey: Survey,
  material: Material,
  axis: Axis,
  wave: FitWave,
  temperature_K?: number,
): QuickMedium | undefined {
  if (temperature_K !== undefined) return mediumAtTemperature(survey, material, axis, wave, temperature_K);
  const choice = chooseFit(material, axis, wave, (fit) =>
    fitPreference(fit, material, wave, {}, survey.bind),
  );
  if (!choice?.inRange) return undefined;
  const { fit } = choice;
  const bound = survey.bind(fit);
  const n = indexOf(fit, bound, wave);
  return Number.isFinite(n) ? { material, axis, wave, fit, bound, n } : undefined;
}

function mediumAtTemperature(
  survey: Survey,
  material: Material,
  axis: Axis,
  wave: FitWave,
  temperature_K: number,
): QuickMedium | undefined {
  const medium = mediumAtWave(material, axis, wave, { temperature_K }, false);
  if (isRefusal(medium)) return undefined;
  const { fit, optics } = medium;
  return { material, axis, wave, fit, bound: survey.bind(fit), n: optics.n.re, atTemperature: medium };
}

/** Absolute index of one fit at a wave, whether its range reaches there or not. */
export function indexOf(fit: Fit, bound: BoundModel, wave: FitWave): number {
  const L_um = fitWavelength_um(fit, wave);
  const air = fit.reference === 'air' ? wave.vacuum_um / wave.air_um : 1;
  if (bound.index) return bound.index(L_um) * air;
  bound.evaluate(L_um, scratch);
  return scratch[N]! * air;
}

const scratch = new Float64Array(JET_LENGTH);

export interface QuickOptics {
  readonly optics: Optics;
  /** False where the fit is real and no absorption data reach the wave: k is then 0 for want of anything better. */
  readonly absorptionKnown: boolean;
}

export function quickOptics(survey: Survey, medium: QuickMedium): QuickOptics {
  const { material, fit, bound, wave, n, atTemperature } = medium;
  const isExact = fit.accuracy_n === 0 && fit.parameters.model === 'constant';
  if (atTemperature) {
    const { optics, absorptionKnown } = atTemperature;
    return { optics, absorptionKnown: absorptionKnown || isExact };
  }
  const L_um = fitWavelength_um(fit, wave);
  const air = fit.reference === 'air' ? wave.vacuum_um / wave.air_um : 1;
  let k = 0;
  let absorptionKnown = bound.complex || isExact;
  if (bound.complex) {
    bound.evaluate(L_um, scratch);
    k = scratch[K]! * air;
  } else if (n > 0 && survey.absorption(material)(wave.vacuum_um, scratch)) {
    k = scratch[K]!;
    absorptionKnown = true;
  }
  const mu = new Float64Array(2);
  if (bound.permeability) bound.permeability(L_um, mu);
  return {
    optics: opticsFromIndex({ re: n, im: k }, bound.permeability ? { re: mu[0]!, im: mu[1]! } : ONE),
    absorptionKnown,
  };
}

/** n_g = n - L n' of the printed formula in its own reference, as the answer states it; null where the fit has no slope. */
export function quickGroupIndex(medium: QuickMedium): number | null {
  const { bound, wave, atTemperature } = medium;
  if (!bound.hasDerivative || bound.derivativeOrder < 1) return null;
  if (bound.groupIndex && !atTemperature) return bound.groupIndex(wave.vacuum_um);
  const jet = formulaJet(medium);
  return jet[N]! - wave.vacuum_um * jet[N + 1]!;
}

/** beta2 = L^3 n''/(2 pi c^2) of the printed formula, in s^2/m; null where the fit has no curvature. */
export function quickGvd_s2_per_m(medium: QuickMedium): number | null {
  const { bound, wave } = medium;
  if (!bound.hasDerivative || bound.derivativeOrder < 2) return null;
  const L_m = wave.vacuum_um * 1e-6;
  return (L_m ** 3 * formulaJet(medium)[N + 2]! * 1e12) / (2 * Math.PI * c ** 2) + 0;
}

function formulaJet({ bound, wave, atTemperature }: QuickMedium): IndexJet {
  if (atTemperature) return atTemperature.formulaJet;
  bound.evaluate(wave.vacuum_um, scratch);
  return scratch;
}
