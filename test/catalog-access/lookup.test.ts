import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { packedSample, sampleMaterial, sampleMaterials } from './sample.ts';

const catalogue = packedSample();

/** The key (with axis) found, or what else came of it. */
function found(name: string, of = catalogue): string {
  const r = of.lookup(name);
  switch (r.kind) {
    case 'one':
      return r.found.axis ? `${r.found.material.key}:${r.found.axis}` : r.found.material.key;
    case 'several':
      return `several ${r.candidates.map((m) => m.key).join(' ')}`;
    case 'no-such-axis':
      return `${r.material.key} has only ${r.axes.join(' ')}`;
    case 'none':
      return 'none';
  }
}

describe('look-up by name', () => {
  it.each([
    ['fused-silica', 'fused-silica'],
    ['Fused Silica', 'fused-silica'],
    ['fusedsilica', 'fused-silica'],
    ['Silica Glass', 'fused-silica'],
    ['fused silica, uv grade', 'fused-silica'],
    ['nbk7', 'n-bk7'],
    ['N-BK7', 'n-bk7'],
    // A key beats an alias, whatever the case typed.
    ['BK7', 'bk7'],
    ['bk7', 'bk7'],
    ['H₂O', 'water'],
    ['h2o', 'water'],
    ['Alpha-Quartz', 'crystal-quartz'],
    // The looser agreement of an alias of silicon does not hide the formula.
    ['CsI', 'caesium-iodide'],
    ['csi', 'caesium-iodide'],
    ['c-Si', 'silicon'],
    ['C-SI', 'silicon'],
    // Written exactly, two formulas that differ by case alone are told apart.
    ['CO', 'carbon-monoxide'],
    ['Co', 'cobalt'],
    ['co', 'several carbon-monoxide cobalt'],
    ['MgO', 'magnesium-oxide'],
    ['MgO:LiNbO₃', 'lithium-niobate-mgo'],
    ['mgo:ln', 'lithium-niobate-mgo'],
    ['KD*P', 'deuterated-kdp'],
    ['kdp', 'none'],
    // Shared by several: all are listed, films last, never the first.
    ['SiO2', 'several crystal-quartz fused-silica silicon-dioxide-film'],
    ['517642', 'several bk7 n-bk7'],
    ['517-642', 'several bk7 n-bk7'],
    // A word in place of a formula names nothing.
    ['glass', 'none'],
    ['silic', 'none'],
    ['', 'none'],
    [' - ', 'none'],
  ])('%s -> %s', (name, expected) => {
    expect(found(name)).toBe(expected);
  });
});

describe('axis of a crystal', () => {
  it.each([
    ['quartz:o', 'crystal-quartz:ordinary'],
    ['quartz:E', 'crystal-quartz:extraordinary'],
    ['QUARTZ : ordinary', 'crystal-quartz:ordinary'],
    ['crystal-quartz:Extraordinary', 'crystal-quartz:extraordinary'],
    ['ktp:x', 'ktp:x'],
    ['KTP:Z', 'ktp:z'],
    ['mgo:ln:e', 'lithium-niobate-mgo:extraordinary'],
    ['MgO:LiNbO3:o', 'lithium-niobate-mgo:ordinary'],
    // Only one of the materials that share the formula has such an axis.
    ['SiO2:o', 'crystal-quartz:ordinary'],
    ['SiO2:y', 'several crystal-quartz fused-silica silicon-dioxide-film'],
    ['quartz:x', 'crystal-quartz has only ordinary extraordinary'],
    ['ktp:o', 'ktp has only x y z'],
    ['ktp:constructor', 'ktp has only x y z'],
    ['ktp:', 'ktp has only x y z'],
    ['water:o', 'water has only isotropic'],
    ['nothing:o', 'none'],
    [':o', 'none'],
  ])('%s -> %s', (name, expected) => {
    expect(found(name)).toBe(expected);
  });
});

describe('any catalogue', () => {
  it('finds every material by its key in any dress', () => {
    for (const m of sampleMaterials) {
      expect(found(m.key.toUpperCase())).toBe(m.key);
      expect(found(` ${m.key.replace(/-/g, '_')} `)).toBe(m.key);
    }
  });

  it('never throws and returns only materials that bear the name', () => {
    const pieces = fc.constantFrom(
      'Si',
      'O2',
      ':',
      'o',
      'e',
      '-',
      ' ',
      'quartz',
      'mgo',
      'LN',
      '\t',
      '\n',
      '₂',
      '5',
    );
    fc.assert(
      fc.property(
        fc.oneof(
          fc.array(pieces, { maxLength: 6 }).map((p) => p.join('')),
          fc.string(),
        ),
        (name) => {
          const r = catalogue.lookup(name);
          if (r.kind === 'several') expect(r.candidates.length).toBeGreaterThan(1);
        },
      ),
      { numRuns: 1000 },
    );
  });

  it('finds a name among names that share its beginning', () => {
    const many = packedSample(
      Array.from({ length: 300 }, (_, i) =>
        sampleMaterial({ key: `sf${i}`, name: `SF${i}, flint`, glassCode: String(100000 + i) }),
      ),
    );
    expect(found('sf1', many)).toBe('sf1');
    expect(found('SF 29', many)).toBe('sf29');
    expect(found('100299', many)).toBe('sf299');
    expect(many.size).toBe(300);
  });
});
