import { describe, expect, it } from 'vitest';
import { fuzz } from './fuzz.ts';
import { TARGETS } from './targets.ts';

/** The same inputs every time: what has passed passes again. `npm run fuzz` makes new ones, and many more. */
const SEED = 20_001;
const INPUTS = 2000;

describe('random inputs', () => {
  for (const target of TARGETS) {
    it(`break nothing: ${target.name}`, { timeout: 60_000 }, async () => {
      const { counts, findings } = await fuzz(SEED, { inputs: INPUTS }, [target]);
      expect(findings.map(({ seed, input, message }) => `seed ${seed}: ${input}\n${message}`)).toEqual([]);
      expect(counts[target.name]).toBe(Math.ceil(INPUTS * target.weight));
    });
  }

  it('are shared out whole', () => {
    expect(TARGETS.reduce((sum, { weight }) => sum + weight, 0)).toBeCloseTo(1, 12);
  });
});
