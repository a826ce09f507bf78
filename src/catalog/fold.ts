/**
 * How a typed name is made comparable. Two strengths:
 *   loose: any case, any Unicode dress (subscripts, full-width letters, micro and angstrom signs, typographic dashes),
 *          Greek letters spelt out, runs of spaces, hyphens, underscores and dots all alike;
 *   tight: loose with those separators and all brackets gone, so that "nbk7" meets "N-BK7".
 * Both are total and idempotent. Case and separators are the only differences they ever hide: "CsI" and "c-Si" meet in
 * the tight form, so a resolver asks for the loose form first.
 */
import { isAscii, isDigit, isLetter } from '../num/ascii.ts';

const GREEK: Readonly<Record<string, string>> = {
  α: 'alpha',
  β: 'beta',
  γ: 'gamma',
  δ: 'delta',
  ε: 'epsilon',
  ζ: 'zeta',
  η: 'eta',
  θ: 'theta',
  κ: 'kappa',
  λ: 'lambda',
  // The prefix micro is typed "u" where the key is missing.
  μ: 'u',
  ν: 'nu',
  ξ: 'xi',
  π: 'pi',
  ρ: 'rho',
  σ: 'sigma',
  τ: 'tau',
  φ: 'phi',
  χ: 'chi',
  ψ: 'psi',
  ω: 'omega',
};

/** The loose form; separators become single hyphens, none at the ends. */
export function foldLoose(text: string): string {
  // Most names typed are ASCII; the Unicode tables that the long way needs cost a millisecond to load.
  if (isAscii(text)) return hyphenatedAscii(text.toLowerCase());
  const folded = text
    .replace(/[®™©℠]/g, '')
    .normalize('NFKD')
    .replace(/[\p{M}\p{Cf}\p{Cc}]/gu, (c) => (c === '\t' || c === '\n' || c === '\r' ? ' ' : ''))
    .toLowerCase()
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .replace(/ς/g, 'σ')
    .replace(/[α-ω]/g, (c) => GREEK[c] ?? c);
  return folded
    .replace(/[\s\-_.\u2010-\u2015\u2212\u00b7\u2022\u2219\u22c5\u30fb\ufe58\ufe63\uff0d]+/g, '-')
    .replace(/^-|-$/g, '');
}

function hyphenatedAscii(text: string): string {
  let out = '';
  let separated = false;
  for (const character of text) {
    if (' -_.'.includes(character)) separated = out !== '';
    else {
      out += separated ? `-${character}` : character;
      separated = false;
    }
  }
  return out;
}

/** The tight form: of the loose one only letters, digits, `+`, `*`, `%` and `:` remain. */
export function foldTight(text: string): string {
  const loose = foldLoose(text);
  return isAscii(loose) ? tightAscii(loose) : loose.replace(/[^\p{L}\p{N}+*%:]+/gu, '');
}

function tightAscii(loose: string): string {
  let out = '';
  for (const character of loose) {
    const code = character.charCodeAt(0);
    if (isLetter(code) || isDigit(code) || '+*%:'.includes(character)) out += character;
  }
  return out;
}
