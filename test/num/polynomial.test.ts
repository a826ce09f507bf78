import { describe, expect, it } from 'vitest';
import { polynomial } from '../../src/num/polynomial.ts';

describe('polynomial', () => {
  it('starts with the constant term', () => {
    expect(polynomial([], 3)).toBe(0);
    expect(polynomial([5], 3)).toBe(5);
    expect(polynomial([5, 7], 3)).toBe(26);
    expect(polynomial([1, -2, 0, 4], 0.5)).toBe(0.5);
  });

  // Binomial theorem.
  it('of the binomial coefficients is a power', () => {
    expect(polynomial([1, 5, 10, 10, 5, 1], 0.25)).toBeCloseTo(1.25 ** 5, 14);
  });
});
