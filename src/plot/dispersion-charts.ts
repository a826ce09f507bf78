/** The dispersion of several media as charts: their refractive indices in one, their group indices in another. */
import type { DispersionCurves } from '../answer/dispersion-curves.ts';
import type { Chart, ChartSeries } from './chart.ts';
import { type WaveQuantity, waveAxis } from './wave-axis.ts';

/** @param names short ones, in the order of the curves: they stand at the ends of the lines */
export function dispersionCharts(
  { span_m, curves }: DispersionCurves,
  names: readonly string[],
  waves_m: readonly number[],
  quantity: WaveQuantity,
): readonly Chart[] {
  const axis = waveAxis(span_m, quantity);
  const chart = (label: string, key: 'n' | 'groupIndex'): Chart => ({
    title: `${label.charAt(0).toUpperCase()}${label.slice(1)} of ${names.join(', ')}`,
    x: axis.chart,
    y: { label, unit: '', scale: 'linear', digits: 5 },
    series: curves
      .map(
        (curve, i): ChartSeries => ({
          label: names[i] ?? curve.name,
          x: curve.wavelength_m.map(axis.shown),
          y: curve[key],
        }),
      )
      .filter(({ y }) => Array.from(y).some(Number.isFinite)),
    marks: waves_m.map(axis.at),
  });
  const charts = [chart('refractive index', 'n'), chart('group index', 'groupIndex')];
  return charts.filter(({ series }) => series.length > 0);
}
