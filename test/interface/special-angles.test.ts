import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fresnel } from '../../src/interface/fresnel.ts';
import { opticsFromIndex, opticsFromPermittivity } from '../../src/interface/optics.ts';
import { brewsterAngles, criticalAngle } from '../../src/interface/special-angles.ts';
import { complex, ONE } from '../../src/num/complex.ts';
import { losslessMagnetic } from './arbitrary-media.ts';

const deg = Math.PI / 180;
const index = (n: number, k = 0) => opticsFromIndex(complex(n, k), ONE);
const medium = (eps: number, mu: number) => opticsFromPermittivity(complex(eps), complex(mu));

describe('Brewster angles', () => {
  // Brewster's law, tan = n2/n1: 56.31 degrees for 1.5, 53.06 for water 1.33.
  it('of dielectrics: p only', () => {
    expect(brewsterAngles(index(1), index(1.5)).p).toBeCloseTo(56.31 * deg, 4);
    expect(brewsterAngles(index(1), index(1.33)).p).toBeCloseTo(53.06 * deg, 4);
    expect(brewsterAngles(index(1), index(1.5)).s).toBeNull();
  });

  // Duality: exchange eps and mu, and s and p exchange (Jackson 6.11); tan^2 = mu2/mu1 for equal eps.
  it('of media that differ in permeability: s only', () => {
    const { s, p } = brewsterAngles(medium(1, 1), medium(1, 2.25));
    expect(s).toBeCloseTo(56.31 * deg, 4);
    expect(p).toBeNull();
    expect(brewsterAngles(medium(2, 2.25), medium(2, 1)).s).toBeCloseTo(33.69 * deg, 4);
  });

  it('are where the reflectance vanishes; where there is none it vanishes nowhere', () => {
    let found = 0;
    fc.assert(
      fc.property(losslessMagnetic, losslessMagnetic, (from, into) => {
        const { s, p } = brewsterAngles(from, into);
        if (s !== null) expect(fresnel(from, into, s).Rs).toBeLessThan(1e-20);
        if (p !== null) expect(fresnel(from, into, p).Rp).toBeLessThan(1e-20);
        found += (s === null ? 0 : 1) + (p === null ? 0 : 1);
        const contrast = Math.abs(Math.log((into.eps.re * from.mu.re) / (from.eps.re * into.mu.re)));
        fc.pre(
          contrast > 0.2 &&
            Math.abs(into.eps.re / from.eps.re - 1) > 0.1 &&
            Math.abs(into.mu.re / from.mu.re - 1) > 0.1,
        );
        for (let angle = 0; angle < 89 * deg; angle += deg) {
          const w = fresnel(from, into, angle);
          // A zero between two steps leaves less than this beside it, unless it lies at grazing.
          if (s === null && angle < 60 * deg) expect(w.Rs).toBeGreaterThan(1e-9);
          if (p === null && angle < 60 * deg) expect(w.Rp).toBeGreaterThan(1e-9);
        }
      }),
    );
    expect(found).toBeGreaterThan(20);
  });

  it('do not exist between media of equal impedance at oblique incidence, nor where absorption fills the zero', () => {
    expect(brewsterAngles(index(1.5), index(1.5))).toEqual({ p: null, s: null });
    expect(brewsterAngles(index(1), index(1.5, 0.1)).p).toBeNull();
    expect(brewsterAngles(index(1), index(1.5, 1e-7)).p).not.toBeNull();
    const lossy = opticsFromPermittivity(ONE, complex(2.25, 0.3));
    expect(brewsterAngles(index(1), lossy).s).toBeNull();
  });
});

describe('critical angle', () => {
  // Textbook figures: 41.8 degrees from glass 1.5, 48.75 from water 1.33, 24.4 from diamond 2.42, all to air.
  it.each<[number, number]>([
    [1.5, 41.81],
    [1.33, 48.75],
    [2.42, 24.41],
  ])('from %d', (n, angle_deg) => {
    expect((criticalAngle(index(n), index(1)) ?? 0) / deg).toBeCloseTo(angle_deg, 1);
    expect(criticalAngle(index(1), index(n))).toBeNull();
    expect(criticalAngle(index(n), index(n))).toBeNull();
  });

  it('has no meaning once either side absorbs', () => {
    expect(criticalAngle(index(1.5, 0.0016), index(1))).toBeNull();
    expect(criticalAngle(index(1.5, 0.0014), index(1))).not.toBeNull();
    expect(criticalAngle(index(3, 0.0029), index(2, 0.00019))).not.toBeNull();
    expect(criticalAngle(index(3), index(2, 0.00021))).toBeNull();
  });

  it('has none out of or into a backward medium', () => {
    expect(criticalAngle(medium(-4, -1), index(1))).toBeNull();
    expect(criticalAngle(index(1.5), medium(-1, -1))).toBeNull();
  });
});
