import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { coherentStack } from '../../src/stack/coherent-stack.ts';
import { etalonFringes, etalonSpacing, etalonTransmittance, ghostRipple } from '../../src/stack/etalon.ts';
import { layerFromIndex, substanceFromIndex } from '../../src/stack/layered-path.ts';
import { slabFractions } from '../../src/stack/window.ts';
import { SPEED_OF_LIGHT_m_per_s as c } from '../../src/units/constants.ts';
import { between } from './random-path.ts';

const air = substanceFromIndex(1);

describe('etalon', () => {
  it('of an uncoated plate is the coherent stack, at any angle and polarization', () => {
    fc.assert(
      fc.property(
        between(1.3, 4),
        between(0, 1.2),
        between(1e-5, 1.1e-5),
        fc.constantFrom('s', 'p'),
        (n, angle, d, side) => {
          const wave = 1e-6;
          const face = coherentStack(
            { incidence: air, layers: [], exit: substanceFromIndex(n) },
            wave,
            angle,
          )[side];
          const fringes = etalonFringes({ R1: face.R, R2: face.R });
          const { roundTripPhase_rad } = etalonSpacing(d, n, n, Math.sin(angle), wave, null);
          const plate = coherentStack(
            { incidence: air, layers: [layerFromIndex(d, n)], exit: air },
            wave,
            angle,
          )[side];
          expect(etalonTransmittance(fringes, roundTripPhase_rad)).toBeCloseTo(plate.T, 11);
        },
      ),
    );
  });

  it('averages over the phase to the sum of intensities', () => {
    fc.assert(
      fc.property(between(0, 0.95), between(0, 0.95), between(0.1, 1), (R1, R2, tau) => {
        const fringes = etalonFringes({ R1, R2, internalTransmittance: tau });
        const steps = 2000;
        let sum = 0;
        for (let i = 0; i < steps; i++) sum += etalonTransmittance(fringes, (2 * Math.PI * i) / steps);
        expect(sum / steps).toBeCloseTo(slabFractions(R1, R2, tau).T, 10);
      }),
    );
  });

  it('the width is a half width: T at half a linewidth off the crest is half the maximum', () => {
    for (const R of [0.2, 0.3, 0.9, 0.999]) {
      const fringes = etalonFringes({ R1: R, R2: R });
      const finesse = fringes.finesseFromWidth;
      expect(finesse).not.toBeNull();
      expect(etalonTransmittance(fringes, Math.PI / (finesse ?? 1))).toBeCloseTo(fringes.T_max / 2, 9);
    }
    expect(etalonFringes({ R1: 0.17, R2: 0.17 }).finesseFromWidth).toBeNull();
    expect(etalonFringes({ R1: 0.172, R2: 0.172 }).finesseFromWidth).not.toBeNull();
  });

  it('mirror absorptance lowers the crest to (1 - A/(1 - R))^2', () => {
    const { T_max, T_min, contrast } = etalonFringes({ R1: 0.95, R2: 0.95, mirrorAbsorptance: 0.01 });
    expect(T_max).toBeCloseTo((1 - 0.01 / 0.05) ** 2, 13);
    expect(contrast).toBeCloseTo(T_max / T_min, 10);
    expect(etalonFringes({ R1: 1, R2: 0.9 }).contrast).toBeNull();
  });

  it('free spectral range: one order per step, dispersion and angle included', () => {
    const [d, angle, wave] = [1e-3, 0.7, 1e-6];
    const q = Math.sin(angle);
    // n(w) = 1.5 + 0.1 (w/w0 - 1): group index 1.6 at w0.
    const order = (x: number): number => {
      const n = 1.5 + 0.1 * (x - 1);
      return (2 * d * Math.sqrt(n * n - q * q) * x) / wave;
    };
    const spacing = etalonSpacing(d, 1.5, 1.6, q, wave, 100);
    const h = 1e-6;
    const perOmega = (order(1 + h) - order(1 - h)) / (2 * h);
    expect(spacing.freeSpectralRange_Hz / (c / wave / perOmega)).toBeCloseTo(1, 8);
    expect(spacing.order).toBeCloseTo(order(1), 9);
    expect(spacing.linewidth_Hz).toBeCloseTo(spacing.freeSpectralRange_Hz / 100, 3);
    expect(spacing.resolvingPower).toBeCloseTo((c / wave / spacing.freeSpectralRange_Hz) * 100, 6);
    expect(etalonSpacing(d, 1.5, 1.5, 0, wave, null).resolvingPower).toBeNull();
  });

  it('refuses what is no etalon', () => {
    expect(() => etalonFringes({ R1: 1.1, R2: 0.5 })).toThrow(/R1 is 1.1/);
    expect(() => etalonFringes({ R1: 0.9, R2: 0.5, mirrorAbsorptance: 0.2 })).toThrow(/R1 plus/);
    expect(() => etalonSpacing(0, 1.5, 1.5, 0, 1e-6, null)).toThrow(/no fringes/);
    expect(() => etalonSpacing(1e-3, 1, 1, 1.2, 1e-6, null)).toThrow(/totally reflected/);
    expect(() => ghostRipple(1)).toThrow(/no ghost/);
  });

  it('ripple of a ghost', () => {
    const { inPhase_dB, outOfPhase_dB, peakToPeak_dB } = ghostRipple(0.01);
    expect(inPhase_dB).toBeCloseTo(20 * Math.log10(1.1), 13);
    expect(outOfPhase_dB).toBeCloseTo(20 * Math.log10(0.9), 13);
    expect(peakToPeak_dB).toBeCloseTo(inPhase_dB - outOfPhase_dB, 13);
  });
});
