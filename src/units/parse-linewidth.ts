/**
 * Spectral width (FWHM) of a source: `0.1nm`, `2MHz`, `0.5cm-1`, `1meV`. Above 0. A width given as a wavelength belongs to
 * the wave it goes with; `linewidth_m` turns the others into one.
 */
import { ABOVE_ZERO, parseQuantity } from './parse-quantity.ts';
import { type WaveTolerance, wavelengthTolerance_m } from './parse-tolerance.ts';
import { WAVE_KINDS } from './parse-wave.ts';
import { isProblem, type Problem } from './problem.ts';

export type Linewidth = WaveTolerance;

export function parseLinewidth(text: string): Linewidth | Problem {
  const quantity = parseQuantity(text, {
    what: 'a spectral width',
    kinds: WAVE_KINDS,
    examples: '0.1nm, 2MHz or 0.5cm-1',
    unitNames: 'pm, nm, um, Hz to PHz, meV, eV and cm-1',
    range: ABOVE_ZERO,
  });
  if (isProblem(quantity)) return quantity;
  const { kind } = quantity.unit;
  return { kind: kind === 'length' ? 'wavelength' : kind, value: quantity.value_SI };
}

/** The width as an interval of wavelengths around the vacuum wavelength, to first order, in metres. */
export function linewidth_m(width: Linewidth, vacuumWavelength_m: number): number {
  return wavelengthTolerance_m(width, vacuumWavelength_m);
}
