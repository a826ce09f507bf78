import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { propagateAll, type Spread } from '../../src/answer/uncertainty.ts';
import { ask, DEGREE, index, vacuumWave } from '../helpers/ask.ts';

const input = (name: string, standardUncertainty: number) => ({ name, standardUncertainty });
const spread = (
  value: number,
  inputs: readonly ReturnType<typeof input>[],
  f: (...x: readonly number[]) => number,
): Spread => {
  const [only] = propagateAll([value], inputs, (shifts) => [f(...shifts)]);
  if (!only) throw new Error('no spread');
  return only;
};

describe('propagateAll', () => {
  it('adds independent first-order parts in squares (GUM 5.1.2)', () => {
    const got = spread(0, [input('a', 3), input('b', 4)], (a = 0, b = 0) => a - b);
    expect(got.standardUncertainty).toBeCloseTo(5, 12);
    expect(got.dominant).toBe('b');
    expect(got.method).toBe('expansion');
  });

  it('names the inputs that contribute most together where they share a name', () => {
    const three = [input('thickness', 3), input('wave', 4), input('thickness', 3)];
    expect(spread(0, three, (a = 0, b = 0, c = 0) => a + b + c).dominant).toBe('thickness');
  });

  it('keeps the second-order part where the slope vanishes: variance of x^2 is 2 u^4 for a normal x', () => {
    const got = spread(0, [input('x', 0.1)], (x = 0) => x * x);
    expect(got.standardUncertainty).toBeCloseTo(Math.SQRT2 * 0.01, 12);
    expect(got.method).toBe('expansion');
  });

  it('samples where the expansion fails: sin^2 over many fringes has mean 1/2 and variance 1/8', () => {
    const got = spread(0, [input('x', 40)], (x = 0) => Math.sin(x) ** 2);
    expect(got.method).toBe('sampled');
    expect(got.mean).toBeCloseTo(0.5, 1);
    expect(got.standardUncertainty / Math.sqrt(1 / 8)).toBeCloseTo(1, 1);
  });

  it('does not count fringes twice where two inputs run through them', () => {
    const got = spread(0, [input('x', 40), input('y', 30)], (x = 0, y = 0) => Math.sin(x + y) ** 2);
    expect(got.standardUncertainty / Math.sqrt(1 / 8)).toBeCloseTo(1, 1);
  });

  it('sees a fringe that ends where it began at one standard uncertainty', () => {
    const got = spread(0, [input('x', Math.PI)], (x = 0) => Math.sin(x) ** 2);
    expect(got.method).toBe('sampled');
    // Normal x of standard deviation pi: mean (1 - exp(-2 pi^2))/2, variance (1 + exp(-8 pi^2) - 2 exp(-4 pi^2))/8.
    expect(got.standardUncertainty / Math.sqrt(1 / 8)).toBeCloseTo(1, 1);
  });

  it('agrees with the exact moments of exp(x): mean exp(u^2/2), variance (exp(u^2) - 1) exp(u^2)', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 1, noNaN: true }), (u) => {
        const got = spread(1, [input('x', u)], (x = 0) => Math.exp(x));
        const exact = Math.sqrt(Math.expm1(u * u) * Math.exp(u * u));
        expect(got.standardUncertainty / exact).toBeGreaterThan(0.89);
        expect(got.standardUncertainty / exact).toBeLessThan(1.1);
      }),
    );
  });

  it('is null without inputs', () => expect(propagateAll([1], [], () => [1])).toEqual([null]));
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
