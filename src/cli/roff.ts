/** Text as roff source for the man macros: what roff would read as a request or an escape is made harmless. */

/** A line or paragraph of running text. Hyphens and quotes stay ASCII, so that options can be copied and searched. */
export function roffText(text: string): string {
  const escaped = text
    .replaceAll('\\', '\\e')
    .replaceAll('\u00a0', '\\ ')
    .replaceAll('-', '\\-')
    .replaceAll("'", '\\(aq')
    .replaceAll('^', '\\(ha')
    .replaceAll('~', '\\(ti')
    .replaceAll('`', '\\(ga');
  return escaped.startsWith('.') ? `\\&${escaped}` : escaped;
}

/** An argument of a macro, quoted. */
export function roffArgument(text: string): string {
  return `"${roffText(text).replaceAll('"', '\\(dq')}"`;
}
