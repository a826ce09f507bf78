import { describe, expect, it } from 'vitest';
import { mediumSide } from '../../src/answer/medium-side.ts';
import { axesOf } from '../../src/catalog/choose-fit.ts';
import { vacuumToAir_um } from '../../src/dispersion/air-index.ts';
import { isRefusal } from '../../src/medium/refusal.ts';
import {
  quickGroupIndex,
  quickGvd_s2_per_m,
  quickMedium,
  quickOptics,
} from '../../src/selection/quick-medium.ts';
import { survey } from './whole-catalogue.ts';

const WAVES_um = [0.193, 0.4, 0.5876, 0.6328, 1.064, 1.55, 3, 5, 10.6, 100, 3e4, 1e6];
const close = (a: number, b: number): boolean =>
  Math.abs(a - b) <= 1e-12 * Math.max(Math.abs(a), Math.abs(b));

describe('the quick way to an index', () => {
  it.each(WAVES_um)('agrees with the answer for every medium and axis at %d um', (vacuum_um) => {
    const wave = { vacuum_um, air_um: vacuumToAir_um(vacuum_um) };
    let reached = 0;
    for (const material of survey.materials) {
      for (const axis of axesOf(material)) {
        const quick = quickMedium(survey, material, axis, wave);
        const side = mediumSide({ kind: 'catalogue', material, axis }, wave, {}, false, survey.sourceOf);
        const name = `${material.key}:${axis}`;
        expect(quick === undefined, name).toBe(isRefusal(side));
        if (!quick || isRefusal(side)) continue;
        reached++;
        const { optics, absorptionKnown } = quickOptics(survey, quick);
        const { answer } = side;
        expect(quick.fit.id, name).toBe(answer.fit?.id);
        expect(close(quick.n, answer.n), name).toBe(true);
        expect(close(optics.n.im, answer.k), name).toBe(true);
        expect(close(optics.mu.re, answer.relativePermeability.re), name).toBe(true);
        expect(absorptionKnown, name).toBe(answer.absorptionCoefficient_per_m !== null);
        for (const [value, wanted] of [
          [quickGroupIndex(quick), answer.groupIndex],
          [quickGvd_s2_per_m(quick), answer.gvd_s2_per_m],
        ] as const) {
          expect(value === null, name).toBe(wanted === null);
          if (value !== null && wanted !== null) expect(close(value, wanted), name).toBe(true);
        }
      }
    }
    expect(reached).toBeGreaterThan(5);
  });

  it('passes the whole catalogue in well under 50 ms once it is bound', () => {
    const wave = { vacuum_um: 0.633, air_um: vacuumToAir_um(0.633) };
    const times = Array.from({ length: 5 }, () => {
      const started = performance.now();
      let found = 0;
      for (const material of survey.materials) {
        for (const axis of axesOf(material)) {
          const n = quickMedium(survey, material, axis, wave)?.n;
          if (n !== undefined && n > 1.37 && n < 1.39) found++;
        }
      }
      expect(found).toBeGreaterThan(0);
      return performance.now() - started;
    });
    expect(Math.min(...times)).toBeLessThan(50);
  });
});
