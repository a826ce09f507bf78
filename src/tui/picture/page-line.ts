/** One line of a page: a mark, and text in the look of its role. */
import type { Layer } from '../../answer/question.ts';
import type { Role } from '../theme.ts';

export interface PageLine {
  readonly mark: string;
  readonly role: Role;
  readonly text: string;
  /** The right one of two columns; `text` is as wide as the left one. */
  readonly right?: Pick<PageLine, 'role' | 'text'>;
  /** Laid out in columns: broken only where it is wider than the page. */
  readonly isLaidOut?: true;
  /** What can be put between the two media from here. */
  readonly layers?: readonly Layer[];
}

export function pageLine(text: string, role: Role = 'text', mark = ''): PageLine {
  return { mark, role, text };
}

/** A line whose columns stand as they are. */
export function laidOut(text: string, role: Role = 'text', mark = ''): PageLine {
  return { mark, role, text, isLaidOut: true };
}
