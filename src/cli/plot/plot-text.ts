/** A plot as text: the charts with what stands at the question below; in words and tables where charts cannot be read. */
import { brailleChart } from '../../plot/braille-chart.ts';
import type { Chart } from '../../plot/chart.ts';
import { chartSentence, chartTable, chartTableLines } from '../../plot/chart-sentence.ts';
import type { PresentStyle } from '../../present/shown.ts';
import { wrap } from '../../present/wrap.ts';
import type { GlyphLevel } from '../../term/ability.ts';
import { PAGE_WIDTH, page, paragraph } from '../render/page.ts';
import { cautionSection } from '../render/text.ts';
import type { PlotPage } from './plot-page.ts';

const HEIGHT = 21;
/** Of every panel behind the first. */
const LOWER_HEIGHT = 15;

/** `level` undefined: for those who hear it. */
export function plotText(plot: PlotPage, level: GlyphLevel | undefined, style: PresentStyle): string {
  const drawn = plot.charts.flatMap((chart, i) => [
    '',
    ...(level === undefined
      ? spoken(chart, style.ascii)
      : brailleChart(chart, { width: PAGE_WIDTH, height: i === 0 ? HEIGHT : LOWER_HEIGHT, level })),
  ]);
  const lines = [
    ...wrap(plot.headline, PAGE_WIDTH, '  '),
    ...drawn,
    '',
    ...(plot.here === undefined ? [] : paragraph(`Here: ${plot.here}.`)),
    ...plot.notes.flatMap((note) => paragraph(`${note}.`)),
    ...cautionSection(plot.cautions),
    ...section('Sources', plot.sources),
  ];
  return page(lines, style.ascii);
}

/** The same on one line each, never wrapped. */
export function plotPlain(plot: PlotPage, style: PresentStyle): string {
  const lines = [
    plot.headline,
    ...plot.charts.flatMap((chart) => [
      chartSentence(chart, style.ascii),
      ...chartTableLines(chart, style.ascii),
    ]),
  ];
  return page(lines, style.ascii);
}

export function plotMarkdown(plot: PlotPage, style: PresentStyle): string {
  const cell = (text: string): string => text.replace(/[|\\]/g, '\\$&');
  const row = (cells: readonly string[]): string => `| ${cells.map(cell).join(' | ')} |`;
  const lines = [
    `## ${plot.headline}`,
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
    ...plot.sources.map((line) => `- ${line}`),
  ];
  return page(lines, style.ascii);
}

function spoken(chart: Chart, ascii: boolean): readonly string[] {
  return [
    ...paragraph(chartSentence(chart, ascii), 0, 0),
    ...chartTableLines(chart, ascii).flatMap((line) => paragraph(line)),
  ];
}

function section(title: string, texts: readonly string[]): readonly string[] {
  return texts.length === 0 ? [] : ['', title, ...texts.flatMap((text) => wrap(text, PAGE_WIDTH, '  '))];
}
