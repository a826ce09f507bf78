import { describe, expect, it } from 'vitest';
import { answerQuestion } from '../../src/answer/answer-question.ts';
import { type Layer, type MediumSpec, makeQuestion } from '../../src/answer/question.ts';
import { isRefusal } from '../../src/medium/refusal.ts';
import { bestOf } from '../../src/selection/best-values.ts';
import { compareReport, type Part } from '../../src/selection/compare-report.ts';
import { material, survey, vacuum } from './whole-catalogue.ts';

const named = (key: string): MediumSpec => ({ kind: 'catalogue', material: material(key) });
const part = (key: string, thickness_m: number | null = null): Part => ({
  medium: named(key),
  text: key,
  thickness_m,
});

function compare(parts: readonly Part[], waves: readonly number[]) {
  const report = compareReport(
    survey,
    parts,
    waves.map((w) => vacuum(w)),
    {},
  );
  if (isRefusal(report)) throw new Error(report.message);
  return report;
}

describe('compare', () => {
  const keys = ['zinc-selenide', 'germanium', 'potassium-chloride', 'sapphire', 'fused-silica'];

  it('states what one question a part states: surface, plate, Brewster angle, index', () => {
    const waves = [2.5e-6, 10.6e-6];
    const report = compare(
      keys.map((key) => part(key, 3e-3)),
      waves,
    );
    for (const [w, { columns }] of report.waves.entries()) {
      for (const [i, column] of columns.entries()) {
        const key = keys[i] ?? '';
        const wave = vacuum(waves[w] ?? 0);
        const surface = answerQuestion(makeQuestion(named('air'), named(key), wave), survey.sourceOf);
        expect(isRefusal(column), key).toBe(isRefusal(surface));
        if (isRefusal(column) || isRefusal(surface)) continue;
        expect(column.medium).toEqual(surface.into);
        expect(column.surfaceReflectance).toBeCloseTo(surface.interface.R, 9);
        if (column.brewsterAngle_rad !== null) {
          expect(column.brewsterAngle_rad).toBeCloseTo(surface.interface.brewsterAngle_rad ?? 0, 8);
        }
        const plate = answerQuestion(
          makeQuestion(named('air'), named('air'), wave, {
            layers: [{ medium: named(key), thickness: { kind: 'length', thickness_m: 3e-3 } }],
            coherenceLength_m: 1e-12,
          }),
          survey.sourceOf,
        );
        if (isRefusal(plate) || column.loss === null) continue;
        expect(column.loss, key).toBeCloseTo(1 - (plate.stack?.T ?? 0), 9);
        expect(column.surfacesOnly).toBe(surface.into.absorptionCoefficient_per_m === null);
      }
    }
  });

  it('takes films by the formulas of one quarter-wave layer and of a plate (Born & Wolf 1.6.4, 7.6)', () => {
    const clear: MediumSpec = { kind: 'literal', literal: { n: { re: 2.2, im: 0 } }, text: 'n=2.2' };
    const quarter = (n: number, ns: number, n0: number): number =>
      ((n0 * ns - n * n) / (n0 * ns + n * n)) ** 2;
    const coatings = [
      [named('magnesium-fluoride-film'), 'n-bk7', 550e-9, 5e-3],
      [clear, 'germanium', 10.6e-6, 3e-3],
      [named('silicon-dioxide-film'), 'sapphire', 633e-9, 10e-3],
    ] as const;
    for (const [medium, key, wavelength_m, thickness_m] of coatings) {
      const film: Layer = { medium, thickness: { kind: 'waves', waves: 0.25 } };
      const bare = part(key, thickness_m);
      const both = { ...bare, coating: { front: [film], back: [film] } };
      const front = { ...bare, coating: { front: [film], back: [] } };
      const columns = compare([bare, both, front], [wavelength_m]).waves[0]?.columns ?? [];
      const [plain, twice, once] = columns.flatMap((c) => (isRefusal(c) ? [] : [c]));
      const index = (of: MediumSpec): number => {
        const answer = answerQuestion(makeQuestion(named('air'), of, vacuum(wavelength_m)), survey.sourceOf);
        return isRefusal(answer) ? Number.NaN : answer.into.n;
      };
      const R = quarter(index(medium), index(named(key)), index(named('air')));
      const R0 = plain?.surfaceReflectance ?? Number.NaN;
      const tau = plain?.internalTransmittance ?? 1;
      const loss = (R1: number, R2: number): number =>
        1 - ((1 - R1) * (1 - R2) * tau) / (1 - R1 * R2 * tau * tau);
      expect(plain?.loss, key).toBeCloseTo(loss(R0, R0), 6);
      expect(twice?.surfaceReflectance, key).toBeCloseTo(R, 7);
      expect(twice?.backReflectance, key).toBeCloseTo(R, 7);
      expect(twice?.loss, key).toBeCloseTo(loss(R, R), 7);
      expect(once?.backReflectance, key).toBeCloseTo(R0, 6);
      expect(once?.loss, key).toBeCloseTo(loss(R, R0), 7);
    }
  });

  it('makes films once, for the first wave unless another is named', () => {
    const ar = {
      ...part('n-bk7', 5e-3),
      coating: {
        front: [{ medium: named('magnesium-fluoride-film'), thickness: { kind: 'waves', waves: 0.25 } }],
        back: [],
      },
    } satisfies Part;
    const R = (waves: readonly number[], design?: number): readonly number[] => {
      const report = compareReport(
        survey,
        [ar, part('n-bk7')],
        waves.map((w) => vacuum(w)),
        {},
        design === undefined ? undefined : vacuum(design),
      );
      if (isRefusal(report)) throw new Error(report.message);
      return report.waves.flatMap(({ columns: [c] }) => (c && !isRefusal(c) ? [c.surfaceReflectance] : []));
    };
    const [atDesign = 0, beside = 0] = R([550e-9, 900e-9]);
    expect(beside).toBeGreaterThan(atDesign);
    expect(R([900e-9], 550e-9)[0]).toBe(beside);
    expect(R([900e-9])[0]).toBeLessThan(beside);
  });

  it('leaves a gap with its reason where the data end, and refuses only where all do', () => {
    const [wave] = compare([part('n-bk7'), part('zinc-selenide')], [10.6e-6]).waves;
    expect(wave?.columns[0]).toMatchObject({ refused: true, code: 'outside-fit-range' });
    expect(wave?.columns[1]).toMatchObject({ surfacesOnly: false });
    const none = compareReport(survey, [part('n-bk7'), part('fused-silica')], [vacuum(10.6e-6)], {});
    expect(none).toMatchObject({ refused: true, exit: 3 });
  });

  it('gives no loss without a thickness, nor for an unknown absorption outside the range of transparency', () => {
    const [wave] = compare([part('yttria', 5e-3), part('germanium', 5e-3)], [9e-6]).waves;
    expect(wave?.columns[0]).toMatchObject({ loss: null, internalTransmittance: null });
    const [bare] = compare([part('zinc-selenide'), part('germanium')], [10.6e-6]).waves;
    expect(bare?.columns[0]).toMatchObject({ loss: null, internalTransmittance: null });
  });

  it('compares two to six', () => {
    expect(compareReport(survey, [part('water')], [vacuum(5e-7)], {})).toMatchObject({ code: 'part-count' });
    const seven = Array.from({ length: 7 }, () => part('water'));
    expect(compareReport(survey, seven, [vacuum(5e-7)], {})).toMatchObject({ code: 'part-count' });
  });

  it('marks the best: least or most, ties together, nothing where all are alike or one is known', () => {
    expect(bestOf([3, 1, 2], 'least')).toEqual([false, true, false]);
    expect(bestOf([3, 1, 3.0001], 'most')).toEqual([true, false, true]);
    expect(bestOf([2, 2, null], 'least')).toEqual([false, false, false]);
    expect(bestOf([null, 5], 'most')).toEqual([false, false]);
    expect(bestOf([0, 1, 2], 'least')).toEqual([true, false, false]);
  });
});
