/** No coefficient, range, reference, temperature or thermal constant changes by accident. */
import { describe, expect, it } from 'vitest';
import type { Fit, Material } from '../../src/catalog/types.ts';
import { differences, freeze, readFrozenFacts } from '../../tools/freeze-facts.ts';
import { ENTRIES } from './catalog-files.ts';

const materials = ENTRIES.map((e) => e.material);

describe('frozen facts', () => {
  it('are those of every fit (after a change that is meant: npx tsx tools/freeze-facts.ts)', () => {
    expect(differences(readFrozenFacts(), freeze(materials)).join('\n')).toBe('');
  });

  it('notice a change of the last digit of one coefficient, and nothing in the order of keys', () => {
    const one = materials.find((m) => m.key === 'n-bk7') as Material;
    const fit = one.fits[0] as Fit;
    if (fit.parameters.model !== 'sellmeier') throw new Error('N-BK7 is no Sellmeier fit');
    const with_ = (changed: Fit): Material => ({ ...one, fits: [changed] });
    const reordered = {
      ...fit,
      parameters: { poles: fit.parameters.poles ?? [], offset: 1, model: 'sellmeier' as const },
    };
    const [first, ...others] = fit.parameters.poles ?? [];
    if (!first) throw new Error('N-BK7 has no poles');
    const changed = {
      ...fit,
      parameters: { ...fit.parameters, poles: [{ ...first, B: first.B + 1e-8 }, ...others] },
    };
    expect(differences(freeze([with_(fit)]), freeze([with_(reordered)]))).toEqual([]);
    expect(differences(freeze([with_(fit)]), freeze([with_(changed)]))).toEqual([
      'n-bk7/isotropic/schott-2025: changed',
    ]);
  });
});
