/** The legend of an SVG chart: samples of lines and hatching with their labels, in as many rows as the width asks for. */
import type { Chart } from './chart.ts';
import { FONT_px, LINE_px, lineElement, strokeOf, textElement } from './svg-elements.ts';
import { decimal, estimatedWidth, labelMarkup } from './svg-text.ts';

export interface LegendEntry {
  readonly label: string;
  /** Undefined for hatching. */
  readonly seriesIndex: number | undefined;
  /** From the left edge of the legend. */
  readonly offset: number;
}

const SAMPLE_px = 36;
const GAP_px = 18;

export function legendRows(chart: Chart, width: number): readonly (readonly LegendEntry[])[] {
  const hatched = [...new Set((chart.hatched ?? []).map(({ label }) => label))];
  const all = [
    ...chart.series.map(({ label }, seriesIndex) => ({ label, seriesIndex })),
    ...hatched.map((label) => ({ label, seriesIndex: undefined })),
  ];
  const rows: LegendEntry[][] = [];
  let offset = 0;
  for (const { label, seriesIndex } of all) {
    const entryWidth = SAMPLE_px + 6 + estimatedWidth(label, FONT_px) + GAP_px;
    if (rows.length === 0 || (offset > 0 && offset + entryWidth > width)) {
      rows.push([]);
      offset = 0;
    }
    rows.at(-1)?.push({ label, seriesIndex, offset });
    offset += entryWidth;
  }
  return rows;
}

export function legendElements(
  rows: readonly (readonly LegendEntry[])[],
  left: number,
  firstBaseline: number,
  hatchId: string,
): readonly string[] {
  return rows.flatMap((entries, row) =>
    entries.map(({ label, seriesIndex, offset }) => {
      const start = left + offset;
      const baseline = firstBaseline + row * LINE_px;
      const sample =
        seriesIndex === undefined
          ? `<rect x="${decimal(start)}" y="${decimal(baseline - 11)}" width="${SAMPLE_px}" height="12" fill="url(#${hatchId})" fill-opacity="0.5"/>`
          : lineElement(start, baseline - 4, start + SAMPLE_px, baseline - 4, strokeOf(seriesIndex));
      const text = textElement(start + SAMPLE_px + 6, baseline, labelMarkup(label, FONT_px), 'start');
      return `<g class="legend">${sample}${text}</g>`;
    }),
  );
}
