/** Cautions as lines of a page: graver than a note with a mark of their own. */
import type { Caution } from '../../answer/answer.ts';
import { type PageLine, pageLine } from './page-line.ts';

export function cautionLines(cautions: readonly Caution[]): readonly PageLine[] {
  return cautions.map(({ level, text }) =>
    level === 'note' ? pageLine(text, 'note', '-') : pageLine(text, level, '!'),
  );
}
