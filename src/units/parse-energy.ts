/** Energy of a pulse in joules: `1mJ`, `200uJ`, `3nJ`. Above 0. */
import { ABOVE_ZERO, parseValue, type QuantitySpec } from './parse-quantity.ts';
import type { Problem } from './problem.ts';

const SPEC: QuantitySpec = {
  what: 'an energy',
  kinds: ['energy'],
  examples: '1mJ, 200uJ or 3nJ',
  unitNames: 'J with an SI prefix',
  range: ABOVE_ZERO,
};

export function parseEnergy(text: string): number | Problem {
  return parseValue(text, SPEC);
}
