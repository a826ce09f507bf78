/** A mixture known from a table: nothing beyond its ends, the numbers printed at them. */
import { describe, expect, it } from 'vitest';
import { answerQuestion } from '../../src/answer/answer-question.ts';
import { makeQuestion } from '../../src/answer/question.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import type { Conditions } from '../../src/dispersion/evaluator.ts';
import { isRefusal } from '../../src/medium/refusal.ts';
import { named, vacuumWave } from '../helpers/ask.ts';

const catalogue = catalogueFromSources();
const into = named('glucose-syrup-solution');

/** At the sodium line in air, the wave of the table. */
const answer = (conditions: Conditions) =>
  answerQuestion(
    makeQuestion(named('air'), into, { ...vacuumWave(589.3e-9), inAir: true }, { conditions }),
    (id) => catalogue.source(id),
  );

describe('the table of glucose syrup (ISO 1743:1973)', () => {
  it.each([
    [0, 20, 1.33299],
    [0.3, 20, 1.38352],
    [0.66, 20, 1.46251],
    [0.66, 60, 1.4545],
  ])('at %d and %d C gives the printed %d', (composition, celsius, n) => {
    const got = answer({ composition, temperature_K: celsius + 273.15 });
    if (isRefusal(got)) throw new Error(got.message);
    expect(got.into.n_published).toBeCloseTo(n, 9);
    expect(got.into.composition).toBe(composition);
  });

  it.each([
    [0.7, 20],
    [0.3, 90],
    [0.3, 10],
  ])('says at %d and %d C that it ends before', (composition, celsius) => {
    for (const extrapolate of [false, true]) {
      const question = makeQuestion(
        named('air'),
        into,
        { ...vacuumWave(589.3e-9), inAir: true },
        {
          conditions: { composition, temperature_K: celsius + 273.15 },
          extrapolate,
        },
      );
      expect(answerQuestion(question, (id) => catalogue.source(id))).toMatchObject({
        code: 'outside-table',
        exit: 3,
        message: expect.stringContaining(
          '0 to 66 % (dry matter of glucose syrup, share by mass) at 20 to 60 C',
        ),
      });
    }
  });

  it('is not asked about where no medium takes a composition, and that is said', () => {
    const question = makeQuestion(named('air'), named('n-bk7'), vacuumWave(589.3e-9), {
      conditions: { composition: 0.3 },
    });
    const got = answerQuestion(question, (id) => catalogue.source(id));
    expect(isRefusal(got) ? [] : got.cautions.map(({ code }) => code)).toContain('condition-not-used');
  });
});
