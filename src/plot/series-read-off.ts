/** Reading values off a series: at a value of x, at its ends and extremes. */
import { type Chart, type ChartSeries, forEachRun } from './chart.ts';

export interface ReadPoint {
  readonly x: number;
  readonly y: number;
}

/** y at a value of x, on the straight line between the two points beside it; NaN in gaps and outside. */
export function readOff(chart: Chart, series: ChartSeries, x: number): number {
  let found = Number.NaN;
  if (!Number.isFinite(x)) return found;
  forEachRun(chart, series, (first, last) => {
    for (let i = first; i <= last && Number.isNaN(found); i++) {
      const here = pointAt(series, i);
      if (here.x === x) found = here.y;
      else if (i < last) found = between(here, pointAt(series, i + 1), x);
    }
  });
  return found;
}

/** The points of a series that a sentence about it needs; undefined where nothing of it can be shown. */
export interface SeriesOutline {
  readonly first: ReadPoint;
  readonly last: ReadPoint;
  readonly lowest: ReadPoint;
  readonly highest: ReadPoint;
  readonly hasGaps: boolean;
}

/** Only points with x from `low` to `high` count. */
export function outlineOf(
  chart: Chart,
  series: ChartSeries,
  [low, high]: readonly [number, number],
): SeriesOutline | undefined {
  let outline: SeriesOutline | undefined;
  let runs = 0;
  forEachRun(chart, series, (first, last) => {
    let isInside = false;
    for (let i = first; i <= last; i++) {
      const point = pointAt(series, i);
      if (point.x < low || point.x > high) continue;
      if (!isInside) runs += 1;
      isInside = true;
      outline = {
        first: outline?.first ?? point,
        last: point,
        lowest: !outline || point.y < outline.lowest.y ? point : outline.lowest,
        highest: !outline || point.y > outline.highest.y ? point : outline.highest,
        hasGaps: runs > 1,
      };
    }
  });
  return outline;
}

export function pointAt(series: ChartSeries, i: number): ReadPoint {
  return { x: series.x[i] ?? Number.NaN, y: series.y[i] ?? Number.NaN };
}

function between(a: ReadPoint, b: ReadPoint, x: number): number {
  if (!((a.x <= x && x <= b.x) || (b.x <= x && x <= a.x)) || a.x === b.x) return Number.NaN;
  if (b.x === x) return b.y;
  const share = (x - a.x) / (b.x - a.x);
  return a.y * (1 - share) + b.y * share;
}
