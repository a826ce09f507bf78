/**
 * Drawing items and text as lines for the terminal: no line is wider than asked for, and each begins and ends in the
 * default style.
 */
import { clusters, displayWidth } from '../../term/display-width.ts';
import { cutToWidth } from '../../term/fit-width.ts';
import { ASCII_GLYPHS, type Glyphs, SCREEN_GLYPHS } from '../glyphs.ts';
import type { Line } from '../line-edit.ts';
import type { Item, Row } from '../picture/item.ts';
import { fieldStop, type State, type StopId } from '../state.ts';
import { COLOUR_THEME, PLAIN_THEME, paint, type Role, type Theme } from '../theme.ts';

const RESULT_LABEL = 4;

/** A piece of a line. */
export interface Span {
  readonly text: string;
  readonly role: Role;
}

export const span = (text: string, role: Role = 'text'): Span => ({ text, role });

/** How things look in a state. */
export interface Pen {
  readonly theme: Theme;
  readonly glyphs: Glyphs;
  readonly focus: StopId | null;
  readonly entry: { readonly stop: StopId; readonly line: Line; readonly isFresh: boolean } | null;
}

export function penOf(state: State): Pen {
  const { preferences, entry } = state;
  return {
    theme: preferences.colour ? COLOUR_THEME : PLAIN_THEME,
    glyphs: preferences.glyphs === 'ascii' ? ASCII_GLYPHS : SCREEN_GLYPHS,
    focus: state.search || state.page || state.curve ? null : state.focus,
    entry: entry && { stop: fieldStop(entry.field), line: entry.line, isFresh: entry.isFresh },
  };
}

/** Spans as one line of at most `columns` columns; what does not fit is cut, and no blank is drawn at the end. */
export function lineOfSpans(spans: readonly Span[], columns: number, pen: Pen): string {
  let left = columns;
  let out = '';
  let blanks = 0;
  for (const { text, role } of spans) {
    if (left <= 0) break;
    const cut = cutToWidth(text, left, pen.glyphs.more);
    left -= displayWidth(cut);
    // Blanks wait until something follows them: what is not there need not be laid out.
    const look = pen.theme[role];
    const end = look.inverse || look.underline ? cut.length : cut.trimEnd().length;
    if (end > 0) {
      out += ' '.repeat(blanks) + paint(cut.slice(0, end), look);
      blanks = 0;
    }
    blanks += cut.length - end;
  }
  return out;
}

/** An empty line; one blank, since a text without any has no line. */
export const BLANK_LINE = ' ';

export const blanks = (columns: number): string => ' '.repeat(Math.max(0, columns));

/** The spans of an item: mark of the focus, label (padded to `labelWidth`), value. */
export function itemSpans(item: Item, labelWidth: number, room: number, pen: Pen): readonly Span[] {
  const isFocus = item.stop !== undefined && item.stop === pen.focus;
  const mark = span(isFocus ? pen.glyphs.focus : ' ', 'marker');
  const label = item.label === '' ? '' : item.label.padEnd(labelWidth) + ' ';
  const entry = pen.entry;
  const space = room - 1 - displayWidth(label);
  const value =
    entry && item.stop === entry.stop
      ? entrySpans(entry.line, entry.isFresh, space)
      : [span(item.text, isFocus ? 'focus' : item.role)];
  return [mark, span(label, item.role === 'result' ? 'result' : 'text'), ...value];
}

/** The line being typed, scrolled so that the cursor is in sight. */
export function entrySpans(line: Line, isFresh: boolean, room: number): readonly Span[] {
  if (isFresh) return [span(line.text, 'focus'), span(' ', 'cursor')];
  const before = line.text.slice(0, line.cursor);
  const [under, ...rest] = [...clusters(line.text.slice(line.cursor))].map((c) => c.text);
  const shown = endThatFits(before, room - 1);
  return [span(shown, 'field'), span(under ?? ' ', 'cursor'), span(rest.join(''), 'field')];
}

function endThatFits(text: string, room: number): string {
  let kept = text;
  while (kept !== '' && displayWidth(kept) > room)
    kept = kept.slice([...clusters(kept)][0]?.text.length ?? 1);
  return kept;
}

/** A row of a block: one item with its label in the column of labels, or several side by side. */
export function rowSpans(row: Row, labelWidth: number, columns: number, pen: Pen): readonly Span[] {
  const [first, second] = row;
  if (!first) return [];
  if (!second) {
    const item = fitted(first, columns, pen);
    const spans = itemSpans(item, labelColumn(item, labelWidth, columns), columns, pen);
    return first.chord === undefined ? spans : withChord(spans, first.chord, columns);
  }
  // Two results side by side stand in columns; anything else follows its neighbour.
  const isPair = row.length === 2 && first.label !== '' && second.label !== '' && first.role === 'text';
  if (!isPair)
    return row.flatMap((item, i) => [...(i === 0 ? [] : [span(' ')]), ...itemSpans(item, 0, columns, pen)]);
  const left = itemSpans(first, 0, columns, pen);
  const gap = Math.max(1, Math.ceil(columns / 2) - spansWidth(left));
  return [...left, span(' '.repeat(gap)), ...itemSpans(second, 0, columns, pen)];
}

/** The numbers people come for stand close to their names. */
function labelColumn(item: Item, labelWidth: number, columns: number): number {
  if (item.role === 'result') return RESULT_LABEL;
  return 2 + labelWidth + displayWidth(item.text) > columns ? 0 : labelWidth;
}

/** No number is cut: where a row is too long its label gives way. */
function fitted(item: Item, columns: number, pen: Pen): Item {
  if (item.stop === undefined || item.role === 'field' || !/^[-(\d]/.test(item.text)) return item;
  const room = Math.max(1, columns - 2 - displayWidth(item.text));
  const label = cutToWidth(item.label, room, pen.glyphs.more);
  return label === item.label ? item : { ...item, label };
}

function withChord(spans: readonly Span[], chord: string, columns: number): readonly Span[] {
  const gap = columns - spansWidth(spans) - displayWidth(chord) - 1;
  return gap < 1 ? spans : [...spans, span(' '.repeat(gap)), span(chord, 'key')];
}

export function spansWidth(spans: readonly Span[]): number {
  return spans.reduce((sum, s) => sum + displayWidth(s.text), 0);
}
