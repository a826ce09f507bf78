/** The lines above the picture. */

import { ITEM_GAP } from '../picture/flow.ts';
import type { Row } from '../picture/item.ts';
import { itemSpans, lineOfSpans, type Pen, span } from './pen.ts';

export function headView(rows: readonly Row[], columns: number, pen: Pen): readonly string[] {
  return rows.map((row) => {
    const spans = row.flatMap((item, i) => [
      ...(i === 0 ? [] : [span(' '.repeat(ITEM_GAP - 1))]),
      ...itemSpans(item, 0, columns, pen),
    ]);
    return lineOfSpans(spans, columns, pen);
  });
}
