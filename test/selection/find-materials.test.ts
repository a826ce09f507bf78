import { describe, expect, it } from 'vitest';
import { answerQuestion } from '../../src/answer/answer-question.ts';
import { makeQuestion } from '../../src/answer/question.ts';
import { axesOf } from '../../src/catalog/choose-fit.ts';
import type { Axis, Material } from '../../src/catalog/types.ts';
import { isRefusal } from '../../src/medium/refusal.ts';
import { type Criteria, NO_CRITERIA } from '../../src/selection/criteria.ts';
import { findMaterials } from '../../src/selection/find-materials.ts';
import { findReport } from '../../src/selection/find-report.ts';
import { matchesClass } from '../../src/selection/material-class.ts';
import { sortFound } from '../../src/selection/sort-found.ts';
import { air, material, survey, vacuum } from './whole-catalogue.ts';

function find(criteria: Partial<Criteria>) {
  const result = findMaterials(survey, { ...NO_CRITERIA, ...criteria });
  if (isRefusal(result)) throw new Error(result.message);
  return result;
}

const keys = (criteria: Partial<Criteria>): readonly string[] =>
  find(criteria).found.map((f) => f.candidate.material.key);

/** The program's own answer, one medium at a time, with nothing of the search in it. */
function askMedium(m: Material, axis: Axis, wavelength_m: number, temperature_K?: number) {
  const vacuumSpec = { kind: 'catalogue' as const, material: material('vacuum') };
  const answer = answerQuestion(
    makeQuestion(vacuumSpec, { kind: 'catalogue', material: m, axis }, vacuum(wavelength_m), {
      conditions: { temperature_K },
    }),
    survey.sourceOf,
  );
  return isRefusal(answer) ? undefined : answer.into;
}

/** 1 - T of a plate in air, from the path of the question, every layer summed as intensities. */
function askPlate(m: Material, axis: Axis, wavelength_m: number, thickness_m: number): number | undefined {
  const outside = { kind: 'catalogue' as const, material: material('air') };
  const answer = answerQuestion(
    makeQuestion(outside, outside, vacuum(wavelength_m), {
      layers: [
        { medium: { kind: 'catalogue', material: m, axis }, thickness: { kind: 'length', thickness_m } },
      ],
      coherenceLength_m: 1e-12,
    }),
    survey.sourceOf,
  );
  return isRefusal(answer) || !answer.stack ? undefined : 1 - answer.stack.T;
}

describe('find, against one question a medium', () => {
  it.each([
    [633e-9, 1.37, 1.39, undefined],
    [10.6e-6, 2.3, 2.5, undefined],
    [1.55e-6, 1.44, 1.45, undefined],
    [193e-9, 1.4, 1.6, undefined],
    [633e-9, 1.32, 1.36, 313.15],
    [10.6e-6, 3.9, 4.1, 353.15],
    [1.55e-6, 1.44, 1.52, 80],
  ])('by index at %d m, from %d to %d, at %s K', (wavelength_m, from, to, temperature_K) => {
    const found: string[] = [];
    let blank = 0;
    for (const m of survey.materials) {
      const media = axesOf(m).map((axis) => askMedium(m, axis, wavelength_m, temperature_K));
      if (media.some((x) => x && x.n >= from && x.n <= to)) found.push(m.key);
      else if (media.length === 0 || media.some((x) => !x)) blank++;
    }
    const result = find({ wave: vacuum(wavelength_m), temperature_K, ranges: { n: { from, to } } });
    expect(result.found.map((f) => f.candidate.material.key)).toEqual(found);
    expect(result.undecided.get('no-data-at-wave') ?? 0).toBe(blank);
    expect(result.examined).toBe(survey.materials.length);
  });

  it('by group index, dispersion and birefringence', () => {
    const wavelength_m = 800e-9;
    const groups: string[] = [];
    const slow: string[] = [];
    const double: string[] = [];
    for (const m of survey.materials) {
      const media = axesOf(m).flatMap((axis) => askMedium(m, axis, wavelength_m) ?? []);
      if (media.some((x) => x.groupIndex !== null && x.groupIndex >= 1.45 && x.groupIndex <= 1.48))
        groups.push(m.key);
      if (media.some((x) => x.gvd_s2_per_m !== null && Math.abs(x.gvd_s2_per_m) <= 30e-27)) slow.push(m.key);
      const of = (axis: Axis) => media.find((x) => x.axis === axis)?.n;
      const [low, high] = [of('ordinary') ?? of('x'), of('extraordinary') ?? of('z')];
      if (low !== undefined && high !== undefined && Math.abs(high - low) >= 0.05) double.push(m.key);
    }
    const wave = vacuum(wavelength_m);
    expect(keys({ wave, ranges: { groupIndex: { from: 1.45, to: 1.48 } } })).toEqual(groups);
    expect(keys({ wave, ranges: { gvd_s2_per_m: { from: -30e-27, to: 30e-27 } } })).toEqual(slow);
    expect(keys({ wave, ranges: { birefringence: { from: 0.05 } } })).toEqual(double);
    expect(double.length).toBeGreaterThan(5);
  });

  it('by group index, dispersion and birefringence at a temperature', () => {
    const [wavelength_m, temperature_K] = [800e-9, 373.15];
    const wave = vacuum(wavelength_m);
    for (const { candidate } of find({ wave, temperature_K }).found) {
      const { material: m, axis } = candidate;
      const answer = askMedium(m, axis, wavelength_m, temperature_K);
      const name = `${m.key}:${axis}`;
      const same = (value: unknown, wanted: number | null | undefined): void => {
        if (typeof value === 'number')
          expect(Math.abs(value - (wanted ?? Number.NaN)), name).toBeLessThan(1e-12);
        else expect(wanted, name).toBeNull();
      };
      same(candidate.groupIndex, answer?.groupIndex);
      same(candidate.gvd_s2_per_m, answer?.gvd_s2_per_m);
    }
    const doubles = find({ wave, temperature_K, ranges: { birefringence: { from: 1e-3 } } }).found;
    const changed = doubles.filter(({ candidate: { material: m, birefringence } }) => {
      const at = (axis: Axis, T?: number): number =>
        axesOf(m).includes(axis) ? (askMedium(m, axis, wavelength_m, T)?.n ?? Number.NaN) : Number.NaN;
      const [low, high]: readonly [Axis, Axis] = axesOf(m).includes('z')
        ? ['x', 'z']
        : ['ordinary', 'extraordinary'];
      const warm = at(high, temperature_K) - at(low, temperature_K);
      expect(birefringence, m.key).toBeCloseTo(warm, 12);
      return Math.abs(warm - (at(high) - at(low))) > 1e-4;
    });
    // Else the temperature would not have been looked at.
    expect(changed.length).toBeGreaterThan(2);
  });

  it('by the loss of a plate, as the path of two surfaces gives it', () => {
    const [wavelength_m, thickness_m, maxLoss] = [1064e-9, 5e-3, 0.09];
    const result = find({ wave: vacuum(wavelength_m), maxLoss, thickness_m });
    const found = new Set(result.found.map((f) => f.candidate.material.key));
    for (const m of survey.materials) {
      const losses = axesOf(m).flatMap((axis) => askPlate(m, axis, wavelength_m, thickness_m) ?? []);
      // A loss that the absorption not on file could raise is no proof: such media are either found with a mark or counted.
      if (losses.length > 0 && losses.every((loss) => loss > maxLoss))
        expect(found.has(m.key), m.key).toBe(false);
      if (found.has(m.key)) expect(Math.min(...losses), m.key).toBeLessThanOrEqual(maxLoss);
    }
    expect(found.has('fused-silica')).toBe(true);
    expect(found.has('germanium')).toBe(false);
  });
});

describe('find, by what is common practice', () => {
  const clear = (wavelength_m: number): Partial<Criteria> => ({ clear_m: [wavelength_m, wavelength_m] });

  it('windows at 10.6 um: zinc selenide, germanium and the alkali halides, not the silicas', () => {
    const found = keys(clear(10.6e-6));
    for (const key of [
      'zinc-selenide',
      'germanium',
      'potassium-chloride',
      'sodium-chloride',
      'potassium-bromide',
    ]) {
      expect(found).toContain(key);
    }
    for (const key of ['fused-silica', 'fused-quartz-ir', 'n-bk7', 'sapphire', 'calcium-fluoride']) {
      expect(found).not.toContain(key);
    }
    const dry = keys({ ...clear(10.6e-6), not: [{ kind: 'property', property: 'hygroscopic' }] });
    expect(dry).toContain('zinc-selenide');
    expect(dry).not.toContain('sodium-chloride');
    const harmless = keys({ ...clear(10.6e-6), not: [{ kind: 'property', property: 'toxic' }] });
    expect(harmless).not.toContain('zinc-selenide');
    expect(harmless).not.toContain('krs-5');
    expect(harmless).toContain('zinc-sulfide-flir');
  });

  it('at 193 nm few optical solids are left: fluorides and silica', () => {
    const solids = keys({
      ...clear(193e-9),
      not: [
        { kind: 'class', text: 'gas' },
        { kind: 'class', text: 'liquid' },
      ],
    });
    expect(solids).toEqual(
      expect.arrayContaining(['calcium-fluoride', 'magnesium-fluoride', 'fused-silica']),
    );
    for (const key of ['n-bk7', 'n-sf11', 'zinc-selenide', 'calcite']) expect(solids).not.toContain(key);
  });

  it('polarizer crystals at 1064 nm: calcite, yttrium vanadate, beta-barium borate', () => {
    const found = keys({ wave: vacuum(1064e-9), ranges: { birefringence: { from: 0.1 } } });
    expect(found).toEqual(
      expect.arrayContaining(['calcite', 'yttrium-orthovanadate', 'beta-barium-borate', 'rutile']),
    );
    expect(found).not.toContain('crystal-quartz');
    expect(found).not.toContain('sapphire');
  });

  it('low-dispersion glasses from V_d = 80 on: the fluor-phosphates', () => {
    const found = keys({ classes: ['glass'], ranges: { abbe: { from: 80 } } });
    expect(found).toEqual(expect.arrayContaining(['n-fk51a', 'n-pk52a', 's-fpl51', 's-fpl53']));
    expect(found).not.toContain('n-bk7');
  });
});

describe('find, conditions by facts', () => {
  it('takes a class by any word of it, singular or plural', () => {
    expect(matchesClass('glass', 'optical glass')).toBe(true);
    expect(matchesClass('glasses', 'chalcogenide glass')).toBe(true);
    expect(matchesClass('films', 'thin film')).toBe(true);
    expect(matchesClass('halide crystals', 'halide crystal')).toBe(true);
    expect(matchesClass('gas', 'optical glass')).toBe(false);
    expect(matchesClass('metal', 'semiconductor')).toBe(false);
    expect(matchesClass('', 'metal')).toBe(false);
  });

  it('looks for words at the beginnings of names, formulas, aliases and classes', () => {
    expect(keys({ words: ['zinc', 'sel'] })).toEqual(['zinc-selenide']);
    expect(keys({ words: ['znse'] })).toContain('zinc-selenide');
    expect(keys({ words: ['corundum'] })).toEqual(['sapphire']);
    expect(keys({ words: ['nosuchthing'] })).toEqual([]);
    expect(keys({}).length).toBe(survey.materials.length);
  });

  it('counts what is not on file instead of guessing', () => {
    const film = find({ clear_m: [550e-9, 550e-9] });
    const blank = survey.materials.filter((m) => !m.transparency_um);
    expect(film.undecided.get('no-transparency-on-file')).toBe(blank.length);
    const dry = find({ not: [{ kind: 'property', property: 'hygroscopic' }] });
    expect(dry.undecided.get('not-on-file')).toBe(
      survey.materials.filter((m) => m.handling?.hygroscopic === undefined).length,
    );
  });

  it('leaves out a plate whose absorption is not known outside its range of transparency', () => {
    const result = find({ wave: vacuum(10.6e-6), maxLoss: 0.99, thickness_m: 1e-3 });
    for (const { candidate } of result.found) {
      const loss = candidate.loss(1e-3);
      const clear = candidate.isClear([10.6e-6, 10.6e-6]);
      expect('fraction' in loss && (loss.absorptionKnown || clear), candidate.material.key).toBe(true);
    }
    expect(result.undecided.get('absorption-not-known')).toBeGreaterThan(0);
  });

  it('refuses conditions that mean nothing without a wave', () => {
    const report = findReport(
      survey,
      { ...NO_CRITERIA, ranges: { n: { from: 1 } } },
      { key: 'key', descending: false },
    );
    expect(report).toMatchObject({ refused: true, code: 'wave-missing', exit: 2 });
  });

  it('shows the very index of the answer, in air or in vacuum', () => {
    const report = findReport(
      survey,
      { ...NO_CRITERIA, words: ['n-bk7'], wave: air(587.5618e-9) },
      { key: 'key', descending: false },
    );
    if (isRefusal(report)) throw new Error(report.message);
    const [hit] = report.hits;
    // Schott data sheet: n_d = 1.51680, relative to air.
    expect(hit?.medium?.n_published).toBeCloseTo(1.5168, 5);
    expect(hit?.n_d).toBeCloseTo(1.5168, 5);
  });

  it('sorts both ways, what has no value last', () => {
    const { found } = find({ classes: ['crystal'] });
    const order = (descending: boolean) =>
      sortFound(found, { key: 'hardness', descending }, NO_CRITERIA).map(
        (f) => f.candidate.material.handling?.knoop,
      );
    const up = order(false);
    const known = up.filter((x) => x !== undefined);
    expect(known).toEqual([...known].sort((a, b) => a - b));
    expect(up.slice(0, known.length)).toEqual(known);
    expect(order(true).slice(0, known.length)).toEqual([...known].reverse());
  });
});
