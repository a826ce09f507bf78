import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { normalQuantile } from '../../src/num/normal-quantile.ts';
import { spreadSequence } from '../../src/num/spread-sequence.ts';
import { evenly } from '../helpers/evenly.ts';

/** Standard normal distribution function by Simpson's rule from 0. */
function distribution(x: number): number {
  const steps = 2000;
  const h = x / steps;
  const density = (t: number): number => Math.exp((-t * t) / 2) / Math.sqrt(2 * Math.PI);
  let sum = density(0) + density(x);
  for (let i = 1; i < steps; i++) sum += (i % 2 === 1 ? 4 : 2) * density(i * h);
  return 0.5 + (sum * h) / 3;
}

describe('normalQuantile', () => {
  it('inverts the distribution function', () => {
    fc.assert(
      fc.property(evenly(-5, 5), (x) => {
        expect(Math.abs(normalQuantile(distribution(x)) - x)).toBeLessThan(
          1e-6 * (1 + Math.exp(x * x * 0.3)),
        );
      }),
    );
  });

  it('knows the quantiles of every table (common practice)', () => {
    expect(normalQuantile(0.5)).toBe(0);
    expect(normalQuantile(0.975)).toBeCloseTo(1.959964, 6);
    expect(normalQuantile(0.995)).toBeCloseTo(2.575829, 6);
    expect(normalQuantile(1e-9)).toBeCloseTo(-5.997807, 5);
    expect(normalQuantile(1e-15)).toBeCloseTo(-7.941345, 5);
  });

  it('is odd about one half, infinite at the ends', () => {
    for (const p of [0.03, 0.06, 0.08, 0.3, 0.45])
      expect(normalQuantile(1 - p)).toBeCloseTo(-normalQuantile(p), 12);
    expect(normalQuantile(0)).toBe(Number.NEGATIVE_INFINITY);
    expect(normalQuantile(1)).toBe(Number.POSITIVE_INFINITY);
  });

  // Algorithm AS 241 itself: about 7 digits wherever the argument.
  it('keeps seven digits far out: the tail is exp(-x^2/2)/(x sqrt(2 pi)) (1 - 1/x^2 + 3/x^4 - 15/x^6 + 105/x^8)', () => {
    for (const x of [6, 7, 8, 12, 20, 30]) {
      const series = 1 - 1 / x ** 2 + 3 / x ** 4 - 15 / x ** 6 + 105 / x ** 8 - 945 / x ** 10;
      const tail = (Math.exp((-x * x) / 2) / (x * Math.sqrt(2 * Math.PI))) * series;
      expect(Math.abs(normalQuantile(tail) + x) / x).toBeLessThan(x < 8 ? 1e-5 : 5e-7);
    }
  });

  it('keeps seven digits within: the distribution function, summed by Simpson, returns', () => {
    for (let x = -3; x <= 3; x += 0.125)
      expect(Math.abs(normalQuantile(distribution(x)) - x)).toBeLessThan(5e-7 * Math.max(1, Math.abs(x)));
  });
});

describe('spreadSequence', () => {
  it('fills the unit cube evenly: the mean of every coordinate and of every product is that of a uniform one', () => {
    for (const dimension of [1, 2, 5, 8]) {
      const at = spreadSequence(dimension);
      const points = Array.from({ length: 1024 }, (_, i) => at(i));
      const mean = (f: (p: Float64Array) => number): number => points.reduce((s, p) => s + f(p), 0) / 1024;
      for (let j = 0; j < dimension; j++) {
        expect(mean((p) => p[j] as number)).toBeCloseTo(0.5, 2);
        for (let k = 0; k < j; k++) {
          expect(Math.abs(mean((p) => (p[j] as number) * (p[k] as number)) - 0.25)).toBeLessThan(0.02);
        }
      }
    }
  });

  it('steps by the golden ratio on a line and by powers of the plastic number, root of x^3 = x + 1, in a plane', () => {
    expect(spreadSequence(1)(0)[0]).toBeCloseTo(0.6180339887 - 0.5, 9);
    expect(spreadSequence(1)(1)[0]).toBeCloseTo((0.5 + 2 * 0.6180339887) % 1, 9);
    const plastic = 1.324717957244746;
    const [x, y] = spreadSequence(2)(0);
    expect(x).toBeCloseTo((0.5 + 1 / plastic) % 1, 12);
    expect(y).toBeCloseTo((0.5 + 1 / plastic ** 2) % 1, 12);
  });
});
