/** Media, plates, coated parts and the waves behind them, for commands that compare. */
import type { Layer, LayerThickness, MediumSpec, WaveSpec } from '../answer/question.ts';
import type { IndexedCatalogue } from '../catalog/entries.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import type { Part } from '../selection/compare-report.ts';
import { parseThickness } from '../units/parse-thickness.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { findMedium, suggestMedia } from './find-medium.ts';
import type { OptionValues } from './options.ts';
import { readWave } from './read-question.ts';

/** The operands that are waves stand last; at least one does, or the refusal says so. */
export function splitWaves(
  operands: readonly string[],
  options: OptionValues,
): { readonly media: readonly string[]; readonly waves: readonly WaveSpec[] } | Refusal {
  const notWave = (text: string): boolean => isProblem(parseWave(text));
  let first = operands.length;
  while (first > 0 && !notWave(operands[first - 1] ?? '')) first--;
  if (first === operands.length) {
    const last = operands.at(-1) ?? '';
    const read = readWave(last, options);
    // Where it begins like a wave, what is wrong with it is worth more than that there is none.
    if (isRefusal(read) && /^[\d.]/.test(last) && !/@/.test(last)) return read;
    return refuse(
      'wave-missing',
      2,
      'a wave is missing behind the media',
      'write one or more, such as 633nm 10.6um',
    );
  }
  const waves: WaveSpec[] = [];
  for (const text of operands.slice(first)) {
    const wave = readWave(text, options);
    if (isRefusal(wave)) return wave;
    waves.push(wave);
  }
  return { media: operands.slice(0, first), waves };
}

/**
 * `MEDIUM`, `MEDIUM@THICKNESS`, or a part with films, in the order the wave meets them: `FILM@qw/MEDIUM@3mm/FILM@100nm`. The
 * part is the piece without a thickness, else the thickest; the others are its films.
 */
export async function readPart(text: string, catalogue: IndexedCatalogue): Promise<Part | Refusal> {
  const texts = text.split('/');
  const pieces: Piece[] = [];
  for (const piece of texts) {
    const read = readPiece(piece, catalogue);
    if (isRefusal(read)) return suggestMedia(read, piece.split('@')[0] ?? '', catalogue);
    pieces.push(read);
  }
  const [only] = pieces;
  if (only && pieces.length === 1) {
    if (only.thickness?.kind === 'waves') return filmAlone(text, texts[0]?.split('@')[0] ?? '');
    return { medium: only.medium, text, thickness_m: only.thickness?.thickness_m ?? null };
  }
  const place = placeOfPlate(pieces);
  const plate = pieces[place];
  if (!plate) {
    const remedy = 'write FILM@qw/MEDIUM@3mm/FILM@qw, films and part in the order the wave meets them';
    return refuse('bad-part', 2, `${quoteInput(text)} is films alone`, `${remedy}; the part in a length`);
  }
  const layersOf = (list: readonly Piece[]): readonly Layer[] | undefined => {
    const layers = list.flatMap(({ medium, thickness }) => (thickness ? [{ medium, thickness }] : []));
    return layers.length === list.length ? layers : undefined;
  };
  const front = layersOf(pieces.slice(0, place));
  const back = layersOf(pieces.slice(place + 1));
  if (!front || !back) {
    return refuse(
      'bad-part',
      2,
      `${quoteInput(text)} names more than one medium without a thickness`,
      'give every film a thickness, such as FILM@qw or FILM@100nm',
    );
  }
  return {
    medium: plate.medium,
    text,
    thickness_m: plate.thickness?.kind === 'length' ? plate.thickness.thickness_m : null,
    coating: { front, back },
  };
}

interface Piece {
  readonly medium: MediumSpec;
  readonly thickness: LayerThickness | undefined;
}

function readPiece(text: string, catalogue: IndexedCatalogue): Piece | Refusal {
  const [name = '', size, ...more] = text.split('@');
  if (more.length > 0) {
    return refuse(
      'bad-thickness',
      2,
      `${quoteInput(text)} has two thicknesses`,
      `write ${name}@THICKNESS, such as ${name}@3mm; films stand apart: FILM@qw/${name}@3mm`,
    );
  }
  const thickness = size === undefined ? undefined : parseThickness(size);
  if (isProblem(thickness)) return refuse('bad-thickness', 2, thickness.message, thickness.remedy);
  const medium = findMedium(name, catalogue);
  return isRefusal(medium) ? medium : { medium, thickness };
}

const filmAlone = (text: string, name: string): Refusal =>
  refuse(
    'bad-thickness',
    2,
    `${quoteInput(text)} is a film, and parts are compared as plates`,
    `give a length: ${name}@3mm; or the part under it: ${text}/MEDIUM@3mm`,
  );

/** The piece without a thickness, else the one of the greatest length; -1 where every piece is a part of a wave. */
function placeOfPlate(pieces: readonly Piece[]): number {
  const open = pieces.findIndex(({ thickness }) => thickness === undefined);
  if (open >= 0) return open;
  const lengths = pieces.map(({ thickness }) => (thickness?.kind === 'length' ? thickness.thickness_m : -1));
  const greatest = Math.max(...lengths);
  return greatest < 0 ? -1 : lengths.indexOf(greatest);
}
