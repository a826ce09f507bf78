/** An erratum or a retraction of the work behind a fit is said with every number that comes from it. */
import { describe, expect, it } from 'vitest';
import { answerQuestion } from '../../src/answer/answer-question.ts';
import { makeQuestion } from '../../src/answer/question.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import type { Source } from '../../src/catalog/types.ts';
import { isRefusal } from '../../src/medium/refusal.ts';
import { named, vacuumWave } from '../helpers/ask.ts';

const catalogue = catalogueFromSources();
const question = makeQuestion(named('air'), named('fused-silica'), vacuumWave(633e-9));

/** Cautions where the source of the second medium has these further fields. */
function cautions(more: Partial<Source>) {
  const plain = answerQuestion(question, (id) => catalogue.source(id));
  const used = isRefusal(plain) ? undefined : plain.into.fit?.source.id;
  const answer = answerQuestion(question, (id) => {
    const source = catalogue.source(id);
    return source && id === used ? { ...source, ...more } : source;
  });
  return isRefusal(answer) ? [] : answer.cautions;
}

describe('a notice about a source', () => {
  it('is a caution with its place', () => {
    const erratum = 'J. Test 2, 3 (2001): a sign';
    expect(cautions({ erratum })).toContainEqual(
      expect.objectContaining({
        code: 'source-erratum',
        about: 'into',
        level: 'caution',
        text: expect.stringContaining(erratum),
      }),
    );
    expect(cautions({ retraction: 'J. Test 3, 4 (2002)' })).toContainEqual(
      expect.objectContaining({ code: 'source-retracted', about: 'into', level: 'caution' }),
    );
  });

  it('is absent where the source has none', () => {
    expect(cautions({}).map(({ code }) => code)).not.toContain('source-erratum');
  });
});
