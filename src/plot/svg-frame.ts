/** Where the plot of an SVG chart lies, its scales and ticks, and the coordinates of values in it. */
import type { Chart } from './chart.ts';
import { type ChartScale, xScale, yScale } from './chart-scale.ts';
import { FONT_px, LINE_px } from './svg-elements.ts';
import { type PlacedMark, placeMarks } from './svg-marks.ts';
import { estimatedWidth } from './svg-text.ts';
import { type AxisTexts, axisTexts } from './tick-text.ts';

export interface SvgFrame {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
  readonly x: ChartScale;
  readonly y: ChartScale;
  readonly xTexts: AxisTexts;
  readonly yTexts: AxisTexts;
  readonly marks: readonly PlacedMark[];
}

const HEAD_px = 40;
const FOOT_px = 48;
const LEAST_HEIGHT_px = 60;
/** Beyond so many sizes of the plot a point is as good as at infinity; viewers keep to single precision. */
const FARTHEST = 1e4;

/** @param height_px wanted, with head and foot; the frame is higher where legend and marks leave less than 60 px for the plot */
export function makeFrame(
  chart: Chart,
  width_px: number,
  height_px: number,
  legendRowCount: number,
): SvgFrame {
  const x = xScale(chart);
  const tickCount = Math.max(2, Math.round((height_px - HEAD_px - FOOT_px) / 55));
  const y = yScale(chart, x, tickCount);
  const yTexts = axisTexts(y, tickCount, false);
  const widest = Math.max(0, ...yTexts.ticks.map((tick) => estimatedWidth(tick.text, FONT_px)));
  const left = Math.min(width_px / 2, 36 + widest);
  const width = Math.max(20, width_px - left - 24);
  const marks = placeMarks(chart.marks ?? [], x, { left, width });
  const markRows = marks.reduce((most, { row }) => Math.max(most, row + 1), 0);
  const top = HEAD_px + (legendRowCount + markRows) * LINE_px;
  const height = Math.max(LEAST_HEIGHT_px, height_px - FOOT_px - top);
  return { left, top, width, height, x, y, xTexts: fittingTexts(x, width), yTexts, marks };
}

/** As many ticks as have room beside each other. */
function fittingTexts(x: ChartScale, width: number): AxisTexts {
  for (let count = Math.max(2, Math.round(width / 70)); count > 1; count--) {
    const texts = axisTexts(x, count, false);
    const places = texts.ticks.map(({ value }) => x.place(value) * width);
    const isRoom = texts.ticks.every(({ text }, i) => {
      const gap = (places[i + 1] ?? Number.POSITIVE_INFINITY) - (places[i] ?? 0);
      return gap > estimatedWidth(text, FONT_px) + 8;
    });
    if (isRoom) return texts;
  }
  return axisTexts(x, 1, false);
}

export function atX({ left, width, x }: SvgFrame, value: number): number {
  return left + near(x.place(value)) * width;
}

export function atY({ top, height, y }: SvgFrame, value: number): number {
  return top + (1 - near(y.place(value))) * height;
}

function near(place: number): number {
  return Math.max(-FARTHEST, Math.min(FARTHEST, place));
}
