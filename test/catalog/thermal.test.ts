/** Thermal forms against printed and recorded changes of index with temperature. */
import { describe, expect, it } from 'vitest';
import type { Fit, Material } from '../../src/catalog/types.ts';
import { standardAirIndex } from '../../src/dispersion/air-index.ts';
import { applyThermalForm } from '../../src/dispersion/thermal.ts';
import { ENTRIES, recommended } from './catalog-files.ts';
import { indexOf } from './fit-index.ts';

const material = (key: string): Material => {
  const found = ENTRIES.find((e) => e.material.key === key)?.material;
  if (!found) throw new Error(`no entry ${key}`);
  return found;
};

/** Mean change of the absolute index per K between two temperatures, in 1e-6/K. */
function meanSlope_1e6(fit: Fit, air_um: number, from_C: number, to_C: number): number {
  if (!fit.thermal || fit.temperature_C === undefined) return Number.NaN;
  const air = fit.reference === 'air' ? standardAirIndex(air_um) : 1;
  const at = (t: number): number => {
    const jet = new Float64Array(8);
    jet[0] = indexOf(fit, air_um).n * air;
    if (fit.thermal && fit.temperature_C !== undefined)
      applyThermalForm(fit.thermal, fit.temperature_C + 273.15, t + 273.15, air_um * air, jet);
    return jet[0] as number;
  };
  return ((at(to_C) - at(from_C)) / (to_C - from_C)) * 1e6;
}

/** Temperature between 20 and 250 C at which n of one fit at 1064.2 nm equals n of another at half the wavelength. */
function meeting_C(
  key: string,
  fundamental: readonly [axis: string, id: string],
  harmonic: readonly [axis: string, id: string],
): number {
  const at = ([axis, id]: readonly [string, string], L: number, t: number): number => {
    const fit = material(key).fits.find((f) => f.axis === axis && f.id === id);
    if (!fit?.thermal || fit.temperature_C === undefined) return Number.NaN;
    const jet = new Float64Array(8);
    jet[0] = indexOf(fit, L).n;
    applyThermalForm(fit.thermal, fit.temperature_C + 273.15, t + 273.15, L, jet);
    return jet[0] as number;
  };
  const mismatch = (t: number): number => at(fundamental, 1.0642, t) - at(harmonic, 0.5321, t);
  let low = 20;
  let high = 250;
  if (!(mismatch(low) * mismatch(high) < 0)) return Number.NaN;
  while (high - low > 0.01) {
    const middle = (low + high) / 2;
    if (mismatch(low) * mismatch(middle) <= 0) high = middle;
    else low = middle;
  }
  return low;
}

describe('thermal constants', () => {
  it('of N-BK7 give the nine values of its data sheet (SCHOTT catalogue, absolute index, from memory)', () => {
    const fit = recommended(material('n-bk7'), 'isotropic', 0.5461) as Fit;
    const rows = [
      // from C, to C, 1.060 um, e line, g line
      [-40, -20, 0.3, 0.8, 1.2],
      [20, 40, 1.1, 1.6, 2.1],
      [60, 80, 1.5, 2.1, 2.7],
    ] as const;
    for (const [from, to, ...printed] of rows)
      for (const [i, L] of [1.06, 0.546074, 0.4358343].entries())
        expect(
          Math.abs(meanSlope_1e6(fit, L, from, to) - (printed[i] as number)),
          `${L} um, ${from} to ${to} C`,
        ).toBeLessThan(0.055);
  });

  it('reproduce the dn/dT that the facts of the same glass state', () => {
    const bad: string[] = [];
    let tested = 0;
    for (const { material: m } of ENTRIES) {
      const { dn_dT_1e6_per_K: stated, dn_dTAt_um: L, dn_dTKind: kind } = m.handling ?? {};
      if (stated === undefined || typeof L !== 'number' || typeof kind !== 'string') continue;
      const fit = recommended(m, 'isotropic', L);
      if (fit?.thermal?.form !== 'dispersive') continue;
      const span = kind.includes('at 30 C')
        ? [29.99, 30.01]
        : kind.includes('mean 20-40 C')
          ? [20, 40]
          : undefined;
      if (!span) continue;
      tested++;
      const slope = meanSlope_1e6(fit, L, span[0] as number, span[1] as number);
      if (Math.abs(slope - stated) > 0.012)
        bad.push(`${m.key}: ${slope.toFixed(3)}e-6/K at ${L} um, stated ${stated} (${kind})`);
    }
    expect(bad.join('\n')).toBe('');
    expect(tested).toBeGreaterThan(180);
  });

  it('bring crystals to the temperature at which they double 1064 nm without angle (papers and makers, from memory)', () => {
    // LBO: n_z of the fundamental meets n_y of the harmonic at 148 to 149.5 C; LiNbO3 with 5 % MgO: n_o meets n_e at 105 to 111 C.
    const lbo = meeting_C('lithium-triborate', ['z', 'kato-1994'], ['y', 'kato-1994']);
    expect(lbo).toBeGreaterThan(147);
    expect(lbo).toBeLessThan(150.5);
    const niobate = meeting_C(
      'lithium-niobate-mgo',
      ['ordinary', 'matsuda-2015'],
      ['extraordinary', 'umemura-2014'],
    );
    expect(niobate).toBeGreaterThan(100);
    expect(niobate).toBeLessThan(116);
  });

  it('have the sign of the substance: liquids and polymers expand and lose index', () => {
    const bad = ENTRIES.flatMap(({ material: m }) =>
      m.class !== 'liquid' && m.class !== 'polymer'
        ? []
        : m.fits.flatMap((f) =>
            f.thermal?.form === 'constant' && f.thermal.dn_dT_per_K >= 0 ? [`${m.key}/${f.id}`] : [],
          ),
    );
    expect(bad).toEqual([]);
  });

  it('stand only where the model takes no temperature, with the temperature they count from', () => {
    const bad = ENTRIES.flatMap(({ material: m }) =>
      m.fits.flatMap((f) =>
        f.thermal && f.temperature_C === undefined ? [`${m.key}/${f.axis}/${f.id}`] : [],
      ),
    );
    expect(bad).toEqual([]);
  });
});
