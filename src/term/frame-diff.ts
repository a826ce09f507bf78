/**
 * What has to be written to turn one picture on the terminal into another, in as few bytes as a left-to-right pass can.
 *
 * Promises: after the returned text the terminal shows `after`; equal rows cost nothing; no line is ever scrolled and
 * no whole line or screen erased (only the rest of a row, where its new content ends earlier).
 * Between two changed stretches of a row the cheaper of "write the equal cells again" and "step over them" is taken;
 * both leave the same state, so the choice is the best one for the whole row.
 * Special cases: a cell of a picture that is not known differs from everything. A glyph whose width terminals do not
 * agree on is written over blanks, the cursor is placed anew after it, and a row that holds one is written whole: it
 * can neither shift its neighbours nor leave a part of itself behind.
 */
import { type CellRow, EMPTY_ROW } from './cells.ts';
import { cursorMove, UNKNOWN } from './cursor-move.ts';
import { isWidthAgreed } from './display-width.ts';
import { PLAIN, type Style, styleTransition } from './sgr.ts';

/** Where the terminal's cursor stands and in which style it writes; changed by every function of this module. */
export interface Pen {
  x: number;
  y: number;
  style: Style;
}

/** Up to this many left-over cells at the end of a row spaces are shorter than erasing. */
const SPACES_BEFORE_ERASE = 3;

/** A row of which nothing is known: every cell has to be written. */
export function unknownRow(columns: number): CellRow {
  return {
    glyphs: new Array<string>(columns).fill('\0'),
    styles: new Array<Style>(columns).fill(PLAIN),
    agreed: true,
  };
}

/**
 * The text that turns `before` into `after` on a screen of `columns` columns. The style of the last cell written stays on, as
 * `pen` says: the next frame mostly begins with another, and what stands between frames sets its own.
 */
export function diffFrames(
  before: readonly CellRow[],
  after: readonly CellRow[],
  pen: Pen,
  columns: number,
): string {
  let out = '';
  const height = Math.max(before.length, after.length);
  for (let y = 0; y < height; y++) {
    const old = before[y] ?? EMPTY_ROW;
    const row = after[y] ?? EMPTY_ROW;
    if (old === row) continue;
    if (old.agreed && row.agreed) out += diffRow(old, row, y, pen, columns);
    else if (!isSameRow(old, row)) out += diffRow(unknownRow(columns), row, y, pen, columns);
  }
  return out;
}

function diffRow(old: CellRow, row: CellRow, y: number, pen: Pen, columns: number): string {
  let out = '';
  const leftOver = old.glyphs.length - row.glyphs.length;
  const end = row.glyphs.length + (leftOver > 0 && leftOver <= SPACES_BEFORE_ERASE ? leftOver : 0);
  let x = nextChange(old, row, 0, end);
  while (x < end) {
    out += moveTo(pen, x, y);
    let stop = x;
    while (stop < end && !isSame(old, row, stop)) stop++;
    out += writeCells(row, x, stop, pen, columns);
    const next = nextChange(old, row, stop, end);
    if (next < end) out += bridge(row, stop, next, y, pen, columns);
    x = next;
  }
  if (end < old.glyphs.length) out += moveTo(pen, end, y) + setStyle(pen, PLAIN) + '\x1b[K';
  return out;
}

/** Writes the equal cells between two changes again where that is shorter than stepping over them. */
function bridge(row: CellRow, from: number, to: number, y: number, pen: Pen, columns: number): string {
  const step = cursorMove(pen, { x: to, y });
  // Rewriting takes a byte per cell at least: no need to try where the gap is longer than the step.
  if (to - from > step.length) return '';
  const nextStyle = styleAt(row, to);
  const trial = { ...pen };
  const again = writeCells(row, from, to, trial, columns);
  const bytesAgain = utf8Length(again) + styleTransition(trial.style, nextStyle).length;
  if (bytesAgain > step.length + styleTransition(pen.style, nextStyle).length) return '';
  Object.assign(pen, trial);
  return again;
}

function writeCells(row: CellRow, from: number, to: number, pen: Pen, columns: number): string {
  let out = '';
  for (let x = from; x < to; x++) {
    const glyph = glyphAt(row, x);
    if (glyph === '') continue;
    const style = styleAt(row, x);
    // A blank looks the same in every style that shows nothing on blanks: no need to switch for it.
    if (glyph !== ' ' || style.showsOnBlank || pen.style.showsOnBlank) out += setStyle(pen, style);
    if (row.agreed || isWidthAgreed(glyph)) {
      if (pen.x === UNKNOWN) out += moveTo(pen, x, pen.y);
      out += glyph;
      pen.x = rightOf(row, x, columns);
    } else {
      out += moveTo(pen, x, pen.y) + ' '.repeat(widthAt(row, x)) + `\x1b[${x + 1}G` + glyph;
      pen.x = UNKNOWN;
    }
  }
  return out;
}

/** The column after the glyph at `x`; not certain at the right edge, where terminals wait before they wrap. */
function rightOf(row: CellRow, x: number, columns: number): number {
  const right = x + widthAt(row, x);
  return right < columns ? right : UNKNOWN;
}

function widthAt(row: CellRow, x: number): number {
  let width = 1;
  while (glyphAt(row, x + width) === '') width++;
  return width;
}

/** The first column at or after `x` that has to be written. The halves of a wide glyph always change together. */
function nextChange(old: CellRow, row: CellRow, x: number, end: number): number {
  let next = x;
  while (next < end && isSame(old, row, next)) next++;
  return next;
}

const glyphAt = (row: CellRow, x: number): string => row.glyphs[x] ?? ' ';
const styleAt = (row: CellRow, x: number): Style => row.styles[x] ?? PLAIN;
const isSame = (old: CellRow, row: CellRow, x: number): boolean =>
  glyphAt(old, x) === glyphAt(row, x) && styleAt(old, x) === styleAt(row, x);

const isSameRow = (old: CellRow, row: CellRow): boolean =>
  old.glyphs.length === row.glyphs.length && row.glyphs.every((_, x) => isSame(old, row, x));

function moveTo(pen: Pen, x: number, y: number): string {
  const out = cursorMove(pen, { x, y });
  pen.x = x;
  pen.y = y;
  return out;
}

function setStyle(pen: Pen, style: Style): string {
  const out = styleTransition(pen.style, style);
  pen.style = style;
  return out;
}

/** Bytes of a text in UTF-8. */
function utf8Length(text: string): number {
  let bytes = 0;
  for (let i = 0; i < text.length; i++) {
    const unit = text.charCodeAt(i);
    // Each half of a surrogate pair stands for two of the four bytes.
    bytes += unit < 0x80 ? 1 : unit < 0x800 || (unit >= 0xd800 && unit < 0xe000) ? 2 : 3;
  }
  return bytes;
}
