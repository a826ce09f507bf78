/** What a comparison says beside its rows: titles of the columns, why one is empty, cautions, sources, legend; for every face. */
import type { Caution } from '../answer/answer.ts';
import { isRefusal } from '../medium/refusal.ts';
import type { ComparedPart, ComparedWave, CompareReport } from '../selection/compare-report.ts';
import type { NumberStyle } from '../units/number-style.ts';
import { mediumKey } from './medium-key.ts';
import { fitLine } from './source-lines.ts';

export const COMPARE_LEGEND: readonly string[] = [
  '* best of the row. n is relative to vacuum; normal incidence, in air, uncoated. R: one surface; loss: both surfaces, all reflections, and the absorption between them; + means surfaces alone, the absorption at this wave not being on file.',
];

/** "zinc-selenide@3mm", "sapphire:o". */
export function partTitle({ part, axis, facts }: ComparedPart): string {
  if (!facts) return part.text;
  const size = part.text.split('@')[1];
  return mediumKey(facts.key, axis) + (size === undefined ? '' : `@${size}`);
}

/** Why a column is empty. */
export function compareGaps({ parts }: CompareReport, { columns: list }: ComparedWave): readonly string[] {
  return list.flatMap((column, i) => {
    const part = parts[i];
    return isRefusal(column) && part ? [`${partTitle(part)}: ${column.message}`] : [];
  });
}

/** Each once, graver ones first. */
export function compareCautions({ waves }: CompareReport): readonly Caution[] {
  const all = waves.flatMap(({ columns: list }) => list.flatMap((c) => (isRefusal(c) ? [] : c.cautions)));
  const levels = ['hazard', 'caution', 'note'];
  return all
    .filter((c, i) => all.findIndex((other) => other.text === c.text) === i)
    .sort((a, b) => levels.indexOf(a.level) - levels.indexOf(b.level));
}

/** Each once. */
export function compareSources({ waves }: CompareReport, style: NumberStyle): readonly string[] {
  const lines = waves.flatMap(({ columns: list }) =>
    list.flatMap((c) => (isRefusal(c) ? [] : fitLine(c.medium, style).slice(0, 1))),
  );
  return [...new Set(lines)];
}
