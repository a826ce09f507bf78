/** Breaks plain text into lines of at most `columns` columns, at blanks where it can. */
import { clusters, displayWidth } from '../../term/display-width.ts';

export function wrapText(text: string, columns: number): readonly string[] {
  if (columns < 1) return [];
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(/\s+/).filter((w) => w !== '')) {
    for (const piece of pieces(word, columns)) {
      const joined = line === '' ? piece : `${line} ${piece}`;
      if (displayWidth(joined) <= columns) line = joined;
      else {
        lines.push(line);
        line = piece;
      }
    }
  }
  if (line !== '') lines.push(line);
  return lines;
}

/** A word longer than a line is cut; an address is cut after a slash where possible. */
function pieces(word: string, columns: number): readonly string[] {
  if (displayWidth(word) <= columns) return [word];
  const out: string[] = [];
  let piece = '';
  let width = 0;
  for (const cluster of clusters(word)) {
    if (width + cluster.width > columns) {
      const slash = piece.lastIndexOf('/') + 1;
      const cut = slash > piece.length / 2 ? slash : piece.length;
      out.push(piece.slice(0, cut));
      piece = piece.slice(cut);
      width = displayWidth(piece);
    }
    piece += cluster.text;
    width += cluster.width;
  }
  return piece === '' ? out : [...out, piece];
}
