/**
 * Text for LaTeX without further packages: signs that LaTeX reads as commands are escaped, Greek letters, powers and
 * operators go into math mode, accented Latin letters stay (UTF-8 is the input encoding of LaTeX). What is left falls back to ASCII.
 */
import { toAscii } from '../units/to-ascii.ts';

const ESCAPED: Readonly<Record<string, string>> = {
  '\\': '\\textbackslash{}',
  '{': '\\{',
  '}': '\\}',
  $: '\\$',
  '&': '\\&',
  '#': '\\#',
  '%': '\\%',
  _: '\\_',
  '^': '\\textasciicircum{}',
  '~': '\\textasciitilde{}',
  '<': '\\textless{}',
  '>': '\\textgreater{}',
  // After the end of a table row these two would be read as belonging to it.
  '[': '{[}',
  '*': '{*}',
  '|': '\\textbar{}',
  '\u00b5': '\\textmu{}',
  '–': '--',
  '—': '---',
  '…': '\\dots{}',
};
const MATH: Readonly<Record<string, string>> = {
  α: '\\alpha',
  β: '\\beta',
  γ: '\\gamma',
  δ: '\\delta',
  ε: '\\varepsilon',
  θ: '\\theta',
  λ: '\\lambda',
  μ: '\\mu',
  ν: '\\nu',
  π: '\\pi',
  σ: '\\sigma',
  φ: '\\varphi',
  ω: '\\omega',
  Δ: '\\Delta',
  Ω: '\\Omega',
  '±': '\\pm',
  '×': '\\times',
  '÷': '\\div',
  '·': '\\cdot',
  '°': '^{\\circ}',
  '\u2212': '-',
  '≤': '\\le',
  '≥': '\\ge',
  '≈': '\\approx',
  '→': '\\to',
  '∥': '\\parallel',
  '⊥': '\\perp',
  '′': "'",
  '″': "''",
};
const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹';
const LOWERED = '₀₁₂₃₄₅₆₇₈₉';
const PIECES =
  /((?<![\p{L}\d.])-(?=\d|\p{L}_))|[⁺⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+|[₀₁₂₃₄₅₆₇₈₉]+|(?<![\p{L}\d_])\p{L}_\p{L}{1,3}(?![\p{L}\d_])|./gsu;

export function latexText(text: string): string {
  return text
    .normalize('NFC')
    .replace(PIECES, (piece, minus: string | undefined) => (minus ? '$-$' : latexPiece(piece)));
}

function latexPiece(piece: string): string {
  const math = Object.hasOwn(MATH, piece) ? MATH[piece] : undefined;
  if (math !== undefined) return `$${math}$`;
  const escaped = Object.hasOwn(ESCAPED, piece) ? ESCAPED[piece] : undefined;
  if (escaped !== undefined) return escaped;
  if (/^[⁺⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+$/u.test(piece)) return `$^{${figures(piece, RAISED)}}$`;
  if (/^[₀₁₂₃₄₅₆₇₈₉]+$/u.test(piece)) return `$_{${figures(piece, LOWERED)}}$`;
  const [letter, index] = piece.split('_');
  if (letter && index) return `$${latinOrGreek(letter)}_{\\mathrm{${index}}}$`;
  return /^[\x20-\x7e\u00c0-\u017f]$/.test(piece) ? piece : escapeAscii(toAscii(piece));
}

function escapeAscii(text: string): string {
  return [...text].map((c) => ESCAPED[c] ?? c).join('');
}

const latinOrGreek = (letter: string): string => MATH[letter] ?? letter;

function figures(text: string, digits: string): string {
  return [...text].map((c) => (c === '⁻' ? '-' : c === '⁺' ? '+' : String(digits.indexOf(c)))).join('');
}
