/** What a terminal shows that is smaller than the program can serve: the size it needs, cut to what fits. */

import type { ScreenSize } from '../../term/cell-writer.ts';
import { SMALLEST } from '../picture/plan.ts';
import { wrapText } from '../picture/wrap.ts';

export function tooSmallView({ columns, rows }: ScreenSize): readonly string[] {
  const text = `halfspace needs ${SMALLEST.columns} x ${SMALLEST.rows} (now ${columns} x ${rows})`;
  return wrapText(text, columns).slice(0, Math.max(1, rows - 1));
}
