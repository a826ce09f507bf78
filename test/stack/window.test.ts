import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { substanceFromIndex } from '../../src/stack/layered-path.ts';
import { mixedStack } from '../../src/stack/mixed-stack.ts';
import {
  absorptionCoefficient_per_m,
  absorptionFromThicknesses_per_m,
  insertionLoss_dB,
  internalTransmittance,
  plateStackTransmittance,
  slabFractions,
  windowFractions,
} from '../../src/stack/window.ts';
import { angle_rad, between, logarithmic, wavelength_m } from './random-path.ts';

const sides = ['s', 'p'] as const;
const air = substanceFromIndex(1);
const loss = fc.oneof(fc.constant(0), logarithmic(1e-12, 1));

describe('windowFractions', () => {
  it('agrees with the mixed stack, absorbing plates and different media in front and behind included', () => {
    fc.assert(
      fc.property(
        between(1, 2),
        between(1, 4),
        loss,
        between(1, 4),
        loss,
        wavelength_m,
        angle_rad,
        logarithmic(1.5, 300),
        (n0, n, k, nExit, kExit, wave, angle, waves) => {
          const before = substanceFromIndex(n0);
          const plate = substanceFromIndex(n, k);
          const after = substanceFromIndex(nExit, kExit);
          const thickness_m = waves * wave;
          const closed = windowFractions(before, plate, thickness_m, after, wave, angle);
          const mixed = mixedStack(
            { incidence: before, layers: [{ ...plate, thickness_m, coherent: false }], exit: after },
            wave,
            angle,
            0,
          );
          fc.pre(mixed.layers[0]?.coherent === false);
          for (const side of sides) {
            // Near grazing incidence between nearly equal indices the two round kappa^2 = eps mu - q^2 differently.
            expect(closed[side].R).toBeCloseTo(mixed[side].R, 9);
            expect(closed[side].T).toBeCloseTo(mixed[side].T, 9);
            expect(closed[side].A).toBeCloseTo(mixed[side].A, 9);
            expect(closed[side].R + closed[side].T + closed[side].A).toBeCloseTo(1, 11);
          }
        },
      ),
    );
  });

  it('adds up to one where a strong absorber lets forward and backward wave beat', () => {
    fc.assert(
      fc.property(
        between(1.2, 4),
        between(0.01, 0.3),
        between(1, 4),
        between(1, 4),
        angle_rad,
        (n, k, nExit, waves, angle) => {
          const { s, p } = windowFractions(
            air,
            substanceFromIndex(n, k),
            waves * 1e-6,
            substanceFromIndex(nExit),
            1e-6,
            angle,
          );
          expect(s.R + s.T + s.A).toBeCloseTo(1, 12);
          expect(p.R + p.T + p.A).toBeCloseTo(1, 12);
        },
      ),
    );
  });

  it('is the sum of its beams', () => {
    const { s, p, unpolarized } = windowFractions(
      air,
      substanceFromIndex(3.4, 1e-6),
      1e-3,
      air,
      1e-6,
      0.8,
      60,
    );
    for (const one of [s, p, unpolarized]) {
      expect(one.transmittedBeams.reduce((a, b) => a + b, 0)).toBeCloseTo(one.T, 12);
      expect(one.reflectedBeams.reduce((a, b) => a + b, 0)).toBeCloseTo(one.R, 12);
    }
    expect(s.transmittedBeams[1]).toBeCloseTo(
      (s.transmittedBeams[0] ?? 0) * s.R1 * s.R2 * s.internalTransmittance ** 2,
      14,
    );
  });

  it('vanishing reflection at Brewster in p, none between equal media', () => {
    const brewster = windowFractions(air, substanceFromIndex(1.5), 1e-3, air, 1e-6, Math.atan(1.5));
    expect(brewster.p.R).toBeLessThan(1e-25);
    const none = windowFractions(air, air, 1e-3, air, 1e-6, 0.4);
    expect(none.s.R).toBe(0);
    expect(none.s.T).toBeCloseTo(1, 15);
  });

  it('stays a number at the critical angle of the plate', () => {
    const prism = substanceFromIndex(2);
    const { s, p } = windowFractions(prism, air, 1e-3, prism, 5e-7, Math.asin(0.5));
    for (const one of [s, p]) {
      expect(one.R).toBeGreaterThan(0.999);
      expect(one.R + one.T).toBeCloseTo(1, 9);
    }
  });
});

describe('slabFractions', () => {
  it('adds up to one and agrees with the transparent window', () => {
    fc.assert(
      fc.property(between(0, 0.99), between(0, 0.99), between(0, 1), (R1, R2, tau) => {
        const { R, T, A } = slabFractions(R1, R2, tau);
        expect(R + T + A).toBeCloseTo(1, 13);
        expect(A).toBeGreaterThanOrEqual(0);
      }),
    );
    const { s } = windowFractions(air, substanceFromIndex(1.5), 1e-3, substanceFromIndex(1.33), 6e-7, 0.5);
    const closed = slabFractions(s.R1, s.R2, 1);
    expect(s.R).toBeCloseTo(closed.R, 14);
    expect(s.T).toBeCloseTo(closed.T, 14);
  });

  it('refuses what is no power fraction', () => {
    expect(() => slabFractions(1.2, 0, 1)).toThrow(/no plate/);
    expect(() => slabFractions(1, 1, 1)).toThrow(/no plate/);
  });
});

describe('losses', () => {
  it('decibels, null where nothing comes through', () => {
    expect(insertionLoss_dB(0.1)).toBeCloseTo(10, 14);
    expect(Object.is(insertionLoss_dB(1), 0)).toBe(true);
    expect(insertionLoss_dB(0)).toBeNull();
  });

  it('absorption coefficient, internal transmittance, and back from two thicknesses', () => {
    const alpha = absorptionCoefficient_per_m(1e-6, 1e-6);
    expect(alpha).toBeCloseTo(4 * Math.PI, 12);
    const [thin, thick] = [internalTransmittance(alpha, 0.01), internalTransmittance(alpha, 0.03)];
    expect(absorptionFromThicknesses_per_m(thin * 0.9, thick * 0.9, 0.02)).toBeCloseTo(alpha, 11);
  });

  it('one plate of the Stokes pile is the slab', () => {
    expect(plateStackTransmittance(0.04, 1)).toBeCloseTo(slabFractions(0.04, 0.04, 1).T, 14);
  });
});
