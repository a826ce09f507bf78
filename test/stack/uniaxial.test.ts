import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { complex } from '../../src/num/complex.ts';
import { coherentStack } from '../../src/stack/coherent-stack.ts';
import { substanceFromIndex } from '../../src/stack/layered-path.ts';
import { StackRefusal } from '../../src/stack/stack-refusal.ts';
import {
  extraordinaryIndex,
  greatestWalkOff,
  retardance_rad,
  walkOffAngle_rad,
  walkOffDisplacement_m,
  waveplateThickness_m,
} from '../../src/stack/uniaxial.ts';
import { uniaxialBrewsterAngle_rad, uniaxialInterface } from '../../src/stack/uniaxial-interface.ts';
import { between } from './random-path.ts';

const [no, ne] = [1.6584, 1.4864];
const quarter = Math.PI / 2;
const index = between(1.2, 3.5);

describe('inside the crystal', () => {
  it('index runs from no along the axis to ne across it', () => {
    expect(extraordinaryIndex(no, ne, 0)).toBeCloseTo(no, 14);
    expect(extraordinaryIndex(no, ne, quarter)).toBeCloseTo(ne, 14);
    const n = extraordinaryIndex(no, ne, 0.6);
    expect(1 / n ** 2).toBeCloseTo(Math.cos(0.6) ** 2 / no ** 2 + Math.sin(0.6) ** 2 / ne ** 2, 14);
  });

  it("walk-off is the slope of the index surface, -n'/n, and tan(theta_ray) = (no/ne)^2 tan(theta)", () => {
    fc.assert(
      fc.property(index, index, between(0.01, 1.5), (o, e, angle) => {
        const rho = walkOffAngle_rad(o, e, angle);
        expect(Math.tan(angle + rho)).toBeCloseTo((o / e) ** 2 * Math.tan(angle), 6);
        const h = 1e-5;
        const slope = (extraordinaryIndex(o, e, angle + h) - extraordinaryIndex(o, e, angle - h)) / (2 * h);
        expect(Math.tan(rho)).toBeCloseTo(-slope / extraordinaryIndex(o, e, angle), 7);
        expect(Math.abs(rho)).toBeLessThanOrEqual(Math.abs(greatestWalkOff(o, e).walkOff_rad) + 1e-15);
      }),
    );
    const top = greatestWalkOff(no, ne);
    expect(walkOffAngle_rad(no, ne, top.angle_rad)).toBeCloseTo(top.walkOff_rad, 14);
    expect(walkOffDisplacement_m(no, ne, 0.7, 0.01)).toBeCloseTo(
      0.01 * Math.tan(walkOffAngle_rad(no, ne, 0.7)),
      15,
    );
  });

  it('waveplates give the retardance they were made for', () => {
    const [o, e, wave] = [1.5443, 1.5534, 5.89e-7];
    for (const [waves, order] of [
      [0.25, 0],
      [0.5, 0],
      [0.25, 8],
    ] as const) {
      const d = waveplateThickness_m(o, e, wave, waves, order);
      expect(retardance_rad(o, e, d, wave) / (2 * Math.PI)).toBeCloseTo(order + waves, 12);
    }
    expect(retardance_rad(no, ne, 1e-3, wave)).toBeLessThan(0);
    expect(retardance_rad(no, ne, 1e-3, wave, 0)).toBeCloseTo(0, 9);
    expect(() => waveplateThickness_m(1.5, 1.5, wave, 0.25)).toThrow(StackRefusal);
    expect(() => waveplateThickness_m(o, e, wave, 0.25, 1.5)).toThrow(StackRefusal);
    expect(() => extraordinaryIndex(-1, 2, 0)).toThrow(StackRefusal);
  });
});

describe('at its face', () => {
  const crystal = { no: complex(no), ne: complex(ne) };

  it('an isotropic "crystal" gives the Fresnel coefficients in every orientation allowed', () => {
    fc.assert(
      fc.property(
        between(1, 2),
        index,
        between(0, 1),
        between(0, 1.5),
        between(0, quarter),
        (n1, n, k, angle, tilt) => {
          const same = { no: complex(n, k), ne: complex(n, k) };
          const wanted = coherentStack(
            { incidence: substanceFromIndex(n1), layers: [], exit: substanceFromIndex(n, k) },
            5e-7,
            angle,
          );
          for (const axis of [
            { tilt_rad: tilt, azimuth_rad: 0 },
            { tilt_rad: quarter, azimuth_rad: quarter },
          ]) {
            const got = uniaxialInterface(n1, same, axis, angle);
            for (const side of ['s', 'p'] as const) {
              expect(got[side].R).toBeCloseTo(wanted[side].R, 12);
              expect(got[side].T).toBeCloseTo(wanted[side].T, 12);
              expect(got[side].r.re).toBeCloseTo(wanted[side].r.re, 12);
              expect(got[side].r.im).toBeCloseTo(wanted[side].r.im, 12);
            }
          }
        },
      ),
    );
  });

  it('R + T = 1 without absorption, in total reflection too', () => {
    fc.assert(
      fc.property(
        between(1, 3),
        index,
        index,
        between(0, quarter),
        between(0, 1.55),
        (n1, o, e, tilt, angle) => {
          const axes = [
            { tilt_rad: tilt, azimuth_rad: Math.PI },
            { tilt_rad: quarter, azimuth_rad: -quarter },
          ];
          for (const axis of axes) {
            const { s, p } = uniaxialInterface(n1, { no: complex(o), ne: complex(e) }, axis, angle);
            expect(s.R + s.T).toBeCloseTo(1, 12);
            expect(p.R + p.T).toBeCloseTo(1, 12);
          }
        },
      ),
    );
  });

  it('wave angle obeys Snell with the index of its own direction, ray angle is off by the walk-off', () => {
    fc.assert(
      fc.property(index, index, between(-quarter, quarter), between(0, 1.5), (o, e, lean, angle) => {
        const axis = { tilt_rad: Math.abs(lean), azimuth_rad: lean < 0 ? Math.PI : 0 };
        const { p } = uniaxialInterface(1, { no: complex(o), ne: complex(e) }, axis, angle);
        const waveAngle = p.waveAngle_rad ?? Number.NaN;
        const toAxis = waveAngle - lean;
        expect(extraordinaryIndex(o, e, toAxis) * Math.sin(waveAngle)).toBeCloseTo(Math.sin(angle), 11);
        expect(Math.sin((p.rayAngle_rad ?? 0) - waveAngle - walkOffAngle_rad(o, e, toAxis))).toBeCloseTo(
          0,
          11,
        );
      }),
    );
  });

  it('at normal incidence any orientation goes: no, and n(theta) along the normal', () => {
    const { s, p } = uniaxialInterface(1, crystal, { tilt_rad: 0.8, azimuth_rad: 0.3 }, 0);
    const n = extraordinaryIndex(no, ne, 0.8);
    expect(s.kind).toBe('ordinary');
    expect(s.r.re).toBeCloseTo((1 - no) / (1 + no), 14);
    expect(p.r.re).toBeCloseTo((n - 1) / (n + 1), 14);
  });

  it('the three principal orientations, by kappa^2 = eps_x (1 - q^2/eps_z)', () => {
    const angle = 0.9;
    const q2 = Math.sin(angle) ** 2;
    const R = (y1: number, y2: number): number => ((y1 - y2) / (y1 + y2)) ** 2;
    const pOf = (ex: number, ez: number): number =>
      R(1 / Math.cos(angle), ex / Math.sqrt(ex * (1 - q2 / ez)));
    const sOf = (ey: number): number => R(Math.cos(angle), Math.sqrt(ey - q2));
    const [eo, ee] = [no ** 2, ne ** 2];
    const at = (tilt_rad: number, azimuth_rad: number) =>
      uniaxialInterface(1, crystal, { tilt_rad, azimuth_rad }, angle);
    expect(at(0, 0.7).p.R).toBeCloseTo(pOf(eo, ee), 13);
    expect(at(0, 0.7).s.R).toBeCloseTo(sOf(eo), 13);
    expect(at(quarter, 0).p.R).toBeCloseTo(pOf(ee, eo), 13);
    expect(at(quarter, 0).s.R).toBeCloseTo(sOf(eo), 13);
    expect(at(quarter, quarter).s.R).toBeCloseTo(sOf(ee), 13);
    expect(at(quarter, quarter).p.R).toBeCloseTo(pOf(eo, eo), 13);
    expect(at(quarter, quarter).s.kind).toBe('extraordinary');
  });

  it('Brewster angle: R_p is zero there, axis anywhere in the plane', () => {
    fc.assert(
      fc.property(
        between(1, 1.2),
        between(1.3, 3),
        between(1.3, 3),
        between(0, quarter),
        (n1, o, e, tilt) => {
          const angle = uniaxialBrewsterAngle_rad(n1, o, e, tilt);
          fc.pre(angle !== null);
          const sinIn = n1 * Math.sin(angle ?? 0);
          fc.pre(sinIn < Math.min(o, e));
          const { p } = uniaxialInterface(
            n1,
            { no: complex(o), ne: complex(e) },
            { tilt_rad: tilt, azimuth_rad: 0 },
            angle ?? 0,
          );
          expect(p.R).toBeLessThan(1e-12);
        },
      ),
    );
    expect(uniaxialBrewsterAngle_rad(1, 1.6, 1.6, 0)).toBeCloseTo(Math.atan(1.6), 14);
  });

  it('refuses an axis that mixes s and p, with a code', () => {
    for (const axis of [
      { tilt_rad: 0.5, azimuth_rad: 0.5 },
      { tilt_rad: 0.5, azimuth_rad: quarter },
      { tilt_rad: quarter, azimuth_rad: 0.01 },
    ]) {
      try {
        uniaxialInterface(1, crystal, axis, 0.3);
        expect.unreachable();
      } catch (error) {
        expect((error as StackRefusal).code).toBe('mixed-polarization');
      }
    }
    expect(() =>
      uniaxialInterface(1, { no: complex(1.5, -0.1), ne: complex(1.6) }, { tilt_rad: 0, azimuth_rad: 0 }, 0),
    ).toThrow(/amplifies/);
    expect(() => uniaxialInterface(1, crystal, { tilt_rad: 0, azimuth_rad: 0 }, 2)).toThrow(StackRefusal);
  });
});
