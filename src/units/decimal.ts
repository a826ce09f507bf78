/**
 * Decimal numbers as digit strings, so that "0.5876 um" is exactly the double nearest to 5.876e-7, and rounding for
 * display is decimal: 1.005 to two places is 1.01, although the double lies below the tie (toFixed gives 1.00).
 *
 * The decimal of a double is its shortest text that reads back as the same double. Ties go away from zero
 * (ISO 80000-1:2022 annex B, rule B). Only finite numbers have a decimal.
 */
import { skipDigits, skipSign } from '../num/ascii.ts';

export interface Decimal {
  readonly negative: boolean;
  /** Digits without leading zeros; trailing zeros are kept as typed. "0" for zero. */
  readonly digits: string;
  /** The number is digits x 10^exponent. */
  readonly exponent: number;
}

/** Text of a plain decimal number (`-12.50e-3`) to its decimal; undefined for anything else. */
export function decimalOfText(text: string): Decimal | undefined {
  const start = skipSign(text, 0);
  const point = skipDigits(text, start);
  const afterPoint = text[point] === '.' ? point + 1 : point;
  const end = skipDigits(text, afterPoint);
  const all = text.slice(start, point) + text.slice(afterPoint, end);
  const power = powerAt(text, end);
  if (all === '' || power === undefined) return undefined;
  let zeros = 0;
  while (zeros < all.length - 1 && all[zeros] === '0') zeros++;
  return { negative: text[0] === '-', digits: all.slice(zeros), exponent: power - (end - afterPoint) };
}

/** The power of ten that is all of the text from `at` on, `e-3`; 0 where nothing stands there. */
function powerAt(text: string, at: number): number | undefined {
  if (at === text.length) return 0;
  if (text[at] !== 'e' && text[at] !== 'E') return undefined;
  const digits = skipSign(text, at + 1);
  const end = skipDigits(text, digits);
  return end > digits && end === text.length ? Number(text.slice(at + 1)) : undefined;
}

/** The decimal of a finite double; throws RangeError for NaN and infinities, which no caller may pass. */
export function decimalOf(x: number): Decimal {
  if (!Number.isFinite(x)) throw new RangeError('only a finite number has a decimal');
  const text = x.toExponential();
  const start = x < 0 ? 1 : 0;
  const power = text.indexOf('e');
  const digits = text[start] + text.slice(start + 2, power);
  const exponent = Number(text.slice(power + 1)) - (digits.length - 1);
  const negative = x < 0;
  // Integers are written out as far as `String` does: their zeros are digits.
  return exponent > 0 && Math.abs(x) < 1e21
    ? { negative, digits: digits + '0'.repeat(exponent), exponent: 0 }
    : { negative, digits, exponent };
}

/** The double nearest to the decimal times 10^shift. May be infinite, or zero where it is too small. */
export function decimalToNumber(d: Decimal, shift = 0): number {
  return Number(`${d.negative ? '-' : ''}${d.digits}e${d.exponent + shift}`);
}

export function shiftDecimal(d: Decimal, shift: number): Decimal {
  return { ...d, exponent: d.exponent + shift };
}

/** Without trailing zeros; equal in value. */
export function trimZeros(d: Decimal): Decimal {
  let kept = d.digits.length;
  while (kept > 1 && d.digits[kept - 1] === '0') kept--;
  const digits = d.digits.slice(0, kept);
  const dropped = d.digits.length - digits.length;
  return { ...d, digits, exponent: digits === '0' ? 0 : d.exponent + dropped };
}

export function isZero(d: Decimal): boolean {
  return d.digits === '0';
}

/** Power of ten of the first significant digit: 2 for 633, -1 for 0.5. Zero counts as its last written place. */
export function leadingPlace(d: Decimal): number {
  return d.digits.length - 1 + d.exponent;
}

/** Rounded to the place 10^place; the result's exponent is `place`, a zero result has no sign. */
export function roundDecimal(d: Decimal, place: number): Decimal {
  if (isZero(d)) return { negative: false, digits: '0', exponent: place };
  if (place <= d.exponent) {
    return { negative: d.negative, digits: d.digits + '0'.repeat(d.exponent - place), exponent: place };
  }
  const drop = place - d.exponent;
  if (drop > d.digits.length) return { negative: false, digits: '0', exponent: place };
  const kept = d.digits.slice(0, d.digits.length - drop) || '0';
  const up = (d.digits[d.digits.length - drop] ?? '0') >= '5';
  const digits = up ? nextInteger(kept) : kept;
  return { negative: d.negative && digits !== '0', digits, exponent: place };
}

/** The integer above; exact in doubles up to fifteen digits. */
const nextInteger = (digits: string): string =>
  digits.length <= 15 ? String(Number(digits) + 1) : String(BigInt(digits) + 1n);

/** Rounded to so many significant digits, also where rounding adds a digit (9.996 to three is 10.0). */
export function roundToDigits(d: Decimal, significantDigits: number): Decimal {
  if (isZero(d)) return roundDecimal(d, 1 - significantDigits);
  const rounded = roundDecimal(d, leadingPlace(d) - significantDigits + 1);
  return leadingPlace(rounded) === leadingPlace(d) ? rounded : roundDecimal(rounded, rounded.exponent + 1);
}

/** The exact sum. */
export function addDecimals(a: Decimal, b: Decimal): Decimal {
  if (isZero(a) || isZero(b)) return isZero(a) ? b : a;
  const exponent = Math.min(a.exponent, b.exponent);
  const units = (d: Decimal): bigint => {
    const size = BigInt(d.digits) * 10n ** BigInt(d.exponent - exponent);
    return d.negative ? -size : size;
  };
  const sum = units(a) + units(b);
  return { negative: sum < 0n, digits: String(sum < 0n ? -sum : sum), exponent };
}

/** Positional notation: `-0.0123`, `630`. A digit always stands before the point. */
export function plainDecimal(d: Decimal): string {
  const sign = d.negative && !isZero(d) ? '-' : '';
  if (d.exponent >= 0) return sign + (isZero(d) ? '0' : d.digits + '0'.repeat(d.exponent));
  const padded = d.digits.padStart(1 - d.exponent, '0');
  const point = padded.length + d.exponent;
  return `${sign}${padded.slice(0, point)}.${padded.slice(point)}`;
}
