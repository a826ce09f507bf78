/** Text broken at spaces to a width in cells; a word longer than the width stands alone. Continuation lines take `indent`, which is ASCII. */
export function wrap(text: string, width: number, indent = ''): readonly string[] {
  const lines: string[] = [];
  let line = '';
  let cells = 0;
  for (const word of text.split(' ')) {
    const more = [...word].length;
    if (line !== '' && cells + 1 + more > width) {
      lines.push(line);
      line = indent + word;
      cells = indent.length + more;
    } else if (line === '') {
      line = word;
      cells = more;
    } else {
      line += ` ${word}`;
      cells += 1 + more;
    }
  }
  if (line !== '' || lines.length === 0) lines.push(line);
  return lines;
}
