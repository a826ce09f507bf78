/**
 * Quantities for people: number, space, unit (no space before the degree sign alone: `56.31°`), the SI prefix chosen so
 * that 1 <= number < 1000 after rounding and no zero stands for an unknown digit (630 nm to two digits is 0.63 µm).
 * Values are in SI; percentages are fractions, angles and Celsius temperatures are numbers of degrees.
 */
import { type Decimal, decimalOf, isZero, leadingPlace, plainDecimal, shiftDecimal } from './decimal.ts';
import { type DisplayUnit, prefixedSymbol, prefixesOf } from './display-unit.ts';
import { formatDecimal, notationPower, type Precision, roundTo } from './format-number.ts';
import { formatPair, roundPair, type UncertaintyForm } from './format-uncertain.ts';
import { NO_VALUE, type NumberStyle, SCREEN } from './number-style.ts';
import { NO_PREFIX, type SiPrefix } from './si-prefix.ts';
import { toAscii } from './to-ascii.ts';

export interface QuantityFormat {
  readonly style?: NumberStyle;
  /** Prefix to use whatever the value, for columns that share one. */
  readonly prefix?: SiPrefix;
  readonly form?: UncertaintyForm;
}

export function formatQuantity(
  value: number | null,
  unit: DisplayUnit,
  precision: Precision,
  format: QuantityFormat = {},
): string {
  if (value === null || !Number.isFinite(value)) return NO_VALUE;
  const { style = SCREEN } = format;
  const exact = shiftDecimal(decimalOf(value), -unit.power);
  const prefix = format.prefix ?? prefixFor(exact, unit, precision);
  const number = writeAt(exact, prefix, precision, style);
  return withUnit(number, prefixedSymbol(unit, prefix), style);
}

/** `2.55(3) kW/m²`; `otherwise` says how many digits to show where no uncertainty is stated. */
export function formatUncertainQuantity(
  value: number | null,
  uncertainty: number | null,
  unit: DisplayUnit,
  otherwise: Precision,
  format: QuantityFormat = {},
): string {
  const pair = value === null ? undefined : roundPair(value, uncertainty);
  if (!pair) return formatQuantity(value, unit, otherwise, format);
  const { style = SCREEN, form = 'parentheses' } = format;
  const larger = leadingPlace(pair.value) > leadingPlace(pair.uncertainty) ? pair.value : pair.uncertainty;
  const prefix = format.prefix ?? choosePrefix(shiftDecimal(larger, -unit.power), unit);
  const shift = -unit.power - prefix.power;
  const shown = {
    value: shiftDecimal(pair.value, shift),
    uncertainty: shiftDecimal(pair.uncertainty, shift),
  };
  const number = formatPair(shown, style, form);
  const bracketed =
    form === 'plus-minus' && unit.symbol !== '' && !number.startsWith('(') ? `(${number})` : number;
  return withUnit(bracketed, prefixedSymbol(unit, prefix), style);
}

/** "0.21 µm to 6.7 µm": one prefix for both ends where that reads well, never a dash. */
export function formatRange(
  range: readonly [number, number],
  unit: DisplayUnit,
  precision: Precision = 'shortest',
  format: QuantityFormat = {},
): string {
  const [low, high] = range;
  const prefix = format.prefix ?? commonPrefix(range, unit);
  const one = (value: number): string =>
    formatQuantity(value, unit, precision, prefix ? { ...format, prefix } : format);
  return `${one(low)} to ${one(high)}`;
}

/** The prefix that suits the largest of the values, for a column that shares one unit. */
export function columnPrefix(values: readonly number[], unit: DisplayUnit): SiPrefix {
  const largest = values.reduce((most, x) => (Number.isFinite(x) ? Math.max(most, Math.abs(x)) : most), 0);
  return largestPrefix(shiftDecimal(decimalOf(largest), -unit.power), unit);
}

/** Symbols that follow the number without a space: ISO 80000-1, 7.1.4. */
const STANDS_CLOSE: readonly string[] = ['°', '′', '″'];

/** A number already written, with its unit. */
export function withUnit(number: string, symbol: string, style: NumberStyle = SCREEN): string {
  if (symbol === '' || number === NO_VALUE) return number;
  const text = STANDS_CLOSE.includes(symbol) ? number + symbol : `${number} ${symbol}`;
  return style.ascii ? toAscii(text) : text;
}

function commonPrefix([low, high]: readonly [number, number], unit: DisplayUnit): SiPrefix | undefined {
  const prefix = columnPrefix([low, high], unit);
  const smaller =
    leadingPlace(decimalOf(Math.min(Math.abs(low), Math.abs(high)))) - unit.power - prefix.power;
  return low === 0 || smaller >= -2 ? prefix : undefined;
}

/** The number of prefixed units. Decimals are those of the number shown; significant digits do not depend on the prefix. */
function writeAt(exact: Decimal, prefix: SiPrefix, precision: Precision, style: NumberStyle): string {
  const shown = roundTo(shiftDecimal(exact, -prefix.power), precision);
  return typeof precision === 'object' && 'decimals' in precision
    ? plainDecimal(shown)
    : formatDecimal(shown, style);
}

function prefixFor(exact: Decimal, unit: DisplayUnit, precision: Precision): SiPrefix {
  if (precision === 'shortest') return largestPrefix(exact, unit);
  if ('significant' in precision) return choosePrefix(roundTo(exact, precision), unit);
  const first = largestPrefix(exact, unit);
  const rounded = roundTo(shiftDecimal(exact, -first.power), precision);
  // Rounding may carry into the next prefix: 999.96 nm to one decimal is 1.0 µm.
  return largestPrefix(shiftDecimal(rounded, first.power), unit);
}

/** For a rounded value: like `largestPrefix`, but where the last known digit lies above the unit, the next prefix writes no unknown zeros. */
function choosePrefix(d: Decimal, unit: DisplayUnit): SiPrefix {
  const best = largestPrefix(d, unit);
  if (isZero(d) || d.exponent <= best.power) return best;
  const next = prefixesOf(unit).find((p) => p.power > best.power);
  const readsWell = next && notationPower(leadingPlace(d) - next.power, 0) === undefined;
  return readsWell ? next : best;
}

/**
 * The largest prefix that leaves at least one digit before the point. None for zero, and none where the number would need
 * a power of ten beside the prefix.
 */
function largestPrefix(d: Decimal, unit: DisplayUnit): SiPrefix {
  if (isZero(d) || unit.prefixes === undefined) return NO_PREFIX;
  const place = leadingPlace(d);
  const allowed = prefixesOf(unit);
  const fitting = allowed.findLast((p) => p.power <= place) ?? allowed[0] ?? NO_PREFIX;
  const leading = place - fitting.power;
  return notationPower(leading, 0) === undefined ? fitting : NO_PREFIX;
}
