/**
 * Dots finer than cells: two by four a cell in braille, one by two with half blocks, one a cell in ASCII. Draws lines with dashes,
 * cut at the edges; gives the character of each cell.
 */
import { coarseDashOf, dashOf, isDrawn } from './dash-patterns.ts';

export type GlyphLevel = 'braille' | 'blocks' | 'ascii';

interface DotGrid {
  readonly columns: number;
  readonly rows: number;
}

const DOTS: Readonly<Record<GlyphLevel, DotGrid>> = {
  braille: { columns: 2, rows: 4 },
  blocks: { columns: 1, rows: 2 },
  ascii: { columns: 1, rows: 1 },
};
/** Bit of a braille dot, by row and column (Unicode, block 2800). */
const BRAILLE_BITS = [0x01, 0x08, 0x02, 0x10, 0x04, 0x20, 0x40, 0x80];
const HALF_BLOCKS = ' ▀▄█';

/** The dashes of a series in dots. In ASCII the letter tells the series, so lines are solid. */
export function dashesAt(level: GlyphLevel, seriesIndex: number): readonly number[] {
  if (level === 'ascii') return [];
  return level === 'braille' ? dashOf(seriesIndex) : coarseDashOf(seriesIndex);
}

export class DotRaster {
  readonly level: GlyphLevel;
  readonly dotColumns: number;
  readonly dotRows: number;
  private readonly grid: DotGrid;
  private readonly width: number;
  private readonly bits: Uint8Array;
  private readonly letters: string[] = [];

  constructor(width: number, height: number, level: GlyphLevel) {
    this.level = level;
    this.grid = DOTS[level];
    this.width = width;
    this.dotColumns = width * this.grid.columns;
    this.dotRows = height * this.grid.rows;
    this.bits = new Uint8Array(width * height);
  }

  /** The dot for places from 0 (left, bottom) to 1 (right, top). */
  dotAt(xPlace: number, yPlace: number): readonly [number, number] {
    return [xPlace * (this.dotColumns - 1), (1 - yPlace) * (this.dotRows - 1)];
  }

  setDot(dotColumn: number, dotRow: number, letter: string): void {
    if (!(dotColumn >= 0 && dotColumn < this.dotColumns && dotRow >= 0 && dotRow < this.dotRows)) return;
    const { columns, rows } = this.grid;
    const cell = Math.floor(dotRow / rows) * this.width + Math.floor(dotColumn / columns);
    const bit =
      this.level === 'braille'
        ? (BRAILLE_BITS[(dotRow % rows) * 2 + (dotColumn % 2)] ?? 0)
        : 1 << (dotRow % rows);
    this.bits[cell] = (this.bits[cell] ?? 0) | bit;
    this.letters[cell] ??= letter;
  }

  /** A point on its own: as large as a dot can be seen. */
  setPoint(dotColumn: number, dotRow: number, letter: string): void {
    const [x, y] = [Math.round(dotColumn), Math.round(dotRow)];
    const size = this.level === 'braille' ? 2 : 1;
    for (let i = 0; i < size; i++) for (let j = 0; j < size; j++) this.setDot(x + i, y + j, letter);
  }

  /**
   * A straight line between two dots, which may lie anywhere outside. Returns how far the line has come along, for the dashes
   * of the next piece.
   */
  line(
    from: readonly [number, number],
    to: readonly [number, number],
    dashes: readonly number[],
    along: number,
    letter: string,
  ): number {
    const cut = cutToBox(from, to, this.dotColumns - 1, this.dotRows - 1);
    if (!cut) return along;
    const [x0, y0, x1, y1] = cut.map(Math.round) as [number, number, number, number];
    const steps = Math.max(Math.abs(x1 - x0), Math.abs(y1 - y0));
    for (let i = 0; i <= steps; i++) {
      const share = steps === 0 ? 0 : i / steps;
      if (isDrawn(dashes, along + i))
        this.setDot(Math.round(x0 + (x1 - x0) * share), Math.round(y0 + (y1 - y0) * share), letter);
    }
    return along + steps;
  }

  /** The character of a cell; a space where it has no dots. */
  glyph(row: number, column: number): string {
    const cell = row * this.width + column;
    const bits = this.bits[cell] ?? 0;
    if (bits === 0) return ' ';
    if (this.level === 'ascii') return this.letters[cell] ?? '*';
    return this.level === 'blocks' ? (HALF_BLOCKS[bits] ?? ' ') : String.fromCharCode(0x2800 + bits);
  }
}

/** The part of a segment within 0..right and 0..bottom (Liang and Barsky 1984); undefined where none is. */
function cutToBox(
  [x0, y0]: readonly [number, number],
  [x1, y1]: readonly [number, number],
  right: number,
  bottom: number,
): readonly [number, number, number, number] | undefined {
  // Half a dot more on each side: what rounds to the last dot belongs to it.
  const sides = [
    [x0 - x1, x0 + 0.5],
    [x1 - x0, right + 0.499 - x0],
    [y0 - y1, y0 + 0.5],
    [y1 - y0, bottom + 0.499 - y0],
  ] as const;
  let enter = 0;
  let leave = 1;
  for (const [slope, room] of sides) {
    if (slope === 0) {
      if (room < 0) return undefined;
    } else if (slope < 0) enter = Math.max(enter, room / slope);
    else leave = Math.min(leave, room / slope);
  }
  if (!(enter <= leave)) return undefined;
  return [x0 + (x1 - x0) * enter, y0 + (y1 - y0) * enter, x0 + (x1 - x0) * leave, y0 + (y1 - y0) * leave];
}
