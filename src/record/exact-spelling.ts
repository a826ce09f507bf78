/** Values as short words that read back as the very same double. */
import type { DisplayUnit } from '../units/display-unit.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { ASCII } from '../units/number-style.ts';
import { isProblem, type Problem } from '../units/problem.ts';

/** The first spelling that reads back as the very value; the last one where none does. */
export function exactSpelling<Value>(
  value: Value,
  spellings: readonly string[],
  read: (text: string) => Value | Problem,
  same: (a: Value, b: Value) => boolean = Object.is,
): string {
  const right = spellings.find((text) => {
    const back = read(text);
    return !isProblem(back) && same(back, value);
  });
  return right ?? spellings.at(-1) ?? '';
}

/** "115nm"; in the SI unit where the prefix loses a bit. */
export function quantityWord(
  value: number,
  unit: DisplayUnit,
  read: (text: string) => number | Problem,
): string {
  const prefixed = formatQuantity(value, unit, 'shortest', { style: ASCII }).replace(' ', '');
  return exactSpelling(value, [prefixed, `${value}${unit.symbol}`], read);
}

export function angleWord(angle_rad: number, read: (text: string) => number | Problem): string {
  const degrees = (angle_rad * 180) / Math.PI;
  return exactSpelling(
    angle_rad,
    [`${Number(degrees.toPrecision(12))}deg`, `${degrees}deg`, `${angle_rad}rad`],
    read,
  );
}
