/** Rows of two media under one name each, in a common order; a dash where one has none. */
import { NO_VALUE } from '../units/number-style.ts';
import type { Shown } from './shown.ts';

export interface PairRow {
  readonly id: string;
  readonly symbol: string;
  readonly label: string;
  readonly left: string;
  readonly right: string;
}

export function pairRows(left: readonly Shown[], right: readonly Shown[]): readonly PairRow[] {
  const order = [...right];
  for (const [i, row] of left.entries()) {
    if (order.some((o) => o.id === row.id)) continue;
    const before = left[i - 1];
    const at = before ? order.findIndex((o) => o.id === before.id) + 1 : 0;
    order.splice(at, 0, row);
  }
  const textOf = (rows: readonly Shown[], id: string): string =>
    rows.find((r) => r.id === id)?.text ?? NO_VALUE;
  return order.map(({ id, symbol, label }) => ({
    id,
    symbol,
    label: commonLabel(label, left.find((l) => l.id === id)?.label),
    left: textOf(left, id),
    right: textOf(right, id),
  }));
}

/** "group index, rel. to air" beside "group index" is "group index": the qualification goes to the value's own place. */
function commonLabel(a: string, b: string | undefined): string {
  if (b === undefined || a === b) return a;
  return a.length < b.length ? a : b;
}
