/** Lengths in metres, such as a beam diameter: `1mm`, `6.35 mm`, `250um`. Above 0. */
import { ABOVE_ZERO, parseValue, type QuantitySpec } from './parse-quantity.ts';
import type { Problem } from './problem.ts';

export const LENGTH_SPEC: QuantitySpec = {
  what: 'a length',
  kinds: ['length'],
  examples: '1mm, 250um or 2cm',
  unitNames: 'nm, um, mm, cm, m and km',
  range: ABOVE_ZERO,
};

export function parseLength(text: string): number | Problem {
  return parseValue(text, LENGTH_SPEC);
}
