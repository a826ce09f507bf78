/**
 * A small black-and-white canvas drawn with characters: braille (2 x 4 dots a cell), half blocks (1 x 2) or plain ASCII
 * (1 x 3). The same drawing works in all three; only the resolution differs.
 */
import type { GlyphLevel } from '../term/ability.ts';

export type DotStyle = GlyphLevel;

interface DotGrid {
  readonly across: number;
  readonly down: number;
  /** The character for a pattern of dots: bit `y * across + x`, counted from the top left. */
  readonly glyph: (bits: number) => string;
}

/** Bits of the Unicode braille block by column and row. */
const BRAILLE_BITS = [0x01, 0x08, 0x02, 0x10, 0x04, 0x20, 0x40, 0x80] as const;

const GRIDS: Readonly<Record<DotStyle, DotGrid>> = {
  braille: {
    across: 2,
    down: 4,
    glyph: (bits) => {
      let code = 0x2800;
      BRAILLE_BITS.forEach((braille, i) => {
        if (bits & (1 << i)) code |= braille;
      });
      return bits === 0 ? ' ' : String.fromCharCode(code);
    },
  },
  blocks: { across: 1, down: 2, glyph: (bits) => ' ▀▄█'.charAt(bits) },
  ascii: { across: 1, down: 3, glyph: (bits) => " '-'.:,|".charAt(bits) },
};

export class DotCanvas {
  /** Size in dots. */
  readonly width: number;
  readonly height: number;
  readonly #columns: number;
  readonly #grid: DotGrid;
  readonly #cells: Uint8Array;

  constructor(columns: number, rows: number, style: DotStyle) {
    this.#grid = GRIDS[style];
    this.#columns = columns;
    this.width = columns * this.#grid.across;
    this.height = rows * this.#grid.down;
    this.#cells = new Uint8Array(columns * rows);
  }

  /** Sets one dot, counted from the top left; outside the canvas nothing happens. */
  set(x: number, y: number): void {
    if (x < 0 || y < 0 || x >= this.width || y >= this.height) return;
    const { across, down } = this.#grid;
    const cell = Math.floor(y / down) * this.#columns + Math.floor(x / across);
    this.#cells[cell]! |= 1 << ((y % down) * across + (x % across));
  }

  /** Sets the dots of column `x` from `y1` to `y2`, in either order. */
  vertical(x: number, y1: number, y2: number): void {
    const top = Math.max(0, Math.min(y1, y2));
    const bottom = Math.min(this.height - 1, Math.max(y1, y2));
    for (let y = top; y <= bottom; y++) this.set(x, y);
  }

  /** The canvas as one text a row, each of the canvas's full width. */
  rows(): readonly string[] {
    const { glyph } = this.#grid;
    const rows: string[] = [];
    for (let start = 0; start < this.#cells.length; start += this.#columns) {
      let row = '';
      for (let i = start; i < start + this.#columns; i++) row += glyph(this.#cells[i]!);
      rows.push(row);
    }
    return rows;
  }
}
