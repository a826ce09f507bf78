/** Irradiance in W/m^2: `1kW/m2`, `5W/cm2`, `2mW/mm2`, `1 W m⁻²`. Above 0. */
import { ABOVE_ZERO, parseValue, type QuantitySpec } from './parse-quantity.ts';
import type { Problem } from './problem.ts';

const SPEC: QuantitySpec = {
  what: 'an irradiance',
  kinds: ['irradiance'],
  examples: '1kW/m2, 5W/cm2 or 2mW/mm2',
  unitNames: 'W/m2, W/cm2, W/mm2 and W/um2 with an SI prefix',
  range: ABOVE_ZERO,
};

export function parseIrradiance(text: string): number | Problem {
  return parseValue(text, SPEC);
}
