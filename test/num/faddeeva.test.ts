import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import * as C from '../../src/num/complex.ts';
import { faddeeva, faddeevaJet } from '../../src/num/faddeeva.ts';
import { variable } from '../../src/num/jet.ts';
import { evenly } from '../helpers/evenly.ts';

/** M. Abramowitz, I. A. Stegun, Handbook of Mathematical Functions (1964), table 7.9: x, y, Re w, Im w (six decimals; from memory). */
const TABLE_7_9 = [
  [0, 0.1, 0.896457, 0],
  [0, 1, 0.427584, 0],
  [0.1, 0, 0.99005, 0.112089],
  [0.5, 0, 0.778801, 0.478925],
  [1, 0, 0.367879, 0.607158],
  [2, 0, 0.018316, 0.340026],
  [3, 0, 0.000123, 0.201157],
  [1, 1, 0.304744, 0.208219],
  [2, 2, 0.147953, 0.13118],
] as const;

/** exp(-z^2) erfc(-iz) in 60-digit arithmetic, rounded to 15 digits: x, y, Re w, Im w. */
const SIXTY_DIGITS: readonly (readonly [number, number, number, number])[] = [
  [0.0009, 0.0011, 0.99875918392384, 0.00101356315881102],
  [0.3, 0.02, 0.895486369184632, 0.308184454084069],
  [1.0228, 0.0002, 0.351319999938397, 0.604788516410773],
  [0.77, 0.5, 0.440549928274927, 0.308714021195711],
  [2.5, 0.001, 0.00206066785570855, 0.251713298504885],
  [3.9, 3.0, 0.0720610592814119, 0.0898264654761046],
  [6.1, 0.3, 0.00473300884429401, 0.0935435797767505],
  [0.2, 6.3, 0.0883819661213069, 0.0027392234972812],
  [6.49, 0.0005, 6.9513799022095e-6, 0.088003229566095],
  [6.6, 0.01, 0.00013425880979314, 0.0865001739127037],
  [4.7, 4.7, 0.0606751818882233, 0.0593192341799545],
  [12.0, 0.5, 0.0019762436764948, 0.0470975569622678],
  [100.0, 3.0, 0.000169129999670431, 0.0056371033117093],
  [1.5, -0.7, -0.381702254110164, 0.587868269708535],
  [3.0, -2.0, -0.0813390799286274, 0.121086162462998],
  [0.0, -1.25, 9.17364344748284, 0.0],
];

const coordinate = (max: number): fc.Arbitrary<number> => evenly(-max, max);

describe('Faddeeva function', () => {
  it.each(TABLE_7_9)('agrees with Abramowitz and Stegun at %d + %di', (x, y, re, im) => {
    const w = faddeeva({ re: x, im: y });
    expect(Math.abs(w.re - re)).toBeLessThanOrEqual(0.51e-6);
    expect(Math.abs(w.im - im)).toBeLessThanOrEqual(0.51e-6);
  });

  it.each(SIXTY_DIGITS)('is accurate to 1e-13 at %d + %di', (x, y, re, im) => {
    const w = faddeeva({ re: x, im: y });
    const size = Math.hypot(re, im);
    expect(Math.hypot(w.re - re, w.im - im) / size).toBeLessThan(1e-13);
  });

  it('has the symmetries w(-conj z) = conj w(z) and w(z) + w(-z) = 2 exp(-z^2)', () => {
    fc.assert(
      fc.property(coordinate(12), coordinate(5), (x, y) => {
        const w = faddeeva({ re: x, im: y });
        const mirrored = faddeeva({ re: -x, im: y });
        expect(mirrored.re).toBeCloseTo(w.re, 12 - Math.log10(1 + C.abs(w)));
        expect(mirrored.im).toBeCloseTo(-w.im, 12 - Math.log10(1 + C.abs(w)));
        const sum = C.add(w, faddeeva({ re: -x, im: -y }));
        const gauss = C.scale(C.exp(C.neg(C.mul({ re: x, im: y }, { re: x, im: y }))), 2);
        const error = C.abs(C.sub(sum, gauss));
        expect(error).toBeLessThan(1e-13 * Math.max(1, C.abs(gauss), C.abs(w)));
      }),
    );
  });

  it('is smooth where the algorithm changes over', () => {
    for (let angle = 0.02; angle < Math.PI; angle += 0.05) {
      const at = (r: number): C.Complex => faddeeva({ re: r * Math.cos(angle), im: r * Math.sin(angle) });
      const inside = at(6.5 * (1 - 1e-15));
      const outside = at(6.5 * (1 + 1e-15));
      expect(C.abs(C.sub(inside, outside)) / C.abs(outside)).toBeLessThan(1e-13);
    }
  });

  it('satisfies w = exp(-z^2) erfc(-iz) along the imaginary axis far out: w(iy) tends to 1/(sqrt(pi) y)', () => {
    const y = 1e6;
    expect(faddeeva({ re: 0, im: y }).re * Math.sqrt(Math.PI) * y).toBeCloseTo(1 - 0.5 / y ** 2, 14);
  });

  it('has jets that obey the differential equations w^(n+1) = -2 z w^(n) - 2 n w^(n-1)', () => {
    fc.assert(
      fc.property(coordinate(20), evenly(0.05, 12), (x, y) => {
        const jet = faddeevaJet({ re: variable(x), im: [y, 0, 0, 0] });
        const z = { re: x, im: y };
        const d = ([0, 1, 2, 3] as const).map((n) =>
          C.scale({ re: jet.re[n], im: jet.im[n] }, [1, 1, 2, 6][n] as number),
        ) as [C.Complex, C.Complex, C.Complex, C.Complex];
        const second = C.scale(C.add(C.mul(z, d[1]), d[0]), -2);
        const third = C.scale(C.add(C.mul(z, d[2]), C.scale(d[1], 2)), -2);
        // The right sides cancel by about |z|^2: that is their rounding, not the jet's.
        const room = 1e-14 * (1 + C.abs(z) ** 2);
        expect(C.abs(C.sub(d[2], second))).toBeLessThan(room * (C.abs(d[0]) + C.abs(z) * C.abs(d[1])));
        expect(C.abs(C.sub(d[3], third))).toBeLessThan(20 * room * (C.abs(d[1]) + C.abs(z) * C.abs(d[2])));
      }),
    );
  });

  // Abramowitz & Stegun 7.1.3, 7.1.20, 7.1.23: w(0) = 1, w' = -2 z w + 2 i/sqrt(pi), w(iy) = exp(y^2) erfc(y).
  it('has jets that begin with the function and its first derivative, in every quadrant, near and far', () => {
    for (const z of [
      { re: 0, im: 0 },
      { re: 1, im: 0.5 },
      { re: -2, im: 1 },
      { re: 0.3, im: -0.8 },
      { re: 2, im: -6.6 },
      { re: -8, im: 0.5 },
      { re: 5, im: 6 },
    ]) {
      const jet = faddeevaJet({ re: variable(z.re), im: [z.im, 0, 0, 0] });
      const w = faddeeva(z);
      expect({ re: jet.re[0], im: jet.im[0] }).toEqual(w);
      const first = C.add(C.scale(C.mul(z, w), -2), { re: 0, im: 2 / Math.sqrt(Math.PI) });
      const size = 1 + C.abs(z) * C.abs(w);
      expect(Math.abs(jet.re[1] - first.re)).toBeLessThan(1e-13 * size);
      expect(Math.abs(jet.im[1] - first.im)).toBeLessThan(1e-13 * size);
    }
  });

  it('keeps the real part exp(-x^2) on the real axis, however far, and is 1 at 0', () => {
    for (const x of [0, 0.5, 3, 6.4, 6.5, 7, 12, -9])
      expect(faddeeva({ re: x, im: 0 }).re / Math.exp(-x * x)).toBeCloseTo(1, x === 6.4 ? 2 : 9);
    expect(faddeeva({ re: 0, im: 0 })).toEqual(C.ONE);
  });

  it('grows as 2 exp(-z^2) below the real axis, far out too', () => {
    const z = { re: 1, im: -7 };
    const gauss = C.scale(C.exp(C.neg(C.mul(z, z))), 2);
    expect(C.abs(C.sub(faddeeva(z), gauss)) / C.abs(gauss)).toBeLessThan(1e-13);
  });

  it('does not overflow on the way where z^2 would', () => {
    const w = faddeeva({ re: 3e160, im: 4e160 });
    // i/(sqrt(pi) z)
    expect(w.re * 5e160 * Math.sqrt(Math.PI)).toBeCloseTo(0.8, 12);
    expect(w.im * 5e160 * Math.sqrt(Math.PI)).toBeCloseTo(0.6, 12);
  });

  it('keeps its digits beside the nodes of either sum: on the real axis Re w = exp(-x^2)', () => {
    const step = Math.sqrt(Math.PI / 12);
    for (let half = 1; half <= 12; half++) {
      for (const away of [-0.1, -1e-3, -1e-9, -1e-12, 0, 1e-12, 1e-9, 1e-3, 0.1]) {
        const x = (half / 2) * step + away;
        for (const y of [0, 1e-13])
          expect(Math.abs(faddeeva({ re: x, im: y }).re - Math.exp(-x * x))).toBeLessThan(2e-13);
      }
    }
  });

  // Abramowitz & Stegun 7.1.23, differentiated: w -> i/(sqrt(pi) z) (1 + 1/(2 z^2)).
  it('has third derivatives without cancellation far out', () => {
    for (const size of [1e2, 1e4, 1e8]) {
      const jet = faddeevaJet({ re: variable(0.6 * size), im: [0.8 * size, 0, 0, 0] });
      const z = { re: 0.6 * size, im: 0.8 * size };
      const z2 = C.mul(z, z);
      const leading = C.div({ re: 0, im: -1 / Math.sqrt(Math.PI) }, C.mul(z2, z2));
      const wanted = C.mul(leading, C.add(C.ONE, C.div({ re: 5, im: 0 }, z2)));
      const error = C.sub({ re: jet.re[3], im: jet.im[3] }, wanted);
      expect(C.abs(error) / C.abs(wanted)).toBeLessThan(1e-6);
    }
  });
});
