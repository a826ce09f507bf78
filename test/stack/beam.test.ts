import { describe, expect, it } from 'vitest';
import { radiationPressure_Pa } from '../../src/interface/energy.ts';
import { opticsFromIndex } from '../../src/interface/optics.ts';
import { complex, ONE } from '../../src/num/complex.ts';
import {
  apertureTransmittance,
  bIntegral_rad,
  footprint,
  nonlinearIndexFromEsu_m2_per_W,
  peakField_V_per_m,
  peakFluence_J_per_m2,
  peakIrradiance_W_per_m2,
  radiusForIrradiance_m,
  radiusFromFwhm_m,
} from '../../src/stack/beam.ts';
import { StackRefusal } from '../../src/stack/stack-refusal.ts';
import { SPEED_OF_LIGHT_m_per_s as c } from '../../src/units/constants.ts';

describe('beam', () => {
  it('a gaussian of peak irradiance carries its power', () => {
    const w = 1e-3;
    const peak = peakIrradiance_W_per_m2(2, w, 'gaussian');
    let power = 0;
    const step = w / 1000;
    for (let r = step / 2; r < 6 * w; r += step)
      power += peak * Math.exp((-2 * r * r) / (w * w)) * 2 * Math.PI * r * step;
    expect(power).toBeCloseTo(2, 5);
    let within = 0;
    for (let r = step / 2; r < 0.7 * w; r += step)
      within += peak * Math.exp((-2 * r * r) / (w * w)) * 2 * Math.PI * r * step;
    expect(within / 2).toBeCloseTo(apertureTransmittance(0.7 * w, w, 'gaussian'), 5);
  });

  it('flat top, fluence, radius and field', () => {
    expect(peakIrradiance_W_per_m2(1, 1, 'flat')).toBeCloseTo(1 / Math.PI, 14);
    expect(peakFluence_J_per_m2(1, 1, 'gaussian')).toBeCloseTo(2 / Math.PI, 14);
    expect(peakIrradiance_W_per_m2(3, radiusForIrradiance_m(3, 77, 'gaussian'), 'gaussian')).toBeCloseTo(
      77,
      11,
    );
    expect(apertureTransmittance(0.5, 1, 'flat')).toBeCloseTo(0.25, 14);
    expect(apertureTransmittance(2, 1, 'flat')).toBe(1);
    const w = radiusFromFwhm_m(1);
    expect(Math.exp((-2 * 0.25) / w ** 2)).toBeCloseTo(0.5, 14);
    expect(peakField_V_per_m(1000, 1.5) / peakField_V_per_m(1000)).toBeCloseTo(1 / Math.sqrt(1.5), 14);
  });

  it('footprint at 60 degrees is twice as long and half as bright', () => {
    const spot = footprint(1e-3, Math.PI / 3);
    expect(spot.alongRadius_m).toBeCloseTo(2e-3, 15);
    expect(spot.acrossRadius_m).toBe(1e-3);
    expect(spot.irradianceFactor).toBeCloseTo(0.5, 14);
  });

  it('B-integral adds stretches and uses the effective length', () => {
    const plain = { length_m: 0.01, nonlinearIndex_m2_per_W: 2.6e-20, irradiance_W_per_m2: 1e14 };
    const one = bIntegral_rad([plain], 8e-7);
    expect(one).toBeCloseTo((2 * Math.PI * 2.6e-20 * 1e14 * 0.01) / 8e-7, 12);
    expect(bIntegral_rad([plain, plain], 8e-7)).toBeCloseTo(2 * one, 12);
    const lossy = bIntegral_rad([{ ...plain, absorptionCoefficient_per_m: 100 }], 8e-7);
    expect(lossy / one).toBeCloseTo(1 - Math.exp(-1), 12);
    // 4.19e-3 n2[esu]/n0 in cm^2/W.
    expect(nonlinearIndexFromEsu_m2_per_W(1e-13, 1) * 1e4).toBeCloseTo(4.19e-16, 18);
  });

  it('refuses', () => {
    expect(() => peakIrradiance_W_per_m2(1, 0, 'flat')).toThrow(StackRefusal);
    expect(() => footprint(1, Math.PI / 2)).toThrow(StackRefusal);
    expect(() => apertureTransmittance(-1, 1, 'flat')).toThrow(StackRefusal);
    expect(() => radiusForIrradiance_m(0, 1, 'flat')).toThrow(StackRefusal);
  });
});

describe('radiation pressure on a body in vacuum', () => {
  it('black, mirror, transparent', () => {
    const vacuum = opticsFromIndex(ONE, ONE);
    const pressure_Pa = (angle_rad: number, R: number, T: number): number =>
      radiationPressure_Pa(vacuum, vacuum, complex(Math.cos(angle_rad)), R, T, angle_rad, c) ?? Number.NaN;
    expect(pressure_Pa(0, 0, 0)).toBeCloseTo(1, 14);
    expect(pressure_Pa(0, 1, 0)).toBeCloseTo(2, 14);
    expect(pressure_Pa(0.3, 0, 1)).toBeCloseTo(0, 14);
    // A mirror takes the momentum along the normal twice, on an area 1/cos as large.
    expect(pressure_Pa(0.3, 1, 0)).toBeCloseTo(2 * Math.cos(0.3) ** 2, 14);
  });
});
