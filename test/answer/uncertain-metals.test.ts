import { describe, expect, it } from 'vitest';
import { isRefusal } from '../../src/medium/refusal.ts';
import { named, tryAsk, vacuumWave } from '../helpers/ask.ts';

describe('plates of metals whose index is hardly known', () => {
  // The stated or assumed uncertainty of n exceeds n itself for several of them.
  it.each(['aluminium', 'iron', 'nickel', 'platinum', 'titanium', 'tungsten', 'gold', 'silver'])(
    'are answered, opaque: %s',
    (key) => {
      for (const wavelength_m of [400e-9, 1064e-9, 10.6e-6]) {
        const answer = tryAsk(named('air'), named('air'), vacuumWave(wavelength_m), {
          layers: [{ medium: named(key), thickness: { kind: 'length', thickness_m: 1e-3 } }],
          coherenceLength_m: 1e-12,
        });
        if (isRefusal(answer)) {
          expect(answer.code, key).toBe('outside-fit-range');
          continue;
        }
        expect(answer.stack?.T, key).toBe(0);
        expect((answer.stack?.R ?? 0) + (answer.stack?.A ?? 0), key).toBeCloseTo(1, 12);
      }
    },
  );
});
