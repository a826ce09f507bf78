/** The visible rows of one block, in the column of their labels, with a mark where rows are out of sight. */
import { displayWidth } from '../../term/display-width.ts';
import type { Arranged } from '../picture/arrange.ts';
import type { Row } from '../picture/item.ts';
import { lineOfSpans, type Pen, rowSpans, type Span, span, spansWidth } from './pen.ts';

const NARROWEST_LABEL = 4;
const WIDEST_LABEL = 9;

export function blockView(block: Arranged, columns: number, pen: Pen): readonly string[] {
  const labelWidth = labelWidthOf(block.all);
  return block.rows.map((row, y) => {
    const spans = rowSpans(row, labelWidth, columns, pen);
    return lineOfSpans(withMore(spans, block, y, columns, pen), columns, pen);
  });
}

/** Labels of results decide the column; words in front of fields may reach beyond it. */
function labelWidthOf(rows: readonly Row[]): number {
  const widths = rows
    .filter((row) => row.length === 1)
    .flatMap((row) => row.filter((item) => item.stop !== undefined).map((item) => displayWidth(item.label)))
    .filter((width) => width <= WIDEST_LABEL);
  return Math.max(NARROWEST_LABEL, ...widths);
}

function withMore(
  spans: readonly Span[],
  block: Arranged,
  y: number,
  columns: number,
  pen: Pen,
): readonly Span[] {
  const below = y === block.lastBodyLine && block.hiddenBelow > 0;
  const above = y === block.firstBodyLine && block.hiddenAbove > 0;
  if (!below && !above) return spans;
  const text = below
    ? `${block.hiddenBelow}${pen.glyphs.moreBelow}`
    : `${block.hiddenAbove}${pen.glyphs.moreAbove}`;
  const gap = columns - spansWidth(spans) - displayWidth(text) - 1;
  return gap < 1 ? spans : [...spans, span(' '.repeat(gap)), span(text, 'aside')];
}
