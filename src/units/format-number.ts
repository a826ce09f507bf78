/**
 * Numbers for people: rounded in decimal (see decimal.ts), significant zeros kept, a digit before the point, no grouping,
 * an ASCII minus, never -0. A number that is not finite, or null, is `NO_VALUE`.
 *
 * Positional notation between 1e-4 and 1e6, if no zero would have to stand for an unknown digit; else a power of ten.
 */
import {
  type Decimal,
  decimalOf,
  leadingPlace,
  plainDecimal,
  roundDecimal,
  roundToDigits,
  trimZeros,
} from './decimal.ts';
import { NO_VALUE, type NumberStyle, SCREEN, timesPowerOfTen } from './number-style.ts';

/** How many digits: a count of significant digits, a count of decimals, or as many as tell this double from its neighbours. */
export type Precision = { readonly significant: number } | { readonly decimals: number } | 'shortest';

export function formatNumber(
  value: number | null,
  precision: Precision,
  style: NumberStyle = SCREEN,
): string {
  if (value === null || !Number.isFinite(value)) return NO_VALUE;
  const rounded = roundTo(decimalOf(value), precision);
  return typeof precision === 'object' && 'decimals' in precision
    ? plainDecimal(rounded)
    : formatDecimal(rounded, style);
}

export function roundTo(d: Decimal, precision: Precision): Decimal {
  if (precision === 'shortest') {
    const bare = trimZeros(d);
    return bare.exponent > 0 && leadingPlace(bare) < 6 ? roundDecimal(bare, 0) : bare;
  }
  return 'decimals' in precision
    ? roundDecimal(d, -precision.decimals)
    : roundToDigits(d, precision.significant);
}

/** A rounded decimal in the notation that suits its size. */
export function formatDecimal(d: Decimal, style: NumberStyle): string {
  const power = notationPower(leadingPlace(d), d.exponent);
  if (power === undefined) return plainDecimal(d);
  return plainDecimal({ ...d, exponent: d.exponent - power }) + timesPowerOfTen(power, style);
}

/** The power of ten to set apart for a number from place `leading` down to place `last`; undefined where it is positional. */
export function notationPower(leading: number, last: number): number | undefined {
  return leading >= -4 && leading < 6 && last <= 0 ? undefined : leading;
}
