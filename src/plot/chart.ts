/**
 * A chart as data, the same for every way of showing it: series over one x axis and one y axis, vertical marks, ranges in which
 * the curve is not to be relied on. Values are numbers of the unit shown (degrees, per cent, µm): charts convert nothing.
 *
 * A point is left out, and the line broken there, where x or y is not finite, or not positive on a logarithmic axis.
 */

export interface ChartAxis {
  /** "angle of incidence". */
  readonly label: string;
  /** "°", "µm", "%"; empty for a plain number. */
  readonly unit: string;
  readonly scale: 'linear' | 'log';
  /** What to show; all of the data where absent. Ends may come in either order. */
  readonly range?: readonly [number, number];
  /** Significant digits of values read off; 4 where absent. */
  readonly digits?: number;
}

export interface ChartSeries {
  /** Short, e.g. "R_s": it stands at the end of the line. */
  readonly label: string;
  readonly x: ArrayLike<number>;
  readonly y: ArrayLike<number>;
}

/** A vertical line at a value of x, e.g. the Brewster angle. */
export interface ChartMark {
  readonly x: number;
  readonly label: string;
}

/** A range of x, e.g. outside the range of a fit. */
export interface HatchedRange {
  readonly from: number;
  readonly to: number;
  readonly label: string;
}

export interface Chart {
  readonly title: string;
  readonly x: ChartAxis;
  readonly y: ChartAxis;
  readonly series: readonly ChartSeries[];
  readonly marks?: readonly ChartMark[];
  readonly hatched?: readonly HatchedRange[];
}

export const DEFAULT_DIGITS = 4;

/** Number of points that both coordinates have. */
export function pointCount({ x, y }: ChartSeries): number {
  return Math.min(x.length, y.length);
}

export function canBeShown(value: number, axis: ChartAxis): boolean {
  return Number.isFinite(value) && (axis.scale === 'linear' || value > 0);
}

/** Calls back with each unbroken run of points of a series, as [first, last] indices. */
export function forEachRun(
  chart: Chart,
  series: ChartSeries,
  call: (first: number, last: number) => void,
): void {
  const count = pointCount(series);
  let first = -1;
  for (let i = 0; i <= count; i++) {
    const isShown =
      i < count &&
      canBeShown(series.x[i] ?? Number.NaN, chart.x) &&
      canBeShown(series.y[i] ?? Number.NaN, chart.y);
    if (isShown && first < 0) first = i;
    if (!isShown && first >= 0) {
      call(first, i - 1);
      first = -1;
    }
  }
}
