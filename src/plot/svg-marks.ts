/** Where the labels of marks stand above an SVG chart: over their lines, in rows so that none covers another. */
import type { ChartMark } from './chart.ts';
import type { ChartScale } from './chart-scale.ts';
import { SMALL_px } from './svg-elements.ts';
import { estimatedWidth } from './svg-text.ts';

export interface PlacedMark {
  readonly mark: ChartMark;
  /** Of the line. */
  readonly x_px: number;
  /** Of the middle of the label. */
  readonly centre_px: number;
  /** 0 is the row next to the chart. */
  readonly row: number;
}

/** Marks outside the chart are left out. */
export function placeMarks(
  marks: readonly ChartMark[],
  x: ChartScale,
  { left, width }: { readonly left: number; readonly width: number },
): readonly PlacedMark[] {
  const ends: number[] = [];
  return [...marks]
    .sort((a, b) => a.x - b.x)
    .flatMap((mark) => {
      const place = x.place(mark.x);
      if (!(place >= 0 && place <= 1)) return [];
      const x_px = left + place * width;
      const half = estimatedWidth(mark.label, SMALL_px) / 2;
      const centre_px = Math.max(half + 4, Math.min(left + width + 20 - half, x_px));
      const free = ends.findIndex((end) => end < centre_px - half);
      const row = free < 0 ? ends.length : free;
      ends[row] = centre_px + half + 6;
      return [{ mark, x_px, centre_px, row }];
    });
}
