/**
 * A part with films on its faces, in air, at normal incidence: the films of a face act together as waves, the plate between
 * them as intensities, as for a window (the law of the path of a question).
 */
import { answerQuestion } from '../answer/answer-question.ts';
import type { Layer, MediumSpec, WaveSpec } from '../answer/question.ts';
import { makeQuestion } from '../answer/question.ts';
import type { FitWave } from '../catalog/choose-fit.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
import { isRefusal, type Refusal } from '../medium/refusal.ts';
import { airAround } from './plate-loss.ts';
import type { Survey } from './survey.ts';

export interface Coating {
  /** From the air to the part. */
  readonly front: readonly Layer[];
  /** From the part to the air. */
  readonly back: readonly Layer[];
}

export interface CoatedFace {
  /** Seen from the air. */
  readonly R: number;
  /** By the indices of the films and the part; null where no accuracy is known. */
  readonly R_uncertainty: number | null;
}

export interface CoatedPart {
  readonly front: CoatedFace;
  readonly back: CoatedFace;
  /** 1 - T; null without a thickness. */
  readonly loss: number | null;
}

export interface CoatedPartQuestion {
  readonly medium: MediumSpec;
  readonly thickness_m: number | null;
  readonly coating: Coating;
  readonly wave: WaveSpec;
  readonly at: FitWave;
  /** The wave that quarter waves are meant for. */
  readonly designWave: WaveSpec;
  readonly conditions: Conditions;
}

export function coatedPart(survey: Survey, question: CoatedPartQuestion): CoatedPart | Refusal {
  const { medium, thickness_m, coating, wave, at, designWave, conditions } = question;
  const air: MediumSpec = { kind: 'literal', literal: { n: airAround(survey, at).n }, text: 'air' };
  const path = (layers: readonly Layer[], into: MediumSpec, coherenceLength_m: number) =>
    answerQuestion(
      makeQuestion(air, into, wave, { layers, conditions, designWave, coherenceLength_m }),
      survey.sourceOf,
    );
  const face = (films: readonly Layer[]): CoatedFace | Refusal => {
    const answer = path(films, medium, Number.POSITIVE_INFINITY);
    if (isRefusal(answer)) return answer;
    const { R, R_uncertainty } = answer.interface;
    return { R: answer.stack?.R ?? R, R_uncertainty };
  };
  const front = face(coating.front);
  if (isRefusal(front)) return front;
  const back = face([...coating.back].reverse());
  if (isRefusal(back)) return back;
  if (thickness_m === null) return { front, back, loss: null };
  const plate: Layer = { medium, thickness: { kind: 'length', thickness_m } };
  // So short that only films, thinner by far than the plate, stay coherent.
  const whole = path([...coating.front, plate, ...coating.back], air, thickness_m);
  if (isRefusal(whole)) return whole;
  return { front, back, loss: whole.stack ? 1 - whole.stack.T : null };
}
