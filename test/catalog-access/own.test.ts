import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type OwnFile, type OwnProblem, problemText, readOwnFiles, withOwn } from '../../src/catalog/own.ts';
import { JET_LENGTH, K, N } from '../../src/dispersion/evaluator.ts';
import { bindModel } from '../../src/dispersion/registry.ts';
import { damagedJson, damagedText } from './mutate.ts';
import { packedSample } from './sample.ts';

const bundled = packedSample();

const file = (name: string, content: unknown): OwnFile => ({
  path: `/home/u/own/${name}`,
  name,
  text: typeof content === 'string' ? content : JSON.stringify(content),
});

const glass = {
  key: 'lab-glass',
  name: 'Lab glass',
  aliases: ['batch 7'],
  formula: 'SiO2',
  fits: [
    {
      parameters: {
        model: 'sellmeier',
        offset: 1,
        poles: [
          { B: 0.7, C_um: 0.07 },
          { B: 0.4, C_um: 0.12 },
          { B: 0.9, C_um: 9.9 },
        ],
      },
      range_um: [0.3, 2],
      reference: 'air',
      source: 'notebook-3',
    },
  ],
  sources: [{ id: 'notebook-3', type: 'dataset', title: 'Notebook 3, page 12' }],
};
const oil = '# name: My oil\n# reference: vacuum\nwavelength_nm,n,k\n400,1.52,0\n600,1.50,1e-6\n800,1.49,0\n';

const texts = (problems: readonly OwnProblem[]): string[] => problems.map(problemText);

describe('own entries', () => {
  const own = readOwnFiles([file('lab-glass.json', glass), file('My oil.csv', oil)], bundled);
  const catalogue = withOwn(bundled, own);

  it('load with what the files leave out filled in', () => {
    expect(own.problems).toEqual([]);
    const found = catalogue.material('lab-glass');
    expect(found).toMatchObject({ own: true, class: 'own entry', aliases: ['batch 7'] });
    expect(found?.fits[0]).toMatchObject({
      id: 'fit-1',
      axis: 'isotropic',
      recommended: true,
      grade: 'B',
      checks: [],
    });
    expect(catalogue.source('notebook-3')?.title).toBe('Notebook 3, page 12');
    expect(catalogue.size).toBe(bundled.size + 2);
    expect(catalogue.keys().slice(-2)).toEqual(['lab-glass', 'my-oil']);
    expect(catalogue.entry('lab-glass')?.own).toBe(true);
    expect(catalogue.hash).toBe(bundled.hash);
  });

  it('are found by key, name and alias like any other', () => {
    for (const name of ['LAB GLASS', 'batch-7', 'my oil', 'My Oil:iso'])
      expect(catalogue.lookup(name).kind).toBe('one');
    expect(catalogue.lookup('fused silica')).toEqual(bundled.lookup('fused silica'));
  });

  it('a table evaluates to its rows and to straight lines between them', () => {
    const fit = catalogue.material('my-oil')?.fits[0];
    expect(fit).toMatchObject({ reference: 'vacuum', range_um: [0.4, 0.8], source: 'own-my-oil' });
    const jet = new Float64Array(JET_LENGTH);
    const bound = bindModel(fit!.parameters, {});
    bound.evaluate(0.6, jet);
    expect(jet[N]).toBeCloseTo(1.5, 12);
    expect(jet[K]).toBeCloseTo(1e-6, 15);
    bound.evaluate(0.5, jet);
    expect(jet[N]).toBeCloseTo(1.51, 12);
  });

  it('says when a table leaves the reference open', () => {
    const r = readOwnFiles([file('oil.csv', 'wavelength_um\tn\n0.5\t1.5\n0.4\t1.6\n')], bundled);
    expect(r.materials[0]?.fits[0]).toMatchObject({ reference: 'air', range_um: [0.4, 0.5] });
    expect(r.materials[0]?.fits[0]?.note).toMatch(/does not state the reference/);
  });
});

describe('own entries and bundled ones', () => {
  it.each([
    ['fused-silica', 'fused-silica'],
    ['fusedsilica', 'fused-silica'],
    ['quartz', 'crystal-quartz'],
    ['sio2', 'crystal-quartz'],
    ['nbk7', 'n-bk7'],
  ])('the key %s is refused, since it names %s', (key, names) => {
    const r = readOwnFiles([file('a.json', { ...glass, key })], bundled);
    expect(r.materials).toEqual([]);
    expect(texts(r.problems)).toEqual([
      `/home/u/own/a.json: key "${key}" names the bundled entry ${names}, which stays; choose a key of its own`,
    ]);
  });

  it('a shared name, alias or formula is reported as ambiguous, never taken over', () => {
    const own = readOwnFiles(
      [file('a.json', { ...glass, name: 'Quartz', aliases: ['CsI', 'Fused Silica'] })],
      bundled,
    );
    expect(own.problems).toEqual([]);
    const catalogue = withOwn(bundled, own);
    const outcome = (name: string): string => {
      const r = catalogue.lookup(name);
      if (r.kind === 'several') return r.candidates.map((m) => m.key).join(' ');
      return r.kind === 'one' ? r.found.material.key : r.kind;
    };
    expect(outcome('quartz')).toBe('crystal-quartz lab-glass');
    expect(outcome('CsI')).toBe('caesium-iodide lab-glass');
    expect(outcome('fused silica')).toBe('fused-silica');
    expect(outcome('SiO2')).toBe('crystal-quartz fused-silica lab-glass silicon-dioxide-film');
  });

  it('two own files of one key: the first in order of names stays', () => {
    const r = readOwnFiles(
      [file('a.json', glass), file('b.json', { ...glass, key: 'lab-glass', sources: [] })],
      bundled,
    );
    expect(r.materials).toHaveLength(1);
    expect(texts(r.problems)[0]).toBe(
      '/home/u/own/b.json: key "lab-glass" is the key of another file (lab-glass); choose a key of its own',
    );
  });

  it('sources may come from bibliography.json or from the bundled bibliography', () => {
    const { sources, ...bare } = glass;
    const withShared = file('bibliography.json', sources);
    expect(readOwnFiles([file('a.json', bare), withShared], bundled).problems).toEqual([]);
    const known = { ...bare, fits: [{ ...bare.fits[0], source: 'doe-1999' }] };
    expect(readOwnFiles([file('a.json', known)], bundled).problems).toEqual([]);
    expect(texts(readOwnFiles([file('a.json', bare)], bundled).problems)).toEqual([
      '/home/u/own/a.json: fits[0].source "notebook-3" is not in the bibliography; add the item or correct the id',
    ]);
  });
});

describe('faults are named with file, place and remedy', () => {
  const fit = glass.fits[0]!;
  const withFit = (over: object): unknown => ({ ...glass, fits: [{ ...fit, ...over }] });
  it.each([
    ['not JSON', '{"key": ', /^\/home\/u\/own\/a\.json is not JSON \(.*\); correct it there$/],
    ['a list', [], /a\.json is a list; must be an object in braces/],
    ['no name', { ...glass, name: undefined }, /: name is missing; add it: a text in quotes/],
    [
      'bad key',
      { ...glass, key: 'Lab Glass' },
      /: key is the text "Lab Glass"; must be a key of lower-case letters/,
    ],
    ['unknown key', { ...glass, comment: 'x' }, /: comment is not a known key; known keys are key, name/],
    [
      'key without unit',
      withFit({ range: [1, 2] }),
      /: fits\[0\]\.range is not a known key; did you mean range_um\?/,
    ],
    [
      'range turned round',
      withFit({ range_um: [2, 0.3] }),
      /: fits\[0\]\.range_um runs from 2 down to 0\.3; state the shorter/,
    ],
    [
      'no reference',
      withFit({ reference: 'glass' }),
      /: fits\[0\]\.reference is the text "glass"; must be one of air, vacuum/,
    ],
    [
      'unknown model',
      withFit({ parameters: { model: 'magic' } }),
      /: fits\[0\]\.parameters\.model is the text "magic"; must be one of constant, sellmeier/,
    ],
    ['no model', withFit({ parameters: {} }), /: fits\[0\]\.parameters\.model is missing; must be one of/],
    [
      'a text for a number',
      withFit({ parameters: { model: 'sellmeier', offset: 1, poles: [{ B: '0.7', C_um: 0.1 }] } }),
      /: fits\[0\]\.parameters\.poles\[0\]\.B is the text "0\.7"; must be a number/,
    ],
    [
      'a pole without position',
      withFit({ parameters: { model: 'sellmeier', offset: 1, poles: [{ B: 0.7 }] } }),
      /: fits\[0\]\.parameters\.poles\[0\] lacks the key that says which kind it is; must have one of C_um, C_um2, C/,
    ],
    [
      'no index in range',
      withFit({ parameters: { model: 'sellmeier', offset: -3 } }),
      /: fits\[0\]\.parameters gives no index at 0\.3 um; check coefficients/,
    ],
    [
      'columns of two lengths',
      withFit({
        parameters: {
          model: 'table',
          abscissa: 'um',
          at: [1, 2, 3],
          n: { values: [1.5, 1.4], along: 'L', kind: 'linear' },
        },
      }),
      /: fits\[0\]\.parameters\.n\.values has 2 values; must have 3, as "at" has/,
    ],
    [
      'negative k',
      withFit({
        parameters: {
          model: 'table',
          abscissa: 'um',
          at: [0.3, 2],
          n: { values: [1.5, 1.4], along: 'L', kind: 'linear' },
          k: { values: [0, -1], along: 'L', kind: 'linear' },
        },
      }),
      /: fits\[0\]\.parameters\.k\.values\[1\] is -1; absorption is 0 or more/,
    ],
    ['an escape code', { ...glass, name: 'x\u001b[2J' }, /: name holds a control character; remove it/],
    [
      'an escape code in a corner',
      { ...glass, bandGap: { note: '\u001b]52;c;' } },
      /control character in the text/,
    ],
    [
      'infinite',
      `{"key":"a","name":"a","fits":[{"parameters":{"model":"constant","n":1e999},"range_um":[1,2],"reference":"air","source":"doe-1999"}]}`,
      /: fits\[0\]\.parameters\.n is Infinity; must be a number above 0/,
    ],
  ])('%s', (_, content, expected) => {
    const r = readOwnFiles([file('a.json', content), file('good.csv', oil)], bundled);
    expect(texts(r.problems).join('\n')).toMatch(expected);
    expect(r.materials.map((m) => m.key)).toEqual(['good']);
  });

  it.each([
    ['', /bad\.csv has no lines; begin with a header line such as/],
    ['um,n\n1,2\n', /: line 1 reads "um,n"; must be a header line such as "wavelength_um,n"/],
    ['wavelength_um,n,k,x\n1,2,3,4\n', /: line 1 reads/],
    ['wavelength_um,n\n1,1.5\n', /bad\.csv has 1 rows of values; give at least two/],
    ['wavelength_um,n\n1,1.5\n2\n', /: line 3 has 1 values; must have 2: wavelength_um, n/],
    ['wavelength_um;n\n1;1,5\n2;1,4\n', /: line 2, n is "1,5"; must be a number above 0, with a point: 1\.5/],
    ['wavelength_um,n,k\n1,1.5,-1e-3\n2,1.4,0\n', /: line 2, k is "-1e-3"; must be a number of at least 0/],
    ['wavelength_um,n\n1,1.5\n1,1.4\n', /: line 3 repeats the wavelength 1; keep one/],
    ['wavelength_um,n\n1,0x10\n2,1.4\n', /: line 2, n is "0x10"/],
    [
      '# reference: glass\nwavelength_um,n\n1,1.5\n2,1.4\n',
      /: line 1, reference is "glass"; must be air or vacuum/,
    ],
    ['# temperature_C: -300\nwavelength_um,n\n1,1.5\n2,1.4\n', /: line 1, temperature_C is "-300"/],
  ])('table %j', (text, expected) => {
    const r = readOwnFiles([file('bad.csv', text), file('good.csv', oil)], bundled);
    expect(texts(r.problems).join('\n')).toMatch(expected);
    expect(r.materials.map((m) => m.key)).toEqual(['good']);
  });

  it('a table whose name makes no key', () => {
    const r = readOwnFiles([file('öl?.csv', oil)], bundled);
    expect(texts(r.problems)[0]).toMatch(/has a name that makes no key; name it with letters/);
  });
});

describe('whatever is done to the files', () => {
  const isPlain = (problems: readonly OwnProblem[]): void => {
    for (const line of texts(problems)) {
      expect(line).not.toMatch(/\n|\u001b|node:internal|^\s*at /);
      expect(line).toMatch(/; ./);
    }
  };

  it('damaged JSON never throws, is explained in one line, and the good file still loads', () => {
    fc.assert(
      fc.property(damagedJson(glass), (damaged) => {
        const r = readOwnFiles([file('a.json', damaged), file('good.csv', oil)], bundled);
        expect(r.materials.map((m) => m.key)).toContain('good');
        expect(r.materials.length + (r.problems.length > 0 ? 1 : 0)).toBeGreaterThanOrEqual(2);
        isPlain(r.problems);
        const catalogue = withOwn(bundled, r);
        for (const entry of catalogue.entries().filter((e) => e.own))
          expect(catalogue.lookup(entry.key).kind).toBe('one');
      }),
      { numRuns: 600 },
    );
  });

  it('damaged text of JSON and tables never throws either', () => {
    fc.assert(
      fc.property(
        damagedText(JSON.stringify(glass)),
        damagedText(oil),
        damagedText(JSON.stringify(glass.sources)),
        (a, b, c) => {
          const files = [
            file('a.json', a),
            file('bibliography.json', c),
            file('b.csv', b),
            file('good.csv', oil),
          ];
          const r = readOwnFiles(files, bundled);
          expect(r.materials.map((m) => m.key)).toContain('good');
          isPlain(r.problems);
          for (const m of r.materials)
            for (const f of m.fits) expect(f.range_um[0]).toBeLessThanOrEqual(f.range_um[1]);
        },
      ),
      { numRuns: 600 },
    );
  });

  it('very deep nesting is no trap', () => {
    const deep = `${'['.repeat(50_000)}${']'.repeat(50_000)}`;
    const r = readOwnFiles([file('a.json', `{"key":${deep}}`), file('good.csv', oil)], bundled);
    expect(r.materials).toHaveLength(1);
    expect(r.problems.length).toBeGreaterThan(0);
  });
});
