import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ownFolderPath, readOwnFolder } from '../../src/catalog/own-folder.ts';

let folder = '';
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'own-'));
});
afterAll(() => {
  rmSync(folder, { recursive: true, force: true });
});

describe('the folder of own entries', () => {
  it('follows XDG_DATA_HOME where it is absolute', () => {
    expect(ownFolderPath({ XDG_DATA_HOME: '/data/me' })).toBe('/data/me/halfspace/materials');
    const fallback = ownFolderPath({});
    expect(fallback).toMatch(/\/\.local\/share\/halfspace\/materials$/);
    for (const value of ['', 'data', './data', '../data'])
      expect(ownFolderPath({ XDG_DATA_HOME: value })).toBe(fallback);
  });

  it('is undefined where there is none, or where the path is a file', () => {
    expect(readOwnFolder(join(folder, 'none'))).toBeUndefined();
    writeFileSync(join(folder, 'file'), '');
    expect(readOwnFolder(join(folder, 'file'))).toBeUndefined();
    expect(readOwnFolder(join(folder, 'file', 'below'))).toBeUndefined();
  });

  it('gives the texts of .json and .csv files in the order of names and says what it could not read', () => {
    const own = join(folder, 'own');
    mkdirSync(join(own, 'c.json'), { recursive: true });
    for (const name of ['b.csv', 'A.JSON', '.hidden.json', 'notes.txt']) writeFileSync(join(own, name), name);
    writeFileSync(join(own, 'z.csv'), Buffer.alloc(9_000_000, 48));
    const read = readOwnFolder(own);
    expect(read?.files.map((f) => f.name)).toEqual(['A.JSON', 'b.csv']);
    expect(read?.files[1]).toEqual({ path: join(own, 'b.csv'), name: 'b.csv', text: 'b.csv' });
    expect(read?.problems).toEqual([
      { file: join(own, 'c.json'), path: '', message: 'is not a regular file', remedy: 'move it elsewhere' },
      { file: join(own, 'z.csv'), path: '', message: 'is larger than 8 MB', remedy: 'thin the table out' },
    ]);
  });

  it('names a file that is there and cannot be read', () => {
    const own = join(folder, 'dangling');
    mkdirSync(own);
    symlinkSync(join(own, 'nowhere'), join(own, 'a.json'));
    expect(readOwnFolder(own)?.problems).toEqual([
      {
        file: join(own, 'a.json'),
        path: '',
        message: 'cannot be read (ENOENT)',
        remedy: 'check that it exists and that you may read it',
      },
    ]);
  });
});
