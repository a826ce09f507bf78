/** Charts with known curves: reflectance of glass against angle, the index of fused silica over two decades of wavelength. */
import type { Chart } from '../../src/plot/chart.ts';

const DEGREE = Math.PI / 180;
const INDEX = 1.5;

export function reflectances(angle_deg: number): { readonly s: number; readonly p: number } {
  const cosine = Math.cos(angle_deg * DEGREE);
  const beyond = Math.sqrt(INDEX * INDEX - Math.sin(angle_deg * DEGREE) ** 2);
  return {
    s: 100 * ((cosine - beyond) / (cosine + beyond)) ** 2,
    p: 100 * ((INDEX * INDEX * cosine - beyond) / (INDEX * INDEX * cosine + beyond)) ** 2,
  };
}

const angles = Array.from({ length: 181 }, (_, i) => i / 2);

export const ANGLE_CHART: Chart = {
  title: 'Reflectance',
  x: { label: 'angle of incidence', unit: '°', scale: 'linear' },
  y: { label: 'R', unit: '%', scale: 'linear' },
  series: [
    { label: 'R_s', x: angles, y: angles.map((angle) => reflectances(angle).s) },
    { label: 'R_p', x: angles, y: angles.map((angle) => reflectances(angle).p) },
  ],
  marks: [{ x: 56.309_932, label: 'Brewster 56.31°' }],
};

/** Malitson 1965, as a curve with the right shape; outside 0.21 to 3.71 µm it means nothing. */
export function silicaIndex(wavelength_um: number): number {
  const square = wavelength_um ** 2;
  return Math.sqrt(
    1 +
      (0.6961663 * square) / (square - 0.0684043 ** 2) +
      (0.4079426 * square) / (square - 0.1162414 ** 2) +
      (0.8974794 * square) / (square - 9.896161 ** 2),
  );
}

const wavelengths = Array.from({ length: 300 }, (_, i) => 0.2 * 40 ** (i / 299));

export const INDEX_CHART: Chart = {
  title: 'Fused silica',
  x: { label: 'vacuum wavelength', unit: 'µm', scale: 'log' },
  y: { label: 'n', unit: '', scale: 'linear', range: [1.3, 1.6], digits: 5 },
  series: [{ label: 'n', x: wavelengths, y: wavelengths.map(silicaIndex) }],
  hatched: [{ from: 3.71, to: 8, label: 'outside the fit' }],
};
