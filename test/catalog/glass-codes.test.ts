/**
 * The six digits of a glass code against the index and dispersion computed from the fit: nd - 1 (after the point, to three
 * digits) and ten times Vd, with the lines d, F, C of ISO 7944 in air.
 */
import { describe, expect, it } from 'vitest';
import { ENTRIES, recommended } from './catalog-files.ts';
import { indexOf } from './fit-index.ts';

const d_um = 0.5875618;
const F_um = 0.4861327;
const C_um = 0.6562725;
/** Half a unit of the code's last digits, and what makers' own rounding adds to it. */
const TOLERANCE = { nd: 0.00055, Vd: 0.055 };

const coded = ENTRIES.map((e) => e.material).filter((m) => m.glassCode !== undefined);

describe('glass codes', () => {
  it('agree with nd and Vd of the glass', () => {
    const bad: string[] = [];
    for (const m of coded) {
      const fit = recommended(m, 'isotropic', d_um);
      if (fit?.reference !== 'air') {
        bad.push(`${m.key}: no recommended fit relative to air at the d line`);
        continue;
      }
      const n = (L: number): number => indexOf(fit, L).n;
      const nd = n(d_um);
      const Vd = (nd - 1) / (n(F_um) - n(C_um));
      const code = m.glassCode as string;
      const tail = Number(code.slice(0, 3)) / 1000;
      const off = Math.abs(((nd % 1) - tail + 0.5) % 1) - 0.5;
      if (Math.abs(off) > TOLERANCE.nd || Math.abs(Vd - Number(code.slice(3)) / 10) > TOLERANCE.Vd)
        bad.push(`${m.key}: code ${code}, computed nd ${nd.toFixed(6)}, Vd ${Vd.toFixed(3)}`);
    }
    expect(bad.join('\n')).toBe('');
    expect(coded.length).toBeGreaterThanOrEqual(218);
  });
});
