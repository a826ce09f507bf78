/**
 * A text in the ASCII that LaTeX and BibTeX read: special characters escaped, accents, Greek letters, sub- and superscripts
 * as commands. Characters with no command here (other scripts) are left as they are, for engines that read UTF-8.
 */

/** `title`: words with a capital are braced (the first word only if it has one beyond its first letter). */
export type LatexUse = 'plain' | 'title';

const SPECIAL: Readonly<Record<string, string>> = {
  '\\': '{\\textbackslash}',
  '{': '{\\textbraceleft}',
  '}': '{\\textbraceright}',
  '~': '{\\textasciitilde}',
  '^': '{\\textasciicircum}',
  '"': "''",
  '&': '\\&',
  '%': '\\%',
  $: '\\$',
  '#': '\\#',
  _: '\\_',
  '@': '{@}',
  '\u2010': '-',
  '\u2011': '-',
  '\u2012': '--',
  '\u2013': '--',
  '\u2014': '---',
  '\u2212': '-',
  '\u2018': '`',
  '\u2019': "'",
  '\u201c': '``',
  '\u201d': "''",
  '\u00a0': '~',
  '\u202f': '~',
  '°': '{\\textdegree}',
  '×': '{$\\times$}',
  '±': '{$\\pm$}',
  '·': '{$\\cdot$}',
  µ: '{\\textmu}',
  μ: '{\\textmu}',
  ß: '{\\ss}',
  ø: '{\\o}',
  Ø: '{\\O}',
  ł: '{\\l}',
  Ł: '{\\L}',
  æ: '{\\ae}',
  Æ: '{\\AE}',
  œ: '{\\oe}',
  Œ: '{\\OE}',
  ı: '{\\i}',
  ð: '{\\dh}',
  þ: '{\\th}',
};

const GREEK =
  'alpha beta gamma delta epsilon zeta eta theta iota kappa lambda mu nu xi omicron pi rho varsigma sigma tau upsilon phi chi psi omega'.split(
    ' ',
  );

const FIRST_GREEK = 'α'.codePointAt(0) ?? 0;

/** The capitals that differ from a Latin one. */
const CAPITALS = new Set('gamma delta theta lambda xi pi sigma upsilon phi psi omega'.split(' '));

/** LaTeX accents by combining mark. */
const ACCENTS: Readonly<Record<string, string>> = {
  '\u0300': '`',
  '\u0301': "'",
  '\u0302': '^',
  '\u0303': '~',
  '\u0304': '=',
  '\u0306': 'u',
  '\u0307': '.',
  '\u0308': '"',
  '\u030a': 'r',
  '\u030b': 'H',
  '\u030c': 'v',
  '\u0327': 'c',
  '\u0328': 'k',
};

export function latexText(text: string, use: LatexUse): string {
  const plain = text.replace(/[\p{Cc}\s]+/gu, ' ').trim();
  if (use === 'plain') return escaped(plain);
  return plain
    .split(' ')
    .map((word, i) => (needsBraces(word, i === 0) ? `{${escaped(word)}}` : escaped(word)))
    .join(' ');
}

const needsBraces = (word: string, first: boolean): boolean =>
  /\p{Lu}/u.test(first ? word.replace(/^[^\p{L}]*\p{L}/u, '') : word);

/** A run of subscripts, a run of superscripts, or any one character. */
const PIECE = /([₀-₉₊₋₌₍₎]+)|([⁰¹²³⁴-⁹⁺⁻⁼⁽⁾ⁿ]+)|./gsu;

const escaped = (text: string): string =>
  text.replace(PIECE, (piece: string, low?: string, high?: string) => {
    if (low !== undefined) return `$_{${level(low)}}$`;
    return high !== undefined ? `$^{${level(high)}}$` : character(piece);
  });

/** Raised or lowered characters on the line. */
const level = (text: string): string => text.normalize('NFKC').replace(/\u2212/g, '-');

function character(c: string): string {
  const special = Object.hasOwn(SPECIAL, c) ? SPECIAL[c] : undefined;
  if (special !== undefined) return special;
  if (/^[\x20-\x7e]$/.test(c)) return c;
  const greek = GREEK[(c.codePointAt(0) ?? 0) - FIRST_GREEK];
  if (greek !== undefined) return greek === 'omicron' ? 'o' : `{$\\${greek}$}`;
  const capital = GREEK[(c.toLowerCase().codePointAt(0) ?? 0) - FIRST_GREEK];
  if (capital !== undefined && CAPITALS.has(capital))
    return `{$\\${capital[0]?.toUpperCase()}${capital.slice(1)}$}`;
  const [letter = '', mark, third] = c.normalize('NFD');
  const accent = mark !== undefined && third === undefined ? ACCENTS[mark] : undefined;
  return accent === undefined || !/^[A-Za-z]$/.test(letter) ? c : `{\\${accent}{${letter}}}`;
}
