/** Salt in sea water in g/kg: `35`, `35g/kg`. From fresh water to a saturated brine. */
import { parseValue, type QuantitySpec } from './parse-quantity.ts';
import type { Problem } from './problem.ts';

const SPEC: QuantitySpec = {
  what: 'a salinity',
  kinds: ['salinity'],
  examples: '35 or 35g/kg',
  unitNames: 'g/kg, which is also the unit of a bare number',
  bare: 'g/kg',
  range: { allows: (x) => x >= 0 && x <= 360, words: 'from 0 to 360 g/kg' },
};

export function parseSalinity(text: string): number | Problem {
  return parseValue(text, SPEC);
}
