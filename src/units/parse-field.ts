/** Peak value of the electric field in V/m: `100V/m`, `2kV/m`, `3 V/cm`. Above 0. */
import { ABOVE_ZERO, parseValue, type QuantitySpec } from './parse-quantity.ts';
import type { Problem } from './problem.ts';

const SPEC: QuantitySpec = {
  what: 'a field strength',
  kinds: ['field'],
  examples: '100V/m, 2kV/m or 3V/cm',
  unitNames: 'V/m, V/cm, V/mm, V/um and V/nm with an SI prefix',
  range: ABOVE_ZERO,
};

export function parseField(text: string): number | Problem {
  return parseValue(text, SPEC);
}
