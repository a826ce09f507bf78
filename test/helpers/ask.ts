/** Short ways for tests to ask the core a question. */
import type { Answer } from '../../src/answer/answer.ts';
import { answerQuestion } from '../../src/answer/answer-question.ts';
import { type MediumSpec, makeQuestion, type Question } from '../../src/answer/question.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import type { Axis } from '../../src/catalog/types.ts';
import type { LiteralMedium } from '../../src/medium/literal.ts';
import { isRefusal } from '../../src/medium/refusal.ts';

export const DEGREE = Math.PI / 180;

export const literal = (medium: LiteralMedium): MediumSpec => ({
  kind: 'literal',
  literal: medium,
  text: 'literal',
});
export const index = (re: number, im = 0): MediumSpec => literal({ n: { re, im } });
export const permittivity = (re: number, im = 0, mu = 1): MediumSpec =>
  literal({ eps: { re, im }, mu: { re: mu, im: 0 } });

export function named(key: string, axis?: Axis): MediumSpec {
  const material = catalogueFromSources().material(key);
  if (!material) throw new Error(`no material ${key}`);
  return { kind: 'catalogue', material, axis };
}

export const vacuumWave = (wavelength_m: number) => ({
  wavelength_m,
  inAir: false,
  text: `${wavelength_m} m`,
});
export const airWave = (wavelength_m: number) => ({
  wavelength_m,
  inAir: true,
  text: `${wavelength_m} m in air`,
});
export const frequency = (f_Hz: number) => vacuumWave(299_792_458 / f_Hz);

export function tryAsk(
  from: MediumSpec,
  into: MediumSpec,
  wave: Question['wave'],
  more: Parameters<typeof makeQuestion>[3] = {},
) {
  return answerQuestion(makeQuestion(from, into, wave, more), (id) => catalogueFromSources().source(id));
}

/** The answer; throws where the core refuses. */
export function ask(...question: Parameters<typeof tryAsk>): Answer {
  const answer = tryAsk(...question);
  if (isRefusal(answer)) throw new Error(answer.message);
  return answer;
}
