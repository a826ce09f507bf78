import { describe, expect, it } from 'vitest';
import { mediumSide } from '../../src/answer/medium-side.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { vacuumToAir_um } from '../../src/dispersion/air-index.ts';
import { JET_LENGTH, K } from '../../src/dispersion/evaluator.ts';
import { bindAbsorption } from '../../src/medium/absorption.ts';
import { isRefusal } from '../../src/medium/refusal.ts';

const row = (wavelength_um: number, alpha_per_cm: number) => ({
  wavelength_um,
  alpha_per_cm,
  source: 'test',
});

/** Absorption coefficient per cm at a wave; undefined where nothing is known. */
function alphaAt(rows: Parameters<typeof bindAbsorption>[0], wavelength_um: number): number | undefined {
  const jet = new Float64Array(JET_LENGTH);
  return bindAbsorption(rows)(wavelength_um, jet)
    ? ((4 * Math.PI * (jet[K] ?? 0)) / wavelength_um) * 1e4
    : undefined;
}

describe('absorption between measured rows', () => {
  it('runs in the logarithm of alpha', () => {
    const rows = [row(1, 0.01), row(2, 1)];
    expect(alphaAt(rows, 1)).toBeCloseTo(0.01, 12);
    expect(alphaAt(rows, 1.5)).toBeCloseTo(0.1, 12);
    expect(alphaAt(rows, 2.01)).toBeUndefined();
  });

  it('draws no line across an absorption edge, and keeps each row for its own wave', () => {
    const rows = [row(0.3, 1e6), row(10.6, 0.03), row(12, 0.1)];
    expect(alphaAt(rows, 4)).toBeUndefined();
    expect(alphaAt(rows, 10)).toBeUndefined();
    expect(alphaAt(rows, 10.59)).toBeCloseTo(0.03, 12);
    expect(alphaAt(rows, 0.3)).toBeCloseTo(1e6, 3);
    expect(alphaAt(rows, 11)).toBeGreaterThan(0.03);
  });

  it('runs straight between no absorption and some', () => {
    expect(alphaAt([row(1, 0), row(2, 0.01)], 1.5)).toBeCloseTo(0.005, 12);
  });

  it('does not take germanium for opaque in the band it is bought for (2 um to 14 um, common practice)', () => {
    const catalogue = catalogueFromSources();
    const material = catalogue.material('germanium');
    if (!material) throw new Error('no germanium');
    for (const vacuum_um of [3, 4, 5, 8, 10, 10.6]) {
      const wave = { vacuum_um, air_um: vacuumToAir_um(vacuum_um) };
      const side = mediumSide({ kind: 'catalogue', material }, wave, {}, false, (id) => catalogue.source(id));
      if (isRefusal(side)) throw new Error(side.message);
      const alpha = side.answer.absorptionCoefficient_per_m;
      expect(alpha === null || alpha < 10, `${vacuum_um} um`).toBe(true);
    }
  });
});
