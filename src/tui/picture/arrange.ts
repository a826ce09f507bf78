/** Fits a block into a number of lines: top and bottom stay, the body scrolls so that the focus is in sight. */
import type { StopId } from '../state.ts';
import { ITEM_GAP, itemWidth } from './flow.ts';
import type { Block, Row } from './item.ts';

export interface Arranged {
  /** Exactly as many as asked for. */
  readonly rows: readonly Row[];
  /** All rows, those out of sight too, top to bottom. */
  readonly all: readonly Row[];
  /** Lines of the body out of sight, and the line on which that is said. */
  readonly hiddenAbove: number;
  readonly hiddenBelow: number;
  readonly firstBodyLine: number;
  readonly lastBodyLine: number;
}

export const EMPTY_BLOCK: Block = { top: [], body: [], bottom: [] };

export function arrangeBlock(block: Block, lines: number, columns: number, focus: StopId): Arranged {
  const top = splitRows(block.top, columns).slice(0, lines);
  const bottom = splitRows(block.bottom, columns).slice(0, Math.max(0, lines - top.length - 1));
  const body = splitRows(block.body, columns);
  const room = Math.max(0, lines - top.length - bottom.length);
  const at = body.findIndex((row) => row.some((item) => item.stop === focus));
  const start = Math.max(0, Math.min(at - room + 1, body.length - room));
  const seen = body.slice(start, start + room);
  const filler: Row[] = new Array<Row>(room - seen.length).fill([]);
  return {
    rows: [...top, ...seen, ...filler, ...bottom],
    all: [...top, ...body, ...bottom],
    hiddenAbove: room > 0 ? start : 0,
    hiddenBelow: room > 0 ? body.length - start - seen.length : 0,
    firstBodyLine: top.length,
    lastBodyLine: top.length + seen.length - 1,
  };
}

/** For small screens: everything under the first lines scrolls, and no line is left blank. */
export function compactBlock(block: Block): Block {
  const isFilled = (row: Row): boolean => row.some((item) => item.text !== '');
  return {
    top: block.top.filter(isFilled),
    body: [...block.body, ...block.bottom].filter(isFilled),
    bottom: [],
  };
}

/** A row whose items do not fit side by side becomes several. */
function splitRows(rows: readonly Row[], columns: number): readonly Row[] {
  return rows.flatMap((row) => {
    const width = row.reduce((sum, item) => sum + itemWidth(item) + ITEM_GAP, -ITEM_GAP + 1);
    return row.length > 1 && width > columns ? row.map((item) => [item]) : [row];
  });
}
