/**
 * A double as text to a number of significant digits, trailing zeros kept: rounded in decimal from the shortest text, ties
 * away from zero, as everywhere in the program. Notation of `toPrecision`: a power of ten below 1e-6 and where the digits
 * asked for do not reach the units.
 */
import { decimalOf, leadingPlace, plainDecimal, roundToDigits } from '../units/decimal.ts';
import { LONGEST_NUMBER, writeShortest, writeText } from './write-number.ts';

export const MOST_SIGNIFICANT = 17;

/** Room that the longest text takes. */
export const LONGEST_ROUNDED = LONGEST_NUMBER + MOST_SIGNIFICANT;

/** Writes x into `out` from `at` on; the place behind it. `digits` from 1 to 17; x is finite. */
export function writeRounded(x: number, digits: number, out: Uint8Array, at: number): number {
  const size = Math.abs(x);
  if (!(size >= 1e-4 && size < 1e6 && size < 10 ** digits)) return writeText(roundedText(x, digits), out, at);
  const end = writeShortest(x, out, at);
  const start = x < 0 ? at + 1 : at;
  let point = start;
  while (point < end && out[point] !== POINT) point++;
  let first = start;
  while (out[first] === ZERO || out[first] === POINT) first++;
  // Where the last digit asked for stands, the point not counted.
  const last = first + digits - 1 + (first < point && first + digits > point ? 1 : 0);
  if (last >= end - 1) return padded(out, end, point, last);
  const next = out[last + 1] === POINT ? out[last + 2]! : out[last + 1]!;
  if (next >= FIVE && carry(out, start, last)) return writeText(roundedText(x, digits), out, at);
  return last + 1;
}

const POINT = 46;
const ZERO = 48;
const FIVE = 53;
const NINE = 57;

function padded(out: Uint8Array, end: number, point: number, last: number): number {
  let o = end;
  if (point === end && last >= end) out[o++] = POINT;
  while (o <= last) out[o++] = ZERO;
  return o;
}

/** Adds one unit of the digit at `last`; true where that would take one more digit in front. */
function carry(out: Uint8Array, start: number, last: number): boolean {
  for (let i = last; i >= start; i--) {
    if (out[i] === POINT) continue;
    if (out[i] !== NINE) {
      // A zero before the first significant digit would become one: the digits asked for move up.
      if (out[i] === ZERO && allZero(out, start, i)) return true;
      out[i] = out[i]! + 1;
      return false;
    }
    out[i] = ZERO;
  }
  return true;
}

function allZero(out: Uint8Array, start: number, end: number): boolean {
  for (let i = start; i < end; i++) if (out[i] !== ZERO && out[i] !== POINT) return false;
  return true;
}

/** The same as a string. */
export function roundedText(x: number, digits: number): string {
  const d = roundToDigits(decimalOf(x), digits);
  const place = x === 0 ? 0 : leadingPlace(d);
  if (x === 0) return digits === 1 ? '0' : `0.${'0'.repeat(digits - 1)}`;
  if (place >= -6 && place < digits) return plainDecimal(d);
  const mantissa = plainDecimal({ ...d, exponent: 1 - digits });
  return `${mantissa}e${place < 0 ? '-' : '+'}${Math.abs(place)}`;
}
