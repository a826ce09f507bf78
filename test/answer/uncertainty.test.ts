import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { propagate } from '../../src/answer/uncertainty.ts';
import { ask, DEGREE, index, vacuumWave } from '../helpers/ask.ts';

const input = (name: string, u: number, at: (x: number) => number) => ({ name, standardUncertainty: u, at });

describe('propagate', () => {
  it('adds independent first-order parts in squares (GUM 5.1.2)', () => {
    const spread = propagate(0, [input('a', 3, (x) => x), input('b', 4, (x) => -x)])!;
    expect(spread.standardUncertainty).toBeCloseTo(5, 12);
    expect(spread.dominant).toBe('b');
  });

  it('keeps the second-order part where the slope vanishes: variance of x^2 is 2 u^4 for a normal x', () => {
    const spread = propagate(0, [input('x', 0.1, (x) => x * x)])!;
    expect(spread.standardUncertainty).toBeCloseTo(Math.SQRT2 * 0.01, 12);
  });

  it('is null without inputs', () => expect(propagate(1, [])).toBeNull());
});

describe('R_uncertainty', () => {
  it('is 4 n1 (n2 - n1)/(n1 + n2)^3 u(n2) at normal incidence (closed form)', () => {
    fc.assert(
      fc.property(fc.double({ min: 1.2, max: 4, noNaN: true }), (n) => {
        const u = 1e-6;
        const got = ask(index(1), index(n), vacuumWave(1e-6), { tolerances: { index: u } }).interface
          .R_uncertainty!;
        expect(Math.abs(got / ((4 * (n - 1)) / (n + 1) ** 3 / (1 / u)) - 1)).toBeLessThan(1e-6);
      }),
    );
  });

  it('follows the angle tolerance, and does not vanish at the Brewster angle', () => {
    const brewster = Math.atan(1.5);
    const at = (angle: number) =>
      ask(index(1), index(1.5), vacuumWave(1e-6), {
        incidenceAngle_rad: angle,
        polarization: 'p',
        tolerances: { angle_rad: 0.5 * DEGREE },
      }).interface;
    expect(at(brewster).R_uncertainty).toBeGreaterThan(1e-6);
    expect(at(1.2).R_uncertaintyFrom).toBe('angle of incidence');
    // Sampled: standard deviation of R_p over a normal distribution of angles around Brewster's, 20,001 quantile points.
    expect(at(brewster).R_uncertainty! / sampledSpread(brewster, 0.5 * DEGREE)).toBeGreaterThan(0.8);
    expect(at(brewster).R_uncertainty! / sampledSpread(brewster, 0.5 * DEGREE)).toBeLessThan(1.25);
  });

  it('is null where nothing is stated', () => {
    expect(ask(index(1), index(1.5), vacuumWave(1e-6)).interface.R_uncertainty).toBeNull();
  });
});

function sampledSpread(angle: number, u: number): number {
  let sum = 0;
  let sum2 = 0;
  let weight = 0;
  for (let z = -6; z <= 6; z += 0.01) {
    const w = Math.exp((-z * z) / 2);
    const R = ask(index(1), index(1.5), vacuumWave(1e-6), {
      incidenceAngle_rad: angle + z * u,
      polarization: 'p',
    }).interface.R;
    sum += w * R;
    sum2 += w * R * R;
    weight += w;
  }
  return Math.sqrt(sum2 / weight - (sum / weight) ** 2);
}
