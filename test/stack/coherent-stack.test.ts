import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { abs, abs2, sub } from '../../src/num/complex.ts';
import { coherentStack } from '../../src/stack/coherent-stack.ts';
import {
  type LayeredPath,
  layerFromIndex,
  reversedPath,
  substanceFromIndex,
} from '../../src/stack/layered-path.ts';
import { StackRefusal } from '../../src/stack/stack-refusal.ts';
import { characteristicMatrix } from './characteristic-matrix.ts';
import {
  angle_rad,
  between,
  dielectric,
  losslessPath,
  path,
  substance,
  wavelength_m,
} from './random-path.ts';

const polarizations = ['s', 'p'] as const;
const air = substanceFromIndex(1);

describe('energy', () => {
  it('R + T + absorptances = 1 to 1e-11, up to 60 layers of up to 1 m', () => {
    fc.assert(
      fc.property(path(60, 1), wavelength_m, angle_rad, (stack, wave, angle) => {
        const result = coherentStack(stack, wave, angle);
        for (const polarization of polarizations) {
          const { R, T, A, layerAbsorptance } = result[polarization];
          expect(Math.abs(R + T + A - 1)).toBeLessThan(1e-11);
          expect(Math.min(R, T, ...layerAbsorptance)).toBeGreaterThan(-1e-14);
        }
      }),
      { numRuns: 2000 },
    );
  });

  it('a lossless layer absorbs exactly nothing', () => {
    fc.assert(
      fc.property(losslessPath(60, 1), wavelength_m, angle_rad, (stack, wave, angle) => {
        const { s, p } = coherentStack(stack, wave, angle);
        expect([...s.layerAbsorptance, ...p.layerAbsorptance].every((a) => a === 0)).toBe(true);
        expect(s.R + s.T).toBeCloseTo(1, 11);
        expect(p.R + p.T).toBeCloseTo(1, 11);
      }),
    );
  });

  it('a weak absorber keeps its digits: A proportional to k down to 1e-14', () => {
    const absorptance = (k: number): number =>
      coherentStack(
        { incidence: air, layers: [layerFromIndex(2e-6, 1.8, k)], exit: substanceFromIndex(1.5) },
        633e-9,
        0.6,
      ).unpolarized.A;
    const strong = absorptance(1e-7) / 1e-7;
    for (const k of [1e-9, 1e-11, 1e-14]) expect(absorptance(k) / k / strong).toBeCloseTo(1, 5);
    expect(absorptance(1e-14) / 1e-14 / (absorptance(1e-13) / 1e-13)).toBeCloseTo(1, 11);
  });
});

describe('symmetries', () => {
  it('T is the same from both sides', () => {
    fc.assert(
      fc.property(path(20, 1e-3), dielectric, wavelength_m, between(0, 1.5), (stack, exit, wave, angle) => {
        const forth = { ...stack, exit };
        const n0 = Math.sqrt(forth.incidence.eps.re);
        const nExit = Math.sqrt(exit.eps.re);
        const sinBack = (n0 * Math.sin(angle)) / nExit;
        fc.pre(sinBack < 0.999);
        const there = coherentStack(forth, wave, angle);
        const back = coherentStack(reversedPath(forth), wave, Math.asin(sinBack));
        for (const polarization of polarizations) {
          // asin and sin round the angle: the phase of a thick layer turns that into more than the rounding of T itself.
          expect(Math.abs(there[polarization].T - back[polarization].T)).toBeLessThan(1e-9);
        }
      }),
    );
  });

  it('s and p agree at normal incidence, r_p = -r_s', () => {
    fc.assert(
      fc.property(path(20, 1e-3), wavelength_m, (stack, wave) => {
        const { s, p } = coherentStack(stack, wave, 0);
        expect(Math.abs(s.R - p.R)).toBeLessThan(1e-12);
        expect(Math.abs(s.T - p.T)).toBeLessThan(1e-12);
        expect(abs2({ re: s.r.re + p.r.re, im: s.r.im + p.r.im })).toBeLessThan(1e-20);
      }),
    );
  });
});

describe('layers that make no difference', () => {
  const close = (a: LayeredPath, b: LayeredPath, wave: number, angle: number, tolerance: number): void => {
    const x = coherentStack(a, wave, angle);
    const y = coherentStack(b, wave, angle);
    for (const polarization of polarizations) {
      expect(abs(sub(x[polarization].r, y[polarization].r))).toBeLessThan(tolerance);
      expect(Math.abs(x[polarization].T - y[polarization].T)).toBeLessThan(tolerance);
    }
  };

  it('a layer of zero thickness', () => {
    fc.assert(
      fc.property(
        path(20, 1e-3),
        substance,
        fc.nat(20),
        wavelength_m,
        angle_rad,
        (stack, of, at, wave, angle) => {
          const layers = [...stack.layers];
          layers.splice(Math.min(at, layers.length), 0, { ...of, thickness_m: 0 });
          close(stack, { ...stack, layers }, wave, angle, 1e-14);
        },
      ),
    );
  });

  it('a half-wave layer, at its wavelength and angle', () => {
    fc.assert(
      fc.property(
        path(12, 1e-5),
        between(1.5, 5),
        fc.nat(12),
        wavelength_m,
        between(0, 1),
        (stack, n, at, wave, angle) => {
          const q = Math.sqrt(stack.incidence.eps.re) * Math.sin(angle);
          fc.pre(q < 0.95 * n);
          const half = layerFromIndex(wave / (2 * Math.sqrt(n * n - q * q)), n);
          const layers = [...stack.layers];
          layers.splice(Math.min(at, layers.length), 0, half);
          close(stack, { ...stack, layers }, wave, angle, 1e-11);
        },
      ),
    );
  });

  it('a cut through a layer', () => {
    fc.assert(
      fc.property(
        path(12, 1e-5),
        fc.nat(11),
        between(0, 1),
        wavelength_m,
        angle_rad,
        (stack, at, share, wave, angle) => {
          fc.pre(stack.layers.length > 0);
          const i = at % stack.layers.length;
          const whole = stack.layers[i];
          if (!whole) return;
          const upper = { ...whole, thickness_m: whole.thickness_m * share };
          const lower = { ...whole, thickness_m: whole.thickness_m - upper.thickness_m };
          const layers = [...stack.layers.slice(0, i), upper, lower, ...stack.layers.slice(i + 1)];
          close(stack, { ...stack, layers }, wave, angle, 1e-10);
        },
      ),
    );
  });
});

describe('characteristic matrix', () => {
  it('gives the same r and t for thin stacks', () => {
    fc.assert(
      fc.property(path(20, 1e-7), wavelength_m, between(0, 1.5), (stack, wave, angle) => {
        const result = coherentStack({ ...stack, layers: stack.layers.map(thin) }, wave, angle);
        for (const polarization of polarizations) {
          const other = characteristicMatrix(
            { ...stack, layers: stack.layers.map(thin) },
            wave,
            angle,
            polarization,
          );
          const { r, R, T } = result[polarization];
          const rTangential = polarization === 's' ? r : { re: -r.re, im: -r.im };
          expect(abs(sub(rTangential, other.rTangential))).toBeLessThan(1e-9);
          expect(Math.abs(R - other.R)).toBeLessThan(1e-9);
          expect(Math.abs(T - other.T)).toBeLessThan(1e-9);
        }
      }),
    );
    function thin<L extends { thickness_m: number }>(layer: L): L {
      return { ...layer, thickness_m: Math.min(layer.thickness_m, 3e-8) };
    }
  });
});

describe('no layers', () => {
  const n = 1.5;
  it.each([0, 0.3, 0.9, 1.4])('Fresnel coefficients of glass in air at %s rad', (angle) => {
    const { s, p } = coherentStack({ incidence: air, layers: [], exit: substanceFromIndex(n) }, 5e-7, angle);
    const cos1 = Math.cos(angle);
    const cos2 = Math.sqrt(1 - (Math.sin(angle) / n) ** 2);
    expect(s.r.re).toBeCloseTo((cos1 - n * cos2) / (cos1 + n * cos2), 14);
    expect(p.r.re).toBeCloseTo((n * cos1 - cos2) / (n * cos1 + cos2), 14);
    expect(s.t.re).toBeCloseTo((2 * cos1) / (cos1 + n * cos2), 14);
    expect(p.t.re).toBeCloseTo((2 * cos1) / (n * cos1 + cos2), 14);
  });
});

describe('frustrated total reflection', () => {
  it('T = 1/(1 + X sinh^2), X = (a^2 + b^2)^2/(4 a^2 b^2), both polarizations', () => {
    fc.assert(
      fc.property(
        between(1.4, 4),
        between(1, 1.3),
        between(0.02, 1),
        between(0.01, 0.99),
        (n1, n2, gap, share) => {
          const critical = Math.asin(n2 / n1);
          const angle = critical + share * (Math.PI / 2 - critical);
          const prism = substanceFromIndex(n1);
          const stack = { incidence: prism, layers: [layerFromIndex(gap * 1e-6, n2)], exit: prism };
          const result = coherentStack(stack, 1e-6, angle);
          const decay = Math.sqrt((n1 * Math.sin(angle)) ** 2 - n2 ** 2);
          const inside = n1 * Math.cos(angle);
          for (const [side, a, b] of [
            ['s', inside, decay],
            ['p', inside / n1 ** 2, decay / n2 ** 2],
          ] as const) {
            const X = (a * a + b * b) ** 2 / (4 * a * a * b * b);
            const T = 1 / (1 + X * Math.sinh(2 * Math.PI * gap * decay) ** 2);
            expect(Math.abs(result[side].T / T - 1)).toBeLessThan(1e-9);
            expect(result[side].R).toBeCloseTo(1 - T, 11);
          }
        },
      ),
    );
  });
});

describe('special cases', () => {
  it('a metre of silver transmits nothing and hides nothing above it', () => {
    const metal = layerFromIndex(1, 0.05, 4.2);
    const film = layerFromIndex(1e-7, 1.46);
    const thick = coherentStack({ incidence: air, layers: [film, metal], exit: air }, 633e-9, 0.7);
    const bulk = coherentStack(
      { incidence: air, layers: [film], exit: substanceFromIndex(0.05, 4.2) },
      633e-9,
      0.7,
    );
    expect(thick.p.T).toBe(0);
    expect(thick.s.R).toBeCloseTo(bulk.s.R, 14);
    expect(thick.p.R).toBeCloseTo(bulk.p.R, 14);
    expect(thick.p.layerAbsorptance[1]).toBeCloseTo(1 - bulk.p.R, 13);
  });

  it('a layer exactly at its critical angle', () => {
    const angle = Math.asin(0.5);
    const at = (a: number) =>
      coherentStack(
        { incidence: substanceFromIndex(2), layers: [layerFromIndex(7e-7, 1)], exit: substanceFromIndex(2) },
        5e-7,
        a,
      );
    const here = at(angle);
    for (const polarization of polarizations) {
      expect(here[polarization].R + here[polarization].T).toBeCloseTo(1, 13);
      const beside = (at(angle - 1e-7)[polarization].T + at(angle + 1e-7)[polarization].T) / 2;
      expect(here[polarization].T).toBeCloseTo(beside, 10);
    }
  });

  it('hundreds of layers of a good conductor at radio frequency stay finite', () => {
    const foil = { eps: { re: 1, im: 1e12 }, mu: { re: 1, im: 0 }, thickness_m: 1e-3 };
    const gap = layerFromIndex(1, 1);
    const layers = Array.from({ length: 200 }, (_, i) => (i % 2 ? gap : foil));
    const { s } = coherentStack({ incidence: air, layers, exit: air }, 300, 0.5);
    expect(s.T).toBe(0);
    expect(s.R + s.A).toBeCloseTo(1, 12);
  });

  it('a doubly negative slab of index -1 undoes the same length of vacuum', () => {
    const slab = { eps: { re: -1, im: 0 }, mu: { re: -1, im: 0 }, thickness_m: 3e-6 };
    const { s, p } = coherentStack(
      { incidence: air, layers: [slab, layerFromIndex(3e-6, 1)], exit: air },
      5e-7,
      0.8,
    );
    for (const one of [s, p]) {
      expect(one.R).toBeLessThan(1e-25);
      expect(one.t.re).toBeCloseTo(1, 12);
      expect(one.t.im).toBeCloseTo(0, 12);
    }
  });
});

describe('refusals', () => {
  const good: LayeredPath = { incidence: air, layers: [layerFromIndex(1e-7, 1.4)], exit: air };
  const gain = { eps: { re: 2, im: -0.1 }, mu: { re: 1, im: 0 } };
  it.each([
    ['gain-medium', { ...good, exit: gain }, 5e-7, 0],
    ['lossy-incidence', { ...good, incidence: substanceFromIndex(1.5, 0.1) }, 5e-7, 0],
    ['no-incident-wave', { ...good, incidence: { eps: { re: -2, im: 0 }, mu: { re: 1, im: 0 } } }, 5e-7, 0],
    ['negative-thickness', { ...good, layers: [layerFromIndex(-1, 1.4)] }, 5e-7, 0],
    ['not-finite', { ...good, layers: [layerFromIndex(Number.NaN, 1.4)] }, 5e-7, 0],
    ['not-finite', { ...good, exit: substanceFromIndex(Number.POSITIVE_INFINITY) }, 5e-7, 0],
    ['zero-permittivity', { ...good, exit: { eps: { re: 0, im: 0 }, mu: { re: 1, im: 0 } } }, 5e-7, 0],
    ['angle-out-of-range', good, 5e-7, 1.6],
    ['angle-out-of-range', good, 5e-7, -0.1],
    ['wavelength-not-positive', good, 0, 0],
  ] as const)('%s', (code, stack, wave, angle) => {
    try {
      coherentStack(stack, wave, angle);
      expect.unreachable();
    } catch (error) {
      expect(error).toBeInstanceOf(StackRefusal);
      expect((error as StackRefusal).code).toBe(code);
      expect((error as StackRefusal).remedy).not.toBe('');
    }
  });
});
