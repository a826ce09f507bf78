/** Crystals: the sign of the birefringence and the order of the principal indices; metals: n and k not exchanged. */
import { describe, expect, it } from 'vitest';
import type { Axis, Material } from '../../src/catalog/types.ts';
import { ENTRIES, recommended } from './catalog-files.ts';
import { indexOf } from './fit-index.ts';

const material = (key: string): Material => {
  const found = ENTRIES.find((e) => e.material.key === key)?.material;
  if (!found) throw new Error(`no entry ${key}`);
  return found;
};
const n = (m: Material, axis: Axis, L: number): number => {
  const fit = recommended(m, axis, L);
  return fit ? indexOf(fit, L).n : Number.NaN;
};

/** Optical sign of uniaxial crystals at a wavelength inside both fits: textbook knowledge, from memory. */
const UNIAXIAL: readonly (readonly [key: string, sign: '+' | '-', wavelength_um: number])[] = [
  ['aluminium-nitride', '+', 0.589],
  ['ammonium-dihydrogen-phosphate', '-', 0.589],
  ['beryllium-oxide', '+', 0.589],
  ['beta-barium-borate', '-', 0.532],
  ['cadmium-selenide', '+', 4],
  ['cadmium-sulfide', '+', 1],
  ['caesium-lithium-borate', '-', 0.532],
  ['calcite', '-', 0.589],
  ['calcium-tungstate', '+', 0.589],
  ['crystal-quartz', '+', 0.589],
  ['deuterated-kdp', '-', 0.633],
  ['gallium-selenide', '-', 5],
  ['lanthanum-fluoride', '-', 0.55],
  ['lead-molybdate', '-', 0.633],
  ['lithium-iodate', '-', 1.064],
  ['lithium-niobate-congruent', '-', 0.633],
  ['lithium-niobate-mgo', '-', 0.633],
  ['lithium-tantalate-congruent', '+', 0.633],
  ['magnesium-fluoride', '+', 0.589],
  ['potassium-dihydrogen-phosphate', '-', 0.589],
  ['rutile', '+', 0.589],
  ['sapphire', '-', 0.589],
  ['silicon-carbide-6h', '+', 0.589],
  ['silver-gallium-selenide', '-', 5],
  ['silver-thiogallate', '-', 1.064],
  ['tellurium', '+', 10],
  ['tellurium-dioxide', '+', 0.633],
  ['yttrium-lithium-fluoride', '+', 0.633],
  ['yttrium-orthovanadate', '+', 1.064],
  ['zinc-germanium-phosphide', '+', 4],
  ['zinc-oxide', '+', 0.589],
];

describe('crystal axes', () => {
  it('carry the known optical sign', () => {
    const bad = UNIAXIAL.flatMap(([key, sign, L]) => {
      const m = material(key);
      const difference = n(m, 'extraordinary', L) - n(m, 'ordinary', L);
      return (sign === '+' ? difference > 0 : difference < 0)
        ? []
        : [`${key} at ${L} um: n_e - n_o = ${difference}`];
    });
    expect(bad).toEqual([]);
  });

  it('cover every uniaxial crystal that has both indices at one wavelength', () => {
    const listed = new Set(UNIAXIAL.map(([key]) => key));
    const missing = ENTRIES.map((e) => e.material)
      .filter((m) => {
        const range = (axis: Axis): (readonly [number, number])[] =>
          m.fits.filter((f) => f.axis === axis && f.recommended).map((f) => f.range_um);
        return range('ordinary').some(([a, b]) =>
          range('extraordinary').some(([c, d]) => Math.max(a, c) < Math.min(b, d)),
        );
      })
      .map((m) => m.key)
      .filter((key) => !listed.has(key));
    expect(missing).toEqual([]);
  });

  it('are ordered n_x < n_y < n_z in biaxial crystals', () => {
    const biaxial = ENTRIES.map((e) => e.material).filter((m) => m.fits.some((f) => f.axis === 'x'));
    const bad = biaxial.flatMap((m) => {
      const at = [0.633, 1.064].filter(
        (L) => recommended(m, 'x', L) && recommended(m, 'y', L) && recommended(m, 'z', L),
      );
      if (at.length === 0) return [`${m.key}: no wavelength with all three indices`];
      return at.flatMap((L) => {
        const [x, y, z] = [n(m, 'x', L), n(m, 'y', L), n(m, 'z', L)] as const;
        return x < y && y < z ? [] : [`${m.key} at ${L} um: ${x}, ${y}, ${z}`];
      });
    });
    expect(bad).toEqual([]);
    expect(biaxial.length).toBeGreaterThanOrEqual(8);
  });

  it('turn at low frequency where they are known to: sapphire is positive there, negative in the visible', () => {
    const m = material('sapphire');
    expect(n(m, 'extraordinary', 3e4)).toBeGreaterThan(n(m, 'ordinary', 3e4));
  });
});

describe('metals', () => {
  it('reflect in the infrared, which they would not with n and k exchanged in the table', () => {
    // Mirror metals at 10.6 um: R above 0.97 for all of them (handbooks).
    for (const key of ['silver', 'gold', 'copper', 'aluminium']) {
      const fit = recommended(material(key), 'isotropic', 10.6);
      if (!fit) throw new Error(`${key} has no fit at 10.6 um`);
      const { n: re, k } = indexOf(fit, 10.6);
      expect(((re - 1) ** 2 + k * k) / ((re + 1) ** 2 + k * k), key).toBeGreaterThan(0.97);
      expect(k, key).toBeGreaterThan(re);
    }
    // Noble metals at 0.8 um: n far below k.
    for (const key of ['silver', 'gold', 'copper']) {
      const fit = recommended(material(key), 'isotropic', 0.8);
      if (!fit) throw new Error(`${key} has no fit at 0.8 um`);
      const { n: re, k } = indexOf(fit, 0.8);
      expect(k / re, key).toBeGreaterThan(10);
    }
  });
});
