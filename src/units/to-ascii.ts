/**
 * Screen text in the bytes 0x20 to 0x7E: `µm` -> `um`, `56.31°` -> `56.31 deg`, `±` -> `+/-`, `4.1 × 10⁻⁶` -> `4.1e-6`,
 * `W/m²` -> `W/m2`, Greek letters by name. Latin letters lose their accents; anything else becomes `?`.
 */
import { isAscii } from '../num/ascii.ts';

const WORDS: Readonly<Record<string, string>> = {
  '\u00b5': 'u',
  μ: 'mu',
  λ: 'lambda',
  θ: 'theta',
  ε: 'eps',
  σ: 'sigma',
  ν: 'nu',
  ω: 'omega',
  Δ: 'Delta',
  δ: 'delta',
  α: 'alpha',
  β: 'beta',
  π: 'pi',
  Ω: 'ohm',
  '±': '+/-',
  '×': 'x',
  '·': ' ',
  '\u2212': '-',
  '–': '-',
  '—': '-',
  '…': '...',
  '≤': '<=',
  '≥': '>=',
  '≈': '~',
  '→': '->',
  '∥': '||',
  '⊥': '_|_',
  '′': "'",
  '″': '"',
  '‘': "'",
  '’': "'",
  '“': '"',
  '”': '"',
  ß: 'ss',
  ø: 'o',
  Ø: 'O',
  æ: 'ae',
  Æ: 'AE',
  œ: 'oe',
  ł: 'l',
  Ł: 'L',
  đ: 'd',
  ı: 'i',
};

const FIGURES = '⁰¹²³⁴⁵⁶⁷⁸⁹';
const POWER_OF_TEN = /\s?×\s?10([⁺⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+)/gu;

export function toAscii(text: string): string {
  if (isAscii(text)) return text;
  return [
    ...text
      .replace(POWER_OF_TEN, (_, power: string) => `e${figures(power)}`)
      .replace(/[⁺⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+/gu, figures)
      .replace(/°C/g, 'degC')
      .replace(/°F/g, 'degF')
      .replace(/\s?°/g, ' deg'),
  ]
    .map(asciiOf)
    .join('');
}

function figures(superscripts: string): string {
  return [...superscripts]
    .map((c) => (c === '⁻' ? '-' : c === '⁺' ? '' : String(FIGURES.indexOf(c))))
    .join('');
}

function asciiOf(character: string): string {
  if (/^[\x20-\x7e\n]$/.test(character)) return character;
  const word = Object.hasOwn(WORDS, character) ? WORDS[character] : undefined;
  if (word !== undefined) return word;
  const plain = character.normalize('NFKD').replace(/\p{M}/gu, '');
  return /^[\x20-\x7e]+$/.test(plain) ? plain : /^\p{M}$/u.test(character) ? '' : '?';
}
