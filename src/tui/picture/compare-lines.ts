/** The page that sets the second medium beside the media chosen last, at the wave of the question. */
import type { MediumSpec, Question } from '../../answer/question.ts';
import { isRefusal, type Refusal } from '../../medium/refusal.ts';
import {
  compareCautions,
  compareGaps,
  compareLegend,
  compareSources,
  partTitles,
} from '../../present/compare-page.ts';
import { type CompareRow, factRows, waveRows } from '../../present/compare-rows.ts';
import {
  type CompareReport,
  compareReport,
  FEWEST_PARTS,
  MOST_PARTS,
  type Part,
} from '../../selection/compare-report.ts';
import { waveWords } from '../../selection/condition-words.ts';
import { columnBlocks } from '../../term/columns.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import type { World } from '../world.ts';
import { cautionLines } from './caution-lines.ts';
import { laidOut, type PageLine, pageLine } from './page-line.ts';

const made = new WeakMap<Question, Map<string, CompareReport | Refusal>>();

/** `recent`: keys of media chosen, latest first. */
export function compareLines(
  question: Question,
  recent: readonly string[],
  style: NumberStyle,
  world: World,
  width: number,
): readonly PageLine[] {
  const report = comparison(question, recent, world);
  if (!report) return [pageLine(NOTHING_TO_COMPARE)];
  if (isRefusal(report)) return [pageLine(`${report.message}; ${report.remedy}`, 'caution', 'x')];
  const titles = partTitles(report);
  const table = (rows: readonly CompareRow[]): readonly PageLine[] =>
    columnBlocks(
      [{ title: '' }, { title: '' }, ...titles.map((title) => ({ title }))],
      rows.map(({ symbol, label, cells }) => [symbol, label, ...cells]),
      2,
      width,
      { ascii: style.ascii, indent: 0 },
    ).map((text) => laidOut(text));
  const cautions = compareCautions(report);
  return [
    ...report.waves.flatMap((wave) => [
      pageLine(`At ${waveWords(wave.spec, style)}`, 'heading'),
      ...table(waveRows(wave, style)),
      ...compareGaps(report, wave).map((text) => pageLine(text, 'note', '-')),
    ]),
    pageLine(''),
    pageLine('At any wave', 'heading'),
    ...table(factRows(report, style)),
    pageLine(''),
    ...compareLegend(report, style).map((text) => pageLine(text, 'aside')),
    ...(cautions.length > 0 ? [pageLine(''), pageLine('Cautions', 'heading')] : []),
    ...cautionLines(cautions),
    pageLine(''),
    pageLine('Sources', 'heading'),
    ...compareSources(report, style).map((text) => pageLine(text)),
  ];
}

export const NOTHING_TO_COMPARE =
  'nothing to compare yet: choose media in either half, and they stand here beside the second one';

/** Undefined while no other medium has been chosen. */
export function comparison(
  question: Question,
  recent: readonly string[],
  world: World,
): CompareReport | Refusal | undefined {
  const parts = partsOf(question, recent, world);
  return parts.length < FEWEST_PARTS ? undefined : reportOn(question, parts, world);
}

function partsOf({ into }: Question, recent: readonly string[], world: World): readonly Part[] {
  const bare = (medium: MediumSpec, text: string): Part => ({ medium, text, thickness_m: null });
  const own = into.kind === 'literal' ? into.text : into.material.key;
  const others = recent
    .filter((key) => key !== own)
    .flatMap((key) => world.material(key) ?? [])
    .slice(0, MOST_PARTS - 1);
  return [bare(into, own), ...others.map((material) => bare({ kind: 'catalogue', material }, material.key))];
}

function reportOn(question: Question, parts: readonly Part[], world: World): CompareReport | Refusal {
  const reports = made.get(question) ?? new Map<string, CompareReport | Refusal>();
  made.set(question, reports);
  const id = parts.map((part) => part.text).join(' ');
  const report =
    reports.get(id) ?? compareReport(world.survey(), parts, [question.wave], question.conditions);
  reports.set(id, report);
  return report;
}
