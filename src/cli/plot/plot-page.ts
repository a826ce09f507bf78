/** What a plot shows beside its curves, the same for every form of it. */
import type { Answer, Caution } from '../../answer/answer.ts';
import type { Chart } from '../../plot/chart.ts';
import { interfaceRows } from '../../present/interface-rows.ts';
import { questionLine } from '../../present/question-line.ts';
import type { PresentStyle } from '../../present/shown.ts';
import { fitLine } from '../../present/source-lines.ts';
import type { Plot } from './plot-curves.ts';

export interface PlotPage {
  /** What was asked. */
  readonly headline: string;
  readonly charts: readonly Chart[];
  /** What stands at the question; undefined where no one place is asked about. */
  readonly here: string | undefined;
  /** What must be said of the curves. */
  readonly notes: readonly string[];
  readonly cautions: readonly Caution[];
  readonly sources: readonly string[];
}

export function pageOfAnswer(answer: Answer, { charts, notes }: Plot, style: PresentStyle): PlotPage {
  return {
    headline: questionLine(answer, style),
    charts,
    here: powersHere(answer, style),
    notes,
    cautions: answer.cautions,
    sources: sourceLines(answer, style),
  };
}

/** R and T at the question, with the digits that the answer has. */
function powersHere(answer: Answer, style: PresentStyle): string {
  const rows = interfaceRows(answer, style).filter(({ id }) => ['R', 'T', 'Rs', 'Rp'].includes(id));
  // For s or p the reflectance asked for is one of the two.
  const once = new Map(rows.map((row) => [row.symbol, row]).reverse() as [string, (typeof rows)[number]][]);
  return rows
    .filter((row) => once.get(row.symbol) === row)
    .map(({ symbol, text }) => `${symbol} = ${text}`)
    .join(', ');
}

function sourceLines(answer: Answer, style: PresentStyle): readonly string[] {
  const media = [answer.from, ...answer.layers.map((l) => l.medium), answer.into];
  return [...new Set(media.flatMap((medium) => fitLine(medium, style)))];
}
