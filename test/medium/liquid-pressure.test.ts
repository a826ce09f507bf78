import { describe, expect, it } from 'vitest';
import { ask, named, vacuumWave } from '../helpers/ask.ts';

describe('pressure on a liquid', () => {
  const codes = (pressure_Pa: number): readonly string[] =>
    ask(named('air'), named('water'), vacuumWave(633e-9), { conditions: { pressure_Pa } })
      .cautions.filter((c) => c.about === 'into')
      .map((c) => c.code);

  it('is said to be left out, but for that of the weather', () => {
    expect(codes(5e6)).toContain('condition-not-used');
    expect(codes(98e3)).not.toContain('condition-not-used');
  });
});
