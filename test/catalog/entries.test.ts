/** What an entry and a source must hold to be complete, and numbers that cannot be right. */
import { describe, expect, it } from 'vitest';
import type { Fit } from '../../src/catalog/types.ts';
import { layOut } from '../../tools/json-layout.ts';
import { BIBLIOGRAPHY, BIBLIOGRAPHY_TEXT, ENTRIES, FITS } from './catalog-files.ts';
import { indexOf } from './fit-index.ts';

const ids = new Set(BIBLIOGRAPHY.map((s) => s.id));
const faults = (check: (say: (text: string) => void) => void): string => {
  const list: string[] = [];
  check((text) => list.push(text));
  return list.join('\n');
};

describe('entries', () => {
  it('are one file each, named after the key, with something to compute or to show', () => {
    expect(
      faults((say) => {
        for (const { file, material: m } of ENTRIES) {
          if (file !== `${m.key}.json`) say(`${file}: key ${m.key}`);
          if (!/^[a-z0-9]+(-[a-z0-9]+)*$/.test(m.key))
            say(`${file}: the key is not lower-case words with hyphens`);
          if (m.name.trim() !== m.name || m.name === '') say(`${file}: name "${m.name}"`);
          if (m.class === '') say(`${file}: no class`);
          if (m.fits.length === 0 && !m.reflectanceTables?.length)
            say(`${file}: neither fits nor reflectances`);
          if (m.handling && !m.factsSource) say(`${file}: facts without a source`);
        }
      }),
    ).toBe('');
    expect(ENTRIES.length).toBeGreaterThanOrEqual(464);
    expect(FITS.length).toBeGreaterThanOrEqual(670);
  });

  it('give every fit an id of its own, a source, a sane range and a graded origin', () => {
    expect(
      faults((say) => {
        const seen = new Set<string>();
        for (const { path, fit } of FITS) {
          if (seen.has(path)) say(`${path}: the id is used twice`);
          seen.add(path);
          for (const id of [fit.source, ...(fit.furtherSources ?? [])])
            if (!ids.has(id)) say(`${path}: source ${id} is not in the bibliography`);
          for (const name of ['range_um', 'confirmedRange_um', 'recommendedRange_um'] as const) {
            const range = fit[name];
            if (range && !(range[0] > 0 && range[0] <= range[1]))
              say(`${path}: ${name} ${range.join(' to ')}`);
            if (range && (range[0] < fit.range_um[0] || range[1] > fit.range_um[1]))
              say(`${path}: ${name} reaches beyond the range`);
          }
          if (fit.range_um[0] === fit.range_um[1] && !isSingleValue(fit))
            say(`${path}: a range without width`);
          if (fit.grade === 'A' && fit.recalled)
            say(`${path}: grade A, yet the coefficients are from memory`);
          if (fit.accuracy_n !== undefined && !(fit.accuracy_n >= 0 && fit.accuracy_n <= 0.1))
            say(`${path}: accuracy ${fit.accuracy_n}`);
          const t = fit.temperature_C;
          if (t !== undefined && !(t > -273.15 && t < 1000)) say(`${path}: measured at ${t} C`);
        }
      }),
    ).toBe('');
  });

  it('have an index above zero without a jump over every range', () => {
    expect(
      faults((say) => {
        for (const { path, fit } of FITS) {
          const [low, high] = fit.range_um;
          const steps = low === high ? 0 : 100;
          let before: number | undefined;
          for (let i = 0; i <= steps; i++) {
            const L = steps === 0 ? low : low * (high / low) ** (i / steps);
            const { n, k } = indexOf(fit, L);
            if (!(n > 0 && Number.isFinite(n) && k >= 0 && Number.isFinite(k)))
              return say(`${path}: n ${n}, k ${k} at ${L} um`);
            if (k === 0 && before !== undefined && Math.abs(n - before) > 0.2 * before)
              say(`${path}: n jumps from ${before} to ${n} near ${L} um`);
            before = n;
          }
        }
      }),
    ).toBe('');
  });

  it('state plausible facts', () => {
    const within = (x: number | undefined, low: number, high: number): boolean =>
      x === undefined || (x >= low && x <= high);
    expect(
      faults((say) => {
        for (const { material: m } of ENTRIES) {
          const h = m.handling ?? {};
          const gas = m.class === 'gas';
          if (!within(h.density_g_per_cm3, gas ? 5e-5 : 0.02, gas ? 0.02 : 23)) say(`${m.key}: density`);
          if (!within(h.knoop, 3, 10000)) say(`${m.key}: Knoop hardness ${h.knoop}`);
          if (!within(h.mohs, 1, 10)) say(`${m.key}: Mohs hardness ${h.mohs}`);
          if (!within(h.melting_C, -270, 4000)) say(`${m.key}: melts at ${h.melting_C} C`);
          if (!within(h.expansion_1e6_per_K, -10, 300)) say(`${m.key}: expansion ${h.expansion_1e6_per_K}`);
          if (!within(h.dn_dT_1e6_per_K, -1000, 500)) say(`${m.key}: dn/dT ${h.dn_dT_1e6_per_K}`);
          const t = m.transparency_um;
          if (t && !(t[0] > 0 && t[0] < t[1])) say(`${m.key}: transparent from ${t.join(' to ')}`);
          for (const row of m.absorption ?? []) {
            const given = [row.alpha_per_cm, row.k, row.internalTransmittance].filter((v) => v !== undefined);
            if (given.length !== 1 || (given[0] as number) < 0)
              say(`${m.key}: absorption at ${row.wavelength_um} um`);
            if (
              row.internalTransmittance !== undefined &&
              !(row.internalTransmittance <= 1 && (row.thickness_mm ?? 0) > 0)
            )
              say(`${m.key}: internal transmittance at ${row.wavelength_um} um`);
            if (row.source === '') say(`${m.key}: absorption without a source`);
          }
        }
      }),
    ).toBe('');
  });

  it('and the bibliography stand in the layout of the catalogue', () => {
    const untidy = ENTRIES.filter(({ text }) => text !== layOut(JSON.parse(text))).map((e) => e.file);
    if (BIBLIOGRAPHY_TEXT !== layOut(JSON.parse(BIBLIOGRAPHY_TEXT))) untidy.push('bibliography.json');
    expect(untidy).toEqual([]);
  });
});

describe('the bibliography', () => {
  it('holds each work once, cited somewhere, with what a citation needs', () => {
    const cited = new Set(
      ENTRIES.flatMap(({ material: m }) => [
        ...m.fits.flatMap((f) => [f.source, ...(f.furtherSources ?? [])]),
        ...(m.reflectanceTables ?? []).map((t) => (t as { source: string }).source),
      ]),
    );
    expect(
      faults((say) => {
        const seen = new Set<string>();
        const dois = new Set<string>();
        for (const s of BIBLIOGRAPHY) {
          if (!/^[a-z0-9]+(-[a-z0-9]+)+$/.test(s.id))
            say(`${s.id}: the id is not lower-case words with hyphens`);
          if (seen.has(s.id)) say(`${s.id}: twice`);
          seen.add(s.id);
          if (!cited.has(s.id)) say(`${s.id}: cited nowhere`);
          if (!s.title) say(`${s.id}: no title`);
          if (!s.author?.length || s.author.some((a) => !a.literal && !a.family)) say(`${s.id}: no author`);
          if (s.DOI !== undefined && !/^10\.\d{4,9}\/[^\sA-Z]+$/.test(s.DOI)) say(`${s.id}: DOI ${s.DOI}`);
          if (s.DOI !== undefined && dois.has(s.DOI)) say(`${s.id}: the DOI belongs to another item too`);
          if (s.DOI !== undefined) dois.add(s.DOI);
          if (s.page !== undefined && !/^[A-Z]?\d+[A-Z]*(-[A-Z]?\d+[A-Z]*)?$/.test(s.page))
            say(`${s.id}: page ${s.page}`);
          const year = s.issued?.['date-parts'][0]?.[0];
          if (year !== undefined && !(year >= 1900 && year <= 2026)) say(`${s.id}: year ${year}`);
          if (
            s.type === 'article-journal' &&
            s.author?.some((a) => a.family) &&
            !(s['container-title'] && s.volume && s.page && year)
          )
            say(`${s.id}: an article needs journal, volume, page and year`);
        }
      }),
    ).toBe('');
  });
});

/** A value printed at one wavelength. */
const isSingleValue = (fit: Fit): boolean => 'publishedAt_um' in fit.parameters;
