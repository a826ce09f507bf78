/**
 * Rows of cells as aligned columns, by display width. Nothing is cut or wrapped: a table is as wide as its cells, so its
 * caller chooses what goes in. Numbers stand at the right, texts at the left.
 */
import { displayWidth } from '../../term/display-width.ts';
import { padEndToWidth, padStartToWidth } from '../../term/fit-width.ts';
import { toAscii } from '../../units/to-ascii.ts';

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
