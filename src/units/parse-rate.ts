/** Repetition rates and bandwidths in hertz: `80MHz`, `1kHz`. Above 0. */
import { ABOVE_ZERO, parseValue, type QuantitySpec } from './parse-quantity.ts';
import type { Problem } from './problem.ts';

const SPEC: QuantitySpec = {
  what: 'a rate',
  kinds: ['frequency'],
  examples: '80MHz, 1kHz or 10Hz',
  unitNames: 'Hz, kHz, MHz, GHz, THz and PHz',
  range: ABOVE_ZERO,
};

export function parseRate(text: string): number | Problem {
  return parseValue(text, SPEC);
}
