/**
 * A value with its standard uncertainty: `1.45846(3)`, the parentheses applying to the last digits shown, or
 * `1.45846 ± 0.00003`. The value is rounded to the place of the uncertainty, which keeps one or two digits (digits.ts).
 */
import {
  type Decimal,
  decimalOf,
  leadingPlace,
  plainDecimal,
  roundDecimal,
  shiftDecimal,
} from './decimal.ts';
import { lastPlace } from './digits.ts';
import { formatNumber, notationPower, type Precision } from './format-number.ts';
import { NO_VALUE, type NumberStyle, SCREEN, timesPowerOfTen } from './number-style.ts';

export type UncertaintyForm = 'parentheses' | 'plus-minus';

/** Value and uncertainty rounded to the same place. */
export interface RoundedPair {
  readonly value: Decimal;
  readonly uncertainty: Decimal;
}

/** Undefined where there is no uncertainty above 0, or no value. */
export function roundPair(value: number, uncertainty: number | null): RoundedPair | undefined {
  const place = lastPlace(uncertainty);
  if (place === undefined || uncertainty === null || !Number.isFinite(value)) return undefined;
  return {
    value: roundDecimal(decimalOf(value), place),
    uncertainty: roundDecimal(decimalOf(uncertainty), place),
  };
}

/** `otherwise` says how many digits to show where no uncertainty is stated. */
export function formatUncertain(
  value: number | null,
  uncertainty: number | null,
  otherwise: Precision,
  style: NumberStyle = SCREEN,
  form: UncertaintyForm = 'parentheses',
): string {
  if (value === null) return NO_VALUE;
  const pair = roundPair(value, uncertainty);
  return pair ? formatPair(pair, style, form) : formatNumber(value, otherwise, style);
}

export function formatPair(pair: RoundedPair, style: NumberStyle, form: UncertaintyForm): string {
  const leading = Math.max(leadingPlace(pair.value), leadingPlace(pair.uncertainty));
  const power = notationPower(leading, pair.value.exponent);
  const value = plainDecimal(shiftDecimal(pair.value, -(power ?? 0)));
  const factor = power === undefined ? '' : timesPowerOfTen(power, style);
  if (form === 'parentheses') return `${value}(${pair.uncertainty.digits})${factor}`;
  const both = `${value} ${style.ascii ? '+/-' : '±'} ${plainDecimal(shiftDecimal(pair.uncertainty, -(power ?? 0)))}`;
  return factor === '' ? both : `(${both})${factor}`;
}
