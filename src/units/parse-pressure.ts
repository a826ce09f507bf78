/** Pressure in pascals: `101325Pa`, `1013.25hPa`, `1atm`, `760mmHg`, `1e-6mbar`. 0 is a vacuum. */
import { NOT_BELOW_ZERO, parseValue, type QuantitySpec } from './parse-quantity.ts';
import type { Problem } from './problem.ts';

const SPEC: QuantitySpec = {
  what: 'a pressure',
  kinds: ['pressure'],
  examples: '101.325kPa, 1013hPa, 1atm or 760Torr',
  unitNames: 'Pa, hPa, kPa, MPa, bar, mbar, atm, mmHg, Torr and psi',
  range: NOT_BELOW_ZERO,
};

export function parsePressure(text: string): number | Problem {
  return parseValue(text, SPEC);
}
