/**
 * Plain decimal numbers read straight from bytes: `633`, `0.6328`, `-12.50`, with blanks around. The digits go into one whole
 * number and a power of ten, from which `decimalValue` makes the very double that the text gives. Everything else (exponents,
 * more than 15 digits, units, typing errors) is left to the parsers of src/units.
 */

/** Where `scanDecimal` writes: the digits as one whole number with its sign, and the power of ten that goes with it. */
export const MANTISSA = 0;
export const EXPONENT = 1;

/** More digits than this may not fit into a double's whole numbers. */
export const MOST_DIGITS = 15;

/** False where the bytes from `from` to `to` are not such a number; `out` then holds nothing. */
export function scanDecimal(bytes: Uint8Array, from: number, to: number, out: Float64Array): boolean {
  let i = from;
  let end = to;
  while (i < end && bytes[i] === 32) i++;
  while (end > i && bytes[end - 1] === 32) end--;
  const negative = bytes[i] === 45;
  if (negative) i++;
  let mantissa = 0;
  let digits = 0;
  let point = -1;
  for (; i < end; i++) {
    const byte = bytes[i]!;
    if (byte >= 48 && byte <= 57) {
      mantissa = mantissa * 10 + (byte - 48);
      digits++;
    } else if (byte === 46 && point < 0) point = digits;
    else return false;
  }
  if (digits === 0 || digits > MOST_DIGITS) return false;
  out[MANTISSA] = negative ? -mantissa : mantissa;
  out[EXPONENT] = point < 0 ? 0 : point - digits;
  return true;
}

const POWERS_OF_TEN = Float64Array.from({ length: 23 }, (_, k) => 10 ** k);

/**
 * mantissa x 10^exponent, rounded once: the mantissa and powers of ten up to 10^22 are exact doubles, so their product or
 * quotient is the double nearest to the decimal (Clinger 1990). NaN beyond: read the text instead.
 */
export function decimalValue(mantissa: number, exponent: number): number {
  if (exponent < -22 || exponent > 22) return Number.NaN;
  return (exponent < 0 ? mantissa / POWERS_OF_TEN[-exponent]! : mantissa * POWERS_OF_TEN[exponent]!) + 0;
}
