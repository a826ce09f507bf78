import { mkdtempSync, readdirSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { readOwnFiles, withOwn } from '../../src/catalog/own.ts';
import { isPointTable, readPoints } from '../../src/catalog/points-csv.ts';
import { run } from './in-process.ts';
import { expectAscii, expectPage } from './page-shape.ts';
import { validDocument } from './schema.ts';

/** n of fused silica at lines, I. H. Malitson, J. Opt. Soc. Am. 55, 1205 (1965), Table I; relative to air at 20 C. */
const SILICA = `# name: Silica of the bench
# source: I. H. Malitson, J. Opt. Soc. Am. 55, 1205 (1965), Table I
# reference: air
# temperature_C: 20
wavelength_um,n
0.404656,1.46962
0.435835,1.46669
0.467816,1.46429
0.486133,1.46313
0.508582,1.46187
0.546074,1.46008
0.576959,1.45885
0.579065,1.45877
0.587561,1.45846
0.589262,1.45840
0.643847,1.45671
0.656272,1.45637
0.667815,1.45608
0.706519,1.45515
0.852111,1.45247
0.894350,1.45184
1.01398,1.45024
`;

let folder = '';
const at = (name: string): string => join(folder, name);
const put = (name: string, text: string): string => {
  writeFileSync(at(name), text);
  return at(name);
};
const flat = (text: string): string => text.replace(/\s+/g, ' ');
const rows = (text: string): string => text.replace(/^#.*\n/gm, '');

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'halfspace-fit-'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe('fit', () => {
  it('shows coefficients with their uncertainties, quality and residuals in 72 columns', async () => {
    const { status, out, err } = await run(['fit', put('silica.csv', SILICA), '--terms', '2'], {
      env: { LANG: 'C.UTF-8' },
    });
    expect([status, err]).toEqual([0, '']);
    expectPage(out);
    expect(flat(out)).toContain('Sellmeier formula, 2 poles, fitted to 17 points, 0.404656 µm to 1.01398 µm');
    expect(out).toContain('index and wavelength relative to air; 20 °C');
    expect(out).toMatch(/^ {2}B1 +1\.\d+\(\d+\) +1\.\d{9,}$/m);
    expect(out).toMatch(/^ {2}degrees of freedom +13$/m);
    // Five printed decimals: the residuals are those of rounding.
    const { largest_n } = JSON.parse((await run(['fit', at('silica.csv'), '--json'])).out);
    expect(largest_n).toBeLessThan(1.2e-5);
    expect(out.match(/^ +[\d.]+ µm +1\.\d+ +1\.\d+ +[-+]/gm)).toHaveLength(17);
    expect(out).toMatch(/[⠁-⣿]/);
  });

  it('draws no chart for screen readers, and keeps to ASCII where asked', async () => {
    const file = put('silica.csv', SILICA);
    const env = { LANG: 'C.UTF-8' };
    expect((await run(['fit', file, '--linear'], { env })).out).not.toMatch(/[⠁-⣿]|┤|┴/);
    const { out } = await run(['fit', file, '--ascii'], { env });
    expectAscii(out);
    expect(out).toContain('n^2 = 1 + sum of B lambda^2/(lambda^2 - C^2), lambda in um');
  });

  it('gives JSON of the published schema, with the entry', async () => {
    const file = put('silica.csv', SILICA);
    for (const form of [
      ['--terms', '3'],
      ['--model', 'cauchy', '--terms', '4'],
      ['--terms', '1', '--ascii'],
    ]) {
      const document = validDocument('fit', (await run(['fit', file, '--json', ...form])).out);
      expect(document['points']).toHaveLength(17);
      expect(document['entry']).toMatchObject({ key: 'silica', name: 'Silica of the bench' });
    }
  });

  it('writes an entry that the program reads back, whose check values hold', async () => {
    const file = put('silica.csv', SILICA);
    const entry = at('bench-silica.json');
    const { status, out } = await run(['fit', file, '--terms', '2', '--key', 'bench-silica', '-o', entry]);
    expect(status).toBe(0);
    expect(out).toContain('Entry written to');
    const bundled = catalogueFromSources();
    const text = readFileSync(entry, 'utf8');
    const own = readOwnFiles([{ path: entry, name: 'bench-silica.json', text }], bundled);
    expect(own.problems).toEqual([]);
    const catalogue = () => withOwn(bundled, own);
    const answer = JSON.parse(
      (await run(['air', 'bench-silica', 'd-line', '--json'], { catalogue })).out,
    ) as { into: { n_published: number; temperature_K: number } };
    // The d line printed in the same table, to its five decimals.
    expect(answer.into.n_published).toBeCloseTo(1.45846, 5);
    expect(answer.into.temperature_K).toBeCloseTo(293.15, 9);
    expect((await run(['verify', '--json'], { catalogue })).status).toBe(0);
    expect(readdirSync(folder).filter((f) => f.endsWith('.part'))).toEqual([]);
  });

  it('never writes over a file unless told to, and leaves the old one whole', async () => {
    const file = put('silica.csv', SILICA);
    const old = put('old.json', 'precious');
    const refused = await run(['fit', file, '-o', old]);
    expect([refused.status, refused.out]).toEqual([4, '']);
    expect(refused.err).toContain('is there already and stays as it is; name another file, or add --force');
    expect(readFileSync(old, 'utf8')).toBe('precious');
    symlinkSync(old, at('link.json'));
    expect((await run(['fit', file, '-o', at('link.json'), '--force'])).status).toBe(0);
    expect(JSON.parse(readFileSync(old, 'utf8'))).toMatchObject({ key: 'silica' });
  });

  it('gives the entry alone where the file is standard output', async () => {
    const { out } = await run([
      'fit',
      put('silica.csv', SILICA),
      '-o',
      '-',
      '--name',
      'Mine',
      '--source',
      'me',
    ]);
    expect(JSON.parse(out)).toMatchObject({ key: 'silica', name: 'Mine', sources: [{ title: 'me' }] });
  });

  it('says what it assumes, and takes the command line over the file', async () => {
    const bare = put('bare.csv', rows(SILICA));
    expect(flat((await run(['fit', bare])).out)).toContain(
      'relative to air (assumed; --reference says otherwise); temperature not stated',
    );
    const told = await run(['fit', bare, '--reference', 'vacuum', '--temperature', '21.5C', '--json']);
    expect(JSON.parse(told.out)).toMatchObject({
      reference: 'vacuum',
      referenceStated: true,
      temperature_C: 21.5,
    });
  });

  it('weighs points by their uncertainties and tells chi squared', async () => {
    const weighted = rows(SILICA)
      .replace(/^(0|1)(.*)$/gm, '$1$2,0.00001')
      .replace('um,n', 'um,n,u');
    const { out } = await run(['fit', put('weighted.csv', weighted), '--terms', '2']);
    expect(out).toMatch(/chi² by freedom +0\.\d+/);
    expect(out).toContain('by its u');
  });

  it('doubts more terms than the points determine, and fails then under --strict', async () => {
    const file = put('silica.csv', SILICA);
    const { status, out } = await run(['fit', file, '--terms', '4', '--strict']);
    expect(status).toBe(1);
    expect(flat(out)).toMatch(/! smaller than twice the uncertainty: .*; fewer terms would do/);
    const exact = put('exact.csv', 'wavelength_nm,n\n400,1.53\n500,1.52\n600,1.515\n');
    const tight = await run(['fit', exact, '--model', 'cauchy', '--terms', '3']);
    expect(flat(tight.out)).toContain('as many coefficients as points');
    expect(
      validDocument('fit', (await run(['fit', exact, '--model', 'cauchy', '--terms', '3', '--json'])).out),
    ).toMatchObject({
      covariance: null,
      deviation_n: null,
    });
  });

  it.each([
    [['none.csv'], 4, 'cannot be read (there is no such file)'],
    [['.'], 4, 'is a folder; name a file in it'],
    [['silica.csv', '--terms', '9'], 2, '--terms 9 is too many; a sellmeier formula takes 1 to 4 terms here'],
    [['silica.csv', '--terms', 'x'], 2, '"x" is no number of terms'],
    [['silica.csv', '--model', 'poly'], 2, 'write sellmeier or cauchy'],
    [['silica.csv', '--key', 'bk7', '-o', '-'], 2, 'names the bundled entry bk7, which stays'],
    [['silica.csv', '--key', 'Bad Key'], 2, 'is no key'],
    [['empty.csv'], 2, 'empty.csv has no lines; begin with a header line'],
    [['noheader.csv'], 2, 'line 1 reads "400,1.5"; must be a header line'],
    [['comma.csv'], 2, 'line 2 has 3 values; must have 2: wavelength_nm, n'],
    [['nan.csv'], 2, 'line 2, n is "NaN"; must be a number above 0'],
    [['few.csv', '--terms', '3'], 3, '2 distinct wavelengths for 6 coefficients'],
    [['silica.csv', '-o', 'no-such-folder/x.json'], 4, 'cannot be written (its folder does not exist)'],
  ])('refuses %j with status %i', async (args, status, message) => {
    put('silica.csv', SILICA);
    put('empty.csv', '');
    put('noheader.csv', '400,1.5\n500,1.49\n');
    put('comma.csv', 'wavelength_nm,n\n400,1,5\n500,1,4\n');
    put('nan.csv', 'wavelength_nm,n\n400,NaN\n');
    put('few.csv', 'wavelength_nm,n\n400,1.5\n500,1.49\n');
    const [file = '', ...rest] = args;
    const outcome = await run(['fit', at(file), ...rest]);
    expect([outcome.status, outcome.out]).toEqual([status, '']);
    expect(outcome.err).toContain(message);
  });
});

describe('a table of points', () => {
  it('may come in any order, repeat a wavelength, hold k and name the uncertainty in full', () => {
    const table = readPoints(
      'wavelength_nm;n;k;uncertainty_n\n600;1.5;0.1;1e-4\n587.5618;1.51;0;2e-4\n600;1.502;0;1e-4\n',
    );
    expect(isPointTable(table) && table).toMatchObject({
      hasExtinction: true,
      points: [
        { wavelength_um: 0.6, n: 1.5, uncertainty_n: 1e-4 },
        { wavelength_um: 0.5875618, n: 1.51, uncertainty_n: 2e-4 },
        { wavelength_um: 0.6, n: 1.502, uncertainty_n: 1e-4 },
      ],
    });
  });

  it.each(['wavelength,n', 'wavelength_nm,k', 'wavelength_nm,n,n', 'wavelength_nm', 'nm,n,x'])(
    'is refused under the header %s',
    (header) => {
      expect(readPoints(`${header}\n400,1.5\n`)).toMatchObject([{ path: 'line 1' }]);
    },
  );
});
