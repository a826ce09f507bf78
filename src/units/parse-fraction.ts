/** Fractions between 0 and 1: `50%`, `50 %`, `0.5`. A bare number is the fraction itself, so a bare 50 is refused. */
import { parseValue, type QuantitySpec } from './parse-quantity.ts';
import type { Problem } from './problem.ts';

const SPEC: QuantitySpec = {
  what: 'a fraction',
  kinds: ['fraction'],
  examples: '50% or 0.5',
  unitNames: '% or none',
  bare: '',
  range: { allows: (x) => x >= 0 && x <= 1, words: 'from 0 to 1 (0% to 100%)' },
};

export function parseFraction(text: string): number | Problem {
  return parseValue(text, SPEC);
}
