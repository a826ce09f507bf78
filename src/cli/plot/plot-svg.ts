/** A plot as a picture for a notebook: its charts below each other, then what was asked, what stands there, where it comes from. */
import type { Answer } from '../../answer/answer.ts';
import { svgPage } from '../../plot/svg-page.ts';
import { questionLine } from '../../present/question-line.ts';
import { SCREEN } from '../../units/number-style.ts';
import type { DocumentHead } from '../render/json-document.ts';
import type { Plot } from './plot-curves.ts';
import { powersHere, sourceLines } from './plot-text.ts';

export function plotSvg(answer: Answer, { charts, notes }: Plot, head: DocumentHead): string {
  const serious = answer.cautions.filter(({ level }) => level !== 'note');
  return svgPage(charts, {
    caption: [
      `${questionLine(answer, SCREEN)}: ${powersHere(answer, SCREEN)}.`,
      ...notes.map((note) => `${note}.`),
      ...serious.map(({ text }) => `Caution: ${text}.`),
      ...sourceLines(answer, SCREEN),
      `halfspace ${head.version}, catalogue ${head.catalogue ?? ''}`,
    ],
  });
}
