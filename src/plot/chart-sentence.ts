/**
 * A chart in words, for readers who hear it: one sentence, and a table of about ten rows in which every value stands behind its name.
 * No drawing characters. Values are read off the series; where one has none the table says so.
 */
import { toAscii } from '../units/to-ascii.ts';
import { type Chart, type ChartSeries, DEFAULT_DIGITS } from './chart.ts';
import { type ChartScale, xScale } from './chart-scale.ts';
import { outlineOf, readOff } from './series-read-off.ts';
import { valueText } from './tick-text.ts';

export interface ChartTable {
  /** "angle of incidence", then the labels of the series. */
  readonly header: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

const TABLE_ROWS = 10;
const NO_VALUE = 'no value';

/** "Reflectance: R_s over angle of incidence from 0° to 90° rises from 4.000 % to 100.0 %; ..." */
export function chartSentence(chart: Chart, ascii = false): string {
  const x = xScale(chart);
  const [low, high] = x.domain;
  const at = (value: number): string => xText(chart, value, x.domain, ascii);
  const over = `over ${chart.x.label} from ${at(low)} to ${at(high)}`;
  const parts = chart.series.map((series) => seriesPart(chart, series, x, ascii));
  const marks = (chart.marks ?? [])
    .filter((mark) => mark.x >= low && mark.x <= high)
    .map((mark) => `mark ${mark.label} at ${at(mark.x)}`);
  const hatched = (chart.hatched ?? [])
    .filter(({ from, to }) => Math.max(from, to) >= low && Math.min(from, to) <= high)
    .map(({ label, from, to }) => {
      const start = Math.max(low, Math.min(from, to));
      const end = Math.min(high, Math.max(from, to));
      return `${label} from ${at(start)} to ${at(end)}`;
    });
  const all = [...(parts.length === 0 ? ['nothing is drawn'] : parts), ...marks, ...hatched];
  const sentence = `${chart.title} ${over}: ${all.join('; ')}.`;
  return ascii ? toAscii(sentence) : sentence;
}

/** At about ten round values of x within the chart. */
export function chartTable(chart: Chart, ascii = false): ChartTable {
  const x = xScale(chart);
  const header = [chart.x.label, ...chart.series.map(({ label }) => label)];
  const rows = tableValues(x).map((at) => [
    xText(chart, at, x.domain, ascii),
    ...chart.series.map((series) => {
      const y = readOff(chart, series, at);
      return Number.isNaN(y) ? NO_VALUE : yText(chart, y, ascii);
    }),
  ]);
  return ascii ? { header: header.map(toAscii), rows } : { header, rows };
}

/** The table line by line, every value behind its name: "angle of incidence 10°: R_s 4.131 %, R_p 3.872 %". */
export function chartTableLines(chart: Chart, ascii = false): readonly string[] {
  const { header, rows } = chartTable(chart, ascii);
  return rows.map(([at = '', ...values]) => {
    const named = values.map((value, i) => `${header[i + 1] ?? ''} ${value}`);
    return `${header[0] ?? ''} ${at}: ${named.join(', ')}`;
  });
}

/** Round values where the axis has about ten of them, else ten evenly spaced along it. */
function tableValues(x: ChartScale): readonly number[] {
  const ticks = [TABLE_ROWS, TABLE_ROWS - 2, TABLE_ROWS + 2]
    .map((count) => x.ticks(count))
    .find(({ length }) => length >= 7 && length <= 13);
  if (ticks) return ticks;
  const [low, high] = x.domain;
  const digits = high / low > 2 ? 2 : 6;
  return Array.from({ length: TABLE_ROWS }, (_, i) => {
    const at = Number(x.valueAt(i / (TABLE_ROWS - 1)).toPrecision(digits));
    return Math.max(low, Math.min(high, at));
  });
}

function seriesPart(chart: Chart, series: ChartSeries, x: ChartScale, ascii: boolean): string {
  const outline = outlineOf(chart, series, x.domain);
  if (!outline) return `${series.label} has no values`;
  const { first, last, lowest, highest, hasGaps } = outline;
  const y = (value: number): string => yText(chart, value, ascii);
  const [start, end] = [y(first.y), y(last.y)];
  const gaps = hasGaps ? ', with gaps' : '';
  if (first === last) return `${series.label} is ${start} at ${xText(chart, first.x, x.domain, ascii)} alone`;
  if (y(lowest.y) === y(highest.y)) return `${series.label} stays at ${start}${gaps}`;
  const way =
    start === end
      ? `starts and ends at ${start}`
      : `${last.y > first.y ? 'rises' : 'falls'} from ${start} to ${end}`;
  const extremes = [
    lowest.y < Math.min(first.y, last.y)
      ? `lowest ${y(lowest.y)} at ${xText(chart, lowest.x, x.domain, ascii)}`
      : '',
    highest.y > Math.max(first.y, last.y)
      ? `highest ${y(highest.y)} at ${xText(chart, highest.x, x.domain, ascii)}`
      : '',
  ].filter((part) => part !== '');
  return `${series.label} ${[way, ...extremes].join(', ')}${gaps}`;
}

/** As short as it can be written, with the digits that tell values of this axis apart. */
function xText(chart: Chart, value: number, [low, high]: readonly [number, number], ascii: boolean): string {
  const span = (high - low) / Math.max(Math.abs(low), Math.abs(high));
  const digits = Math.max(chart.x.digits ?? DEFAULT_DIGITS, Math.min(15, 4 - Math.floor(Math.log10(span))));
  return valueText(Number(value.toPrecision(digits)), chart.x, 'shortest', ascii);
}

function yText(chart: Chart, value: number, ascii: boolean): string {
  return valueText(value, chart.y, chart.y.digits ?? DEFAULT_DIGITS, ascii);
}
