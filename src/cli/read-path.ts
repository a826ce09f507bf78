/**
 * The layers of a path as typed, in the order the wave meets them: `MEDIUM@THICKNESS`, and groups that repeat:
 *
 *   8x: titanium-dioxide-film@qw silica-film@qw :        the pair eight times
 *   3x: 5x: n=2.3@qw n=1.46@qw : n=2.3@hw :              groups may stand in groups
 *
 * `8x:` opens a group and `:` closes the innermost one; both are operands of their own, so no shell takes them for
 * anything else. Equal layers are one object, which the laws work out once.
 */
import type { Layer } from '../answer/question.ts';
import type { IndexedCatalogue } from '../catalog/entries.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { parseThickness } from '../units/parse-thickness.ts';
import { isProblem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { findMedium } from './find-medium.ts';

/** More layers than any coating has; a mistyped count stops here. */
export const MOST_LAYERS = 2000;

const OPENS = /^(\d+)[x×]:$/iu;
const CLOSES = ':';
const USAGE = 'write 8x: LAYER LAYER : for the two layers eight times';

/** A refusal, with the medium's name where the catalogue may know a close one. */
export interface UnreadLayer {
  readonly refusal: Refusal;
  readonly name: string;
}

interface OpenGroup {
  readonly times: number;
  readonly text: string;
  readonly layers: Layer[];
}

export function readLayers(
  words: readonly string[],
  catalogue: IndexedCatalogue,
): readonly Layer[] | UnreadLayer {
  const known = new Map<string, Layer>();
  const outer: OpenGroup = { times: 1, text: '', layers: [] };
  const open: OpenGroup[] = [outer];
  for (const word of words) {
    const innermost = open.at(-1) ?? outer;
    const opens = OPENS.exec(word);
    if (opens) {
      const times = Number(opens[1]);
      if (times === 0) return unread('bad-group', `${quoteInput(word)} repeats nothing`, 'give 1 or more');
      open.push({ times, text: word, layers: [] });
    } else if (word === CLOSES) {
      if (open.length === 1) return unread('bad-group', 'a colon closes no group here', USAGE);
      open.pop();
      const { times, text, layers } = innermost;
      const around = open.at(-1) ?? outer;
      if (layers.length === 0) return unread('bad-group', `the group ${text} holds no layer`, USAGE);
      const total = around.layers.length + times * layers.length;
      if (total > MOST_LAYERS) return tooMany(total);
      for (let i = 0; i < times; i++) around.layers.push(...layers);
    } else {
      const layer = known.get(word) ?? readLayer(word, catalogue);
      if (isRefusal(layer)) return { refusal: layer, name: layerName(word) };
      known.set(word, layer);
      innermost.layers.push(layer);
    }
  }
  if (open.length > 1) {
    const { text } = open.at(-1) ?? outer;
    return unread('bad-group', `the group ${text} is not closed`, `${USAGE}; each group ends with a colon`);
  }
  return outer.layers.length > MOST_LAYERS ? tooMany(outer.layers.length) : outer.layers;
}

export function isUnread(read: readonly Layer[] | UnreadLayer): read is UnreadLayer {
  return !Array.isArray(read);
}

/** True for the words that open or close a group. */
export function isGroupMark(word: string): boolean {
  return word.endsWith(CLOSES) && (word === CLOSES || OPENS.test(word));
}

const layerName = (text: string): string => text.split('@')[0] ?? '';

export function readLayer(text: string, catalogue: IndexedCatalogue): Layer | Refusal {
  const [name = '', size, ...more] = text.split('@');
  const mark = groupMark(text);
  if (mark !== undefined) return refuse('bad-group', 2, `${quoteInput(text)} is no layer`, mark);
  if (size === undefined || more.length > 0) {
    return refuse(
      'layer-without-thickness',
      2,
      `${quoteInput(text)} stands between two media and has no thickness`,
      `write ${name}@THICKNESS, such as ${name}@100nm or ${name}@qw`,
    );
  }
  const thickness = parseThickness(size);
  if (isProblem(thickness)) return refuse('bad-thickness', 2, thickness.message, thickness.remedy);
  const medium = findMedium(name, catalogue);
  return isRefusal(medium) ? medium : { medium, thickness };
}

/** What would be right where somebody nearly wrote a group; undefined for anything else. */
function groupMark(text: string): string | undefined {
  const glued = /^(\d+)[x×]:?(.+)$/iu.exec(text);
  if (glued && text.includes('@')) return `leave a space after ${glued[1]}x: (${USAGE})`;
  if (/^\d+[x×*]?$/iu.test(text) || /^[x×*]\d+:?$/iu.test(text)) {
    return `write ${/\d+/.exec(text)?.[0]}x: before the group and a colon after it (${USAGE})`;
  }
  if (/.@.*:$/.test(text)) return `leave a space before the colon (${USAGE})`;
  if (/^[()[\]{}]/.test(text) || /[()[\]{}]$/.test(text)) return USAGE;
  return undefined;
}

function unread(code: string, message: string, remedy: string): UnreadLayer {
  return { refusal: refuse(code, 2, message, remedy), name: '' };
}

function tooMany(count: number): UnreadLayer {
  return unread(
    'too-many-layers',
    `the path has ${count} layers, more than ${MOST_LAYERS}`,
    'repeat fewer times',
  );
}
