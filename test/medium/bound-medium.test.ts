import { describe, expect, it } from 'vitest';
import type { FitWave } from '../../src/catalog/choose-fit.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import type { Axis, Material } from '../../src/catalog/types.ts';
import { vacuumToAir_um } from '../../src/dispersion/air-index.ts';
import type { Conditions } from '../../src/dispersion/evaluator.ts';
import {
  type BoundMedium,
  bindLiteral,
  bindMaterial,
  EXTRAPOLATED,
  INSIDE,
  REFUSED,
} from '../../src/medium/bound-medium.ts';
import { literalOptics } from '../../src/medium/literal.ts';
import { mediumAtWave } from '../../src/medium/optics-at.ts';
import { isRefusal } from '../../src/medium/refusal.ts';

const catalogue = catalogueFromSources();
const materials = catalogue.keys().map((key) => catalogue.material(key) as Material);

const CONDITIONS: readonly Conditions[] = [
  {},
  { temperature_K: 293.15 },
  { temperature_K: 333.4 },
  { temperature_K: 300, pressure_Pa: 80_000, humidity: 0.4, co2_ppm: 600, salinity_g_per_kg: 20 },
];

const wave = (vacuum_um: number): FitWave => ({ vacuum_um, air_um: vacuumToAir_um(vacuum_um) });

/** On, just inside, just outside and between the limits of every fit, and well beyond all of them. */
function wavesOf(material: Material): readonly FitWave[] {
  const limits = material.fits
    .flatMap((f) => [...f.range_um, ...(f.recommendedRange_um ?? [])])
    .sort((a, b) => a - b);
  const around = limits.flatMap((l) => [0.97, 0.9995, 1, 1.0005, 1.03].map((factor) => l * factor));
  const between = limits.slice(1).map((l, i) => Math.sqrt(l * (limits[i] as number)));
  const beyond = [(limits[0] ?? 1) / 3, (limits.at(-1) ?? 1) * 3];
  return [...new Set([...around, ...between, ...beyond])].filter((l) => l > 0.05).map(wave);
}

const out = new Float64Array(2);

const waves = { vacuum_um: new Float64Array(2), air_um: new Float64Array(2) };

/** The wave stands in second place: the first must not matter. */
function put({ vacuum_um, air_um }: FitWave): void {
  waves.vacuum_um.set([Number.NaN, vacuum_um]);
  waves.air_um.set([Number.NaN, air_um]);
}

function same(bound: BoundMedium, at: FitWave, expected: ReturnType<typeof mediumAtWave>): void {
  put(at);
  const reach = bound.indexAt(waves, 1, out, 0);
  const alone = { vacuum_um: waves.vacuum_um.subarray(1), air_um: waves.air_um.subarray(1) };
  const n = new Float64Array(1);
  expect(bound.indexBlock(alone, 1, n)).toBe(reach === REFUSED ? 0 : 1);
  if (reach !== REFUSED) expect(n[0]).toBe(out[0]);
  const optics = bound.opticsAt(waves, 1);
  const pole = isRefusal(expected) && expected.code === 'no-index-here';
  if (!pole) expect(bound.reachAt(waves, 1)).toBe(reach);
  if (isRefusal(expected)) {
    expect(reach).toBe(REFUSED);
    expect(optics).toBeUndefined();
    expect(bound.refusalAt(at)).toEqual(expected);
    return;
  }
  expect(reach).toBe(expected.inRange ? INSIDE : EXTRAPOLATED);
  expect([out[0], out[1]]).toEqual([expected.optics.n.re, expected.optics.n.im]);
  expect(optics).toEqual(expected.optics);
}

describe('a bound medium', () => {
  for (const [c, conditions] of CONDITIONS.entries()) {
    it(`gives the very numbers of the answer for every material, conditions ${c}`, () => {
      let compared = 0;
      for (const material of materials) {
        const axes: (Axis | undefined)[] = [undefined, ...new Set(material.fits.map((f) => f.axis))];
        for (const axis of axes) {
          const bound = bindMaterial(material, axis, conditions, false);
          const insisting = bindMaterial(material, axis, conditions, true);
          // Each condition takes its quarter of the waves: together they take all.
          for (const at of wavesOf(material).filter((_, i) => i % CONDITIONS.length === c)) {
            const expected = mediumAtWave(material, axis, at, conditions, false);
            same(bound, at, expected);
            if (isRefusal(expected)) same(insisting, at, mediumAtWave(material, axis, at, conditions, true));
            compared++;
          }
        }
      }
      expect(compared).toBeGreaterThan(2000);
    });
  }

  it('refuses an axis the material does not have', () => {
    const bound = bindMaterial(catalogue.material('n-bk7') as Material, 'ordinary', {}, false);
    put(wave(0.5));
    expect(bound.indexAt(waves, 1, out, 0)).toBe(REFUSED);
    expect(bound.refusalAt(wave(0.5))).toMatchObject({ code: 'no-such-axis' });
  });

  it('gives a literal medium its own numbers, dispersive where it conducts', () => {
    const literal = { eps: { re: 4, im: 0 }, conductivity_S_per_m: 0.01, mu: { re: 1.2, im: 0.1 } };
    const bound = bindLiteral(literal);
    for (const vacuum_um of [1, 1e4, 1e6]) {
      const optics = literalOptics(literal, vacuum_um * 1e-6);
      put({ vacuum_um, air_um: vacuum_um });
      expect(bound.opticsAt(waves, 1)).toEqual(optics);
      expect(bound.indexAt(waves, 1, out, 0)).toBe(INSIDE);
      expect([out[0], out[1]]).toEqual([optics.n.re, optics.n.im]);
    }
  });
});
