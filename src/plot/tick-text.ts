/**
 * Texts for the ticks of an axis: one number of decimals for all, a common power of ten set apart into the title of the axis where the
 * numbers would be long.
 */
import { decimalOf, leadingPlace, plainDecimal, roundDecimal, shiftDecimal } from '../units/decimal.ts';
import { formatNumber } from '../units/format-number.ts';
import { ASCII, SCREEN, superscript } from '../units/number-style.ts';
import { toAscii } from '../units/to-ascii.ts';
import type { ChartAxis } from './chart.ts';
import type { ChartScale } from './chart-scale.ts';

export interface Tick {
  readonly value: number;
  readonly text: string;
}

export interface AxisTexts {
  readonly ticks: readonly Tick[];
  /** "angle of incidence (°)". */
  readonly title: string;
}

const MOST_DECIMALS = 12;

export function axisTexts(scale: ChartScale, count: number, ascii: boolean): AxisTexts {
  const values = scale.ticks(count);
  const isLog = scale.axis.scale === 'log' && !isEvenlySpaced(values);
  const power = isLog ? 0 : commonPower(values);
  const ticks = isLog
    ? values.map((value) => ({ value, text: logText(value, ascii) }))
    : linearTexts(values, power);
  return { ticks, title: titleOf(scale.axis, power, ascii) };
}

/** A value as read off, with its unit: "56.31°", "4.012 %"; to so many significant digits. */
export function valueText(
  value: number,
  axis: ChartAxis,
  digits: number | 'shortest',
  ascii: boolean,
): string {
  const precision = digits === 'shortest' ? digits : { significant: digits };
  const number = formatNumber(Number.isFinite(value) ? value : null, precision, ascii ? ASCII : SCREEN);
  const text =
    axis.unit === '' || number === '-' ? number : number + (axis.unit === '°' ? '' : ' ') + axis.unit;
  return ascii ? toAscii(text) : text;
}

function titleOf({ label, unit }: ChartAxis, power: number, ascii: boolean): string {
  const factor = power === 0 ? '' : ascii ? `1e${power}` : `10${superscript(power)}`;
  const shown = (text: string): string => (ascii ? toAscii(text).trim() : text);
  const inside = [factor, shown(unit)].filter((part) => part !== '').join(' ');
  return inside === '' ? shown(label) : `${shown(label)} (${inside})`;
}

function commonPower(values: readonly number[]): number {
  const largest = Math.max(0, ...values.map(Math.abs));
  if (largest === 0) return 0;
  const power = leadingPlace(decimalOf(largest));
  return power >= 5 || power < -3 ? power : 0;
}

function linearTexts(values: readonly number[], power: number): readonly Tick[] {
  const [first = 0, second = first] = values;
  const step = second - first;
  const place = step > 0 ? lastPlaceOf(step) - power : 0;
  const decimals = Math.max(0, Math.min(MOST_DECIMALS, -place));
  return values.map((value) => ({
    value,
    text:
      values.length === 1 && power === 0
        ? formatNumber(value, { significant: 4 })
        : plainDecimal(roundDecimal(shiftDecimal(decimalOf(value), -power), -decimals)),
  }));
}

/** Place of the leading digit of a step; steps of ticks are 1, 2 or 5 times a power of ten, up to rounding. */
function lastPlaceOf(step: number): number {
  return leadingPlace(decimalOf(Number(step.toPrecision(3))));
}

function logText(value: number, ascii: boolean): string {
  const round = Number(value.toPrecision(9));
  const [mantissa = '1', exponent = '0'] = round.toExponential().split('e');
  const power = Number(exponent);
  if (power >= -3 && power < 5) return formatNumber(round, 'shortest');
  if (ascii) return `${mantissa}e${power}`;
  return mantissa === '1' ? `10${superscript(power)}` : `${mantissa}×10${superscript(power)}`;
}

function isEvenlySpaced(values: readonly number[]): boolean {
  const [first = 0, second = 0] = values;
  return (
    values.length >= 3 &&
    values.every((value, i) => Math.abs(value - first - i * (second - first)) <= 1e-6 * Math.abs(value))
  );
}
