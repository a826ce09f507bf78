/**
 * How the lines and columns of a screen are shared out. Three kinds:
 *   full     the whole picture: head, wave strip, the two halves with the surface between them; curves where there is room
 *   single   one part at a time below the head: the first medium, the surface, or the second medium
 *   none     smaller than the program can serve
 * Promises: the lines add up to at most rows - 1, so that no terminal scrolls; every part has a size of at least 0.
 */
import type { ScreenSize } from '../../term/cell-writer.ts';

export const SMALLEST: ScreenSize = { columns: 40, rows: 12 };
const FULL: ScreenSize = { columns: 72, rows: 20 };

export interface Plan {
  readonly kind: 'full' | 'single' | 'none';
  readonly columns: number;
  /** Lines of each part, top to bottom. */
  readonly head: number;
  readonly strip: number;
  /** The line in which the boundary opens (full) or the path of media (single). */
  readonly joint: number;
  readonly body: number;
  readonly curve: number;
  readonly notice: number;
  readonly footer: number;
  /** Columns of the halves and of the surface between its two rails; all of them the whole width in a single plan. */
  readonly left: number;
  readonly middle: number;
  readonly right: number;
}

export interface PlanNeeds {
  /** Lines that the head takes at this width. */
  readonly head: number;
  /** Lines of the notice, at least 1. */
  readonly notice: number;
  /** Lines of the longest block. */
  readonly body: number;
}

export function planScreen(size: ScreenSize, needs: PlanNeeds): Plan {
  const { columns, rows } = size;
  if (columns < SMALLEST.columns || rows < SMALLEST.rows) return nothing(columns);
  const isFull = columns >= FULL.columns && rows >= FULL.rows;
  return isFull ? fullPlan(size, needs) : singlePlan(size, needs);
}

function nothing(columns: number): Plan {
  return {
    kind: 'none',
    columns,
    head: 0,
    strip: 0,
    joint: 0,
    body: 0,
    curve: 0,
    notice: 0,
    footer: 0,
    left: 0,
    middle: 0,
    right: 0,
  };
}

/** A curve of fewer lines says nothing; of more, nothing further. */
const SHORTEST_CURVE = 8;
const TALLEST_CURVE = 26;

function fullPlan({ columns, rows }: ScreenSize, needs: PlanNeeds): Plan {
  const lines = rows - 1;
  const head = Math.min(needs.head, 4);
  const footer = 1;
  const joint = 1;
  const strip = rows < 22 ? 3 : rows < 28 ? 4 : rows < 46 ? 5 : rows < 56 ? 7 : 9;
  const least = 8;
  const notice = Math.max(1, Math.min(needs.notice, lines - head - strip - joint - footer - least));
  const rest = lines - head - strip - joint - notice - footer;
  const spare = rest - Math.max(14, needs.body);
  const curve = spare >= SHORTEST_CURVE ? Math.min(spare, TALLEST_CURVE) : 0;
  const middle = columns < 100 ? 22 : columns < 140 ? 28 : 32;
  const left = Math.floor((columns - middle - 2) / 2);
  return {
    kind: 'full',
    columns,
    head,
    strip,
    joint,
    body: rest - curve,
    curve,
    notice,
    footer,
    left,
    middle,
    right: columns - middle - 2 - left,
  };
}

function singlePlan({ columns, rows }: ScreenSize, needs: PlanNeeds): Plan {
  const lines = rows - 1;
  const head = Math.min(needs.head, 2);
  const strip = rows >= 20 ? 4 : rows >= 16 ? 3 : 0;
  const joint = 1;
  const footer = 1;
  const least = 4;
  const notice = Math.max(1, Math.min(needs.notice, lines - head - strip - joint - footer - least));
  return {
    kind: 'single',
    columns,
    head,
    strip,
    joint,
    body: lines - head - strip - joint - notice - footer,
    curve: 0,
    notice,
    footer,
    left: columns,
    middle: columns,
    right: columns,
  };
}

/** Column of the boundary in the wave strip. */
export function boundaryColumn(plan: Plan): number {
  return plan.kind === 'full' ? plan.left + 1 + Math.floor(plan.middle / 2) : Math.floor(plan.columns / 2);
}
