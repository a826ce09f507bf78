/**
 * A typed unit in the one spelling the table of units uses: NFKC (both code points of angstrom, ohm, kelvin; superscripts
 * as digits), `u` for micro, `W/cm2` for W·cm⁻², W cm^-2, W / cm². Letters keep their case.
 */
import { isLetter } from '../num/ascii.ts';

export function canonicalUnit(text: string): string {
  const trimmed = text.trim();
  return isWord(trimmed) ? trimmed : inOneSpelling(trimmed);
}

/** Letters from a to z alone are as they should be; most units are. */
function isWord(text: string): boolean {
  for (let i = 0; i < text.length; i++) if (!isLetter(text.charCodeAt(i))) return false;
  return true;
}

function inOneSpelling(text: string): string {
  return text
    .replaceAll('º', '°')
    .normalize('NFKC')
    .replaceAll('μ', 'u')
    .replace(/[\u2212\u207b]/gu, '-')
    .replace(/[∕⁄÷]/gu, '/')
    .replace(/[′’]/gu, "'")
    .replace(/[″”]/gu, '"')
    .replace(/\^|\*\*/g, '')
    .replace(/\s*\/\s*/g, '/')
    .replace(/^(\p{L}+)\s*[\s·⋅*.]\s*(\p{L}+)-(\d)$/u, '$1/$2$3')
    .replace(/^(\p{L}+\/\p{L}+)1$/u, '$1')
    .replace(/°\s+/g, '°')
    .replace(/\s+-/g, '-');
}
