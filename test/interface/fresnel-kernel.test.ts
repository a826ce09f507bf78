import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { SURFACE_LENGTH, writeSurface, writeSurfaceOf } from '../../src/interface/fresnel-kernel.ts';
import { type Optics, opticsFromIndex, opticsFromPermittivity } from '../../src/interface/optics.ts';
import { abs2, ONE } from '../../src/num/complex.ts';
import { evenly } from '../helpers/evenly.ts';
import {
  absorbing,
  incidence,
  losslessDielectric,
  losslessMagnetic,
  passiveMagnetic,
} from './arbitrary-media.ts';
import { fresnelByAdmittance } from './fresnel-by-admittance.ts';

const out = new Float64Array(SURFACE_LENGTH + 3);

/** What the kernel writes, in the words of the law. */
function written(from: Optics, into: Optics, angle_rad: number) {
  out.fill(Number.NaN);
  writeSurfaceOf(from, into, angle_rad, out, 3);
  expect([...out.subarray(0, 3)]).toEqual([Number.NaN, Number.NaN, Number.NaN]);
  return [...out.subarray(3)];
}

function lawful(from: Optics, into: Optics, angle_rad: number) {
  const { rs, rp, Rs, Rp, Ts, Tp } = fresnelByAdmittance(from, into, angle_rad);
  return [rs.re, rs.im, rp.re, rp.im, Rs, Rp, Ts, Tp];
}

/** Equal to rounding; the reflected amplitudes are of order one, so an absolute bound is right for them. */
function expectEqual(from: Optics, into: Optics, angle_rad: number): void {
  const expected = lawful(from, into, angle_rad);
  // kappa2^2 is a difference: both forms carry the rounding of its terms, over what is left.
  const { kappa2 } = fresnelByAdmittance(from, into, angle_rad);
  const lost = Math.max(1, (abs2(from.n) + abs2(into.n)) / (10 * abs2(kappa2)));
  for (const [i, value] of written(from, into, angle_rad).entries()) {
    const law = expected[i] ?? Number.NaN;
    expect(Math.abs(value - law), `number ${i}: ${value} for ${law}`).toBeLessThanOrEqual(
      1e-13 * lost * Math.max(1, Math.abs(law)),
    );
  }
}

const between = evenly;
const magnetic = fc.oneof(losslessMagnetic, passiveMagnetic);
const doublyNegative = fc
  .tuple(between(-6, -0.5), between(-6, -0.5))
  .map(([eps, mu]) => opticsFromPermittivity({ re: eps, im: 0 }, { re: mu, im: 0 }));
const losslessMetal = between(-50, -0.1).map((eps) => opticsFromPermittivity({ re: eps, im: 0 }, ONE));
const any = fc.oneof(losslessDielectric, absorbing, losslessMetal, magnetic, doublyNegative);

describe('Fresnel on bare numbers', () => {
  it('is the law, for media without magnetism', () => {
    const plain = fc.oneof(losslessDielectric, absorbing, losslessMetal);
    fc.assert(
      fc.property(losslessDielectric, plain, incidence, (a, b, angle) => expectEqual(a, b, angle)),
      { numRuns: 3000 },
    );
  });

  it('is the law, for any far side', () => {
    fc.assert(
      fc.property(fc.oneof(losslessDielectric, losslessMagnetic), any, incidence, (a, b, angle) =>
        expectEqual(a, b, angle),
      ),
      { numRuns: 3000 },
    );
  });

  it('is the law where the medium of incidence absorbs', () => {
    fc.assert(
      fc.property(absorbing, any, between(0, 1.5), (a, b, angle) => expectEqual(a, b, angle)),
      { numRuns: 3000 },
    );
  });

  it('is the law for the very good and the very weak absorbers', () => {
    const extreme = fc
      .tuple(between(-9, 9), between(-12, 9))
      .map(([n, k]) => opticsFromIndex({ re: 10 ** (n / 3), im: 10 ** k }, ONE));
    fc.assert(
      fc.property(losslessDielectric, extreme, incidence, (a, b, angle) => expectEqual(a, b, angle)),
      { numRuns: 3000 },
    );
  });

  it('returns all and passes nothing in total reflection, exactly', () => {
    fc.assert(
      fc.property(losslessMagnetic, losslessMagnetic, incidence, (a, b, angle) => {
        fc.pre(a.n.re * Math.sin(angle) > b.n.re * 1.000001);
        expect(written(a, b, angle).slice(4)).toEqual([1, 1, 0, 0]);
      }),
    );
    writeSurface(1.5, 0, 1, 0, Math.cos(0.9), out);
    expect([...out.subarray(4, 8)]).toEqual([1, 1, 0, 0]);
  });

  it('is exact for like media and at normal incidence', () => {
    writeSurface(1.7, 0, 1.7, 0, Math.cos(1.2), out);
    expect([...out.subarray(0, 8)]).toEqual([0, 0, 0, 0, 0, 0, 1, 1]);
    writeSurface(1, 0, 1.5, 0, 1, out);
    expect(out[0]).toBeCloseTo(-0.2, 15);
    expect(out[2]).toBeCloseTo(0.2, 15);
  });

  it('stands at the critical angle, where the wave beyond runs along the surface', () => {
    const critical = Math.asin(1 / 1.5);
    writeSurface(1.5, 0, 1, 0, Math.cos(critical), out);
    for (const value of out.subarray(0, 8)) expect(Number.isFinite(value)).toBe(true);
    expect(out[4]).toBeCloseTo(1, 6);
  });
});
