/**
 * A curve in a box of characters: a scale at the left from 0 to 100 %, lines drawn in dots and named where they run apart, the
 * present value marked on the axis below.
 */
import { displayWidth } from '../../term/display-width.ts';
import { padStartToWidth } from '../../term/fit-width.ts';
import { DotCanvas, type DotStyle } from '../dot-canvas.ts';
import type { Curve } from '../reflectance-curves.ts';
import { BLANK_LINE, blanks, lineOfSpans, type Pen, span } from './pen.ts';

export interface Plot {
  readonly title: string;
  readonly curves: readonly Curve[];
  /** Texts of the two ends of the axis. */
  readonly ends: readonly [string, string];
  /** Where on the axis the question stands, from 0 to 1, and its text; null where it is off the axis. */
  readonly present: { readonly x: number; readonly text: string } | null;
  /** Value at the top of the scale, from 0 to 1. */
  readonly top: number;
  /** Shown in place of the lines where there are none. */
  readonly instead?: string;
}

const SCALE_WIDTH = 6;

export function curveView(
  plot: Plot,
  columns: number,
  rows: number,
  style: DotStyle,
  pen: Pen,
): readonly string[] {
  const width = columns - SCALE_WIDTH - 2;
  const height = rows - 2;
  if (width < 8 || height < 3) return new Array<string>(rows).fill(BLANK_LINE);
  const title = lineOfSpans([span(blanks(SCALE_WIDTH + 1)), span(plot.title, 'heading')], columns, pen);
  const body = plot.curves.length > 0 ? drawn(plot, width, height, style, pen) : insteadLines(plot, height);
  const lines = body.map((row, y) =>
    lineOfSpans(
      [span(scaleText(y, height, plot.top)), span(pen.glyphs.axisDown, 'boundary'), span(row, 'curve')],
      columns,
      pen,
    ),
  );
  return [title, ...lines, axisLine(plot, width, columns, pen)];
}

const percent = (value: number): string => `${Number((value * 100).toPrecision(3))} %`;

function scaleText(y: number, height: number, top: number): string {
  const isMiddle = y === (height - 1) / 2;
  const text = y === 0 ? percent(top) : y === height - 1 ? '0 %' : isMiddle ? percent(top / 2) : '';
  return padStartToWidth(text, SCALE_WIDTH - 1) + ' ';
}

function insteadLines(plot: Plot, height: number): readonly string[] {
  return Array.from({ length: height }, (_, y) =>
    y === Math.floor(height / 2) ? ` ${plot.instead ?? ''}` : '',
  );
}

function drawn(plot: Plot, width: number, height: number, style: DotStyle, pen: Pen): readonly string[] {
  const canvas = new DotCanvas(width, height, style);
  const top = canvas.height - 1;
  const yOf = (value: number): number => Math.round((1 - Math.min(1, value / plot.top)) * top);
  for (const { valueAt } of plot.curves) {
    let before: number | undefined;
    for (let x = 0; x < canvas.width; x++) {
      const value = valueAt(x / (canvas.width - 1));
      const y = value === null ? undefined : yOf(value);
      if (y !== undefined) canvas.vertical(x, y, before === undefined ? y : nextTo(before, y));
      before = y;
    }
  }
  const rows = canvas.rows().map((row) => [...row]);
  markPresent(rows, plot, width, pen);
  nameCurves(rows, plot, width, height);
  return rows.map((row) => row.join(''));
}

/** Joins a dot to its left neighbour without doubling it. */
const nextTo = (before: number, y: number): number => (before < y ? before + 1 : before > y ? before - 1 : y);

function markPresent(rows: string[][], plot: Plot, width: number, pen: Pen): void {
  if (!plot.present) return;
  const x = Math.round(plot.present.x * (width - 1));
  for (const row of rows) if (row[x] === ' ') row[x] = pen.glyphs.axisDown;
}

/** Tops of scales that read well. */
const TOPS = [0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1] as const;

export function scaleTop(largest: number): number {
  return TOPS.find((top) => top >= largest) ?? 1;
}

/** Each name stands beside its line, above the upper one and below the lower one, where they are farthest apart. */
function nameCurves(rows: string[][], plot: Plot, width: number, height: number): void {
  const [upper, lower] = plot.curves;
  if (!upper || !lower) return;
  let best = 0;
  let distance = -1;
  for (let column = 2; column < width - 2; column++) {
    const x = column / (width - 1);
    const apart = Math.abs((upper.valueAt(x) ?? 0) - (lower.valueAt(x) ?? 0));
    if (apart > distance) {
      distance = apart;
      best = column;
    }
  }
  for (const curve of [upper, lower]) {
    const value = curve.valueAt(best / (width - 1)) ?? 0;
    const other = curve === upper ? lower : upper;
    const isAbove = value >= (other.valueAt(best / (width - 1)) ?? 0);
    const y = Math.round((1 - value / plot.top) * (height - 1)) + (isAbove ? -1 : 1);
    const row = rows[Math.max(0, Math.min(height - 1, y))];
    if (row) row[best] = curve.name;
  }
}

function axisLine(plot: Plot, width: number, columns: number, pen: Pen): string {
  const cells = new Array<string>(width).fill(pen.glyphs.axisAlong);
  // Half a number reads as another one: what has no room beside what stands there is left out.
  const put = (text: string, at: number): void => {
    const start = Math.max(0, Math.min(width - displayWidth(text), at));
    const end = start + displayWidth(text);
    if (cells.slice(start, end).some((c) => c !== pen.glyphs.axisAlong)) return;
    [...text].forEach((c, i) => {
      cells[start + i] = c;
    });
  };
  if (plot.present) {
    const { text, x } = plot.present;
    put(` ${text} `, Math.round(x * (width - 1)) - Math.floor(displayWidth(text) / 2) - 1);
  }
  put(` ${plot.ends[0]} `, 0);
  put(` ${plot.ends[1]}`, width);
  return lineOfSpans([span(blanks(SCALE_WIDTH)), span(pen.glyphs.axisCorner + cells.join(''))], columns, pen);
}
