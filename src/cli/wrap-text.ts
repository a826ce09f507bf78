/** Plain text in lines of a given width, for help. */
/** A space at which no line is broken; wrapping turns it into a plain one. */
export const NO_BREAK = '\u00a0';

/**
 * Text in lines of at most `width` characters, broken at spaces; later lines begin with `indent`. A word longer than a line
 * stands alone in it. For ASCII text, where characters are columns.
 */
export function wrapText(text: string, width: number, indent = ''): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(/[ \n]+/).filter((w) => w !== '')) {
    const start = lines.length === 0 ? '' : indent;
    if (line === '') line = start + word;
    else if (line.length + 1 + word.length <= width) line += ` ${word}`;
    else {
      lines.push(line);
      line = indent + word;
    }
  }
  if (line !== '') lines.push(line);
  return lines.map((l) => l.replaceAll(NO_BREAK, ' '));
}

/** `  term   meaning`, the meaning wrapped in a column of its own from `column` on; a long term gets its own line. */
export function definition(term: string, meaning: string, column: number, width: number): string[] {
  const head = `  ${term}`;
  const body = wrapText(meaning, width - column).map((line) => ' '.repeat(column) + line);
  const [first = ''] = body;
  if (head.length + 2 > column) return [head, ...body];
  return [head + first.slice(head.length), ...body.slice(1)];
}
