/** Media and parts side by side for people, as text or as Markdown; the best value of a row has a star. */
import {
  compareCautions,
  compareGaps,
  compareLegend,
  compareSources,
  partTitles,
} from '../../present/compare-page.ts';
import { type CompareRow, factRows, waveRows } from '../../present/compare-rows.ts';
import type { CompareReport } from '../../selection/compare-report.ts';
import { waveWords } from '../../selection/condition-words.ts';
import { columnBlocks } from '../../term/columns.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { page, paragraph } from './page.ts';
import { cautionSection } from './text.ts';

/** Columns of one block of the table are as many as fit this. */
const WIDEST = 80;

export function compareText(report: CompareReport, style: NumberStyle): string {
  const { waves } = report;
  const titles = partTitles(report);
  return page(
    [
      ...waves.flatMap((wave) => [
        `At ${waveWords(wave.spec, style)}`,
        '',
        ...blocks(titles, waveRows(wave, style), style),
        ...compareGaps(report, wave).flatMap((line) => paragraph(line)),
        '',
      ]),
      ...blocks(titles, factRows(report, style), style),
      '',
      ...compareLegend(report, style).flatMap((line) => paragraph(line)),
      ...cautionSection(compareCautions(report)),
      ...sources(report, style),
    ],
    style.ascii,
  );
}

/** The table in one piece, or in blocks where it is too wide. */
function blocks(
  titles: readonly string[],
  rows: readonly CompareRow[],
  style: NumberStyle,
): readonly string[] {
  return columnBlocks(
    [{ title: '' }, { title: '' }, ...titles.map((title) => ({ title }))],
    rows.map(({ symbol, label, cells }) => [symbol, label, ...cells]),
    2,
    WIDEST,
    { ascii: style.ascii, indent: 0 },
  );
}

function sources(report: CompareReport, style: NumberStyle): readonly string[] {
  const texts = compareSources(report, style);
  return texts.length === 0 ? [] : ['', 'Sources', ...texts.flatMap((line) => paragraph(line))];
}

export function compareMarkdown(report: CompareReport, style: NumberStyle): string {
  const { waves } = report;
  const titles = partTitles(report);
  const cautions = compareCautions(report);
  const lines = [
    ...waves.flatMap((wave) => [
      `### At ${waveWords(wave.spec, style)}`,
      '',
      ...markdownTable(titles, waveRows(wave, style)),
      '',
      ...compareGaps(report, wave).map((line) => `- ${line}`),
      '',
    ]),
    '### Material',
    '',
    ...markdownTable(titles, factRows(report, style)),
    '',
    // A star of its own in a table, not the mark of a list.
    ...compareLegend(report, style).map((line) => line.replace(/^\*/, '\\*')),
    ...(cautions.length > 0 ? ['', ...cautions.map((c) => `- **${c.level}** ${c.text}`)] : []),
    '',
    ...compareSources(report, style).map((line) => `- ${line}`),
  ];
  const text = lines
    .join('\n')
    .replace(/\n{3,}/g, '\n\n')
    .trimEnd();
  return `${style.ascii ? text.split('\n').map(toAscii).join('\n') : text}\n`;
}

function markdownTable(titles: readonly string[], rows: readonly CompareRow[]): readonly string[] {
  const line = (cells: readonly string[]): string =>
    `| ${cells.map((cell) => cell.replaceAll('|', '\\|').replaceAll('*', '\\*')).join(' | ')} |`;
  return [
    line(['', ...titles]),
    line(['---', ...titles.map(() => '---')]),
    ...rows.map(({ symbol, label, cells }) =>
      line([[symbol, label].filter((t) => t !== '').join(' '), ...cells]),
    ),
  ];
}
