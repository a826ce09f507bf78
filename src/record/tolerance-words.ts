/** Tolerances as the option that states them, each number so written that it reads back as the same double. */
import type { Tolerances } from '../answer/question.ts';
import { decimalOf, plainDecimal, shiftDecimal } from '../units/decimal.ts';
import { METRE } from '../units/display-unit.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { ASCII } from '../units/number-style.ts';
import { parseAngleTolerance } from '../units/parse-angle.ts';
import { angleWord } from './exact-spelling.ts';

export function toleranceWords(tolerances: Tolerances): readonly string[] {
  const { wavelength_m, angle_rad, index, indexFrom, indexLayers, temperature_K } = tolerances;
  const { thickness_m, thicknessShare } = tolerances;
  const parts = [
    ...one('wave', wavelength_m, lengthWord),
    ...one('angle', angle_rad, (x) => angleWord(x, parseAngleTolerance)),
    ...one('n', index, String),
    ...one('n1', indexFrom, String),
    ...one('nlayer', indexLayers, String),
    ...(thicknessShare === undefined
      ? one('thickness', thickness_m, lengthWord)
      : one('thickness', thicknessShare, (x) => `${plainDecimal(shiftDecimal(decimalOf(x), 2))}%`)),
    ...one('temperature', temperature_K, (x) => `${x}K`),
  ];
  return parts.length === 0 ? [] : ['--tolerance', parts.join(',')];
}

function one(name: string, value: number | undefined, write: (value: number) => string): readonly string[] {
  return value === undefined ? [] : [`${name}=${write(value)}`];
}

/** The point of a decimal number is moved, so no bit is lost. */
function lengthWord(value_m: number): string {
  return formatQuantity(value_m, METRE, 'shortest', { style: ASCII }).replace(' ', '');
}
