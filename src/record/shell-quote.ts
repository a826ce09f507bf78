/**
 * Words as a command line for a POSIX shell: read back by `sh` they are the same words, whatever is in them.
 * Words of harmless characters stay bare; others go into single quotes (XCU 2.2.2), where only the single quote itself
 * needs a way out.
 */
const BARE = /^[A-Za-z0-9_@%+:,./-][A-Za-z0-9_@%+:,./=-]*$/;

/** Throws RangeError for a word with a NUL, which no command can be given. */
export function quoteForShell(word: string): string {
  if (word.includes('\0')) throw new RangeError('no command takes a word with a NUL in it');
  return BARE.test(word) ? word : `'${word.replaceAll("'", "'\\''")}'`;
}

export function shellCommand(words: readonly string[]): string {
  return words.map(quoteForShell).join(' ');
}

/**
 * The command over several lines of at most `width` columns, broken between words alone; the shell reads them as one. A word
 * longer than a line is left whole.
 */
export function shellCommandLines(
  words: readonly string[],
  width: number,
  indent = '    ',
): readonly string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of words.map(quoteForShell)) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (line !== '' && [...longer].length + ' \\'.length > width) {
      lines.push(`${line} \\`);
      line = indent + word;
    } else line = longer;
  }
  return [...lines, line];
}
