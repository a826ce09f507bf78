/** A plot as text: the charts with what stands at the question below; in words and tables where charts cannot be read. */
import type { Answer } from '../../answer/answer.ts';
import { brailleChart } from '../../plot/braille-chart.ts';
import type { Chart } from '../../plot/chart.ts';
import { chartSentence, chartTable, chartTableLines } from '../../plot/chart-sentence.ts';
import { interfaceRows } from '../../present/interface-rows.ts';
import { questionLine } from '../../present/question-line.ts';
import type { PresentStyle } from '../../present/shown.ts';
import { fitLine } from '../../present/source-lines.ts';
import { wrap } from '../../present/wrap.ts';
import type { GlyphLevel } from '../../term/ability.ts';
import { PAGE_WIDTH, page, paragraph } from '../render/page.ts';
import { cautionSection } from '../render/text.ts';
import type { Plot } from './plot-curves.ts';

const HEIGHT = 21;
/** Of every panel behind the first. */
const LOWER_HEIGHT = 15;

/** `level` undefined: for those who hear it. */
export function plotText(
  answer: Answer,
  plot: Plot,
  level: GlyphLevel | undefined,
  style: PresentStyle,
): string {
  const drawn = plot.charts.flatMap((chart, i) => [
    '',
    ...(level === undefined
      ? spoken(chart, style.ascii)
      : brailleChart(chart, { width: PAGE_WIDTH, height: i === 0 ? HEIGHT : LOWER_HEIGHT, level })),
  ]);
  const lines = [
    ...wrap(questionLine(answer, style), PAGE_WIDTH, '  '),
    ...drawn,
    '',
    ...paragraph(`Here: ${powersHere(answer, style)}.`),
    ...plot.notes.flatMap((note) => paragraph(`${note}.`)),
    ...cautionSection(answer.cautions),
    ...section('Sources', sourceLines(answer, style)),
  ];
  return page(lines, style.ascii);
}

/** The same on one line each, never wrapped. */
export function plotPlain(answer: Answer, plot: Plot, style: PresentStyle): string {
  const lines = [
    questionLine(answer, style),
    ...plot.charts.flatMap((chart) => [
      chartSentence(chart, style.ascii),
      ...chartTableLines(chart, style.ascii),
    ]),
  ];
  return page(lines, style.ascii);
}

export function plotMarkdown(answer: Answer, plot: Plot, style: PresentStyle): string {
  const cell = (text: string): string => text.replace(/[|\\]/g, '\\$&');
  const row = (cells: readonly string[]): string => `| ${cells.map(cell).join(' | ')} |`;
  const lines = [
    `## ${questionLine(answer, style)}`,
    ...plot.charts.flatMap((chart) => {
      const { header, rows } = chartTable(chart, style.ascii);
      return [
        '',
        chartSentence(chart, style.ascii),
        '',
        row(header),
        row(header.map(() => '---')),
        ...rows.map(row),
      ];
    }),
    '',
    ...sourceLines(answer, style).map((line) => `- ${line}`),
  ];
  return page(lines, style.ascii);
}

function spoken(chart: Chart, ascii: boolean): readonly string[] {
  return [
    ...paragraph(chartSentence(chart, ascii), 0, 0),
    ...chartTableLines(chart, ascii).flatMap((line) => paragraph(line)),
  ];
}

/** R and T at the question, with the digits that the answer has. */
export function powersHere(answer: Answer, style: PresentStyle): string {
  const rows = interfaceRows(answer, style).filter(({ id }) => ['R', 'T', 'Rs', 'Rp'].includes(id));
  // For s or p the reflectance asked for is one of the two.
  const once = new Map(rows.map((row) => [row.symbol, row]).reverse() as [string, (typeof rows)[number]][]);
  return rows
    .filter((row) => once.get(row.symbol) === row)
    .map(({ symbol, text }) => `${symbol} = ${text}`)
    .join(', ');
}

export function sourceLines(answer: Answer, style: PresentStyle): readonly string[] {
  const media = [answer.from, ...answer.layers.map((l) => l.medium), answer.into];
  return [...new Set(media.flatMap((medium) => fitLine(medium, style)))];
}

function section(title: string, texts: readonly string[]): readonly string[] {
  return texts.length === 0 ? [] : ['', title, ...texts.flatMap((text) => wrap(text, PAGE_WIDTH, '  '))];
}
