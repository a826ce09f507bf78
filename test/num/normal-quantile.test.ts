import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { normalQuantile } from '../../src/num/normal-quantile.ts';
import { spreadSequence } from '../../src/num/spread-sequence.ts';

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
      fc.property(fc.double({ min: -5, max: 5, noNaN: true }), (x) => {
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
});
