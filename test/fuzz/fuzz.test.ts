import { describe, expect, it } from 'vitest';
import { fuzz } from './fuzz.ts';
import { TARGETS } from './targets.ts';

/** A new day, new inputs; a failure says the seed. */
const SEED = Math.floor(Date.now() / 86_400_000);

describe('random inputs', () => {
  for (const target of TARGETS) {
    it(`break nothing: ${target.name}`, async () => {
      const { counts, findings } = await fuzz(SEED, { inputs: 4000, time_ms: 2000 }, [target]);
      expect(findings.map(({ seed, input, message }) => `seed ${seed}: ${input}\n${message}`)).toEqual([]);
      expect(counts[target.name]).toBeGreaterThan(10);
    });
  }
});
