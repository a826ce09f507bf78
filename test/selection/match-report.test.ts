import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { answerQuestion } from '../../src/answer/answer-question.ts';
import { type MediumSpec, makeQuestion } from '../../src/answer/question.ts';
import { axesOf } from '../../src/catalog/choose-fit.ts';
import { isRefusal } from '../../src/medium/refusal.ts';
import { NO_CRITERIA } from '../../src/selection/criteria.ts';
import { type MatchQuestion, matchReport } from '../../src/selection/match-report.ts';
import { mixes } from '../../src/selection/miscibility.ts';
import { indexOfRefraction, lorentzLorenz, mixtureIndex, shareFor } from '../../src/selection/mixture.ts';
import { material, survey, vacuum } from './whole-catalogue.ts';

const named = (key: string): MediumSpec => ({ kind: 'catalogue', material: material(key) });

function match(target: MediumSpec, wavelength_m: number, more: Partial<MatchQuestion> = {}) {
  const question = { target, wave: vacuum(wavelength_m), mix: false, criteria: NO_CRITERIA, ...more };
  const report = matchReport(survey, question);
  if (isRefusal(report)) throw new Error(report.message);
  return report;
}

describe('match', () => {
  it.each([
    ['fused-silica', undefined],
    ['n-bk7', undefined],
    ['sapphire', undefined],
    ['n-bk7', 313.15],
  ])('ranks as one question a medium does: %s at %s K', (key, temperature_K) => {
    const wavelength_m = 589e-9;
    const reflectances = survey.materials.flatMap((m) =>
      axesOf(m).flatMap((axis) => {
        const answer = answerQuestion(
          makeQuestion(named(key), { kind: 'catalogue', material: m, axis }, vacuum(wavelength_m), {
            conditions: { temperature_K },
          }),
          survey.sourceOf,
        );
        if (isRefusal(answer) || (m.key === key && axis === answer.from.axis)) return [];
        return [{ name: `${m.key}:${axis}`, R: answer.interface.R }];
      }),
    );
    const report = match(named(key), wavelength_m, { criteria: { ...NO_CRITERIA, temperature_K } });
    expect(report.ranked).toBe(reflectances.length);
    const sorted = [...reflectances].sort((a, b) => a.R - b.R);
    for (const [i, found] of report.matches.entries()) {
      expect(found.R).toBeCloseTo(sorted[i]?.R ?? -1, 14);
      const same = reflectances.find((r) => r.name === `${found.facts.key}:${found.medium.axis}`);
      expect(found.R).toBeCloseTo(same?.R ?? -1, 14);
    }
  });

  it('lists every medium within a difference, and none beyond', () => {
    const { target, matches } = match(named('n-bk7'), 589e-9, { within: 0.002 });
    for (const { difference } of matches) expect(Math.abs(difference)).toBeLessThanOrEqual(0.002);
    const all = survey.materials.filter((m) =>
      axesOf(m).some((axis) => {
        const answer = answerQuestion(
          makeQuestion(named('n-bk7'), { kind: 'catalogue', material: m, axis }, vacuum(589e-9)),
          survey.sourceOf,
        );
        return !isRefusal(answer) && m.key !== 'n-bk7' && Math.abs(answer.into.n - target.medium.n) <= 0.002;
      }),
    );
    expect(new Set(matches.map((m) => m.facts.key))).toEqual(new Set(all.map((m) => m.key)));
  });

  it('finds that immersion oil, benzene and toluene sit near crown glass, as benches use them (common practice)', () => {
    const { matches } = match(named('n-bk7'), 589e-9, { criteria: { ...NO_CRITERIA, classes: ['liquid'] } });
    expect(
      matches
        .slice(0, 2)
        .map((m) => m.facts.key)
        .sort(),
    ).toEqual(['cedar-oil', 'immersion-oil']);
    expect(matches.map((m) => m.facts.key)).toEqual(
      expect.arrayContaining(['benzene', 'toluene', 'glycerol']),
    );
  });

  it('glycerol is the liquid of a crown-like medium of index 1.47 (common practice)', () => {
    const target: MediumSpec = { kind: 'literal', literal: { n: { re: 1.4725, im: 0 } }, text: 'n=1.4725' };
    const { matches } = match(target, 589e-9, {
      criteria: { ...NO_CRITERIA, classes: ['liquid'], not: [{ kind: 'property', property: 'toxic' }] },
    });
    expect(matches[0]?.facts.key).toBe('glycerol');
    expect(matches[0]?.resolved).toBe(false);
    expect(matches[0]?.R).toBeLessThanOrEqual(matches[0]?.R_upTo ?? 0);
  });

  it('names a temperature at which the program itself finds the indices together', () => {
    const { matches } = match(named('fused-silica'), 633e-9, {
      criteria: { ...NO_CRITERIA, classes: ['liquid'] },
    });
    const warmed = matches.filter((m) => m.thermal?.bothSlopesKnown);
    expect(warmed.length).toBeGreaterThan(2);
    for (const { facts, thermal, difference } of warmed) {
      const answer = answerQuestion(
        makeQuestion(named('fused-silica'), named(facts.key), vacuum(633e-9), {
          conditions: { temperature_K: thermal?.temperature_K },
        }),
        survey.sourceOf,
      );
      if (isRefusal(answer)) throw new Error(answer.message);
      // First order: what is left is small beside what there was. Another fit may answer at that temperature: 2e-3 covers it.
      expect(Math.abs(answer.into.n - answer.from.n), facts.key).toBeLessThan(
        Math.max(2e-3, 0.1 * Math.abs(difference)),
      );
    }
  });

  it('keeps a liquid between its freezing and its boiling point', () => {
    const { matches } = match(named('fused-silica'), 589e-9, {
      within: 1,
      criteria: { ...NO_CRITERIA, classes: ['liquid'] },
    });
    for (const { facts, thermal } of matches) {
      if (!thermal) continue;
      const { boiling_C, melting_C } = (material(facts.key).handling ?? {}) as Record<
        string,
        number | undefined
      >;
      expect(thermal.temperature_K - 273.15, facts.key).toBeLessThan(boiling_C ?? 1000);
      expect(thermal.temperature_K - 273.15, facts.key).toBeGreaterThan(melting_C ?? 0);
    }
  });
});

describe('mixtures', () => {
  it('follow the rule of Lorentz and Lorenz both ways', () => {
    const index = fc.double({ min: 1.05, max: 2.2, noNaN: true });
    fc.assert(
      fc.property(index, index, fc.double({ min: 0, max: 1, noNaN: true }), (n1, n2, share) => {
        const n = mixtureIndex(n1, n2, share);
        expect(n).toBeGreaterThanOrEqual(Math.min(n1, n2) - 1e-12);
        expect(n).toBeLessThanOrEqual(Math.max(n1, n2) + 1e-12);
        expect(indexOfRefraction(lorentzLorenz(n1))).toBeCloseTo(n1, 12);
        if (Math.abs(n1 - n2) > 1e-3)
          expect(mixtureIndex(n1, n2, shareFor(n1, n2, n) ?? -1)).toBeCloseTo(n, 9);
      }),
    );
  });

  it('come within several 1e-3 of glycerol and water, and no nearer, as the caution says', () => {
    // CRC Handbook, concentrative properties (from memory): n_D at 20 C of 50 % glycerol by mass is 1.3981.
    const [glycerol, water] = [
      { n: 1.4746, density: 1.2613 },
      { n: 1.333, density: 0.9982 },
    ];
    const share = 1 / glycerol.density / (1 / glycerol.density + 1 / water.density);
    const miss = Math.abs(mixtureIndex(glycerol.n, water.n, share) - 1.3981);
    expect(miss).toBeLessThan(6e-3);
    expect(miss).toBeGreaterThan(1e-3);
  });

  it('bracket the target with two liquids that mix, and hit its index', () => {
    const { mixtures, target } = match(named('fused-silica'), 633e-9, { mix: true });
    expect(mixtures?.mixtures.length).toBe(8);
    for (const { low, high } of mixtures?.mixtures ?? []) {
      expect(low.n).toBeLessThan(target.medium.n);
      expect(high.n).toBeGreaterThan(target.medium.n);
      expect(low.share + high.share).toBeCloseTo(1, 12);
      expect(mixtureIndex(high.n, low.n, high.share)).toBeCloseTo(target.medium.n, 12);
      expect(mixes(low.facts.key, high.facts.key)).toBe(true);
    }
    expect(mixtures?.notKnownToMix).toBeGreaterThan(0);
  });

  it('do not pair what separates (common practice)', () => {
    for (const [a, b] of [
      ['water', 'toluene'],
      ['glycerol', 'n-hexane'],
      ['methanol', 'n-hexane'],
      ['dimethyl-sulfoxide', 'cyclohexane'],
      ['fc-72', 'water'],
      ['water', '1-butanol'],
      // They mix, but with a base the two react violently.
      ['acetone', 'chloroform'],
    ] as const) {
      expect([mixes(a, b), mixes(b, a)], `${a} ${b}`).toEqual([false, false]);
    }
    for (const [a, b] of [
      ['water', 'glycerol'],
      ['water', 'ethanol'],
      ['toluene', 'n-hexane'],
      ['mineral-oil', '1-bromonaphthalene'],
      ['1-bromonaphthalene', 'diiodomethane'],
    ] as const) {
      expect([mixes(a, b), mixes(b, a)], `${a} ${b}`).toEqual([true, true]);
    }
  });

  it('are not offered for a metal', () => {
    expect(match(named('gold'), 633e-9, { mix: true }).mixtures).toMatchObject({
      outOfReach: true,
      mixtures: [],
    });
  });
});
