/**
 * The frame of every text for people: lines within 72 columns, no blanks at their ends, one newline at the end, and bytes
 * 0x20 to 0x7E only where the terminal has no more.
 */
import { wrap } from '../../present/wrap.ts';
import { toAscii } from '../../units/to-ascii.ts';

/** Pastes into a notebook; also what a terminal of 80 columns shows with room for a quotation mark. */
export const PAGE_WIDTH = 72;

export function page(lines: readonly string[], ascii: boolean): string {
  const shown = ascii ? lines.map(toAscii) : lines;
  return `${shown
    .map((line) => line.trimEnd())
    .join('\n')
    .trimEnd()}\n`;
}

/** A paragraph `indent` columns in, its later lines two further. */
export function paragraph(text: string, indent = 0, hang = 2): readonly string[] {
  const start = ' '.repeat(indent);
  return wrap(text, PAGE_WIDTH - indent, ' '.repeat(hang)).map((line) => start + line);
}

/** `label` in a column of its own, the text wrapped beside it; nothing where there is no text. */
export function labelled(label: string, text: string | undefined, column = 18): readonly string[] {
  if (text === undefined || text === '') return [];
  const body = wrap(text, PAGE_WIDTH - column).map((line) => ' '.repeat(column) + line);
  const head = `  ${label}`;
  const [first = '', ...rest] = body;
  return head.length + 1 > column ? [head, ...body] : [head + first.slice(head.length), ...rest];
}
