/** The legend of a terminal chart: a sample and the label of each series and of each hatched range, in rows that fit. */
import type { Chart } from './chart.ts';
import { letterOf } from './dash-patterns.ts';
import { DotRaster, dashesAt, type GlyphLevel } from './dot-raster.ts';
import { HATCH } from './text-glyphs.ts';

const GAP = '  ';

export function legendEntries(chart: Chart, level: GlyphLevel, hasSamples: boolean): readonly string[] {
  const samples = chart.series.flatMap(({ label }, i) =>
    label === '' ? [] : [`${lineSample(level, i)} ${label}`],
  );
  const hatched = new Set((chart.hatched ?? []).map(({ label }) => label));
  return [
    ...(hasSamples ? samples : []),
    ...[...hatched].map((label) => `${HATCH[level].repeat(3)} ${label}`),
  ];
}

/** As few rows as hold the entries whole; what is beyond `mostRows` stands in the last one, to be cut. */
export function headingRows(
  entries: readonly string[],
  width: number,
  mostRows: number,
  columnsOf: (text: string) => number,
): readonly string[] {
  const rows: string[] = [];
  for (const entry of entries) {
    const last = rows.at(-1);
    const joined = last === undefined ? entry : last + GAP + entry;
    if (last === undefined || (columnsOf(joined) > width && rows.length < mostRows)) rows.push(entry);
    else rows[rows.length - 1] = joined;
  }
  return rows;
}

/** A piece of the line long enough to see its dashes come again. */
function lineSample(level: GlyphLevel, seriesIndex: number): string {
  if (level === 'ascii') return letterOf(seriesIndex);
  const dashes = dashesAt(level, seriesIndex);
  const dots = dashes.reduce((sum, run) => sum + run, dashes[0] ?? 0);
  const columns = Math.max(4, Math.min(9, Math.ceil(level === 'braille' ? dots / 2 : dots)));
  const raster = new DotRaster(columns, 1, level);
  const row = level === 'braille' ? 1 : 0;
  raster.line([0, row], [raster.dotColumns - 1, row], dashes, 0, '');
  return Array.from({ length: columns }, (_, column) => raster.glyph(0, column))
    .join('')
    .trimEnd();
}
