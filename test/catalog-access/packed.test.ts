import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { canonicalJson, contentHash, type MaterialChecks, packCatalogue } from '../../src/catalog/pack.ts';
import { indexLength, openPacked } from '../../src/catalog/packed.ts';
import { sampleFit, sampleMaterial, sampleMaterials, sampleSource } from './sample.ts';

const input = { version: '3.1', date: '2026-01-02', materials: sampleMaterials, sources: [sampleSource] };

describe('the packed file', () => {
  const packed = packCatalogue(input);
  const catalogue = openPacked(packed.catalogue);

  it('gives back every record but the check values', () => {
    for (const m of sampleMaterials)
      expect(catalogue.material(m.key)).toEqual({ ...m, fits: m.fits.map((f) => ({ ...f, checks: [] })) });
    expect(catalogue.source('doe-1999')).toEqual(sampleSource);
    expect(catalogue.material('nothing')).toBeUndefined();
    expect(catalogue.source('nothing')).toBeUndefined();
    expect(catalogue.material('fused-silica\t0')).toBeUndefined();
  });

  it('keeps the check values in the second file, one material a line', () => {
    const lines = packed.checks.toString().trimEnd().split('\n');
    expect(lines).toHaveLength(sampleMaterials.length);
    const ktp = lines.map((l) => JSON.parse(l) as MaterialChecks).find((c) => c.key === 'ktp');
    expect(Object.keys(ktp?.checks ?? {}).sort()).toEqual(['x/doe-1999', 'y/doe-1999', 'z/doe-1999']);
    expect(ktp?.checks['x/doe-1999']?.[0]?.rows).toEqual([[0.5, 1.5, 1e-6]]);
  });

  it('states hash, date, version and size', () => {
    expect(catalogue.hash).toMatch(/^[0-9a-f]{12}$/);
    expect([catalogue.version, catalogue.date, catalogue.size]).toEqual([
      '3.1',
      '2026-01-02',
      sampleMaterials.length,
    ]);
    expect(catalogue.keys()).toEqual(sampleMaterials.map((m) => m.key).sort());
    expect(catalogue.sourceIds()).toEqual(['doe-1999']);
  });

  it('lists entries without parsing a material', () => {
    const parse = vi.spyOn(JSON, 'parse');
    const fresh = openPacked(packed.catalogue);
    const headerOnly = parse.mock.calls.length;
    const entry = fresh.entries().find((e) => e.key === 'crystal-quartz');
    expect(parse.mock.calls.length).toBe(headerOnly);
    expect(headerOnly).toBe(1);
    fresh.lookup('quartz:o');
    expect(parse.mock.calls.length).toBe(2);
    parse.mockRestore();
    expect(entry).toEqual({
      key: 'crystal-quartz',
      name: 'Crystal quartz',
      formula: 'SiO2',
      aliases: ['quartz', 'α-quartz'],
      class: 'test class',
      axes: ['ordinary', 'extraordinary'],
    });
  });

  it('refuses bytes that are something else', () => {
    expect(() => openPacked(Buffer.from('{}'))).toThrow(/packed catalogue/);
    expect(() => openPacked(Buffer.alloc(0))).toThrow(/packed catalogue/);
  });

  it('refuses two materials of one key and line breaks in names', () => {
    const twice = [sampleMaterial({ key: 'a' }), sampleMaterial({ key: 'a' })];
    expect(() => packCatalogue({ ...input, materials: twice })).toThrow(/share the material key "a"/);
    expect(() =>
      packCatalogue({ ...input, materials: [sampleMaterial({ key: 'a', name: 'x\ty' })] }),
    ).toThrow(/"a"/);
  });
});

describe('the digits guide', () => {
  const guide = (
    rows: readonly (readonly [number, number, number])[],
    accuracy_n?: number,
  ): number | undefined => {
    const { accuracy_n: _, ...bare } = sampleFit();
    const columns = ['wavelength_um', 'n', 'tolerance_n'];
    const check = { source: 's', recalled: false, independent: true, columns, rows };
    const fit = { ...bare, checks: [check], ...(accuracy_n === undefined ? {} : { accuracy_n }) };
    const packed = packCatalogue({ ...input, materials: [sampleMaterial({ key: 'a', fits: [fit] })] });
    return openPacked(packed.catalogue).material('a')?.fits[0]?.digitsGuide_n;
  };
  it('is the largest difference from the values the fit is tested against', () => {
    expect(
      guide([
        [0.5, 1.5001, 1e-3],
        [0.6, 1.5003, 1e-3],
      ]),
    ).toBe(0.0003);
  });
  it('is no finer than the finest of those values is printed', () => {
    expect(
      guide([
        [0.5, 1.5, 1e-3],
        [0.6, 1.5, 1e-3],
      ]),
    ).toBe(0.05);
  });
  it('is absent where the source states the accuracy, or where nothing is tested', () => {
    expect(guide([[0.5, 1.5001, 1e-3]], 1e-5)).toBeUndefined();
    expect(guide([])).toBeUndefined();
  });
});

describe('the content hash', () => {
  it('does not depend on the order of files or keys, and does on any value', () => {
    const shuffled = [...sampleMaterials]
      .reverse()
      .map((m) => Object.fromEntries(Object.entries(m).reverse()));
    expect(packCatalogue({ ...input, materials: shuffled as never }).hash).toBe(packCatalogue(input).hash);
    const changed = sampleMaterials.map((m, i) => (i === 3 ? { ...m, note: 'changed' } : m));
    expect(contentHash(changed, [])).not.toBe(contentHash(sampleMaterials, []));
  });

  it('canonical JSON is JSON of the same value', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        expect(JSON.parse(canonicalJson(value))).toEqual(JSON.parse(JSON.stringify(value)));
      }),
    );
  });
});

describe('work', () => {
  it('to look a name up grows with the materials it gives, not with the catalogue', () => {
    const many = Array.from({ length: 2000 }, (_, i) =>
      sampleMaterial({ key: `material-${i}`, aliases: [`m ${i}`] }),
    );
    const { catalogue: bytes } = packCatalogue({ ...input, materials: many });
    const whole = bytes.length;
    const read: number[] = [];
    const catalogue = openPacked(bytes.subarray(0, indexLength(bytes)), (from, length) => {
      read.push(length);
      return bytes.subarray(from, from + length);
    });
    for (let i = 0; i < 200; i++) expect(catalogue.lookup(`m ${i * 7}`).kind).toBe('one');
    for (let i = 0; i < 200; i++) catalogue.lookup(`m ${i * 7}`);
    expect(read).toHaveLength(200);
    expect(Math.max(...read)).toBeLessThan(whole / 1000);
  });
});
