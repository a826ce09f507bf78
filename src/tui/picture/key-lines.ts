/** The keys in force, for the help: those of the picture, of typing, of lists, in the order of the table. */
import { displayWidth } from '../../term/display-width.ts';
import { padEndToWidth } from '../../term/fit-width.ts';
import type { Action, Context } from '../keys/actions.ts';
import { keyText } from '../keys/key-names.ts';
import type { State } from '../state.ts';
import type { World } from '../world.ts';
import { type PageLine, pageLine } from './page-line.ts';

const SECTIONS: readonly (readonly [Context, string])[] = [
  ['picture', 'in the picture'],
  ['entry', 'while typing'],
  ['search', 'in the list of media'],
  ['page', 'on a page like this'],
  ['curve', 'on a curve'],
];
const KEYS_WIDTH = 22;
const GAP = 2;
const TWO_COLUMNS_FROM = 2 * 60;

export function keyLines(state: State, filter: string, world: World): readonly PageLine[] {
  const ascii = state.preferences.glyphs === 'ascii';
  const word = filter.trim().toLowerCase();
  const shown = new Set<Action>();
  // The keys of what is open come first.
  const first = state.curve ? 'curve' : 'picture';
  const sections = [...SECTIONS].sort(([a], [b]) => Number(b === first) - Number(a === first));
  const lines = sections.flatMap(([context, title]) => {
    const actions = world.bindings.actions.filter((a) => a.contexts.includes(context) && !shown.has(a));
    for (const action of actions) shown.add(action);
    const rows = actions
      .map((action) => actionLine(action, ascii))
      .filter((text) => text.toLowerCase().includes(word));
    const typed =
      context === 'picture' && word === ''
        ? [`${padEndToWidth('0-9 .', KEYS_WIDTH)}type a value where you are`]
        : [];
    return rows.length === 0
      ? []
      : [pageLine(title, 'heading'), ...[...typed, ...rows].map((text) => pageLine(text)), pageLine('')];
  });
  if (lines.length === 0) return [pageLine(`no key is about "${filter.trim()}"`)];
  return state.size.columns >= TWO_COLUMNS_FROM ? inTwoColumns(lines, state.size.columns) : lines;
}

function actionLine(action: Action, ascii: boolean): string {
  const keys = action.keys.map((chord) => keyText(chord, ascii)).join(' ');
  return `${padEndToWidth(keys, KEYS_WIDTH)}${displayWidth(keys) >= KEYS_WIDTH ? ' ' : ''}${action.help}`;
}

function inTwoColumns(lines: readonly PageLine[], columns: number): readonly PageLine[] {
  const width = Math.floor(columns / 2) - GAP;
  const half = Math.ceil(lines.length / 2);
  return lines.slice(0, half).map((left, i) => {
    const right = lines[half + i];
    return right ? pageLine(`${padEndToWidth(left.text, width)}${right.text}`, left.role) : left;
  });
}
