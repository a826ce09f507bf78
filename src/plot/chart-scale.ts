/**
 * The scale of an axis: its domain, where a value lies on it (0 to 1), the value at a place, and round ticks (those of d3-scale).
 *
 * Special cases: no data gives 0 to 1 (logarithmic: 1 to 10); a flat or single value gets room on both sides; spans that a double
 * cannot hold are cut at 1e300; an axis shorter than one decade takes the ticks of a linear one.
 */
import { scaleLinear, scaleLog } from 'd3-scale';
import { type Chart, type ChartAxis, canBeShown, pointCount } from './chart.ts';

export interface ChartScale {
  readonly axis: ChartAxis;
  /** Ascending. */
  readonly domain: readonly [number, number];
  /** 0 at the low end of the domain, 1 at the high end; beyond that outside. NaN for values that cannot be shown. */
  readonly place: (value: number) => number;
  /** The value at a place. */
  readonly valueAt: (place: number) => number;
  /** About so many round values within the domain, ascending, at most twice as many. */
  readonly ticks: (count: number) => readonly number[];
}

const LARGEST = 1e300;
const SMALLEST = 1e-300;
/** Stands for places too far outside for a double. */
const FARTHEST = 1e300;
/** Below this share of its size a change of the data is rounding noise, and the data count as flat. */
const FLAT = 1e-10;

export function xScale(chart: Chart): ChartScale {
  const values: number[] = [];
  for (const series of chart.series) {
    for (let i = 0; i < pointCount(series); i++) values.push(series.x[i] ?? Number.NaN);
  }
  return makeScale(chart.x, rangeOf(values, chart.x), false);
}

/** Of the points within the range of x; the ends are rounded to ticks unless the axis has a range. */
export function yScale(chart: Chart, x: ChartScale, tickCount: number): ChartScale {
  const values: number[] = [];
  for (const series of chart.series) {
    for (let i = 0; i < pointCount(series); i++) {
      const place = x.place(series.x[i] ?? Number.NaN);
      if (place >= 0 && place <= 1) values.push(series.y[i] ?? Number.NaN);
    }
  }
  return makeScale(chart.y, rangeOf(values, chart.y), chart.y.range === undefined, tickCount);
}

function makeScale(
  axis: ChartAxis,
  range: readonly [number, number],
  niceEnds: boolean,
  tickCount = 5,
): ChartScale {
  const isLog = axis.scale === 'log';
  const scale = (isLog ? scaleLog() : scaleLinear()).domain(range).range([0, 1]);
  if (niceEnds && !isLog) (scale as ReturnType<typeof scaleLinear>).nice(Math.max(1, tickCount));
  const [low = 0, high = 1] = scale.domain();
  const place = (value: number): number => {
    if (!canBeShown(value, axis)) return Number.NaN;
    const at = scale(value);
    return Number.isFinite(at) ? at : value > high ? FARTHEST : -FARTHEST;
  };
  return {
    axis,
    domain: [low, high],
    place,
    valueAt: (place) => scale.invert(place),
    ticks: (count) => (isLog ? logTicks(low, high, count) : linearTicks(low, high, count)),
  };
}

function linearTicks(low: number, high: number, count: number): readonly number[] {
  return scaleLinear()
    .domain([low, high])
    .ticks(Math.max(1, count))
    .filter((tick) => tick >= low && tick <= high)
    .map((tick) => tick + 0);
}

/** Powers of ten, between them 2 and 5 where there is room; on a short axis those of a linear one. */
function logTicks(low: number, high: number, count: number): readonly number[] {
  const most = Math.max(1, count);
  const all = scaleLog().domain([low, high]).ticks(most);
  const within = all.filter((tick) => tick >= low && tick <= high);
  for (const mantissas of [[1, 2, 5], [1]]) {
    const chosen = within.filter((tick) => mantissas.includes(mantissaOf(tick)));
    if (chosen.length >= 2 && chosen.length <= 2 * most) return chosen;
  }
  return high / low < 10 ? linearTicks(low, high, most) : thinned(within, most);
}

function mantissaOf(value: number): number {
  return Number(value.toExponential(6).split('e')[0]);
}

function thinned(ticks: readonly number[], most: number): readonly number[] {
  const step = Math.max(1, Math.ceil(ticks.length / most));
  return ticks.filter((_, i) => i % step === 0);
}

/** The span to show: the one asked for, or that of the data, never empty. */
function rangeOf(values: readonly number[], axis: ChartAxis): readonly [number, number] {
  const asked = axis.range?.filter((value) => canBeShown(value, axis)) ?? [];
  const isAsked = asked.length === 2 && asked[0] !== asked[1];
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  for (const value of isAsked ? asked : values) {
    if (!canBeShown(value, axis)) continue;
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  if (low > high) return axis.scale === 'log' ? [1, 10] : [0, 1];
  const limited = axis.scale === 'log' ? limitLog(low, high) : limitLinear(low, high);
  const [from, to] = limited;
  const flat = Math.max(FLAT * Math.abs(from), FLAT * Math.abs(to), axis.scale === 'log' ? 0 : SMALLEST);
  return to - from > flat ? limited : roomAround(from, axis);
}

function limitLinear(low: number, high: number): readonly [number, number] {
  return [Math.max(-LARGEST, Math.min(LARGEST, low)), Math.max(-LARGEST, Math.min(LARGEST, high))];
}

function limitLog(low: number, high: number): readonly [number, number] {
  return [Math.max(SMALLEST, Math.min(LARGEST, low)), Math.max(SMALLEST, Math.min(LARGEST, high))];
}

function roomAround(value: number, axis: ChartAxis): readonly [number, number] {
  if (axis.scale === 'log') return [value / 2, value * 2];
  const room = Math.abs(value) < SMALLEST ? 1 : Math.abs(value) * 0.1;
  return [value - room, value + room];
}
