import { describe, expect, it } from 'vitest';
import { abbeNumbers } from '../../src/selection/abbe-numbers.ts';
import { material, sources, survey } from './whole-catalogue.ts';

describe('Abbe numbers', () => {
  // Makers' catalogues, recalled for the crystals: N-BK7 and N-SF11 data sheets (Schott); fused silica of I. H. Malitson,
  // J. Opt. Soc. Am. 55, 1205 (1965); CaF2 of M. Daimon and A. Masumura, Appl. Opt. 41, 5275 (2002).
  it.each([
    ['n-bk7', 1.5168, 64.17, 63.96, 0.005],
    ['n-sf11', 1.78472, 25.68, 25.47, 0.005],
    ['fused-silica', 1.45846, 67.82, 67.67, 0.02],
    ['calcium-fluoride', 1.43385, 94.99, 94.45, 0.02],
  ])('of %s', (key, n_d, Vd, Ve, tolerance) => {
    const found = abbeNumbers(survey, material(key), 'isotropic');
    expect(found.n_d).toBeCloseTo(n_d, 5);
    expect(Math.abs((found.Vd ?? 0) - Vd)).toBeLessThanOrEqual(tolerance);
    expect(Math.abs((found.Ve ?? 0) - Ve)).toBeLessThanOrEqual(tolerance);
  });

  it('agree with every number that is printed for a recommended fit', () => {
    let tested = 0;
    for (const { key, fits } of sources) {
      for (const { recommended, abbe = [], axis } of fits) {
        if (!recommended) continue;
        const found = abbeNumbers(survey, material(key), axis);
        for (const { quantity, published, tolerance } of abbe) {
          if (quantity === 'VD') continue;
          const value = found[quantity];
          expect(Math.abs((value ?? 0) - published), `${key} ${quantity} ${value}`).toBeLessThanOrEqual(
            tolerance,
          );
          tested++;
        }
      }
    }
    expect(tested).toBeGreaterThan(200);
  });

  it('do not exist for gases, metals, single values and straight lines', () => {
    for (const key of ['nitrogen', 'gold', 'diiodomethane', 'zirconium-dioxide-film', 'germanium']) {
      expect(abbeNumbers(survey, material(key), 'isotropic').Vd, key).toBeNull();
    }
  });
});
