/** The lines under the picture. */
import type { NoticeLine } from '../picture/notice.ts';
import { BLANK_LINE, lineOfSpans, type Pen, span } from './pen.ts';

export function noticeView(
  notice: readonly NoticeLine[],
  lines: number,
  columns: number,
  pen: Pen,
): readonly string[] {
  return Array.from({ length: lines }, (_, i) => {
    const line = notice[i];
    if (!line) return BLANK_LINE;
    return lineOfSpans([span(line.mark.padEnd(1), line.markRole), span(' '), span(line.text)], columns, pen);
  });
}
