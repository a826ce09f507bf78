/** Every published value of every entry, recomputed; the tolerance beside it is the agreement found when it was entered. */
import { describe, expect, it } from 'vitest';
import { type CheckedValue, checkValues, passes } from '../../src/catalog/check-values.ts';
import { QUANTITIES, STATES } from '../../src/catalog/fit-optics.ts';
import type { Fit, Material } from '../../src/catalog/types.ts';
import { ENTRIES, FITS } from './catalog-files.ts';
import { digits17 } from './fit-index.ts';

const line = (v: CheckedValue): string =>
  `${v.key}/${v.axis}/${v.fit} at ${v.wavelength_um} um: ${v.quantity} ${digits17(v.computed)}, published ` +
  `${digits17(v.published)}, off ${digits17(v.computed - v.published)}, allowed ${v.tolerance} (${v.source})`;

describe('published values', () => {
  it('are met by every fit within their own tolerances', () => {
    const all = ENTRIES.flatMap(({ material }) => checkValues(material));
    expect(
      all
        .filter((v) => !passes(v))
        .map(line)
        .join('\n'),
    ).toBe('');
    expect(all.filter((v) => v.setAside === undefined).length).toBeGreaterThan(3000);
  });

  it('stand in complete rows of known columns, inside the range of their fit unless set aside', () => {
    const bad: string[] = [];
    for (const { path, fit } of FITS) {
      for (const group of fit.checks) {
        const where = `${path} (${group.source})`;
        const quantities = group.columns.filter((c) => Object.hasOwn(QUANTITIES, c));
        const tolerances = quantities.map((q) => `tolerance_${q}`);
        const known = new Set(['wavelength_um', ...STATES, ...quantities, ...tolerances]);
        if (group.columns[0] !== 'wavelength_um') bad.push(`${where}: the first column is not wavelength_um`);
        if (quantities.length === 0) bad.push(`${where}: no published quantity`);
        for (const c of [...group.columns, ...Object.keys(group.conditions ?? {})])
          if (!known.has(c)) bad.push(`${where}: column ${c} means nothing here`);
        for (const t of tolerances)
          if (group.columns.includes(t) === (group.setAside !== undefined))
            bad.push(
              `${where}: ${t} is ${group.setAside === undefined ? 'missing' : 'given for a set-aside group'}`,
            );
        for (const row of group.rows) {
          if (row.length !== group.columns.length || !row.every(Number.isFinite))
            bad.push(`${where}: row ${JSON.stringify(row)} does not fit its columns`);
          if (group.setAside === undefined && !covers(fit, row[0] as number))
            bad.push(`${where}: ${row[0]} um lies outside ${fit.range_um.join(' to ')} um`);
        }
      }
    }
    expect(bad.join('\n')).toBe('');
  });

  it('notice a coefficient that is wrong in its fifth digit', () => {
    const silica = ENTRIES.find((e) => e.material.key === 'fused-silica')?.material as Material;
    const wrong = {
      ...silica,
      fits: silica.fits.map((fit): Fit => {
        const p = fit.parameters;
        if (fit.id !== 'malitson-1965' || p.model !== 'sellmeier') return fit;
        return {
          ...fit,
          parameters: { ...p, poles: p.poles?.map((pole) => ({ ...pole, B: pole.B * 1.0001 })) ?? [] },
        };
      }),
    };
    expect(checkValues(silica).every(passes)).toBe(true);
    expect(checkValues(wrong).filter((v) => v.fit === 'malitson-1965' && !passes(v)).length).toBeGreaterThan(
      5,
    );
  });
});

/** Fits of one published wavelength are compared with neighbours a fraction of a nanometre away. */
function covers(fit: Fit, wavelength_um: number): boolean {
  const [low, high] = fit.range_um;
  return low === high || (wavelength_um >= low * (1 - 1e-6) && wavelength_um <= high * (1 + 1e-6));
}
