import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { type BundledPackage, bundledPackages, noticeText, refusedPackages } from '../../tools/licences.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));

const some = (licence: string, text = 'the text'): BundledPackage => ({
  name: 'some',
  version: '1.0.0',
  licence,
  text,
});

describe('the licence list', () => {
  it('lets permissive licences in, and choices that name one', () => {
    for (const licence of ['MIT', 'ISC', '(MIT OR GPL-3.0-only)', 'MIT AND BSD-3-Clause'])
      expect(refusedPackages([some(licence)])).toEqual([]);
  });

  it('keeps out the others, what states none, and what brings no text', () => {
    for (const licence of ['GPL-3.0-only', 'MIT AND GPL-2.0-only', 'none stated', 'SEE LICENSE IN x'])
      expect(refusedPackages([some(licence)])[0]).toContain('some 1.0.0');
    expect(refusedPackages([some('MIT', '')])[0]).toContain('neither');
  });
});

describe('the notices of the build', () => {
  const { entry, parts } = JSON.parse(readFileSync(path.join(root, 'dist/inputs.json'), 'utf8')) as {
    entry: string[];
    parts: string[];
  };
  const packages = bundledPackages(root, [...entry, ...parts]);

  it('name every package in the program, each with a licence on the list and its text', () => {
    expect(packages.map(({ name }) => name)).toEqual(expect.arrayContaining(['ink', 'react', 'yoga-layout']));
    expect(refusedPackages(packages)).toEqual([]);
    expect(readFileSync(path.join(root, 'dist/THIRD-PARTY.txt'), 'utf8')).toBe(noticeText(packages));
  });
});

describe('a package without a licence file', () => {
  let folder = '';
  beforeEach(() => {
    folder = mkdtempSync(path.join(os.tmpdir(), 'licences-'));
    const place = path.join(folder, 'node_modules/some');
    mkdirSync(place, { recursive: true });
    writeFileSync(path.join(folder, 'LICENSE'), readFileSync(path.join(root, 'LICENSE')));
    writeFileSync(path.join(place, 'package.json'), '{"name":"some","version":"1.0.0","license":"MIT"}');
    writeFileSync(path.join(place, 'a.js'), '/**\n * Copyright (c) Somebody.\n */\n');
    writeFileSync(path.join(place, 'b.js'), '1\n');
  });
  afterEach(() => rmSync(folder, { recursive: true }));
  const only = (file: string): BundledPackage =>
    bundledPackages(folder, [`node_modules/some/${file}`])[0] as BundledPackage;

  it('gets the copyright of its sources over the words of its licence, and says so', () => {
    const { text } = only('a.js');
    expect(text).toMatch(/brings no licence file.*\n\nCopyright \(c\) Somebody\.\n\nPermission is hereby/);
    expect(text).toContain('THE SOFTWARE IS PROVIDED "AS IS"');
    expect(text).not.toContain('halfspace');
  });

  it('is refused where its sources state none', () => {
    expect(refusedPackages([only('b.js')])).toHaveLength(1);
  });
});
