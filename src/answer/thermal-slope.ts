/**
 * How a medium of the question changes with temperature: its index by evaluating it above and below the temperature asked, so
 * that whatever the catalogue knows (a thermal form, a model that takes a temperature, a single dn/dT) counts; a solid's
 * thickness by its expansion.
 */
import type { FitWave } from '../catalog/choose-fit.ts';
import { isRefusal } from '../medium/refusal.ts';
import { type MediumSide, mediumSide, type SourceOf } from './medium-side.ts';
import type { MediumSpec, Question } from './question.ts';

/** Where neither the question nor the fit states one: 20 C. */
const ROOM_K = 293.15;

export interface ThermalSlope {
  readonly dn_per_K: number;
  readonly dk_per_K: number;
  /** Relative change of a length; 0 where not known. */
  readonly expansion_per_K: number;
}

const NONE: ThermalSlope = { dn_per_K: 0, dk_per_K: 0, expansion_per_K: 0 };

/** Null where the catalogue has nothing thermal about the medium. Media given by their numbers, and vacuum, do not change. */
export function thermalSlope(
  spec: MediumSpec,
  side: MediumSide,
  question: Question,
  wave: FitWave,
  sourceOf: SourceOf,
): ThermalSlope | null {
  const step_K = question.tolerances.temperature_K ?? 0;
  if (spec.kind === 'literal' || side.accuracy === 0 || step_K === 0) return NONE;
  const centre_K = question.conditions.temperature_K ?? side.answer.temperature_K ?? ROOM_K;
  const at = (temperature_K: number): MediumSide | null => {
    const conditions = { ...question.conditions, temperature_K };
    const there = mediumSide(spec, wave, conditions, question.extrapolate, sourceOf);
    const known = !isRefusal(there) && !there.notes.some((n) => n.code === 'temperature-not-modelled');
    return known ? there : null;
  };
  const warm = at(centre_K + step_K);
  const cold = at(Math.max(1, centre_K - step_K));
  if (!warm || !cold) return null;
  const between_K = centre_K + step_K - Math.max(1, centre_K - step_K);
  return {
    dn_per_K: (warm.optics.n.re - cold.optics.n.re) / between_K,
    dk_per_K: (warm.optics.n.im - cold.optics.n.im) / between_K,
    expansion_per_K: (spec.material.handling?.expansion_1e6_per_K ?? 0) * 1e-6,
  };
}
