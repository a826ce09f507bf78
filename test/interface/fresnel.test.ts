import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fresnel, fresnelAngleDerivative } from '../../src/interface/fresnel.ts';
import { opticsFromIndex } from '../../src/interface/optics.ts';
import { pseudoBrewsterAngle } from '../../src/interface/pseudo-brewster.ts';
import { brewsterAngles, criticalAngle } from '../../src/interface/special-angles.ts';
import { abs, abs2, add, type Complex, mul, ONE, scale, sub } from '../../src/num/complex.ts';
import { evenly } from '../helpers/evenly.ts';
import {
  absorbing,
  incidence,
  losslessDielectric,
  losslessMagnetic,
  passiveMagnetic,
} from './arbitrary-media.ts';

const real = (n: number) => opticsFromIndex({ re: n, im: 0 }, ONE);
const distance = (a: Complex, b: Complex) => abs(sub(a, b));

describe('fresnel: conservation and symmetry', () => {
  it('conserves energy to 1e-12 for lossless pairs at every angle, both polarizations', () => {
    fc.assert(
      fc.property(losslessMagnetic, losslessMagnetic, incidence, (a, b, angle) => {
        const w = fresnel(a, b, angle);
        expect(Math.abs(w.Rs + w.Ts - 1)).toBeLessThan(1e-12);
        expect(Math.abs(w.Rp + w.Tp - 1)).toBeLessThan(1e-12);
      }),
      { numRuns: 2000 },
    );
  });

  it('conserves energy into absorbing media: what is not reflected crosses the surface', () => {
    fc.assert(
      fc.property(losslessDielectric, passiveMagnetic, incidence, (a, b, angle) => {
        const w = fresnel(a, b, angle);
        expect(Math.abs(w.Rs + w.Ts - 1)).toBeLessThan(1e-10);
        expect(Math.abs(w.Rp + w.Tp - 1)).toBeLessThan(1e-10);
      }),
      { numRuns: 2000 },
    );
  });

  it('keeps R and T in [0, 1] for any passive far side', () => {
    fc.assert(
      fc.property(losslessDielectric, passiveMagnetic, incidence, (a, b, angle) => {
        const w = fresnel(a, b, angle);
        for (const x of [w.Rs, w.Rp, w.Ts, w.Tp]) {
          expect(x).toBeGreaterThanOrEqual(0);
          expect(x).toBeLessThanOrEqual(1 + 1e-12);
        }
      }),
      { numRuns: 2000 },
    );
  });

  it('changes continuously when the medium of incidence begins to absorb, below and above the critical angle', () => {
    const weak = evenly(1e-12, 1e-7);
    fc.assert(
      fc.property(losslessDielectric, losslessDielectric, weak, incidence, (a, b, k, angle) => {
        const sin = a.n.re * Math.sin(angle);
        fc.pre(Math.abs(sin - b.n.re) > 1e-3 && angle < 1.55);
        const clear = fresnel(a, b, angle);
        const absorbing = fresnel(opticsFromIndex({ re: a.n.re, im: k }, ONE), b, angle);
        for (const part of ['rs', 'rp', 'ts', 'tp'] as const)
          expect(distance(absorbing[part], clear[part])).toBeLessThan(1e5 * k);
      }),
      { numRuns: 2000 },
    );
  });

  it('sends no more back than came in where glass with a trace of absorption meets air', () => {
    const glass = opticsFromIndex({ re: 1.5155, im: 7.7e-9 }, ONE);
    const clear = real(1.5155);
    for (const degrees of [1, 10, 30, 33.4, 40, 41, 42, 60, 89]) {
      const angle = (degrees * Math.PI) / 180;
      const [with_, without] = [fresnel(glass, real(1), angle), fresnel(clear, real(1), angle)];
      expect(Math.abs(with_.Rs - without.Rs)).toBeLessThan(1e-6);
      expect(Math.abs(with_.Rp - without.Rp)).toBeLessThan(1e-6);
    }
  });

  it('is reciprocal: T12 = T21 at conjugate angles', () => {
    fc.assert(
      fc.property(losslessDielectric, losslessDielectric, incidence, (a, b, angle) => {
        const s = (a.n.re * Math.sin(angle)) / b.n.re;
        // asin itself loses digits close to grazing; the law does not.
        fc.pre(s < 0.999 && angle < 1.5);
        const there = fresnel(a, b, angle);
        const back = fresnel(b, a, Math.asin(s));
        expect(Math.abs(there.Ts - back.Ts)).toBeLessThan(1e-11);
        expect(Math.abs(there.Tp - back.Tp)).toBeLessThan(1e-11);
      }),
    );
  });

  it('obeys the Stokes relations r12 = -r21, t12 t21 = 1 - r12^2', () => {
    fc.assert(
      fc.property(losslessDielectric, losslessDielectric, incidence, (a, b, angle) => {
        const s = (a.n.re * Math.sin(angle)) / b.n.re;
        fc.pre(s < 0.999 && angle < 1.5);
        const there = fresnel(a, b, angle);
        const back = fresnel(b, a, Math.asin(s));
        for (const [r12, r21, t12, t21] of [
          [there.rs, back.rs, there.ts, back.ts],
          [there.rp, back.rp, there.tp, back.tp],
        ] as const) {
          expect(distance(r12, scale(r21, -1))).toBeLessThan(1e-10);
          expect(distance(mul(t12, t21), sub(ONE, mul(r12, r12)))).toBeLessThan(1e-10);
        }
      }),
    );
  });

  it('continues the tangential field: t_s = 1 + r_s', () => {
    fc.assert(
      fc.property(passiveMagnetic, passiveMagnetic, incidence, (a, b, angle) => {
        const w = fresnel(a, b, angle);
        expect(distance(w.ts, add(ONE, w.rs))).toBeLessThan(1e-9 * (1 + abs(w.ts)));
      }),
    );
  });

  it('reflects nothing between equal media', () => {
    fc.assert(
      fc.property(losslessMagnetic, incidence, (a, angle) => {
        const w = fresnel(a, a, angle);
        expect(w.Rs).toBeLessThan(1e-20);
        expect(w.Rp).toBeLessThan(1e-20);
      }),
    );
  });

  it('tells s from p only off the normal, and r_p = -r_s at the normal', () => {
    fc.assert(
      fc.property(losslessDielectric, absorbing, (a, b) => {
        const w = fresnel(a, b, 0);
        expect(Math.abs(w.Rs - w.Rp)).toBeLessThan(1e-13);
        expect(distance(w.rp, scale(w.rs, -1))).toBeLessThan(1e-13);
      }),
    );
    expect(fresnel(real(1), real(1.5), 1).Rs).toBeGreaterThan(fresnel(real(1), real(1.5), 1).Rp + 0.1);
  });

  it('satisfies the identity of Abeles at 45 degrees: R_p = R_s^2 (lossless, non-magnetic)', () => {
    fc.assert(
      fc.property(losslessDielectric, (b) => {
        const w = fresnel(real(1), b, Math.PI / 4);
        expect(Math.abs(w.Rp - w.Rs ** 2)).toBeLessThan(1e-13);
      }),
    );
  });
});

describe('fresnel: special angles', () => {
  it('has R_p = 0 at the Brewster angle of any lossless pair that has one, magnetic ones included', () => {
    let found = 0;
    fc.assert(
      fc.property(losslessMagnetic, losslessMagnetic, (a, b) => {
        const angles = brewsterAngles(a, b);
        if (angles.p !== null) {
          found++;
          expect(fresnel(a, b, angles.p).Rp).toBeLessThan(1e-20);
        }
        if (angles.s !== null) expect(fresnel(a, b, angles.s).Rs).toBeLessThan(1e-20);
      }),
      { numRuns: 500 },
    );
    expect(found).toBeGreaterThan(50);
  });

  it('reflects all beyond the critical angle and is continuous across it', () => {
    fc.assert(
      fc.property(losslessDielectric, losslessDielectric, evenly(1e-6, 1), (a, b, part) => {
        fc.pre(a.n.re > b.n.re + 1e-3);
        const critical = criticalAngle(a, b)!;
        const beyond = critical + (Math.PI / 2 - critical) * part * 0.999;
        const w = fresnel(a, b, beyond);
        expect(Math.abs(w.Rs - 1)).toBeLessThan(1e-13);
        expect(Math.abs(w.Rp - 1)).toBeLessThan(1e-13);
        expect(w.Ts).toBe(0);
        expect(w.Tp).toBe(0);
        const below = fresnel(a, b, critical - 1e-13);
        const above = fresnel(a, b, critical + 1e-13);
        expect(distance(below.rs, above.rs)).toBeLessThan(1e-3);
        expect(distance(below.rp, above.rp)).toBeLessThan(2e-2);
      }),
    );
  });

  it('is finite exactly at the critical angle', () => {
    const w = fresnel(real(2), real(1), Math.PI / 6);
    for (const z of [w.rs, w.rp, w.ts, w.tp]) expect(Number.isFinite(abs2(z))).toBe(true);
    expect(w.Rs).toBeCloseTo(1, 6);
  });

  it('finds the least R_p of absorbing media: neighbours are not lower, and it tends to Brewster as k goes to 0', () => {
    fc.assert(
      fc.property(absorbing, (b) => {
        const angle = pseudoBrewsterAngle(real(1), b);
        if (angle === null) return;
        const R = (a: number) => fresnel(real(1), b, a).Rp;
        for (const step of [1e-3, 1e-4, -1e-4, -1e-3]) {
          const a = angle + step;
          if (a > 0 && a < Math.PI / 2) expect(R(a)).toBeGreaterThanOrEqual(R(angle) - 1e-15);
        }
      }),
      { numRuns: 200 },
    );
    const weak = pseudoBrewsterAngle(real(1), opticsFromIndex({ re: 1.5, im: 1e-7 }, ONE));
    expect(weak).toBeCloseTo(Math.atan(1.5), 9);
  });
});

describe('fresnelAngleDerivative', () => {
  it('agrees with differences of the amplitudes', () => {
    fc.assert(
      fc.property(losslessDielectric, passiveMagnetic, evenly(0.02, 1.5), (a, b, angle) => {
        const h = 1e-6;
        const up = fresnel(a, b, angle + h);
        const down = fresnel(a, b, angle - h);
        const { drs, drp } = fresnelAngleDerivative(a, b, angle);
        const bound = (z: Complex) => 1e-5 * (1 + abs(z));
        // Close to grazing along a pole the differences themselves lose digits.
        fc.pre(abs(drs) < 1e3 && abs(drp) < 1e3);
        expect(distance(scale(sub(up.rs, down.rs), 1 / (2 * h)), drs)).toBeLessThan(bound(drs));
        expect(distance(scale(sub(up.rp, down.rp), 1 / (2 * h)), drp)).toBeLessThan(bound(drp));
      }),
    );
  });
});
