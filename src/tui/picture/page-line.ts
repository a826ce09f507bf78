/** One line of a page: a mark, and text in the look of its role. */
import type { Role } from '../theme.ts';

export interface PageLine {
  readonly mark: string;
  readonly role: Role;
  readonly text: string;
}

export function pageLine(text: string, role: Role = 'text', mark = ''): PageLine {
  return { mark, role, text };
}
