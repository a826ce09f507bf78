/** A table in Markdown. */

/** Nothing for a table without rows; a blank line after any other. */
export function markdownTable(
  heads: readonly string[],
  rows: readonly (readonly string[])[],
): readonly string[] {
  if (rows.length === 0) return [];
  return [
    line(heads.map(markdownCell)),
    line(heads.map(() => '---')),
    ...rows.map((r) => line(r.map(markdownCell))),
    '',
  ];
}

const line = (cells: readonly string[]): string => `| ${cells.join(' | ')} |`;

/** Text with what Markdown would take for its own made plain. */
export const markdownCell = (text: string): string => text.replaceAll('|', '\\|').replaceAll('*', '\\*');
