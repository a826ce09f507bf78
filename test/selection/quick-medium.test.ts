import { describe, expect, it } from 'vitest';
import { mediumSide } from '../../src/answer/medium-side.ts';
import { axesOf } from '../../src/catalog/choose-fit.ts';
import type { Fit } from '../../src/catalog/types.ts';
import { vacuumToAir_um } from '../../src/dispersion/air-index.ts';
import type { BoundModel } from '../../src/dispersion/evaluator.ts';
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

  it('evaluates at most one model for each axis of the catalogue, and binds none twice', () => {
    const wave = { vacuum_um: 0.633, air_um: vacuumToAir_um(0.633) };
    let evaluations = 0;
    const bound = new Map<Fit, BoundModel>();
    const counting = {
      ...survey,
      bind: (fit: Fit): BoundModel => {
        const model = survey.bind(fit);
        expect(bound.get(fit) ?? model).toBe(model);
        bound.set(fit, model);
        const { index } = model;
        return {
          ...model,
          evaluate: (...given) => {
            evaluations++;
            model.evaluate(...given);
          },
          ...(index && {
            index: (wavelength_um: number) => {
              evaluations++;
              return index(wavelength_um);
            },
          }),
        };
      },
    };
    let axes = 0;
    let found = 0;
    for (const material of survey.materials) {
      for (const axis of axesOf(material)) {
        axes++;
        const n = quickMedium(counting, material, axis, wave)?.n;
        if (n !== undefined && n > 1.37 && n < 1.39) found++;
      }
    }
    expect(found).toBeGreaterThan(0);
    expect(evaluations).toBeGreaterThan(axes / 4);
    expect(evaluations).toBeLessThanOrEqual(axes);
  });
});
