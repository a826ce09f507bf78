/** A page to read, over the whole width or inside a half. */
import type { PageLine } from '../picture/page-line.ts';
import type { Page } from '../state.ts';
import { BLANK_LINE, entrySpans, lineOfSpans, type Pen, type Span, span } from './pen.ts';

export function pageView(
  lines: readonly PageLine[],
  top: number,
  rows: number,
  columns: number,
  pen: Pen,
  marked?: number,
): readonly string[] {
  return Array.from({ length: rows }, (_, i) => {
    const line = lines[top + i];
    if (!line) return BLANK_LINE;
    if (top + i === marked)
      return lineOfSpans([span(` ${pen.glyphs.focus}`, 'marker'), span(line.text, 'focus')], columns, pen);
    const isMarked = line.mark !== '';
    const mark = span(` ${line.mark}`.padEnd(2) + (isMarked ? ' ' : ''), isMarked ? line.role : 'text');
    const { right } = line;
    const beside = right ? [span(right.text, right.role)] : [];
    return lineOfSpans([mark, span(line.text, isMarked ? 'text' : line.role), ...beside], columns, pen);
  });
}

/** Where a page is narrowed to the lines with a word: what is typed, and how much is out of sight. */
export function pageStatus(page: Page, length: number, rows: number): readonly Span[] {
  const filter = page.filter
    ? [
        span('/'),
        ...(page.isFiltering ? entrySpans(page.filter, false, 30) : [span(page.filter.text)]),
        span('   '),
      ]
    : [];
  const below = Math.max(0, length - page.top - rows);
  const more = below > 0 ? `${below} more lines below` : page.top > 0 ? 'end' : '';
  return [...(page.filter ? filter : [span('  ')]), span(more, 'aside')];
}
