import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fresnel, fresnelAngleDerivative } from '../../src/interface/fresnel.ts';
import { type Optics, opticsFromIndex } from '../../src/interface/optics.ts';
import { pseudoBrewsterAngle } from '../../src/interface/pseudo-brewster.ts';
import { ONE } from '../../src/num/complex.ts';
import { evenly } from '../helpers/evenly.ts';
import { absorbing, losslessDielectric, losslessMagnetic, passiveMagnetic } from './arbitrary-media.ts';

const RIGHT_ANGLE = Math.PI / 2;
/** Even steps, and ever smaller ones towards grazing incidence. */
const ANGLES_rad = [
  ...Array.from({ length: 900 }, (_, i) => (i * RIGHT_ANGLE) / 900),
  ...Array.from({ length: 60 }, (_, i) => RIGHT_ANGLE - 0.002 * 0.7 ** i),
];
const Rp = (a: Optics, b: Optics, angle_rad: number): number => fresnel(a, b, angle_rad).Rp;

function expectLeast(a: Optics, b: Optics): void {
  const angle_rad = pseudoBrewsterAngle(a, b);
  const least = Math.min(...ANGLES_rad.map((x) => Rp(a, b, x)));
  if (angle_rad === null) expect(least).toBeGreaterThanOrEqual(Rp(a, b, 0) - 1e-13);
  else {
    expect(Rp(a, b, angle_rad)).toBeLessThanOrEqual(least + 1e-14);
    expect(angle_rad).toBeGreaterThan(0);
    expect(angle_rad).toBeLessThan(RIGHT_ANGLE);
  }
}

const ofIndex = (re: number, im: number) => opticsFromIndex({ re, im }, ONE);
const decades = (from: number, to: number) => evenly(from, to).map((x) => 10 ** x);

describe('the angle of least R_p', () => {
  it('has no lower point anywhere, from a transparent medium without magnetism', () => {
    fc.assert(fc.property(losslessDielectric, absorbing, expectLeast), { numRuns: 400 });
  });

  it('has no lower point for extreme constants: vacuum ultraviolet to radio metals', () => {
    const extreme = fc.tuple(decades(-2, 4), decades(-9, 4)).map(([n, k]) => ofIndex(n, k));
    fc.assert(fc.property(losslessDielectric, extreme, expectLeast), { numRuns: 400 });
  });

  it('makes the slope of R_p vanish, as the derivative of the law has it', () => {
    fc.assert(
      fc.property(losslessDielectric, absorbing, (a, b) => {
        const angle_rad = pseudoBrewsterAngle(a, b);
        fc.pre(angle_rad !== null && angle_rad < 1.57);
        const slope = (x: number): number => {
          const { rp } = fresnel(a, b, x);
          const { drp } = fresnelAngleDerivative(a, b, x);
          return rp.re * drp.re + rp.im * drp.im;
        };
        expect(slope(angle_rad * (1 - 1e-9))).toBeLessThanOrEqual(1e-14);
        expect(slope(angle_rad * (1 + 1e-9))).toBeGreaterThanOrEqual(-1e-14);
      }),
      { numRuns: 400 },
    );
  });

  it('agrees between the cubic and the scan', () => {
    fc.assert(
      fc.property(losslessDielectric, absorbing, (a, b) => {
        // A trace of magnetism sends the same pair to the scan.
        const nearly = { ...b, mu: { re: 1, im: 1e-15 } };
        const cubic = pseudoBrewsterAngle(a, b);
        const scan = pseudoBrewsterAngle(a, nearly);
        fc.pre(cubic !== null && scan !== null && Rp(a, b, cubic) < Rp(a, b, 0) - 1e-6 && cubic < 1.56);
        expect(scan).toBeCloseTo(cubic, 6);
      }),
      { numRuns: 200 },
    );
  });

  it('is found for magnetic and absorbing media of incidence too', () => {
    fc.assert(
      fc.property(losslessMagnetic, passiveMagnetic, (a, b) => {
        const angle_rad = pseudoBrewsterAngle(a, b);
        fc.pre(angle_rad !== null);
        const around = [-1e-4, 1e-4].map((d) => Rp(a, b, Math.min(angle_rad + d, RIGHT_ANGLE - 1e-9)));
        expect(Rp(a, b, angle_rad)).toBeLessThanOrEqual(Math.min(...around) + 1e-14);
      }),
      { numRuns: 200 },
    );
  });

  it('is that of the trade for metals: gold and silver in the visible, by their n and k', () => {
    // tan(theta) ~ |n| for strong reflectors; exact by the law at hand, so the bound is that of the rule of thumb.
    for (const [n, k] of [
      [0.18, 3.45],
      [0.06, 4.28],
    ] as const) {
      const angle_rad = pseudoBrewsterAngle(ofIndex(1, 0), ofIndex(n, k));
      expect(Math.abs((angle_rad ?? 0) - Math.atan(Math.hypot(n, k)))).toBeLessThan(0.03);
    }
  });

  it('is none where nothing absorbs and all returns', () => {
    expect(pseudoBrewsterAngle(ofIndex(1, 0), ofIndex(0, 3))).toBeNull();
  });
});
