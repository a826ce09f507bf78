import { describe, expect, it } from 'vitest';
import {
  isLossless,
  opticsFromIndex,
  opticsFromPermittivity,
  refractiveIndex,
} from '../../src/interface/optics.ts';
import { complex, ONE } from '../../src/num/complex.ts';

describe('refractive index of permittivity and permeability', () => {
  // Veselago, Sov. Phys. Usp. 10, 509 (1968): negative where both are negative, no propagation where one is.
  it.each<[number, number, number, number]>([
    [2, 8, 4, 0],
    [-2, -8, -4, 0],
    [-2, 8, 0, 4],
    [2, -8, 0, 4],
  ])('eps = %d, mu = %d', (eps, mu, re, im) => {
    const n = refractiveIndex(complex(eps), complex(mu));
    expect(n.re).toBeCloseTo(re, 14);
    expect(n.im).toBeCloseTo(im, 14);
  });

  it('keeps the absorption of a backward wave', () => {
    const n = refractiveIndex(complex(-2, 0.1), complex(-8, 0.3));
    expect(n.re).toBeLessThan(0);
    expect(n.im).toBeGreaterThan(0);
    expect(n.re * n.re - n.im * n.im).toBeCloseTo(16 - 0.03, 12);
    expect(2 * n.re * n.im).toBeCloseTo(-2 * 0.3 - 8 * 0.1, 12);
  });
});

describe('lossless', () => {
  it('is what has real eps and mu and lets the wave propagate', () => {
    expect(isLossless(opticsFromPermittivity(complex(2), complex(3)))).toBe(true);
    expect(isLossless(opticsFromPermittivity(complex(-2), ONE))).toBe(false);
    expect(isLossless(opticsFromPermittivity(complex(2, 1e-9), ONE))).toBe(false);
    expect(isLossless(opticsFromPermittivity(complex(2), complex(1, 1e-9)))).toBe(false);
  });

  it('is not what has a real index with complex eps and mu', () => {
    expect(isLossless(opticsFromIndex(ONE, complex(1, 0.1)))).toBe(false);
  });
});
