/** The keys in force, for the help: those of the picture, of typing, of lists, in the order of the table. */
import { displayWidth } from '../../term/display-width.ts';
import { padEndToWidth } from '../../term/fit-width.ts';
import type { Action, Context } from '../keys/actions.ts';
import { keyText } from '../keys/key-names.ts';
import type { State } from '../state.ts';
import type { World } from '../world.ts';
import { type PageLine, pageLine } from './page-line.ts';
import { wrapText } from './wrap.ts';

const SECTIONS: readonly (readonly [Context, string])[] = [
  ['picture', 'in the picture'],
  ['entry', 'while typing'],
  ['search', 'in the list of media'],
  ['page', 'on a page like this'],
  ['curve', 'on a curve'],
];
const KEYS_WIDTH = 22;
const GAP = 2;
const TWO_COLUMNS_FROM = 117;

/** In two columns where there is room; every line fits into `columns`. */
export function keyLines(state: State, filter: string, world: World, columns: number): readonly PageLine[] {
  const ascii = state.preferences.glyphs === 'ascii';
  const word = filter.trim().toLowerCase();
  const isWide = columns >= TWO_COLUMNS_FROM;
  const width = isWide ? Math.floor((columns - GAP) / 2) : columns;
  const shown = new Set<Action>();
  // The keys of what is open come first.
  const first = state.curve ? 'curve' : 'picture';
  const order = [...SECTIONS].sort(([a], [b]) => Number(b === first) - Number(a === first));
  const sections = order.flatMap(([context, title]) => {
    const actions = world.bindings.actions.filter((a) => a.contexts.includes(context) && !shown.has(a));
    for (const action of actions) shown.add(action);
    const typed: readonly Row[] = context === 'picture' ? [TYPING] : [];
    const rows = [...typed, ...actions.map((action) => rowOf(action, ascii))].filter((row) =>
      row.join(' ').toLowerCase().includes(word),
    );
    if (rows.length === 0) return [];
    return [[[pageLine(title, 'heading')], ...rows.map((row) => rowLines(row, width)), [pageLine('')]]];
  });
  if (sections.length === 0) return [pageLine(`no key is about "${filter.trim()}"`)];
  const entries = sections.flat();
  return isWide ? inTwoColumns(entries, width) : entries.flat();
}

/** The keys, and what they do. */
type Row = readonly [keys: string, help: string];
const TYPING: Row = ['0-9 .', 'type a value where you are'];

const rowOf = ({ keys, help }: Action, ascii: boolean): Row => [
  keys.map((chord) => keyText(chord, ascii)).join(' '),
  help,
];

/** The help stands beside its keys, further lines of it below its first one. */
function rowLines([keys, help]: Row, width: number): readonly PageLine[] {
  const gap = displayWidth(keys) >= KEYS_WIDTH ? ' ' : '';
  const beside = padEndToWidth(keys, KEYS_WIDTH) + gap;
  return wrapText(help, width - displayWidth(beside)).map((piece, i) =>
    pageLine((i === 0 ? beside : ' '.repeat(displayWidth(beside))) + piece),
  );
}

/** Side by side, about half of the lines in each; the lines of one entry stay together. */
function inTwoColumns(entries: readonly (readonly PageLine[])[], width: number): readonly PageLine[] {
  const left: PageLine[] = [];
  const right: PageLine[] = [];
  const half = Math.ceil(entries.flat().length / 2);
  for (const lines of entries) (left.length < half ? left : right).push(...lines);
  return Array.from({ length: Math.max(left.length, right.length) }, (_, i) => {
    const [l, r] = [left[i] ?? pageLine(''), right[i]];
    return r && r.text !== '' ? { ...l, text: padEndToWidth(l.text, width + GAP), right: r } : l;
  });
}
