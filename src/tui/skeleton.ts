/** What is drawn while the rest of the program loads: the boundary alone, where it will stand. */
import type { ScreenSize } from '../term/cell-writer.ts';
import type { Glyphs } from './glyphs.ts';
import { boundaryColumn, planScreen } from './picture/plan.ts';

export function skeletonFrame(size: ScreenSize, glyphs: Glyphs): string {
  const plan = planScreen(size, { head: 2, notice: 2, body: 15 });
  if (plan.kind !== 'full') return '';
  const boundary = ' '.repeat(boundaryColumn(plan)) + glyphs.rail;
  const rails = ' '.repeat(plan.left) + glyphs.rail + ' '.repeat(plan.middle) + glyphs.rail;
  return [
    ...new Array<string>(plan.head).fill(''),
    ...new Array<string>(plan.strip).fill(boundary),
    '',
    ...new Array<string>(plan.body).fill(rails),
  ].join('\n');
}
