/**
 * A chart for a terminal, in braille dots, half blocks or ASCII: lines of text, each exactly as wide as asked, blank cells as spaces,
 * no escape codes. Series differ by their dashes (in ASCII by their letter) and carry their labels at the line ends, so
 * no colour is needed.
 *
 * Special cases: any size from 0 x 0 up; no data draws the axes alone; points outside the range are cut at the edge.
 */
import { type Chart, type ChartSeries, forEachRun } from './chart.ts';
import { letterOf } from './dash-patterns.ts';
import { DotRaster, dashesAt } from './dot-raster.ts';
import { CURSOR_LINE, HATCH, MARK_LINE } from './text-glyphs.ts';
import { TextGrid } from './text-grid.ts';
import { writeAxes, writeEndLabels, writeHeading, writeMarkLabels } from './text-labels.ts';
import { layOut, plotColumnOf, type TextChartOptions, type TextLayout } from './text-layout.ts';

/** Beyond so many widths of the chart a point is as good as at infinity. */
const FARTHEST = 1e6;

export function brailleChart(chart: Chart, options: TextChartOptions): string[] {
  const layout = layOut(chart, options);
  const grid = new TextGrid(layout.width, layout.height, layout.clusters);
  if (layout.plot.rows > 0 && layout.plot.columns > 0) {
    drawCurves(chart, layout, options.level, grid);
    drawVerticals(chart, layout, options, grid);
    drawHatching(chart, layout, options.level, grid);
  }
  writeHeading(chart, layout, options.level, grid);
  writeMarkLabels(chart, layout, grid);
  writeAxes(layout, grid);
  writeEndLabels(chart, layout, grid);
  return grid.lines();
}

function drawCurves(
  chart: Chart,
  layout: TextLayout,
  level: TextChartOptions['level'],
  grid: TextGrid,
): void {
  const { plot } = layout;
  const raster = new DotRaster(plot.columns, plot.rows, level);
  chart.series.forEach((series, i) => {
    drawSeries(chart, layout, series, raster, i);
  });
  for (let row = 0; row < plot.rows; row++) {
    for (let column = 0; column < plot.columns; column++) {
      const glyph = raster.glyph(row, column);
      if (glyph !== ' ') grid.write(plot.row + row, plot.column + column, glyph);
    }
  }
}

function drawSeries(
  chart: Chart,
  layout: TextLayout,
  series: ChartSeries,
  raster: DotRaster,
  seriesIndex: number,
): void {
  const dashes = dashesAt(raster.level, seriesIndex);
  const letter = letterOf(seriesIndex);
  const dotOf = (i: number): readonly [number, number] => {
    const x = layout.x.place(series.x[i] ?? Number.NaN);
    const y = layout.y.place(series.y[i] ?? Number.NaN);
    return raster.dotAt(nearer(x), nearer(y));
  };
  let along = 0;
  forEachRun(chart, series, (first, last) => {
    if (first === last) raster.setPoint(...dotOf(first), letter);
    for (let i = first; i < last; i++) along = raster.line(dotOf(i), dotOf(i + 1), dashes, along, letter);
  });
}

function nearer(place: number): number {
  return Math.max(-FARTHEST, Math.min(FARTHEST, place));
}

/** Blank cells of a hatched range; curves stay as they are. */
function drawHatching(
  chart: Chart,
  layout: TextLayout,
  level: TextChartOptions['level'],
  grid: TextGrid,
): void {
  const { plot, x } = layout;
  for (const { from, to } of chart.hatched ?? []) {
    const [low, high] = [Math.min(from, to), Math.max(from, to)];
    for (let column = 0; column < plot.columns; column++) {
      const value = x.valueAt(plot.columns === 1 ? 0.5 : column / (plot.columns - 1));
      if (!(value >= low && value <= high)) continue;
      for (let row = 0; row < plot.rows; row++) {
        if ((row + column) % 2 === 0 && grid.isBlank(plot.row + row, plot.column + column))
          grid.write(plot.row + row, plot.column + column, HATCH[level]);
      }
    }
  }
}

/** Lines of marks and of the cursor, behind the curves. */
function drawVerticals(
  chart: Chart,
  layout: TextLayout,
  { cursor, level }: TextChartOptions,
  grid: TextGrid,
): void {
  const { plot } = layout;
  const line = (value: number, glyph: string): void => {
    const column = plotColumnOf(layout, value);
    if (column === undefined) return;
    for (let row = 0; row < plot.rows; row++) {
      const cell = [plot.row + row, plot.column + column] as const;
      if (grid.isBlank(...cell)) grid.write(...cell, glyph);
    }
  };
  for (const { x } of chart.marks ?? []) line(x, MARK_LINE[level]);
  if (cursor !== undefined) line(cursor, CURSOR_LINE[level]);
}
