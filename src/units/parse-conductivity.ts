/** Electric conductivity in S/m: `4S/m`, `50mS/cm`; a bare number is S/m. 0 or above. */
import { NOT_BELOW_ZERO, parseValue, type QuantitySpec } from './parse-quantity.ts';
import type { Problem } from './problem.ts';

const SPEC: QuantitySpec = {
  what: 'a conductivity',
  kinds: ['conductivity'],
  examples: '4S/m or 50mS/cm',
  unitNames: 'S/m and S/cm with an SI prefix',
  bare: 'S/m',
  range: NOT_BELOW_ZERO,
};

export function parseConductivity(text: string): number | Problem {
  return parseValue(text, SPEC);
}
