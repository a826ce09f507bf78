/**
 * The cell model of a screen row: one entry per terminal column, made from a line of text with SGR sequences.
 *
 * Promises: a row is never wider than the screen; it ends with its last visible cell, so trailing blanks are not stored;
 * nothing but glyphs and styles survives, so no control character or foreign escape sequence reaches the terminal.
 * Special cases: the right half of a wide glyph is an empty string; a wide glyph that would be cut by the right edge
 * becomes a blank; the blank braille cell U+2800 becomes a space (one byte for three); the invisible parts of a blank's
 * style are dropped.
 */
import { clusters, isWidthAgreed } from './display-width.ts';
import { applySgr, PLAIN, type Style } from './sgr.ts';

export interface CellRow {
  readonly glyphs: readonly string[];
  readonly styles: readonly Style[];
  /** False where the row holds a glyph whose width terminals do not agree on. */
  readonly agreed: boolean;
}

interface GrowingRow {
  glyphs: string[];
  styles: Style[];
  agreed: boolean;
}

export const EMPTY_ROW: CellRow = { glyphs: [], styles: [], agreed: true };

const BLANK_BRAILLE = '\u2800';
const CONTROL_SEQUENCE =
  /\x1b\[([0-?]*)[ -/]*([@-~])?|\x1b[\]PX^_][^\x07\x1b]*(?:\x07|\x1b\\)?|\x1b[ -/]*[0-~]?/y;

/** Reads one line, which starts in the default style, into at most `columns` cells. */
export function parseRow(line: string, columns: number): CellRow {
  const row: GrowingRow = { glyphs: [], styles: [], agreed: true };
  let style = PLAIN;
  let position = 0;
  while (position < line.length && row.glyphs.length < columns) {
    const sequence = line.indexOf('\x1b', position);
    const end = sequence < 0 ? line.length : sequence;
    if (end > position) pushText(row, line.slice(position, end), style, columns);
    if (sequence < 0) break;
    CONTROL_SEQUENCE.lastIndex = sequence;
    const match = CONTROL_SEQUENCE.exec(line);
    if (match?.[2] === 'm') style = applySgr(style, match[1] ?? '');
    position = sequence + Math.max(1, match?.[0].length ?? 1);
  }
  trimEnd(row);
  return row;
}

function pushText(row: GrowingRow, text: string, style: Style, columns: number): void {
  const blankStyle = style.showsOnBlank ? style : PLAIN;
  for (const { text: glyph, width } of clusters(text)) {
    const room = columns - row.glyphs.length;
    if (room <= 0) return;
    if (width === 0) continue;
    if (width > room || glyph === ' ' || glyph === BLANK_BRAILLE) {
      for (let i = Math.min(width, room); i > 0; i--) {
        row.glyphs.push(' ');
        row.styles.push(blankStyle);
      }
    } else {
      row.glyphs.push(glyph);
      row.styles.push(style);
      row.agreed &&= isWidthAgreed(glyph);
      for (let i = 1; i < width; i++) {
        row.glyphs.push('');
        row.styles.push(style);
      }
    }
  }
}

function trimEnd(row: GrowingRow): void {
  let length = row.glyphs.length;
  while (length > 0 && row.glyphs[length - 1] === ' ' && row.styles[length - 1] === PLAIN) length--;
  row.glyphs.length = length;
  row.styles.length = length;
}
