/** A published number beside what the program makes of it, as texts. */
import type { CheckedValue } from '../../catalog/check-values.ts';
import { decimalOf, leadingPlace, trimZeros } from '../../units/decimal.ts';
import { formatNumber } from '../../units/format-number.ts';
import type { NumberStyle } from '../../units/number-style.ts';

export interface CheckedTexts {
  readonly published: string;
  readonly computed: string;
  /** Computed minus published. */
  readonly difference: string;
  readonly tolerance: string;
}

export function checkedTexts(value: CheckedValue, style: NumberStyle): CheckedTexts {
  const { published, computed, tolerance } = value;
  const difference = computed - published;
  return {
    published: formatNumber(value.tolerance === undefined ? short(published) : published, 'shortest', style),
    computed: formatNumber(computed, comparable(value), style),
    difference: signed(difference, style),
    tolerance:
      tolerance === undefined ? '' : formatNumber(Number(tolerance.toPrecision(3)), 'shortest', style),
  };
}

/** With its sign, so that a column shows which side the fit lies on. */
export function signed(difference: number, style: NumberStyle): string {
  const text = formatNumber(Math.abs(difference), { significant: 2 }, style);
  if (difference === 0 || !Number.isFinite(difference)) return difference === 0 ? '0' : text;
  return `${difference < 0 ? '-' : '+'}${text}`;
}

/** The computed number to the last place of the published one, and at least to one place below the tolerance. */
function comparable({ published, computed, tolerance }: CheckedValue): { readonly significant: number } {
  const printed = trimZeros(decimalOf(tolerance === undefined ? short(published) : published)).exponent;
  const last = tolerance ? Math.min(printed, leadingPlace(decimalOf(tolerance)) - 1) : printed;
  const leading = Number.isFinite(computed) && computed !== 0 ? leadingPlace(decimalOf(computed)) : last;
  return { significant: Math.max(1, leading - last + 1) };
}

/** What is not judged needs no more digits than a person compares. */
const short = (x: number): number => Number(x.toPrecision(8));
