import { describe, expect, it } from 'vitest';
import {
  bandwidth_Hz,
  broadenedDuration_s,
  broadenedHalfWidth_s,
  gddForDuration_s2,
  PEAK_POWER_FACTOR,
  peakPower_W,
  TIME_BANDWIDTH,
  thirdOrderRatio,
  transformLimit_s,
} from '../../src/stack/pulse.ts';
import { StackRefusal } from '../../src/stack/stack-refusal.ts';
import { SPEED_OF_LIGHT_m_per_s as c } from '../../src/units/constants.ts';

/** Intensity of a pulse of unit FWHM, for numerical checks of the closed forms. */
const shapes = {
  gaussian: (t: number): number => Math.exp(-4 * Math.LN2 * t * t),
  sech2: (t: number): number => 1 / Math.cosh(2 * Math.log(1 + Math.SQRT2) * t) ** 2,
};

describe('pulse shapes', () => {
  it.each(['gaussian', 'sech2'] as const)('%s: energy 1 means a peak of the factor', (shape) => {
    let sum = 0;
    for (let i = -20000; i <= 20000; i++) sum += shapes[shape](i * 1e-3) * 1e-3;
    expect(1 / sum).toBeCloseTo(PEAK_POWER_FACTOR[shape], 10);
    expect(shapes[shape](0.5)).toBeCloseTo(0.5, 14);
    expect(peakPower_W(3, 2, shape)).toBeCloseTo((1.5 * 1) / sum, 9);
  });

  it.each(['gaussian', 'sech2'] as const)(
    '%s: time-bandwidth product from its Fourier transform',
    (shape) => {
      const spectrum = (nu: number): number => {
        let sum = 0;
        for (let i = -12000; i <= 12000; i++) {
          const t = i * 1e-3;
          sum += Math.sqrt(shapes[shape](t)) * Math.cos(2 * Math.PI * nu * t);
        }
        return sum * sum;
      };
      expect(spectrum(TIME_BANDWIDTH[shape] / 2) / spectrum(0)).toBeCloseTo(0.5, 9);
    },
  );

  it('square: sinc^2 at half its width is one half', () => {
    const x = (Math.PI * TIME_BANDWIDTH.square) / 2;
    expect((Math.sin(x) / x) ** 2).toBeCloseTo(0.5, 14);
  });
});

describe('dispersion', () => {
  it('broadening, its 1/e form and its inverse agree', () => {
    const [fwhm, gdd] = [1e-13, 3.6e-27];
    const out = broadenedDuration_s(fwhm, gdd);
    expect(out / (fwhm * Math.sqrt(1 + ((4 * Math.LN2 * gdd) / fwhm ** 2) ** 2))).toBeCloseTo(1, 13);
    const toHalf = 1 / (2 * Math.sqrt(Math.LN2));
    expect(broadenedHalfWidth_s(fwhm * toHalf, gdd) / (out * toHalf)).toBeCloseTo(1, 13);
    expect(gddForDuration_s2(fwhm, out) / gdd).toBeCloseTo(1, 12);
    expect(broadenedDuration_s(fwhm, -gdd)).toBe(out);
  });

  it('third order: ratio, absent, alone', () => {
    expect(thirdOrderRatio(1e-13, 1e-27, -2e-40)).toBeCloseTo(2, 12);
    expect(thirdOrderRatio(1e-13, 0, 0)).toBeNull();
    expect(thirdOrderRatio(1e-13, 0, 1e-42)).toBe(Number.POSITIVE_INFINITY);
  });

  it('bandwidth is the difference of the band edges', () => {
    expect(bandwidth_Hz(8e-7, 3e-8)).toBeCloseTo(c / 7.85e-7 - c / 8.15e-7, 0);
    expect(transformLimit_s(1e13, 'gaussian')).toBeCloseTo(0.44127e-13, 17);
  });

  it('refuses durations and widths that are none', () => {
    expect(() => broadenedDuration_s(0, 1)).toThrow(StackRefusal);
    expect(() => gddForDuration_s2(2e-13, 1e-13)).toThrow(/does not shorten/);
    expect(() => bandwidth_Hz(5e-7, 1e-6)).toThrow(StackRefusal);
    expect(() => transformLimit_s(0, 'sech2')).toThrow(StackRefusal);
  });
});
