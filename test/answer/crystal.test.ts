/** A uniaxial crystal at its cut: laws that hold for any indices, angle and cut. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { crystalReport } from '../../src/answer/crystal-report.ts';
import type { CrystalAnswer } from '../../src/answer/crystal-shape.ts';
import { opticAxisAngle_rad } from '../../src/answer/optic-axis.ts';
import { type CrystalCut, makeQuestion } from '../../src/answer/question.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { isRefusal } from '../../src/medium/refusal.ts';
import { ask, DEGREE, index, literal, named, tryAsk, vacuumWave } from '../helpers/ask.ts';

const crystal = (no: number, ne: number) => literal({ n: { re: no, im: 0 }, ne: { re: ne, im: 0 } });
const wave = vacuumWave(1e-6);
const n = fc.double({ min: 1.2, max: 3, noNaN: true });
const angle = fc.double({ min: 0, max: 89, noNaN: true }).map((deg) => deg * DEGREE);
const tilt = fc.double({ min: 0, max: 90, noNaN: true }).map((deg) => deg * DEGREE);

const at = (
  no: number,
  ne: number,
  cut: CrystalCut,
  incidenceAngle_rad = 0,
  thickness_m?: number,
): CrystalAnswer => {
  const layers =
    thickness_m === undefined
      ? []
      : [{ medium: crystal(no, ne), thickness: { kind: 'length', thickness_m } as const }];
  const into = thickness_m === undefined ? crystal(no, ne) : index(1);
  const answer = ask(index(1), into, wave, { cut, incidenceAngle_rad, layers });
  if (!answer.crystal) throw new Error('no crystal');
  return answer.crystal;
};

describe('a uniaxial crystal at its cut', () => {
  it('at normal incidence: n(theta) by the index ellipsoid, r of each wave by its own index', () => {
    fc.assert(
      fc.property(n, n, tilt, (no, ne, angle_rad) => {
        const { ordinary, extraordinary: e } = at(no, ne, { angle_rad, azimuth_rad: 0 });
        const inverse = Math.cos(angle_rad) ** 2 / no ** 2 + Math.sin(angle_rad) ** 2 / ne ** 2;
        expect(e.n).toBeCloseTo(1 / Math.sqrt(inverse), 12);
        expect(ordinary.R).toBeCloseTo(((no - 1) / (no + 1)) ** 2, 12);
        expect(e.R).toBeCloseTo(((e.n - 1) / (e.n + 1)) ** 2, 12);
        expect([ordinary.polarization, e.polarization]).toEqual([null, null]);
      }),
    );
  });

  it('energy is kept at the face, and the walk-off is the angle between wave vector and ray', () => {
    fc.assert(
      fc.property(n, n, tilt, angle, (no, ne, angle_rad, incidence) => {
        const { ordinary, extraordinary: e } = at(no, ne, { angle_rad, azimuth_rad: 0 }, incidence);
        expect(ordinary.R + ordinary.T).toBeCloseTo(1, 9);
        expect(e.R + e.T).toBeCloseTo(1, 9);
        const between = Math.abs((e.rayAngle_rad ?? 0) - (e.waveAngle_rad ?? 0));
        expect(Math.abs(e.walkOff_rad ?? 0)).toBeCloseTo(between, 9);
        // Snell for the extraordinary wave with its own index.
        expect(e.n * Math.sin(e.waveAngle_rad ?? 0)).toBeCloseTo(Math.sin(incidence), 9);
      }),
    );
  });

  it('a crystal that is not birefringent is a glass', () => {
    fc.assert(
      fc.property(n, tilt, angle, (n1, angle_rad, incidenceAngle_rad) => {
        const { ordinary, extraordinary } = at(n1, n1, { angle_rad, azimuth_rad: 0 }, incidenceAngle_rad);
        const glass = ask(index(1), index(n1), wave, { incidenceAngle_rad }).interface;
        const [s, p] =
          ordinary.polarization === 'p' ? [extraordinary.R, ordinary.R] : [ordinary.R, extraordinary.R];
        expect(s).toBeCloseTo(glass.Rs, 9);
        expect(p).toBeCloseTo(glass.Rp, 9);
      }),
    );
  });

  it('with the axis across the plane of incidence s is extraordinary and p ordinary', () => {
    const across = { angle_rad: Math.PI / 2, azimuth_rad: Math.PI / 2 };
    const { ordinary, extraordinary, brewsterAngle_rad } = at(1.658, 1.486, across, 40 * DEGREE);
    expect([ordinary.polarization, extraordinary.polarization]).toEqual(['p', 's']);
    expect(extraordinary.walkOff_rad).toBe(0);
    expect(brewsterAngle_rad).toBeCloseTo(Math.atan(1.658), 12);
  });

  it('R of the p wave vanishes at the Brewster angle stated, whatever the cut in the plane', () => {
    fc.assert(
      fc.property(n, n, tilt, (no, ne, angle_rad) => {
        const cut = { angle_rad, azimuth_rad: 0 };
        const brewster = at(no, ne, cut).brewsterAngle_rad;
        fc.pre(brewster !== null && brewster < 89 * DEGREE);
        expect(at(no, ne, cut, brewster ?? 0).extraordinary.R).toBeLessThan(1e-12);
      }),
    );
  });

  it('a plate retards by (n(theta) - no) d at the normal; a waveplate of any order by what was asked', () => {
    fc.assert(
      fc.property(n, n, fc.double({ min: 1, max: 90, noNaN: true }), (no, ne, deg) => {
        fc.pre(Math.abs(no - ne) > 1e-3);
        const cut = { angle_rad: deg * DEGREE, azimuth_rad: 0, retardance_waves: 0.25 };
        const { plate, extraordinary, waveplate } = at(no, ne, cut, 0, 1e-4);
        expect(plate?.retardance_waves).toBeCloseTo(((extraordinary.n - no) * 1e-4) / 1e-6, 6);
        for (const { order, thickness_m } of waveplate?.orders ?? []) {
          const waves = Math.abs(extraordinary.n - no) * (thickness_m / 1e-6);
          expect(waves).toBeCloseTo(order + 0.25, 6);
        }
      }),
    );
  });

  it('its group index is that of the index ellipsoid at two neighbouring waves', () => {
    const calcite = named('calcite');
    const cut = { angle_rad: 45 * DEGREE, azimuth_rad: 0 };
    const e = (m: number) => ask(index(1), calcite, vacuumWave(m), { cut }).crystal!.extraordinary;
    const [L, h] = [633e-9, 0.01e-9];
    const slope = (e(L + h).n - e(L - h).n) / (2 * h);
    expect(e(L).groupIndex).toBeCloseTo(e(L).n - L * slope, 6);
  });

  it('is refused where s and p mix, with what would be right', () => {
    const refused = tryAsk(index(1), crystal(1.6, 1.5), wave, {
      cut: { angle_rad: 0.5, azimuth_rad: 0.3 },
      incidenceAngle_rad: 0.4,
    });
    expect(refused).toMatchObject({ code: 'mixed-polarization', exit: 2 });
    expect(isRefusal(refused) && refused.remedy).toContain('--cut-azimuth 0');
    expect(
      isRefusal(tryAsk(index(1), crystal(1.6, 1.5), wave, { cut: { angle_rad: 0.5, azimuth_rad: 0.3 } })),
    ).toBe(false);
  });
});

describe('every birefringent crystal of the catalogue', () => {
  it('has a report at a wave inside its data, or is refused for one axis only', () => {
    const catalogue = catalogueFromSources();
    const refused: string[] = [];
    for (const { key, axes } of catalogue.entries()) {
      if (!axes.some((a) => a !== 'isotropic')) continue;
      const material = catalogue.material(key)!;
      const fits = material.fits.filter((f) => f.recommended && f.axis !== 'isotropic');
      const low = Math.max(...fits.map((f) => f.range_um[0]));
      const high = Math.min(...fits.map((f) => f.range_um[1]));
      const question = makeQuestion(
        index(1),
        { kind: 'catalogue', material },
        vacuumWave(Math.sqrt(low * high) * 1e-6),
        { extrapolate: true },
      );
      const report = crystalReport({ question, thickness_m: 1e-3, retardance_waves: null }, (id) =>
        catalogue.source(id),
      );
      if (isRefusal(report)) refused.push(key);
      else {
        for (const p of report.plates) expect(Number.isFinite(p.retardance_waves), key).toBe(true);
        expect(report.axes.length, key).toBe(report.kind === 'uniaxial' ? 2 : 3);
      }
    }
    expect(refused).toEqual(['gallium-nitride', 'lithium-tantalate-stoichiometric', 'silicon-carbide-4h']);
  });
});

describe('optic axes of a biaxial crystal', () => {
  it('lie where the two waves have one index: at V from the largest, whichever axis is called z', () => {
    const [a, b, c] = [1.5, 1.6, 1.8];
    const V = opticAxisAngle_rad(a, b, c)!;
    // In the plane of a and c the wave polarized in it has n with 1/n^2 = cos^2/a^2 + sin^2/c^2, V counted from c; it must be b.
    expect(1 / Math.sqrt(Math.cos(V) ** 2 / a ** 2 + Math.sin(V) ** 2 / c ** 2)).toBeCloseTo(b, 12);
    expect(opticAxisAngle_rad(c, b, a)).toBeCloseTo(Math.PI / 2 - V, 12);
    expect(opticAxisAngle_rad(a, c, b)).toBe(Math.PI / 2);
    expect(opticAxisAngle_rad(a, a, c)).toBeNull();
  });
});
