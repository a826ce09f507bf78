import { describe, expect, it, vi } from 'vitest';
import { checkMaterial } from '../../src/catalog/check-material.ts';
import { passes } from '../../src/catalog/check-values.ts';
import { catalogueFromSources, readCatalogueSources } from '../../src/catalog/from-sources.ts';
import { packCatalogue } from '../../src/catalog/pack.ts';
import { openPacked } from '../../src/catalog/packed.ts';
import { toleranceUsed, verifyMaterials, withCheckValues } from '../../src/catalog/verify.ts';
import { cite } from '../../src/cite/cite.ts';
import { parseBibtex } from '../cite/parse-bibtex.ts';

const sources = readCatalogueSources();
const catalogue = catalogueFromSources();

describe('the catalogue', () => {
  it('has entries that hold together, with sources that exist', () => {
    const ids = new Set(sources.sources.map((s) => s.id));
    for (const m of sources.materials)
      expect([m.key, checkMaterial(m, (id) => ids.has(id))]).toEqual([m.key, []]);
  });

  it('names no source that nothing uses', () => {
    const used = new Set(
      sources.materials.flatMap((m) => m.fits.flatMap((f) => [f.source, ...(f.furtherSources ?? [])])),
    );
    const text = JSON.stringify(sources.materials);
    const idle = sources.sources
      .map((s) => s.id)
      .filter((id) => !used.has(id) && !text.includes(JSON.stringify(id)));
    expect(idle).toEqual([]);
  });

  it('finds every material by its key and by nothing less than all that share a name', () => {
    for (const m of sources.materials) {
      const byKey = catalogue.lookup(m.key);
      expect(byKey.kind === 'one' && byKey.found.material.key).toBe(m.key);
      for (const name of [m.name, ...m.aliases, m.glassCode ?? m.key]) {
        const r = catalogue.lookup(name);
        if (r.kind === 'several') expect(r.candidates.map((c) => c.key)).toContain(m.key);
        else expect(r.kind).toBe('one');
      }
    }
  });

  it.each([
    ['SiO₂', ['crystal-quartz', 'fused-quartz-ir', 'fused-silica', 'silicon-dioxide-film']],
    ['fused silica', ['fused-silica']],
    ['Fused_Silica', ['fused-silica']],
    ['nbk7', ['n-bk7']],
    ['CsI', ['caesium-iodide']],
    ['c-Si', ['silicon']],
    ['517642', ['bk7', 'bsc7', 'h-k9l', 'n-bk7']],
    ['krs5', ['krs-5']],
    ['KD*P', ['deuterated-kdp']],
    ['glass', []],
  ])('%s', (name, keys) => {
    const r = catalogue.lookup(name);
    const found = r.kind === 'one' ? [r.found.material] : r.kind === 'several' ? r.candidates : [];
    expect(found.map((m) => m.key)).toEqual(keys);
  });

  it.each([
    ['sapphire:o', 'ordinary'],
    ['SiO2:e', 'extraordinary'],
    ['KTP:z', 'z'],
    ['mgo:ln:e', 'extraordinary'],
  ])('%s', (name, axis) => {
    const r = catalogue.lookup(name);
    expect(r.kind === 'one' && r.found.axis).toBe(axis);
  });
});

describe('every published value', () => {
  const report = verifyMaterials(sources.materials);

  it('is met within its tolerance', () => {
    const missed = report.failures.map((v) => ({
      what: `${v.key} ${v.axis} ${v.fit} ${v.quantity} at ${v.wavelength_um ?? 'lines'} um`,
      published: v.published,
      computed: v.computed,
      tolerance: v.tolerance,
      source: v.source,
    }));
    expect(missed).toEqual([]);
    expect(report.passed).toBe(report.tested);
  });

  it('is one of many, of every grade', () => {
    expect(report.materials).toBe(sources.materials.length);
    expect(report.tested).toBeGreaterThan(2700);
    for (const grade of ['A', 'B', 'C'] as const) {
      expect(report.grades[grade].tested).toBeGreaterThan(50);
      expect(toleranceUsed(report.grades[grade].worst!)).toBeLessThanOrEqual(1 + 1e-9);
    }
  });

  it('would be missed by a coefficient changed in its fourth digit', () => {
    const glass = sources.materials.find((m) => m.key === 'n-bk7')!;
    const changed = JSON.parse(JSON.stringify(glass).replace('1.03961212', '1.03971212')) as typeof glass;
    expect(verifyMaterials([changed]).failures.length).toBeGreaterThan(0);
    expect(verifyMaterials([glass]).failures).toEqual([]);
  });

  it('that cannot be computed counts as missed', () => {
    const value = { ...report.values.find((v) => v.tolerance !== undefined)!, computed: Number.NaN };
    expect(passes(value)).toBe(false);
    expect(toleranceUsed(value)).toBe(Number.POSITIVE_INFINITY);
  });

  it('is recomputed from the packed files to the same result', () => {
    const packed = packCatalogue(sources);
    const again = verifyMaterials(withCheckValues(openPacked(packed.catalogue), packed.checks.toString()));
    expect(again.values.map((v) => v.computed)).toEqual(
      verifyMaterials([...sources.materials].sort((a, b) => (a.key < b.key ? -1 : 1))).values.map(
        (v) => v.computed,
      ),
    );
    expect([again.tested, again.setAside]).toEqual([report.tested, report.setAside]);
  });
});

describe('what answers need and no more', () => {
  it('fits without stated accuracy carry what their check values say about their digits', () => {
    const guided = catalogue.keys().flatMap((key) => catalogue.material(key)?.fits ?? []);
    for (const fit of guided) {
      expect(fit.checks).toEqual([]);
      expect(fit.abbe).toBeUndefined();
      if (fit.accuracy_n !== undefined) expect(fit.digitsGuide_n).toBeUndefined();
      if (fit.digitsGuide_n !== undefined) expect(fit.digitsGuide_n).toBeGreaterThan(0);
    }
    expect(guided.filter((f) => f.digitsGuide_n !== undefined).length).toBeGreaterThan(50);
  });

  it.each(['fused silica', 'n-bk7', 'silicon', 'gold', 'water', 'KTP:z', 'SiO2', 'nosuch'])(
    'looks up %s without parsing anything but the header and the materials it gives',
    (name) => {
      const packed = packCatalogue(sources).catalogue;
      const parsed = vi.spyOn(JSON, 'parse');
      const found = openPacked(packed).lookup(name);
      const keys = parsed.mock.results.slice(1).map(({ value }) => (value as { key?: string }).key);
      parsed.mockRestore();
      const given =
        found.kind === 'one' ? [found.found.material] : found.kind === 'several' ? found.candidates : [];
      expect(keys).toEqual(given.map(({ key }) => key));
    },
  );
});

describe('the bibliography', () => {
  it('cites as BibTeX with distinct keys and no empty field', () => {
    const entries = parseBibtex(cite(sources.sources, 'bibtex'));
    expect(new Set(entries.map((e) => e.key)).size).toBe(sources.sources.length);
    for (const e of entries) {
      expect(e.fields['title']).toBeTruthy();
      for (const value of Object.values(e.fields)) expect(value).toMatch(/^[\x20-\x7e]+$/);
      if (e.fields['pages']) expect(e.fields['pages']).not.toMatch(/\d-\d|\u2013/);
    }
  });

  it('cites as CSL-JSON that is the record itself, and as one line of text each', () => {
    expect(JSON.parse(cite(sources.sources, 'csl'))).toEqual(sources.sources);
    const lines = cite(sources.sources, 'text').split('\n');
    expect(lines).toHaveLength(sources.sources.length);
    for (const line of lines) expect(line.length).toBeGreaterThan(20);
  });

  it('states years as numbers, and no date after the catalogue', () => {
    for (const s of sources.sources) {
      const year = s.issued?.['date-parts'][0]?.[0];
      if (year !== undefined) {
        expect(year).toBeGreaterThan(1700);
        expect(year).toBeLessThanOrEqual(Number(sources.date.slice(0, 4)));
      }
    }
  });
});
