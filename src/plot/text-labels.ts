/** The texts around the curves of a terminal chart: heading with legend, labels of marks, axes with ticks, labels at the line ends. */
import { toAscii } from '../units/to-ascii.ts';
import { type Chart, forEachRun } from './chart.ts';
import type { GlyphLevel } from './dot-raster.ts';
import { axisGlyphs, MARK_LINE } from './text-glyphs.ts';
import type { TextGrid } from './text-grid.ts';
import { headingRows, legendEntries } from './text-heading.ts';
import { plotColumnOf, plotRowOf, type TextLayout } from './text-layout.ts';

/** Title of the y axis, then a sample and the label of each series and of each hatched range. */
export function writeHeading(chart: Chart, layout: TextLayout, level: GlyphLevel, grid: TextGrid): void {
  if (layout.headingRows === 0) return;
  const entries = [
    layout.yTexts.title,
    ...legendEntries(chart, level, chart.series.length > 1 || layout.endColumns === 0),
    ...marksWithoutRow(chart, layout).map((label) => `${MARK_LINE[level]} ${label}`),
  ].map((text) => plain(text, layout));
  const rows = headingRows(entries, layout.width, layout.headingRows, (text) => columnsOf(text, layout));
  for (const [row, text] of rows.entries()) writeCut(grid, row, 0, text, layout);
}

interface PlacedLabel {
  readonly row: number;
  readonly column: number;
  readonly text: string;
}

/** Each label across its line, or beside it where another is in the way, in the first row with room. */
function placeMarkLabels(chart: Chart, layout: TextLayout): { placed: PlacedLabel[]; left: string[] } {
  const placed: PlacedLabel[] = [];
  const left: string[] = [];
  const ends = new Array<number>(layout.markRows).fill(0);
  const marks = [...(chart.marks ?? [])].sort((a, b) => a.x - b.x);
  for (const { x, label } of marks) {
    const at = plotColumnOf(layout, x);
    if (at === undefined) continue;
    const text = plain(label, layout);
    const columns = columnsOf(text, layout);
    const column = layout.plot.column + at;
    const row = ends.findIndex((end) => {
      const start = startOf(column, columns, end, layout.width);
      return start >= end && start <= column && column < start + columns;
    });
    if (row < 0) {
      left.push(label);
      continue;
    }
    const start = startOf(column, columns, ends[row] ?? 0, layout.width);
    placed.push({ row, column: start, text });
    ends[row] = start + columns + 1;
  }
  return { placed, left };
}

function startOf(column: number, columns: number, end: number, width: number): number {
  return Math.max(0, Math.min(width - columns, Math.max(end, column - (columns >> 1))));
}

function marksWithoutRow(chart: Chart, layout: TextLayout): readonly string[] {
  return placeMarkLabels(chart, layout).left;
}

export function writeMarkLabels(chart: Chart, layout: TextLayout, grid: TextGrid): void {
  for (const { row, column, text } of placeMarkLabels(chart, layout).placed)
    grid.write(layout.headingRows + row, column, text);
}

export function writeAxes(layout: TextLayout, grid: TextGrid): void {
  const { plot, ascii } = layout;
  const glyphs = axisGlyphs(ascii);
  const axisColumn = plot.column - 1;
  if (axisColumn >= 0) {
    for (let row = 0; row < plot.rows; row++) grid.write(plot.row + row, axisColumn, glyphs.vertical);
    writeYTicks(layout, grid, glyphs.verticalTick);
  }
  if (!layout.hasAxisRow) return;
  const axisRow = plot.row + plot.rows;
  grid.write(axisRow, plot.column, glyphs.horizontal.repeat(plot.columns));
  if (axisColumn >= 0) grid.write(axisRow, axisColumn, glyphs.corner);
  writeXTicks(layout, grid, axisRow, glyphs.horizontalTick);
  if (layout.hasXTitle) {
    const title = plain(layout.xTexts.title, layout);
    const spare = Math.max(0, plot.columns - columnsOf(title, layout));
    writeCut(grid, axisRow + 2, plot.column + (spare >> 1), title, layout);
  }
}

function writeYTicks(layout: TextLayout, grid: TextGrid, glyph: string): void {
  const { plot, yTexts, hasYTicks } = layout;
  let lastRow = Number.NaN;
  for (const { value, text } of yTexts.ticks) {
    const row = plotRowOf(layout, value);
    if (row === undefined || !hasYTicks || row === lastRow) continue;
    lastRow = row;
    grid.write(plot.row + row, plot.column - 1, glyph);
    grid.write(plot.row + row, plot.column - 1 - columnsOf(text, layout), text);
  }
}

/** Ticks whose numbers would touch are left out. */
function writeXTicks(layout: TextLayout, grid: TextGrid, axisRow: number, glyph: string): void {
  const { plot, xTexts, hasTickRow, width } = layout;
  let end = 0;
  for (const { value, text } of xTexts.ticks) {
    const at = plotColumnOf(layout, value);
    if (at === undefined) continue;
    const columns = columnsOf(text, layout);
    const column = plot.column + at;
    const start = Math.max(0, Math.min(width - columns, column - (columns >> 1)));
    if (start < end || columns > width) continue;
    grid.write(axisRow, column, glyph);
    if (!hasTickRow) continue;
    grid.write(axisRow + 1, start, text);
    end = start + columns + 1;
  }
}

/** Right of the plot, each in the row where its line ends, moved where two would share a row. */
export function writeEndLabels(chart: Chart, layout: TextLayout, grid: TextGrid): void {
  const { plot, endColumns } = layout;
  if (endColumns === 0) return;
  const wanted: { row: number; text: string }[] = [];
  for (const series of chart.series) {
    const text = plain(series.label, layout);
    let row: number | undefined;
    forEachRun(chart, series, (first, last) => {
      for (let i = first; i <= last; i++) {
        const place = layout.x.place(series.x[i] ?? Number.NaN);
        if (place >= 0 && place <= 1) row = plotRowOf(layout, series.y[i] ?? Number.NaN) ?? row;
      }
    });
    if (row !== undefined && columnsOf(text, layout) < endColumns) wanted.push({ row, text });
  }
  wanted.sort((a, b) => a.row - b.row);
  let next = 0;
  wanted.forEach(({ row, text }, i) => {
    const lowest = plot.rows - (wanted.length - i);
    const free = Math.max(next, Math.min(row, lowest));
    if (free >= plot.rows) return;
    grid.write(plot.row + free, plot.column + plot.columns + 1, text);
    next = free + 1;
  });
}

function writeCut(grid: TextGrid, row: number, column: number, text: string, layout: TextLayout): void {
  const { cutOff } = axisGlyphs(layout.ascii);
  const room = layout.width - column;
  if (columnsOf(text, layout) <= room) {
    grid.write(row, column, text);
    return;
  }
  const markColumns = columnsOf(cutOff, layout);
  if (markColumns > room) return;
  grid.write(row, column, text, layout.width - markColumns);
  grid.write(row, layout.width - markColumns, cutOff);
}

function plain(text: string, layout: TextLayout): string {
  const line = text.replace(/[\p{Cc}\p{Cf}\p{Cs}\p{Zl}\p{Zp}]/gu, '?');
  return layout.ascii ? toAscii(line) : line;
}

function columnsOf(text: string, { clusters }: TextLayout): number {
  return clusters(text).reduce((sum, { width }) => sum + width, 0);
}
