/** Curves: at every point the numbers are those of an answer there; outside the data there are none. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { angleCurve } from '../../src/answer/angle-curve.ts';
import type { Answer } from '../../src/answer/answer.ts';
import { answerQuestion } from '../../src/answer/answer-question.ts';
import { type CurvePath, curvePath } from '../../src/answer/curve-path.ts';
import { fieldCurve } from '../../src/answer/field-curve.ts';
import { dispersiveMedia, indexCurve } from '../../src/answer/index-curve.ts';
import { type Layer, makeQuestion, type Question } from '../../src/answer/question.ts';
import { usualSpan, waveCurve } from '../../src/answer/wave-curve.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { isRefusal, type Refusal } from '../../src/medium/refusal.ts';
import { DEGREE, index, named, vacuumWave } from '../helpers/ask.ts';

const sourceOf = (id: string) => catalogueFromSources().source(id);

function unrefused<T>(x: T | Refusal): T {
  if (isRefusal(x)) throw new Error(`${x.message}; ${x.remedy}`);
  return x;
}

const answerTo = (question: Question): Answer => unrefused(answerQuestion(question, sourceOf));
const pathOf = (question: Question): CurvePath => unrefused(curvePath(question, sourceOf));
const layer = (medium: Layer['medium'], thickness_m: number): Layer => ({
  medium,
  thickness: { kind: 'length', thickness_m },
});
const atWave = (question: Question, wavelength_m: number): Question => ({
  ...question,
  wave: vacuumWave(wavelength_m),
});

/** By number, so that a counterexample is short. */
const oneOf = (questions: readonly Question[]) =>
  fc.nat(questions.length - 1).map((i) => ({ toString: () => `question ${i}`, ...questions[i] }) as Question);

const film = layer(named('magnesium-fluoride-film'), 115e-9);
const window = layer(named('fused-silica'), 5e-3);
const QUESTIONS: readonly Question[] = [
  makeQuestion(named('air'), named('fused-silica'), vacuumWave(633e-9)),
  makeQuestion(named('n-bk7'), named('air'), vacuumWave(633e-9), {
    polarization: 'p',
    incidenceAngle_rad: 0.5,
  }),
  makeQuestion(named('air'), named('gold'), vacuumWave(633e-9), { polarization: 's', incidenceAngle_rad: 1 }),
  makeQuestion(index(1.33), index(1.5, 0.2), vacuumWave(1e-6)),
  makeQuestion(named('air'), named('n-bk7'), vacuumWave(550e-9), { layers: [film] }),
  makeQuestion(named('air'), named('air'), vacuumWave(800e-9), { layers: [window], incidenceAngle_rad: 0.3 }),
  makeQuestion(named('air'), named('n-bk7'), vacuumWave(550e-9), {
    layers: [film, window, layer(index(2.3), 60e-9)],
    polarization: 'p',
  }),
];

describe('curves over the angle', () => {
  it('have the numbers of an answer at every angle', () => {
    fc.assert(
      fc.property(oneOf(QUESTIONS), fc.double({ min: 0, max: 1, noNaN: true }), (question, share) => {
        const curve = angleCurve(pathOf(question), answerTo(question));
        const i = Math.floor(share * (curve.angle_rad.length - 2));
        const there = answerTo({ ...question, incidenceAngle_rad: curve.angle_rad[i] ?? 0 }).interface;
        for (const key of ['Rs', 'Rp', 'Ts', 'Tp'] as const) {
          // A surface to the last bit; a path within the rounding of a sum.
          if (question.layers.length === 0) expect(curve[key][i]).toBe(there[key]);
          else expect(curve[key][i]).toBeCloseTo(there[key] ?? Number.NaN, 12);
        }
      }),
      { numRuns: 60 },
    );
  });

  it('run from the normal to grazing, through the marked angles', () => {
    for (const question of QUESTIONS) {
      const answer = answerTo(question);
      const { angle_rad, Rs } = angleCurve(pathOf(question), answer);
      expect([angle_rad[0], angle_rad.at(-1)]).toEqual([0, Math.PI / 2]);
      expect(Rs.at(-1)).toBeCloseTo(1, 6);
      const { brewsterAngle_rad, criticalAngle_rad } = answer.interface;
      for (const marked of [brewsterAngle_rad, criticalAngle_rad, question.incidenceAngle_rad])
        if (marked !== null) expect(angle_rad).toContain(marked);
      expect([...angle_rad].sort((a, b) => a - b)).toEqual(angle_rad);
    }
  });

  it('keep a part of that, and the thickness of a quarter wave', () => {
    const quarter: Layer = { medium: index(1.38), thickness: { kind: 'waves', waves: 0.25 } };
    const question = makeQuestion(named('air'), named('n-bk7'), vacuumWave(550e-9), { layers: [quarter] });
    const answer = answerTo(question);
    const curve = angleCurve(pathOf(question), answer, [20 * DEGREE, 40 * DEGREE]);
    expect([curve.angle_rad[0], curve.angle_rad.at(-1)]).toEqual([20 * DEGREE, 40 * DEGREE]);
    const fixed = layer(index(1.38), answer.layers[0]?.thickness_m ?? 0);
    const there = answerTo({ ...question, layers: [fixed], incidenceAngle_rad: 20 * DEGREE }).interface;
    expect(curve.Rs[0]).toBeCloseTo(there.Rs, 12);
  });
});

describe('curves over the wave', () => {
  it('have the numbers of an answer at every wave', () => {
    // Coherence is as answered along the curve: an answer elsewhere may decide anew for a thick layer.
    const surfaces = QUESTIONS.filter(({ layers }) => layers.length === 0 || layers[0] === film);
    fc.assert(
      fc.property(oneOf(surfaces), fc.double({ min: 0, max: 1, noNaN: true }), (question, share) => {
        const curve = waveCurve(pathOf(question));
        const i = Math.floor(share * (curve.wavelength_m.length - 1));
        const there = answerTo(atWave(question, curve.wavelength_m[i] ?? 0)).interface;
        expect(curve.R[i]).toBeCloseTo(there.R, 12);
        expect(curve.T[i]).toBeCloseTo(there.T ?? Number.NaN, 12);
      }),
      { numRuns: 60 },
    );
  });

  it('span what all media cover around the wave, and stay while the wave is stepped', () => {
    for (const question of QUESTIONS) {
      const path = pathOf(question);
      const [low, high] = usualSpan(path);
      expect(low).toBeLessThan(path.wavelength_m);
      expect(high).toBeGreaterThan(path.wavelength_m);
      for (const end of [low, high])
        expect(isRefusal(answerQuestion(atWave(question, end), sourceOf))).toBe(false);
    }
    const [question = makeQuestion(index(1), index(2), vacuumWave(1))] = QUESTIONS;
    expect(usualSpan(pathOf(atWave(question, 640e-9)))).toEqual(usualSpan(pathOf(question)));
  });

  it('have no values outside the data, and say from where to where that is', () => {
    const question = makeQuestion(named('vacuum'), named('fused-silica'), vacuumWave(633e-9));
    const curve = waveCurve(pathOf(question), [0.1e-6, 20e-6]);
    expect(curve.outside.length).toBe(2);
    for (const { name, from_m, to_m } of curve.outside) {
      expect(name).toMatch(/silica/i);
      const [inside, outside] = from_m === 0.1e-6 ? [to_m, to_m * (1 - 1e-9)] : [from_m, from_m * (1 + 1e-9)];
      expect(isRefusal(answerQuestion(atWave(question, inside), sourceOf))).toBe(false);
      expect(answerQuestion(atWave(question, outside), sourceOf)).toMatchObject({
        code: 'outside-fit-range',
      });
    }
    curve.wavelength_m.forEach((at, i) => {
      const isOutside = curve.outside.some(({ from_m, to_m }) => at > from_m && at < to_m);
      if (isOutside) expect(curve.R[i]).toBeNaN();
    });
    const extrapolated = waveCurve(pathOf({ ...question, extrapolate: true }), [0.1e-6, 20e-6]);
    expect(extrapolated.outside).toEqual(curve.outside);
    const missing = (R: readonly number[]) => R.filter(Number.isNaN).length;
    expect(missing(extrapolated.R)).toBeLessThan(missing(curve.R));
  });

  it('are dense enough for fringes', () => {
    const plate = layer(named('fused-silica'), 100e-6);
    const question = makeQuestion(named('air'), named('air'), vacuumWave(633e-9), {
      layers: [plate],
      coherenceLength_m: 1e-3,
    });
    const curve = waveCurve(pathOf(question), [600e-9, 700e-9]);
    const crests = curve.R.filter((R, i) => R > (curve.R[i - 1] ?? 1) && R >= (curve.R[i + 1] ?? 1)).length;
    // 2 n d (1/600 nm - 1/700 nm) with n near 1.457.
    expect(crests).toBeGreaterThan(66);
    expect(crests).toBeLessThan(73);
    const thick = { ...question, layers: [layer(index(1.5), 20e-3)], coherenceLength_m: 1 };
    expect(waveCurve(pathOf(thick), [600e-9, 700e-9]).isTooFine).toBe(true);
    expect(curve.isTooFine).toBe(false);
  });
});

describe('curves of an index', () => {
  it('have the numbers of an answer, for condensed media of the catalogue, each once', () => {
    const question = makeQuestion(named('air'), named('air'), vacuumWave(800e-9), {
      layers: [window, film, window],
    });
    const path = pathOf(question);
    const media = dispersiveMedia(path.media);
    expect(media.map(({ name }) => name).length).toBe(2);
    const waves = [400e-9, 800e-9, 1e-6];
    const [silica] = media.map((medium) => indexCurve(medium, question, waves, sourceOf));
    waves.forEach((wave, i) => {
      const { n, k, absolute } = answerTo(makeQuestion(index(1), window.medium, vacuumWave(wave))).into;
      expect([silica?.n[i], silica?.k[i], silica?.groupIndex[i]]).toEqual([n, k, absolute.groupIndex]);
    });
  });

  it('have no group index where a metal swallows the pulse', () => {
    const question = makeQuestion(named('air'), named('gold'), vacuumWave(633e-9));
    const [gold] = dispersiveMedia(pathOf(question).media);
    if (!gold) throw new Error('no medium');
    const curve = indexCurve(gold, question, [600e-9, 700e-9], sourceOf);
    expect(curve.groupIndex).toEqual([Number.NaN, Number.NaN]);
    expect(curve.k.every((k) => k > 1)).toBe(true);
  });
});

describe('curves of the field', () => {
  const mirror = Array.from({ length: 4 }, () => [
    layer(index(2.3), 68.8e-9),
    layer(index(1.46), 108.4e-9),
  ]).flat();

  it('meet the greatest values that the answer names, in front and inside', () => {
    for (const polarization of ['s', 'p'] as const) {
      const question = makeQuestion(named('air'), named('n-bk7'), vacuumWave(633e-9), {
        layers: mirror,
        polarization,
        incidenceAngle_rad: 0.4,
      });
      const answer = answerTo(question);
      const curve = unrefused(fieldCurve(question, answer, sourceOf));
      const values = curve[polarization] ?? [];
      const inFront = Math.max(...values.filter((_, i) => curve.layer[i] === 0));
      const inside = Math.max(...values.filter((_, i) => (curve.layer[i] ?? 0) > 0));
      const { fieldMaximum, fieldMaximumBefore } = answer.stack ?? {};
      expect(inFront / (fieldMaximumBefore?.intensity ?? 0)).toBeCloseTo(1, 2);
      expect(inside / (fieldMaximum?.intensity ?? 0)).toBeCloseTo(1, 2);
      expect(inside).toBeLessThanOrEqual((fieldMaximum?.intensity ?? 0) * (1 + 1e-9));
      expect(curve.faces.map(({ position_m }) => position_m)).toHaveLength(mirror.length + 1);
    }
  });

  it('go on across every face in s, and draw both polarizations of unpolarized light', () => {
    const question = makeQuestion(named('air'), named('n-bk7'), vacuumWave(633e-9), {
      layers: mirror,
      incidenceAngle_rad: 0.6,
    });
    const curve = unrefused(fieldCurve(question, answerTo(question), sourceOf));
    const s = curve.s ?? [];
    expect(curve.p).toHaveLength(s.length);
    let faces = 0;
    for (let i = 1; i < s.length; i++) {
      expect(curve.position_m[i] ?? 0).toBeGreaterThanOrEqual((curve.position_m[i - 1] ?? 0) - 1e-18);
      if (curve.layer[i] === curve.layer[i - 1]) continue;
      faces += 1;
      expect(Math.abs((s[i] ?? 0) - (s[i - 1] ?? 0))).toBeLessThan(1e-9);
    }
    expect(faces).toBe(mirror.length + 1);
  });

  it('show the tail of total reflection and the skin of a metal', () => {
    const total = makeQuestion(named('n-bk7'), named('air'), vacuumWave(633e-9), {
      polarization: 's',
      incidenceAngle_rad: 45 * DEGREE,
    });
    const answer = answerTo(total);
    const curve = unrefused(fieldCurve(total, answer, sourceOf));
    const start = curve.layer.indexOf(1);
    const depth_m = answer.interface.evanescentDepth_m ?? 0;
    const first = curve.s?.[start] ?? 0;
    curve.position_m.slice(start).forEach((z, i) => {
      expect((curve.s?.[start + i] ?? 0) / first).toBeCloseTo(Math.exp((-2 * z) / depth_m), 6);
    });
    const gold = makeQuestion(named('air'), named('gold'), vacuumWave(633e-9));
    const skin = unrefused(fieldCurve(gold, answerTo(gold), sourceOf));
    expect(Math.min(...(skin.s ?? [1]))).toBeLessThan(0.01);
  });

  it('are refused where layers are summed as intensities, with what would do', () => {
    const question = makeQuestion(named('air'), named('air'), vacuumWave(633e-9), { layers: [window] });
    const refusal = fieldCurve(question, answerTo(question), sourceOf) as Refusal;
    expect(refusal).toMatchObject({ code: 'field-not-coherent', exit: 3 });
    const stated = /--coherence (\d+(?:\.\d+)?)mm/.exec(refusal.remedy)?.[1];
    const coherent = { ...question, coherenceLength_m: Number(stated) * 1e-3 };
    expect(isRefusal(fieldCurve(coherent, answerTo(coherent), sourceOf))).toBe(false);
  });
});
