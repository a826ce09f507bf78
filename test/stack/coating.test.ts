import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { complex } from '../../src/num/complex.ts';
import {
  type DispersiveFilm,
  filmReflectance,
  idealFilmIndex,
  lowReflectanceBand,
  quarterWaveFilmReflectance,
  quarterWaveThickness_m,
  twoLayerCoating,
} from '../../src/stack/coating.ts';
import { coherentStack } from '../../src/stack/coherent-stack.ts';
import { layerFromIndex, substanceFromIndex } from '../../src/stack/layered-path.ts';
import { StackRefusal } from '../../src/stack/stack-refusal.ts';
import { between } from './random-path.ts';

const film = (thickness_m: number): DispersiveFilm => ({
  outside: () => 1,
  film: () => complex(1.38),
  substrate: () => complex(1.52),
  thickness_m,
});

describe('one film', () => {
  it('of the ideal index reflects nothing, of any other what the closed form says', () => {
    fc.assert(
      fc.property(between(1, 2), between(1.1, 4), between(1, 4), (n0, nf, ns) => {
        const wave = 6e-7;
        const R = (index: number): number =>
          coherentStack(
            {
              incidence: substanceFromIndex(n0),
              layers: [layerFromIndex(quarterWaveThickness_m(wave, index), index)],
              exit: substanceFromIndex(ns),
            },
            wave,
            0,
          ).s.R;
        expect(R(nf)).toBeCloseTo(quarterWaveFilmReflectance(n0, nf, ns), 13);
        expect(R(idealFilmIndex(n0, ns))).toBeLessThan(1e-25);
      }),
    );
  });

  it('a quarter wave at an angle is thicker by 1/cos inside', () => {
    const q = Math.sin(0.8);
    const inside = Math.asin(q / 1.38);
    expect(quarterWaveThickness_m(5e-7, 1.38, q)).toBeCloseTo(5e-7 / (4 * 1.38 * Math.cos(inside)), 20);
    expect(() => quarterWaveThickness_m(5e-7, 1.2, 1.3)).toThrow(StackRefusal);
  });

  it('refuses indices that are none', () => {
    for (const n of [0, -1, Number.NaN, Number.POSITIVE_INFINITY]) {
      expect(() => idealFilmIndex(1, n)).toThrow(StackRefusal);
    }
  });
});

describe('lowReflectanceBand', () => {
  const wave = 5.5e-7;
  const coating = film(quarterWaveThickness_m(wave, 1.38));
  const range = { from_m: 3e-7, to_m: 2e-6 };

  it('ends where the reflectance reaches the limit', () => {
    const R = (w: number): number => filmReflectance(coating, w);
    const band = lowReflectanceBand(R, wave, 0.02, range);
    expect(band).not.toBeNull();
    if (!band) return;
    expect(band.openBelow || band.openAbove).toBe(false);
    expect(R(band.from_m)).toBeCloseTo(0.02, 9);
    expect(R(band.to_m)).toBeCloseTo(0.02, 9);
    expect(R(band.from_m * (1 - 1e-9))).toBeGreaterThan(0.02);
    expect(R(band.to_m * (1 + 1e-9))).toBeGreaterThan(0.02);
    // Symmetric in frequency for a film without dispersion.
    expect(1 / band.from_m + 1 / band.to_m).toBeCloseTo(2 / wave, -1);
  });

  it('is open where the range ends first, and null where the limit is passed from the start', () => {
    const bare = lowReflectanceBand((w) => filmReflectance(coating, w), wave, 0.5, range);
    expect(bare).toEqual({ ...range, openBelow: true, openAbove: true });
    expect(lowReflectanceBand((w) => filmReflectance(coating, w), wave, 0.01, range)).toBeNull();
    expect(() => lowReflectanceBand(() => 0, 1, 0.1, range)).toThrow(StackRefusal);
  });

  it('follows angle, polarization and dispersion', () => {
    const glass = { ...coating, substrate: (w: number) => complex(1.5 + 5e-15 / w ** 2) };
    const R = (w: number): number => filmReflectance(glass, w, 0.5, 's');
    const band = lowReflectanceBand(R, wave, 0.025, range);
    expect(R(band?.to_m ?? 0)).toBeCloseTo(0.025, 9);
    expect(filmReflectance(glass, wave, 0.5)).toBeCloseTo(
      (filmReflectance(glass, wave, 0.5, 's') + filmReflectance(glass, wave, 0.5, 'p')) / 2,
      14,
    );
  });
});

describe('twoLayerCoating', () => {
  it('both solutions are zeros of the stack, or there is no zero at all', () => {
    let solved = 0;
    let refused = 0;
    fc.assert(
      fc.property(between(1, 2), between(1.2, 3), between(1.2, 3), between(1.2, 4), (n0, n1, n2, ns) => {
        const wave = 1e-6;
        const R = (d1: number, d2: number): number =>
          coherentStack(
            {
              incidence: substanceFromIndex(n0),
              layers: [layerFromIndex(d1, n1), layerFromIndex(d2, n2)],
              exit: substanceFromIndex(ns),
            },
            wave,
            0,
          ).s.R;
        try {
          const solutions = twoLayerCoating(n0, n1, n2, ns, wave);
          solved++;
          for (const { outerThickness_m, innerThickness_m, outerWaves, innerWaves } of solutions) {
            expect(R(outerThickness_m, innerThickness_m)).toBeLessThan(1e-20);
            expect(outerWaves).toBeGreaterThanOrEqual(0);
            expect(outerWaves).toBeLessThanOrEqual(0.5);
            expect(innerWaves).toBeGreaterThanOrEqual(0);
            expect(innerWaves).toBeLessThanOrEqual(0.5);
            expect(outerThickness_m).toBeCloseTo((outerWaves * wave) / n1, 18);
          }
          const [a, b] = solutions;
          expect(a.outerThickness_m + a.innerThickness_m).toBeLessThanOrEqual(
            b.outerThickness_m + b.innerThickness_m,
          );
        } catch (error) {
          if (!(error instanceof StackRefusal)) throw error;
          refused++;
          // No pair of thicknesses comes near zero.
          let least = 1;
          for (let i = 0; i < 30; i++) {
            for (let j = 0; j < 30; j++) {
              least = Math.min(least, R((i / 60) * (wave / n1), (j / 60) * (wave / n2)));
            }
          }
          expect(least).toBeGreaterThan(0);
        }
      }),
      { numRuns: 60, seed: 7 },
    );
    expect(Math.min(solved, refused)).toBeGreaterThan(5);
  });

  it('the pair of quarter waves where n1^2 ns = n0 n2^2', () => {
    const [a, b] = twoLayerCoating(1, 1.4, 1.4 * Math.sqrt(1.5), 1.5, 1e-6);
    for (const x of [a, b]) {
      expect(x.outerWaves).toBeCloseTo(0.25, 6);
      expect(x.innerWaves).toBeCloseTo(0.25, 6);
    }
  });

  it('an outer layer that is ideal by itself needs no inner one', () => {
    const [a] = twoLayerCoating(1, 1.5, 2, 2.25, 1e-6);
    expect(a.outerWaves).toBe(0.25);
    expect(a.innerWaves).toBe(0);
  });

  it('says what would be right where it refuses', () => {
    try {
      twoLayerCoating(1, 1.38, 1.6, 1.5, 1e-6);
      expect.unreachable();
    } catch (error) {
      expect((error as StackRefusal).code).toBe('no-two-layer-coating');
      expect((error as StackRefusal).remedy).toBe('take an inner index below 1.225 or above 1.690');
    }
    expect(() => twoLayerCoating(1, 1.38, 1.7, 1.5, 1e-6)).not.toThrow();
    expect(() => twoLayerCoating(1, 1.38, 1.2, 1.5, 1e-6)).not.toThrow();
  });
});
