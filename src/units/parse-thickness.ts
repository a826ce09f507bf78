/**
 * Thickness of a layer: a length (`100nm`, `5mm`), or a part of the wavelength inside the layer: `qw` is a quarter wave,
 * `hw` a half wave, `3qw` three quarters, `0.5hw` a quarter.
 */
import { LENGTH_SPEC } from './parse-length.ts';
import { parseNumber } from './parse-number.ts';
import { parseValue } from './parse-quantity.ts';
import { isProblem, type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';

export type TypedThickness =
  | { readonly kind: 'length'; readonly thickness_m: number }
  /** In wavelengths inside the layer. */
  | { readonly kind: 'waves'; readonly waves: number };

const SPEC = {
  ...LENGTH_SPEC,
  what: 'a thickness',
  examples: '100nm, 5mm, qw or 3qw',
  unitNames: 'nm, um, mm, cm, m, qw and hw',
};

export function parseThickness(text: string): TypedThickness | Problem {
  const optical = /^(.*?)\s*([qh])w$/iu.exec(text.trim());
  if (!optical) {
    const thickness_m = parseValue(text, SPEC);
    return isProblem(thickness_m) ? thickness_m : { kind: 'length', thickness_m };
  }
  const count = optical[1] === '' ? 1 : parseNumber(optical[1] ?? '');
  if (isProblem(count)) return count;
  if (count <= 0) {
    return problem(
      'out-of-range',
      `${quoteInput(text)} is no thickness: it must be above 0`,
      `write for example ${SPEC.examples}`,
    );
  }
  return { kind: 'waves', waves: count * (optical[2]?.toLowerCase() === 'q' ? 0.25 : 0.5) };
}
