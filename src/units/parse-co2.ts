/** CO2 content of air in 1e-6 by amount: `450`, `450 umol/mol`, `450ppm` (accepted, never printed). */
import { parseValue, type QuantitySpec } from './parse-quantity.ts';
import type { Problem } from './problem.ts';

const SPEC: QuantitySpec = {
  what: 'a CO2 content',
  kinds: ['mole-fraction'],
  examples: '450 or 450umol/mol',
  unitNames: 'umol/mol (1e-6), which is also the unit of a bare number',
  bare: 'umol/mol',
  range: { allows: (x) => x >= 0 && x <= 1e6, words: 'from 0 to 1000000 umol/mol' },
};

export function parseCo2(text: string): number | Problem {
  return parseValue(text, SPEC);
}
