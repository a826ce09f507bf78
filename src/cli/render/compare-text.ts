/** Media and parts side by side for people, as text or as Markdown; the best value of a row has a star. */
import { isRefusal } from '../../medium/refusal.ts';
import { fitLine } from '../../present/source-lines.ts';
import type { ComparedPart, ComparedWave, CompareReport } from '../../selection/compare-report.ts';
import { waveWords } from '../../selection/condition-words.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { columns } from './columns.ts';
import { type CompareRow, factRows, waveRows } from './compare-rows.ts';
import { mediumKey } from './medium-key.ts';
import { page, paragraph } from './page.ts';
import { cautionSection } from './text.ts';

/** Columns of one block of the table are as many as fit this. */
const WIDEST = 80;

export function compareText(report: CompareReport, style: NumberStyle): string {
  const { parts, waves } = report;
  const titles = parts.map(partTitle);
  return page(
    [
      ...waves.flatMap((wave) => [
        `At ${waveWords(wave.spec, style)}`,
        '',
        ...blocks(titles, waveRows(wave, style), style),
        ...gaps(report, wave).flatMap((line) => paragraph(line)),
        '',
      ]),
      ...blocks(titles, factRows(report, style), style),
      '',
      ...LEGEND.flatMap((line) => paragraph(line)),
      ...cautionSection(cautionsOf(report)),
      ...sources(report, style),
    ],
    style.ascii,
  );
}

const LEGEND: readonly string[] = [
  '* best of the row. n is relative to vacuum; normal incidence, in air, uncoated. R: one surface; loss: both surfaces, all reflections, and the absorption between them; + means surfaces alone, the absorption at this wave not being on file.',
];

/** "zinc-selenide@3mm", "sapphire:o". */
function partTitle({ part, axis, facts }: ComparedPart): string {
  if (!facts) return part.text;
  const size = part.text.split('@')[1];
  return mediumKey(facts.key, axis) + (size === undefined ? '' : `@${size}`);
}

/** The table in one piece, or in halves where it is too wide. */
function blocks(
  titles: readonly string[],
  rows: readonly CompareRow[],
  style: NumberStyle,
): readonly string[] {
  const block = (from: number, to: number): readonly string[] =>
    columns(
      [{ title: '' }, { title: '' }, ...titles.slice(from, to).map((title) => ({ title }))],
      rows.map(({ symbol, label, cells }) => [symbol, label, ...cells.slice(from, to)]),
      { ascii: style.ascii, indent: 0 },
    );
  const whole = block(0, titles.length);
  if (titles.length < 2 || whole.every((line) => [...line].length <= WIDEST)) return whole;
  const half = Math.ceil(titles.length / 2);
  return [...block(0, half), '', ...block(half, titles.length)];
}

/** Why a column is empty. */
function gaps({ parts }: CompareReport, { columns: list }: ComparedWave): readonly string[] {
  return list.flatMap((column, i) => {
    const part = parts[i];
    return isRefusal(column) && part ? [`${partTitle(part)}: ${column.message}`] : [];
  });
}

function cautionsOf({ waves }: CompareReport): Parameters<typeof cautionSection>[0] {
  const all = waves.flatMap(({ columns: list }) => list.flatMap((c) => (isRefusal(c) ? [] : c.cautions)));
  const levels = ['hazard', 'caution', 'note'];
  return all
    .filter((c, i) => all.findIndex((other) => other.text === c.text) === i)
    .sort((a, b) => levels.indexOf(a.level) - levels.indexOf(b.level));
}

function sourceTexts({ waves }: CompareReport, style: NumberStyle): readonly string[] {
  const lines = waves.flatMap(({ columns: list }) =>
    list.flatMap((c) => (isRefusal(c) ? [] : fitLine(c.medium, style).slice(0, 1))),
  );
  return [...new Set(lines)];
}

function sources(report: CompareReport, style: NumberStyle): readonly string[] {
  const texts = sourceTexts(report, style);
  return texts.length === 0 ? [] : ['', 'Sources', ...texts.flatMap((line) => paragraph(line))];
}

export function compareMarkdown(report: CompareReport, style: NumberStyle): string {
  const { parts, waves } = report;
  const titles = parts.map(partTitle);
  const cautions = cautionsOf(report);
  const lines = [
    ...waves.flatMap((wave) => [
      `### At ${waveWords(wave.spec, style)}`,
      '',
      ...markdownTable(titles, waveRows(wave, style)),
      '',
      ...gaps(report, wave).map((line) => `- ${line}`),
      '',
    ]),
    '### Material',
    '',
    ...markdownTable(titles, factRows(report, style)),
    '',
    // A star of its own in a table, not the mark of a list.
    ...LEGEND.map((line) => line.replace(/^\*/, '\\*')),
    ...(cautions.length > 0 ? ['', ...cautions.map((c) => `- **${c.level}** ${c.text}`)] : []),
    '',
    ...sourceTexts(report, style).map((line) => `- ${line}`),
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
