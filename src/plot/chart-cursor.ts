/** Reading a terminal chart: the value of x that a column stands for, and what each series has there. */
import { decimalOf, decimalToNumber, leadingPlace, roundDecimal } from '../units/decimal.ts';
import { toAscii } from '../units/to-ascii.ts';
import { type Chart, DEFAULT_DIGITS } from './chart.ts';
import { readOff } from './series-read-off.ts';
import { layOut, plotColumnOf, type TextChartOptions, type TextLayout } from './text-layout.ts';
import { valueText } from './tick-text.ts';

export interface CursorValue {
  readonly label: string;
  /** Between the points of the series on a straight line; NaN where it has none. */
  readonly y: number;
  /** "4.012 %". */
  readonly text: string;
}

export interface CursorReading {
  /** Column within the plot, from 0. */
  readonly column: number;
  readonly x: number;
  readonly xText: string;
  readonly values: readonly CursorValue[];
  /** The marks in this column. */
  readonly marks: readonly string[];
  /** Labels of the hatched ranges that hold x. */
  readonly hatched: readonly string[];
}

/** How many columns a cursor can stand on. */
export function cursorColumns(chart: Chart, options: TextChartOptions): number {
  return layOut(chart, options).plot.columns;
}

/** The column of a value of x, the nearest one where it lies outside; 0 where there is no column. */
export function cursorColumnOf(chart: Chart, options: TextChartOptions, x: number): number {
  const layout = layOut(chart, options);
  const last = Math.max(0, layout.plot.columns - 1);
  const place = layout.x.place(x);
  return Number.isNaN(place) ? 0 : Math.max(0, Math.min(last, Math.round(place * last)));
}

/** What stands at a column of the plot; columns outside count as the first or the last. Undefined where the plot has none. */
export function readColumn(
  chart: Chart,
  options: TextChartOptions,
  column: number,
): CursorReading | undefined {
  const layout = layOut(chart, options);
  const { columns } = layout.plot;
  if (columns === 0) return undefined;
  const at = Math.max(0, Math.min(columns - 1, Math.round(column)));
  const { x, digits } = xOfColumn(layout, at);
  const { ascii } = layout;
  return {
    column: at,
    x,
    xText: valueText(x, chart.x, digits, ascii),
    values: chart.series.map((series) => {
      const y = readOff(chart, series, x);
      const text = valueText(y, chart.y, chart.y.digits ?? DEFAULT_DIGITS, ascii);
      return { label: ascii ? toAscii(series.label) : series.label, y, text };
    }),
    marks: (chart.marks ?? [])
      .filter((mark) => plotColumnOf(layout, mark.x) === at)
      .map(({ label }) => label),
    hatched: (chart.hatched ?? [])
      .filter(({ from, to }) => x >= Math.min(from, to) && x <= Math.max(from, to))
      .map(({ label }) => label),
  };
}

/** The value in the middle of a column, rounded as far as it stays in that column, and how many digits that leaves. */
function xOfColumn({ x, plot }: TextLayout, at: number): { readonly x: number; readonly digits: number } {
  const last = plot.columns - 1;
  const middle = x.valueAt(last === 0 ? 0.5 : at / last);
  const step =
    last === 0
      ? Number.NaN
      : x.valueAt((at === last ? at : at + 1) / last) - x.valueAt((at === last ? at - 1 : at) / last);
  const place = Math.floor(Math.log10(Math.abs(step) / 2));
  if (!Number.isFinite(place)) return { x: middle, digits: x.axis.digits ?? DEFAULT_DIGITS };
  const rounded = decimalToNumber(roundDecimal(decimalOf(middle), place));
  const inside = Math.max(x.domain[0], Math.min(x.domain[1], rounded));
  return { x: inside, digits: Math.max(1, Math.min(15, leadingPlace(decimalOf(inside)) - place + 1)) };
}
