/** All that must be said with an answer, in the order of weight: each medium at its place, the interface, the beam. */
import type { CautionNote } from '../medium/caution.ts';
import type { Caution } from './answer.ts';
import { orderCautions, wordCaution } from './caution-text.ts';
import type { CrystalAnswer } from './crystal-shape.ts';
import type { ThermalSide } from './input-uncertainty.ts';
import type { Question } from './question.ts';

export interface CautionSources {
  readonly question: Question;
  /** The first medium, the layers, the last one. */
  readonly media: readonly ThermalSide[];
  readonly crystal: CrystalAnswer | null;
  readonly interfaceNotes: readonly CautionNote[];
  readonly beamNotes: readonly CautionNote[];
}

const THERMAL_GAP: CautionNote = { code: 'tolerance-incomplete', details: {} };

export function collectCautions(sources: CautionSources): readonly Caution[] {
  const { media, interfaceNotes, beamNotes } = sources;
  return orderCautions([
    ...media.flatMap((medium, i) =>
      mediumNotes(medium, sources).map((n) => wordCaution(n, placeName(i, media.length), medium.side.name)),
    ),
    ...unusedComposition(sources),
    ...interfaceNotes.map((n) => wordCaution(n, 'interface', 'interface')),
    ...beamNotes.map((n) => wordCaution(n, 'beam', 'beam')),
  ]);
}

/** A composition belongs to one medium of a path; it is said where none takes it. */
function unusedComposition({ question, media }: CautionSources): readonly Caution[] {
  const last = media.at(-1);
  const { composition } = question.conditions;
  if (!last || composition === undefined) return [];
  if (media.some(({ side }) => side.answer.composition !== null)) return [];
  const note: CautionNote = { code: 'condition-not-used', details: { condition: 'composition' } };
  return [wordCaution(note, 'into', last.side.name)];
}

/** "from", "layer 1" and so on, "into". */
function placeName(i: number, count: number): string {
  if (i === 0) return 'from';
  return i === count - 1 ? 'into' : `layer ${i}`;
}

function mediumNotes(
  { side, slope }: ThermalSide,
  { question, crystal }: CautionSources,
): readonly CautionNote[] {
  // A stated cut says which wave is meant where; nothing is assumed then.
  const cut = crystal !== null && side.answer.key !== null && side.answer.key === crystal.key;
  const own = cut ? side.notes.filter((n) => n.code !== 'axis-assumed') : side.notes;
  const gap = (question.tolerances.temperature_K ?? 0) > 0 && slope === null;
  return gap ? [...own, THERMAL_GAP] : own;
}
