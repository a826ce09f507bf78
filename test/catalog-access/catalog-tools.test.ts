import { describe, expect, it } from 'vitest';
import { checkShape } from '../../src/catalog/check-shape.ts';
import { checkValues } from '../../src/catalog/check-values.ts';
import { readCatalogueSources } from '../../src/catalog/from-sources.ts';
import { materialShape } from '../../src/catalog/material-shape.ts';
import { parameterShapes } from '../../src/catalog/parameter-shapes.ts';
import type { Material } from '../../src/catalog/types.ts';
import { describeChange } from '../../tools/catalog-diff.ts';
import { sharedNames, swappedAxes, swappedColumns } from '../../tools/catalog-lint.ts';
import { blankEntry } from '../../tools/new-material.ts';
import { sampleMaterial } from './sample.ts';

const { materials } = readCatalogueSources();
const entry = (key: string): Material => materials.find((m) => m.key === key)!;

describe('swapped columns and axes', () => {
  it('are found where the ordinary and the extraordinary fit of a crystal change places', () => {
    const calcite = entry('calcite');
    expect(swappedAxes(calcite, checkValues(calcite))).toEqual([]);
    const other = { ordinary: 'extraordinary', extraordinary: 'ordinary' } as const;
    const swapped: Material = {
      ...calcite,
      // The check values stay where they were.
      fits: calcite.fits.map((f) => {
        const axis = other[f.axis as 'ordinary'];
        const twin = calcite.fits.find((g) => g.axis === axis && g.recommended === f.recommended) ?? f;
        return { ...twin, axis: f.axis, id: f.id, checks: f.checks };
      }),
    };
    expect(swappedAxes(swapped, checkValues(swapped)).length).toBeGreaterThan(1);
  });

  it('are found where n and k of a metal change places', () => {
    const gold = entry('gold');
    expect(swappedColumns(checkValues(gold))).toEqual([]);
    const swapped: Material = {
      ...gold,
      fits: gold.fits.map((f) => ({
        ...f,
        checks: f.checks.map((g) => ({
          ...g,
          columns: g.columns.map(
            (c) => ({ n: 'k', k: 'n', tolerance_n: 'tolerance_k', tolerance_k: 'tolerance_n' })[c] ?? c,
          ),
        })),
      })),
    };
    expect(swappedColumns(checkValues(swapped)).length).toBeGreaterThan(5);
  });
});

describe('shared names', () => {
  it('are named once for each, glass codes and formulas aside', () => {
    const a = sampleMaterial({
      key: 'a',
      name: 'Alpha',
      aliases: ['Same Name', '517642'],
      formula: 'SiO2',
      glassCode: '517642',
    });
    const b = sampleMaterial({
      key: 'b',
      name: 'Beta',
      aliases: ['same-name'],
      formula: 'SiO2',
      glassCode: '517642',
    });
    const notes = sharedNames([a, b]);
    expect(notes.map((n) => `${n.key} ${n.message}`)).toEqual([
      'a and b share a name: alias "Same Name" of a, alias "same-name" of b',
    ]);
  });
});

describe('what changed', () => {
  const glass = entry('n-bk7');
  it('names the field, the old and the new value, and what it does to n', () => {
    const changed = JSON.parse(
      JSON.stringify(glass).replace('1.03961212', '1.03961312').replace('"name":"', '"name":"New '),
    ) as Material;
    const lines = describeChange(glass, changed);
    expect(lines[0]).toBe(`name: ${JSON.stringify(glass.name)} -> ${JSON.stringify(changed.name)}`);
    expect(lines[1]).toMatch(
      /^fit \S+ \(isotropic\): parameters\.poles\[\d\]\.B: 1\.03961212 -> 1\.03961312$/,
    );
    expect(lines[2]).toMatch(/: n changes by up to [34]\.\de-7 \(at 0\.3\d* um\)$/);
    expect(lines).toHaveLength(3);
  });
  it('tells new, removed and unchanged entries, fits and check values apart', () => {
    expect(describeChange(glass, glass)).toEqual([]);
    expect(describeChange(undefined, glass)[0]).toMatch(/^new entry/);
    expect(describeChange(glass, undefined)[0]).toMatch(/^removed/);
    const [first] = glass.fits;
    expect(describeChange(glass, { ...glass, fits: [] })).toEqual(
      glass.fits.map((f) => `fit ${f.id} (${f.axis}) removed`),
    );
    expect(describeChange({ ...glass, fits: [] }, { ...glass, fits: [first!] })).toEqual([
      `new fit ${first!.id} (isotropic)`,
    ]);
    expect(
      describeChange(glass, { ...glass, fits: glass.fits.map((f) => ({ ...f, checks: [] })) })[0],
    ).toMatch(/check values changed, \d+ -> 0 rows/);
  });
});

describe('a new entry', () => {
  it.each(Object.keys(parameterShapes()))(
    'of model %s has every key and lacks only what stands as null',
    (model) => {
      const blank = blankEntry({ key: 'new-glass', name: 'New glass', model });
      const faults = checkShape(blank, materialShape());
      expect(faults.length).toBeGreaterThan(5);
      for (const fault of faults) expect(fault.message).toBe('is null');
    },
  );
  it('refuses keys and models that do not exist', () => {
    expect(() => blankEntry({ key: 'New Glass', name: 'x', model: 'sellmeier' })).toThrow(
      /must be lower-case/,
    );
    expect(() => blankEntry({ key: 'new-glass', name: 'x', model: 'magic' })).toThrow(
      /no model "magic"; there are constant, sellmeier/,
    );
  });
});
