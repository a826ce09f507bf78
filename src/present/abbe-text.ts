/** An Abbe number to the decimals that hold, at most the two that makers print, filled up so that points stand under points. */
import { lastPlace } from '../units/digits.ts';
import { formatNumber } from '../units/format-number.ts';
import { NO_VALUE, type NumberStyle } from '../units/number-style.ts';

const MOST_DECIMALS = 2;

export function abbeText(V: number | null, digitsGuide: number | null, style: NumberStyle): string {
  if (V === null) return NO_VALUE;
  const decimals = Math.min(MOST_DECIMALS, Math.max(0, -(lastPlace(digitsGuide) ?? 0)));
  const point = decimals === 0 ? 1 : 0;
  return formatNumber(V, { decimals }, style) + ' '.repeat(MOST_DECIMALS - decimals + point);
}
