import { mkdirSync, mkdtempSync, rmSync, truncateSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { CatalogueFileError, loadCatalogue, openBundled, readCheckValues } from '../../src/catalog/load.ts';
import { problemText } from '../../src/catalog/own.ts';
import { packCatalogue } from '../../src/catalog/pack.ts';
import { CATALOGUE_FILE, CHECKS_FILE } from '../../src/catalog/packed-header.ts';
import { sampleMaterial, sampleMaterials, sampleSource } from './sample.ts';

let folder = '';
/** A folder with the packed files of some materials. */
function packedFolder(name: string, materials: typeof sampleMaterials): string {
  const path = join(folder, name);
  mkdirSync(path);
  const packed = packCatalogue({ version: '1', date: '2026-01-02', materials, sources: [sampleSource] });
  writeFileSync(join(path, CATALOGUE_FILE), packed.catalogue);
  writeFileSync(join(path, CHECKS_FILE), packed.checks);
  return path;
}

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'load-'));
});
afterAll(() => {
  rmSync(folder, { recursive: true, force: true });
});

describe('opening the catalogue', () => {
  it('reads index and records from the file', () => {
    const path = packedFolder('small', sampleMaterials);
    const { catalogue, problems } = loadCatalogue({
      folder: path,
      env: { XDG_DATA_HOME: join(folder, 'nowhere') },
    });
    expect(problems).toEqual([]);
    expect(catalogue.size).toBe(sampleMaterials.length);
    expect(catalogue.lookup('quartz:o').kind).toBe('one');
    expect(catalogue.source('doe-1999')).toEqual(sampleSource);
    expect(readCheckValues(path).split('\n')).toHaveLength(sampleMaterials.length + 1);
  });

  it('reads an index larger than its first read', () => {
    const many = Array.from({ length: 3000 }, (_, i) =>
      sampleMaterial({
        key: `m-${i}`,
        name: `Material number ${i}`,
        aliases: [`another name of number ${i}`],
      }),
    );
    const catalogue = openBundled(packedFolder('large', many));
    expect(catalogue.keys()).toHaveLength(3000);
    for (const i of [0, 1234, 2999]) expect(catalogue.material(`m-${i}`)?.name).toBe(`Material number ${i}`);
  });

  it.each([
    ['missing', undefined, /cannot|ENOENT/],
    ['empty', '', /not a packed catalogue/],
    ['of another kind', '{"materials":[]}\n', /not a packed catalogue/],
    ['with a broken header', 'halfspace-catalogue 1 {"version":\n', /catalog\.dat/],
  ])('says so where the file is %s', (name, content, message) => {
    const path = join(folder, `bad-${name.replaceAll(' ', '-')}`);
    mkdirSync(path);
    if (content !== undefined) writeFileSync(join(path, CATALOGUE_FILE), content);
    expect(() => openBundled(path)).toThrow(CatalogueFileError);
    expect(() => openBundled(path)).toThrow(message);
  });

  it('says so where the file is cut short', () => {
    const path = packedFolder('cut', sampleMaterials);
    truncateSync(join(path, CATALOGUE_FILE), 3000);
    expect(() => openBundled(path)).toThrow(/cut short or changed/);
    expect(new CatalogueFileError('x').remedy).not.toBe('');
    expect(() => readCheckValues(join(folder, 'nowhere'))).toThrow(CatalogueFileError);
  });
});

describe('entries of the user beside it', () => {
  it('come from XDG_DATA_HOME or from the folder named; faults are problems, never errors', () => {
    const path = packedFolder('with-own', sampleMaterials);
    const data = join(folder, 'data');
    const own = join(data, 'halfspace', 'materials');
    mkdirSync(own, { recursive: true });
    writeFileSync(join(own, 'my-oil.csv'), 'wavelength_um,n\n0.4,1.52\n0.8,1.49\n');
    writeFileSync(join(own, 'broken.json'), '{');
    for (const options of [{ env: { XDG_DATA_HOME: data } }, { ownFolder: own, env: {} }]) {
      const { catalogue, problems } = loadCatalogue({ folder: path, ...options });
      expect(catalogue.lookup('my oil').kind).toBe('one');
      expect(catalogue.size).toBe(sampleMaterials.length + 1);
      expect(problems.map(problemText)).toEqual([
        expect.stringMatching(/^.*broken\.json is not JSON \(.*\); correct it there$/),
      ]);
    }
    const nowhere = join(folder, 'no-such-folder');
    expect(loadCatalogue({ folder: path, ownFolder: nowhere }).problems.map(problemText)).toEqual([
      `${nowhere} is not a folder that exists; name the folder that holds your .json and .csv files`,
    ]);
  });
});
