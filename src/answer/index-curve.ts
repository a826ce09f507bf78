/** Refractive index and group index of a medium over the wavelength, each number that of an answer at that wave. */
import { isRefusal } from '../medium/refusal.ts';
import type { CurveMedium } from './curve-path.ts';
import { mediumSide, type SourceOf } from './medium-side.ts';
import type { Question } from './question.ts';
import { bothReferences } from './wave.ts';

export interface IndexCurve {
  readonly kind: 'index';
  readonly name: string;
  readonly wavelength_m: readonly number[];
  /** Relative to vacuum, all of them; NaN where there is no value. */
  readonly n: readonly number[];
  readonly k: readonly number[];
  /** NaN too where the medium swallows a pulse within a wavelength or so. */
  readonly groupIndex: readonly number[];
}

/** From this ratio k/n on a group index says nothing about a pulse. */
const PULSES_UP_TO_k = 0.1;

export function indexCurve(
  medium: CurveMedium,
  question: Pick<Question, 'conditions' | 'extrapolate'>,
  wavelength_m: readonly number[],
  sourceOf: SourceOf,
): IndexCurve {
  const answers = wavelength_m.map((at_m) => {
    const wave = bothReferences({ wavelength_m: at_m, inAir: false, text: '' });
    if (isRefusal(wave)) return null;
    const side = mediumSide(medium.spec, wave, question.conditions, question.extrapolate, sourceOf);
    return isRefusal(side) ? null : side.answer;
  });
  return {
    kind: 'index',
    name: medium.name,
    wavelength_m,
    n: answers.map((a) => a?.n ?? Number.NaN),
    k: answers.map((a) => a?.k ?? Number.NaN),
    groupIndex: answers.map((a) =>
      a && a.k < PULSES_UP_TO_k * Math.abs(a.n) ? (a.absolute.groupIndex ?? Number.NaN) : Number.NaN,
    ),
  };
}

/** The media whose dispersion a picture is worth: those of the catalogue that are condensed matter. */
export function dispersiveMedia(media: readonly CurveMedium[]): readonly CurveMedium[] {
  return media.filter(
    ({ spec }) => spec.kind === 'catalogue' && !['gas', 'reference'].includes(spec.material.class),
  );
}
