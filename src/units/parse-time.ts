/** Durations in seconds: `100fs`, `2 ps`, `10ns`, `5us`, `1ms`, `1s`. Above 0. */
import { ABOVE_ZERO, parseValue, type QuantitySpec } from './parse-quantity.ts';
import type { Problem } from './problem.ts';

const SPEC: QuantitySpec = {
  what: 'a duration',
  kinds: ['time'],
  examples: '100fs, 2ps, 10ns or 1ms',
  unitNames: 'as, fs, ps, ns, us, ms and s',
  range: ABOVE_ZERO,
};

export function parseTime(text: string): number | Problem {
  return parseValue(text, SPEC);
}
