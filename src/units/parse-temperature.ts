/** Temperatures: `25C`, `25 °C`, `298.15K`, `-40C`, `77F`, in kelvin. A bare number is refused: it could be any of three. */

import { parseNumber } from './parse-number.ts';
import { parseValue, type QuantitySpec } from './parse-quantity.ts';
import { isProblem, type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';

const SPEC: QuantitySpec = {
  what: 'a temperature',
  kinds: ['temperature'],
  examples: '25C, 298.15K or 77F',
  unitNames: 'C, K and F',
  range: { allows: (kelvin) => kelvin > 0, words: 'above absolute zero (0 K, -273.15 C)' },
};

export function parseTemperature(text: string): number | Problem {
  const value = parseValue(text, SPEC);
  if (!isProblem(value) || value.code !== 'unit-missing') return value;
  const shown = quoteInput(text.trim()).slice(1, -1);
  return { ...value, remedy: `write ${shown}C, ${shown}K or ${shown}F` };
}

/** A difference of temperatures, such as a tolerance: `0.5C` and `0.5K` are the same. In kelvin. */
export function parseTemperatureInterval(text: string): number | Problem {
  const parts = /^(.*?)\s*(?:°|º|deg)?\s*([CKF])$/iu.exec(text.trim());
  const number = parts ? parseNumber(parts[1] ?? '') : undefined;
  if (!parts || number === undefined || isProblem(number) || number < 0) {
    return problem(
      'not-a-tolerance',
      `${quoteInput(text)} is no temperature difference`,
      'write for example 0.5C or 0.5K',
    );
  }
  return parts[2]?.toUpperCase() === 'F' ? number / 1.8 : number;
}
