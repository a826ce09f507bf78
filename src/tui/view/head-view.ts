/** The lines above the picture. */

import { ITEM_GAP } from '../picture/flow.ts';
import type { Row } from '../picture/item.ts';
import { itemSpans, lineOfSpans, type Pen, type Span, span, spansWidth } from './pen.ts';

export function headView(rows: readonly Row[], columns: number, pen: Pen): readonly string[] {
  return rows.map((row) => {
    const spans: Span[] = [];
    for (const item of row) {
      if (spans.length > 0) spans.push(span(' '.repeat(ITEM_GAP - 1)));
      spans.push(...itemSpans(item, 0, columns - spansWidth(spans), pen));
    }
    return lineOfSpans(spans, columns, pen);
  });
}
