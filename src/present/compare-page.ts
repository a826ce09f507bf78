/** What a comparison says beside its rows: titles of the columns, why one is empty, cautions, sources, legend; for every face. */
import type { Caution } from '../answer/answer.ts';
import { isRefusal } from '../medium/refusal.ts';
import type { ComparedPart, ComparedWave, CompareReport } from '../selection/compare-report.ts';
import { waveWords } from '../selection/condition-words.ts';
import type { NumberStyle } from '../units/number-style.ts';
import { mediumKey } from './medium-key.ts';
import { fitLine } from './source-lines.ts';

/** What the signs mean, and what stands on the faces of coated parts. */
export function compareLegend(report: CompareReport, style: NumberStyle): readonly string[] {
  const coated = report.parts.some(({ part }) => part.coating);
  return [
    ...coatingWords(report, style),
    `* best of the row. n is relative to vacuum; normal incidence, in air, ${coated ? 'bare where no films are named' : 'uncoated'}. R: one surface; loss: both surfaces, all reflections, and the absorption between them; + means ${coated ? 'without the absorption of the medium' : 'surfaces alone, the absorption'} at this wave${coated ? ', which is not on file' : ' not being on file'}.`,
  ];
}

/** "(a) zinc-sulfide-film@qw/germanium@3mm; ..., quarter waves at 10.6 um in vacuum". */
function coatingWords(report: CompareReport, style: NumberStyle): readonly string[] {
  const coated = report.parts.filter(({ part }) => part.coating);
  if (coated.length === 0) return [];
  const list = coated.map((part) => `${letterOf(report, part)} ${part.part.text}`).join('; ');
  const design = coated.some(({ part }) => /@(?:[^/]*w)(?:\/|$)/i.test(part.text))
    ? `; quarter and half waves at ${waveWords(report.design.spec, style)}`
    : '';
  return [`${list}${design}.`];
}

const letterOf = ({ parts }: CompareReport, part: ComparedPart): string =>
  `(${String.fromCharCode('a'.charCodeAt(0) + parts.filter((p) => p.part.coating).indexOf(part))})`;

/** "zinc-selenide@3mm", "sapphire:o"; a coated part has a letter that the legend explains: "germanium@3mm (a)". */
export function partTitles(report: CompareReport): readonly string[] {
  return report.parts.map((part) =>
    part.part.coating ? `${partTitle(part)} ${letterOf(report, part)}` : partTitle(part),
  );
}

/** Without its films. */
export function partTitle({ part, axis, facts }: ComparedPart): string {
  const { text, coating } = part;
  const piece = coating ? (text.split('/')[coating.front.length] ?? text) : text;
  if (!facts) return piece;
  const size = piece.split('@')[1];
  return mediumKey(facts.key, axis) + (size === undefined ? '' : `@${size}`);
}

/** Why a column is empty. */
export function compareGaps(report: CompareReport, { columns: list }: ComparedWave): readonly string[] {
  const titles = partTitles(report);
  return list.flatMap((column, i) => (isRefusal(column) ? [`${titles[i]}: ${column.message}`] : []));
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
    list.flatMap((c) =>
      isRefusal(c) ? [] : [c.medium, ...c.films].flatMap((m) => fitLine(m, style).slice(0, 1)),
    ),
  );
  return [...new Set(lines)];
}
