/**
 * Rows of cells as aligned columns, by display width. Nothing is cut or wrapped: a table is as wide as its cells, so its
 * caller chooses what goes in. Numbers stand at the right, texts at the left.
 */

import { toAscii } from '../units/to-ascii.ts';
import { displayWidth } from './display-width.ts';
import { padEndToWidth, padStartToWidth } from './fit-width.ts';

export interface Column {
  readonly title: string;
  /** Numbers, and everything else that is compared from its end. */
  readonly right?: true;
}

export interface ColumnStyle {
  readonly ascii: boolean;
  /** Blanks before each line. */
  readonly indent?: number;
  /** Blanks between columns. */
  readonly gap?: number;
}

/** Titles, then the rows. A missing cell is empty. */
export function columns(
  heads: readonly Column[],
  rows: readonly (readonly string[])[],
  { ascii, indent = 2, gap = 2 }: ColumnStyle,
): readonly string[] {
  const plain = (text: string): string => (ascii ? toAscii(text) : text);
  const all = [heads.map((h) => h.title), ...rows].map((row) => row.map(plain));
  const widths = heads.map((_, i) =>
    all.reduce((most, row) => Math.max(most, displayWidth(row[i] ?? '')), 0),
  );
  return all.map((row) => {
    const cells = heads.map(({ right }, i) =>
      right ? padStartToWidth(row[i] ?? '', widths[i] ?? 0) : padEndToWidth(row[i] ?? '', widths[i] ?? 0),
    );
    return (' '.repeat(indent) + cells.join(' '.repeat(gap))).trimEnd();
  });
}

/**
 * A table of labels and a column for each thing compared, in one piece or, where that is wider than `widest`, in as few blocks
 * below each other as fit, each with the labels.
 * @param labels how many columns at the left are labels.
 */
export function columnBlocks(
  heads: readonly Column[],
  rows: readonly (readonly string[])[],
  labels: number,
  widest: number,
  style: ColumnStyle,
): readonly string[] {
  const compared = heads.length - labels;
  const block = (from: number, to: number): readonly string[] => {
    const part = <T>(list: readonly T[]): readonly T[] => [
      ...list.slice(0, labels),
      ...list.slice(labels + from, labels + to),
    ];
    return columns(part(heads), rows.map(part), style);
  };
  const whole = block(0, compared);
  const fits = (lines: readonly string[]): boolean => lines.every((line) => displayWidth(line) <= widest);
  if (compared < 2 || fits(whole)) return whole;
  for (let size = Math.ceil(compared / 2); ; size = Math.min(size - 1, Math.ceil(size / 2))) {
    const blocks: (readonly string[])[] = [];
    for (let from = 0; from < compared; from += size)
      blocks.push(block(from, Math.min(compared, from + size)));
    if (size <= 1 || blocks.every(fits)) return blocks.flatMap((b, i) => (i === 0 ? b : ['', ...b]));
  }
}
