/** Radiant power in watts: `5mW`, `1kW`, `10dBm` (decibels over one milliwatt). Above 0. */
import { ABOVE_ZERO, parseValue, type QuantitySpec } from './parse-quantity.ts';
import type { Problem } from './problem.ts';

const SPEC: QuantitySpec = {
  what: 'a power',
  kinds: ['power'],
  examples: '5mW, 1kW or 10dBm',
  unitNames: 'W with an SI prefix, and dBm',
  range: ABOVE_ZERO,
};

export function parsePower(text: string): number | Problem {
  return parseValue(text, SPEC);
}
