/** The residuals of a fit over the wavelength as points beside the line of 0, in the characters the terminal has. */
import type { FittedPoint } from '../../catalog/fit-points.ts';
import { brailleChart } from '../../plot/braille-chart.ts';
import type { Chart } from '../../plot/chart.ts';
import type { GlyphLevel } from '../../term/ability.ts';
import { superscript } from '../../units/number-style.ts';
import { PAGE_WIDTH } from './page.ts';

const HEIGHT = 13;
/** Ends of the axis between which ticks fall well. */
const ROUND = [1, 2, 5];

/** No lines where the formula meets every point to the last bit. */
export function residualChart(points: readonly FittedPoint[], level: GlyphLevel): readonly string[] {
  const largest = points.reduce((most, p) => Math.max(most, Math.abs(p.residual_n)), 0);
  if (!(largest > 0)) return [];
  const power = Math.floor(Math.log10(largest));
  const unit = level === 'ascii' ? `1e${power}` : `10${superscript(power)}`;
  const x: number[] = [];
  const y: number[] = [];
  for (const { wavelength_um, residual_n } of points) {
    // A gap after each point: residuals are not joined.
    x.push(wavelength_um, Number.NaN);
    y.push(residual_n * 10 ** -power, Number.NaN);
  }
  // The line of 0, in the same series: two would ask for a legend. In ASCII it would look like points.
  if (level !== 'ascii') {
    x.push(points[0]?.wavelength_um ?? 0, points.at(-1)?.wavelength_um ?? 0);
    y.push(0, 0);
  }
  const top = ROUND.find((end) => end >= largest * 10 ** -power) ?? 10;
  const chart: Chart = {
    title: 'residuals',
    x: { label: 'wavelength', unit: 'µm', scale: 'linear' },
    y: { label: 'measured less fitted', unit, scale: 'linear', range: [-top, top] },
    series: [{ label: '', x, y }],
  };
  return brailleChart(chart, { width: PAGE_WIDTH, height: HEIGHT, level });
}
