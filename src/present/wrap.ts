/** Text broken at spaces to a width in cells; a word longer than the width stands alone. Continuation lines take `indent`. */
export function wrap(text: string, width: number, indent = ''): readonly string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ')) {
    const candidate = line === '' ? (lines.length === 0 ? word : indent + word) : `${line} ${word}`;
    if ([...candidate].length > width && line !== '') {
      lines.push(line);
      line = indent + word;
    } else line = candidate;
  }
  if (line !== '' || lines.length === 0) lines.push(line);
  return lines;
}
