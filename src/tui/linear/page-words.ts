/** The pages of coatings, order check and comparison as sentences: every value has its name before it, and no table is needed. */
import { isRefusal } from '../../medium/refusal.ts';
import { coatHeadline } from '../../present/coat-headline.ts';
import {
  bareText,
  type DesignTable,
  idealText,
  mirrorTable,
  mirrorText,
  neededText,
  noPairText,
  pairTable,
  singleFilmTable,
} from '../../present/coat-page.ts';
import { DATA_END_NOTE, hasOpenBand } from '../../present/coat-rows.ts';
import {
  compareCautions,
  compareGaps,
  compareLegend,
  compareSources,
  partTitles,
} from '../../present/compare-page.ts';
import { type CompareRow, factRows, waveRows } from '../../present/compare-rows.ts';
import { waveWords } from '../../selection/condition-words.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { comparison, NOTHING_TO_COMPARE } from '../picture/compare-lines.ts';
import { orderLines } from '../picture/order-lines.ts';
import type { State } from '../state.ts';
import type { World } from '../world.ts';

/** So narrow that every remark is one sentence. */
const ONE_COLUMN = 40;

export function orderWords({ question }: State, style: NumberStyle, world: World): readonly string[] {
  return orderLines(question, style, world, ONE_COLUMN).map(({ text }) => text);
}

export function compareWords(state: State, style: NumberStyle, world: World): readonly string[] {
  const report = comparison(state.question, state.recent, world);
  if (!report) return [NOTHING_TO_COMPARE];
  if (isRefusal(report)) return [`${report.message}; ${report.remedy}`];
  const titles = partTitles(report);
  const said = (rows: readonly CompareRow[]): readonly string[] =>
    rows.map(({ symbol, label, cells }) => {
      const name = [symbol, label].filter((part) => part !== '').join(', ');
      return `${name}: ${cells.map((cell, i) => `${titles[i]} ${cell.replace(/ \*$/, ', the best')}`).join('; ')}`;
    });
  return [
    ...report.waves.flatMap((wave) => [
      `at ${waveWords(wave.spec, style)}`,
      ...said(waveRows(wave, style)),
      ...compareGaps(report, wave),
    ]),
    ...said(factRows(report, style)),
    ...compareLegend(report, style).map((line) => line.replace(/^\* best of the row\. /, '')),
    ...compareCautions(report).map(({ level, text }) => `${level}: ${text}`),
    ...compareSources(report, style),
  ];
}

export function coatWords({ question }: State, style: NumberStyle, world: World): readonly string[] {
  const report = world.coatings(question);
  if (!report) return ['coatings are being designed; ask again in a moment'];
  if (isRefusal(report)) return [`${report.message}; ${report.remedy}`];
  const single = singleFilmTable(report, style);
  const pairs = pairTable(report, style);
  const { mirror } = report;
  return [
    coatHeadline(report, style),
    bareText(report, style),
    idealText(report, style),
    ...(single ? tableWords(single) : ['no film of the catalogue reaches this wave']),
    ...(pairs ? tableWords(pairs) : [noPairText(report)]),
    ...(mirror
      ? [
          mirrorText(report, mirror, style),
          ...tableWords(mirrorTable(mirror, style)),
          neededText(mirror, style),
        ]
      : []),
    ...(hasOpenBand(report) ? [DATA_END_NOTE] : []),
    ...report.skipped.map(({ key, reason }) => `left out: ${key}: ${reason}`),
    ...report.cautions.map(({ level, text }) => `${level}: ${text}`),
  ];
}

function tableWords<Design>({ title, heads, rows }: DesignTable<Design>): readonly string[] {
  const lines = rows.map(({ cells }) =>
    cells.map((cell, i) => `${heads[i]?.title ?? ''} ${cell}`).join(', '),
  );
  return [title, ...lines];
}
