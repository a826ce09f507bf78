/**
 * The part of the `@alcalzone/ansi-tokenize` module that Ink lays its output out with, to stand in for it in the bundle:
 * a line of text becomes styled characters, a row of styled characters becomes text. Most of the time of a frame goes
 * there; here lines and characters seen before are not looked into again, and styles compare by identity.
 *
 * Special cases: only SGR sequences are understood (Ink has taken everything else out); hyperlinks are not, and nothing in
 * the program writes any. `tokenize` gives the styled characters already and `styledCharsFromTokens` hands them on: Ink
 * never looks into the tokens between the two.
 */
import { clusters } from './display-width.ts';
import { applySgr, PLAIN, type Style, styleTransition } from './sgr.ts';

export interface StyledChar {
  readonly type: 'char';
  readonly value: string;
  readonly fullWidth: boolean;
  /** A `Style`; Ink's own blank cells have an empty list instead. */
  readonly styles: Style | readonly never[];
}

/** Lines kept; a screen has far fewer, so what is on it stays while the old is forgotten. */
const MOST_LINES = 600;
const MOST_CHARS = 4000;

let lines = new Map<string, readonly StyledChar[]>();
let linesBefore = new Map<string, readonly StyledChar[]>();
let chars = new Map<Style, Map<string, StyledChar>>();
let charCount = 0;

const SGR = /\x1b\[([0-9;:]*)m/g;

/** The styled characters of a line. */
export function tokenize(line: string): readonly StyledChar[] {
  let known = lines.get(line);
  if (known === undefined) {
    known = linesBefore.get(line) ?? parse(line);
    if (lines.size >= MOST_LINES) {
      linesBefore = lines;
      lines = new Map();
    }
    lines.set(line, known);
  }
  return known;
}

export function styledCharsFromTokens(tokens: readonly StyledChar[]): readonly StyledChar[] {
  return tokens;
}

function parse(line: string): readonly StyledChar[] {
  const out: StyledChar[] = [];
  let style = PLAIN;
  let at = 0;
  SGR.lastIndex = 0;
  for (let match = SGR.exec(line); match !== null; match = SGR.exec(line)) {
    pushChars(out, line.slice(at, match.index), style);
    style = applySgr(style, match[1] ?? '');
    at = SGR.lastIndex;
  }
  pushChars(out, line.slice(at), style);
  return out;
}

function pushChars(out: StyledChar[], text: string, style: Style): void {
  if (text === '') return;
  for (const { text: value, width } of clusters(text)) out.push(charOf(value, width === 2, style));
}

/** One object for each character in each style. */
function charOf(value: string, fullWidth: boolean, styles: Style): StyledChar {
  const known = chars.get(styles)?.get(value);
  if (known !== undefined) return known;
  if (charCount >= MOST_CHARS) {
    chars = new Map();
    charCount = 0;
  }
  const char: StyledChar = { type: 'char', value, fullWidth, styles };
  const row = chars.get(styles) ?? new Map<string, StyledChar>();
  row.set(value, char);
  chars.set(styles, row);
  charCount++;
  return char;
}

/** A row as text that begins and ends in the default style. */
export function styledCharsToString(row: readonly StyledChar[]): string {
  let out = '';
  let style = PLAIN;
  for (const { value, styles } of row) {
    const next = 'code' in styles ? styles : PLAIN;
    if (next !== style) {
      out += styleTransition(style, next);
      style = next;
    }
    out += value;
  }
  return out + styleTransition(style, PLAIN);
}
