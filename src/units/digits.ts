/**
 * How many digits a value deserves, from how well it is known (GUM, JCGM 100:2008, 7.2.6: at most two significant digits
 * of an uncertainty, and the value to the same place).
 *
 * Rule for the uncertainty: two digits where they begin with 1 or 2 (one digit would round it by up to a third there), one
 * digit otherwise: 0.0128 -> 0.013, 0.034 -> 0.03, 0.0296 -> 0.03, 0.0096 -> 0.010.
 */
import { decimalOf, leadingPlace, roundToDigits } from './decimal.ts';

/** Most digits shown of a value that is exact or whose uncertainty is below what doubles resolve. */
export const MOST_DIGITS = 15;

/** The last decimal place, as a power of ten, that an uncertainty above 0 leaves to its value; undefined for none stated. */
export function lastPlace(uncertainty: number | null | undefined): number | undefined {
  if (uncertainty === null || uncertainty === undefined || !(uncertainty > 0) || uncertainty === Infinity)
    return undefined;
  const two = roundToDigits(decimalOf(uncertainty), 2);
  return leadingPlace(two) - (two.digits < '3' ? 1 : 0);
}

/** Significant digits of a value known to this standard uncertainty; 1 where it is not known to a digit. */
export function significantDigits(value: number, uncertainty: number): number {
  const place = lastPlace(uncertainty);
  if (place === undefined || value === 0 || !Number.isFinite(value)) return MOST_DIGITS;
  return Math.min(MOST_DIGITS, Math.max(1, leadingPlace(decimalOf(value)) - place + 1));
}

/** Significant digits of a quantity derived from one that is known to this relative standard uncertainty. */
export function derivedDigits(value: number, relativeUncertainty: number): number {
  return significantDigits(value, Math.abs(value) * relativeUncertainty);
}
