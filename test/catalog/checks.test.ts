/** Every published value of every fit, recomputed; the tolerance beside it is the agreement found when it was entered. */
import { describe, expect, it } from 'vitest';
import { FITS } from './catalog-files.ts';
import { digits17, QUANTITY_NAMES, recompute, STATES } from './recompute.ts';

/** Rounding of a tolerance that was itself computed from the difference. */
const SLACK = 1 + 1e-6;

describe('published values', () => {
  it('are met by every fit within their own tolerances', () => {
    const bad: string[] = [];
    let tested = 0;
    for (const { path, fit } of FITS) {
      for (const group of fit.checks) {
        if (group.setAside !== undefined) continue;
        for (const r of recompute(fit, group)) {
          tested++;
          const off = Math.abs(r.computed - r.published);
          if (!(r.tolerance !== undefined && off <= r.tolerance * SLACK))
            bad.push(
              `${path} at ${r.wavelength_um} um: ${r.quantity} ${digits17(r.computed)}, published ${digits17(r.published)}, ` +
                `off ${digits17(r.computed - r.published)}, allowed ${r.tolerance} (${group.source})`,
            );
        }
      }
    }
    expect(bad.join('\n')).toBe('');
    expect(tested).toBeGreaterThan(1000);
  });

  it('stand in complete rows of known columns, inside the range of their fit unless set aside', () => {
    const bad: string[] = [];
    for (const { path, fit } of FITS) {
      for (const group of fit.checks) {
        const where = `${path} (${group.source})`;
        if (group.columns[0] !== 'wavelength_um') bad.push(`${where}: the first column is not wavelength_um`);
        const quantities = group.columns.filter((c) => QUANTITY_NAMES.has(c));
        if (quantities.length === 0) bad.push(`${where}: no published quantity`);
        const known = new Set([
          'wavelength_um',
          ...STATES,
          ...quantities,
          ...(group.setAside === undefined ? quantities.map((q) => `tolerance_${q}`) : []),
        ]);
        for (const c of [...group.columns, ...Object.keys(group.conditions ?? {})])
          if (!known.has(c)) bad.push(`${where}: column ${c} means nothing here`);
        if (group.setAside === undefined)
          for (const q of quantities)
            if (!group.columns.includes(`tolerance_${q}`)) bad.push(`${where}: ${q} has no tolerance`);
        for (const row of group.rows) {
          if (row.length !== group.columns.length || row.some((v) => !Number.isFinite(v)))
            bad.push(`${where}: row ${JSON.stringify(row)} does not fit its columns`);
          const L = row[0] as number;
          const [low, high] = fit.range_um;
          const single = low === high;
          if (group.setAside === undefined && !single && (L < low * (1 - 1e-6) || L > high * (1 + 1e-6)))
            bad.push(`${where}: ${L} um lies outside ${low} to ${high} um`);
        }
      }
    }
    expect(bad.join('\n')).toBe('');
  });

  it('notice a coefficient that is wrong in its fifth digit', () => {
    const silica = FITS.find((f) => f.path === 'fused-silica/isotropic/malitson-1965');
    expect(silica).toBeDefined();
    if (silica?.fit.parameters.model !== 'sellmeier') throw new Error('fused silica is no Sellmeier fit');
    const [first, ...others] = silica.fit.parameters.poles ?? [];
    if (!first) throw new Error('fused silica has no poles');
    const wrong = {
      ...silica.fit,
      parameters: { ...silica.fit.parameters, poles: [{ ...first, B: first.B * 1.0001 }, ...others] },
    };
    const missed = silica.fit.checks
      .filter((g) => g.setAside === undefined)
      .flatMap((g) => recompute(wrong, g))
      .filter((r) => Math.abs(r.computed - r.published) > (r.tolerance ?? 0));
    expect(missed.length).toBeGreaterThan(0);
  });
});
