import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { abs2, add, type Complex, complex, div, exp, mul, scale, sub } from '../../src/num/complex.ts';
import { coherenceLength_m, coherenceOf, isCoherent } from '../../src/stack/coherence.ts';
import { coherentStack } from '../../src/stack/coherent-stack.ts';
import {
  type Layer,
  layerFromIndex,
  reversedPath,
  substanceFromIndex,
} from '../../src/stack/layered-path.ts';
import { mixedStack } from '../../src/stack/mixed-stack.ts';
import { characteristicMatrix } from './characteristic-matrix.ts';
import {
  angle_rad,
  between,
  dielectric,
  layer,
  logarithmic,
  path,
  substance,
  wavelength_m,
} from './random-path.ts';

const sides = ['s', 'p'] as const;
const air = substanceFromIndex(1);
const slab = (of: Layer): Layer => ({ ...of, coherent: false });

/** Weak to strong absorbers a millimetre to a metre thick, and lossless ones. */
const thick: fc.Arbitrary<Layer> = fc
  .tuple(between(1.05, 4), fc.oneof(fc.constant(0), logarithmic(1e-12, 0.5)), logarithmic(1e-3, 1))
  .map(([n, k, thickness_m]) => slab(layerFromIndex(thickness_m, n, k)));

describe('coherence', () => {
  it('is decided by half the coherence length', () => {
    expect(coherenceLength_m(1e-6, 1e-9)).toBeCloseTo(1e-3, 15);
    expect(isCoherent(4.9e-4, 1e-3)).toBe(true);
    expect(isCoherent(5.1e-4, 1e-3)).toBe(false);
    expect(isCoherent(0, 0)).toBe(true);
    expect(isCoherent(1, Number.POSITIVE_INFINITY)).toBe(true);
    expect([0.05, 0.3, 2].map((x) => coherenceOf(x, 1))).toEqual(['coherent', 'partial', 'incoherent']);
  });

  it('is reported layer by layer, with the round trip', () => {
    const layers = [layerFromIndex(1e-7, 1.38), layerFromIndex(1e-3, 1.5), layerFromIndex(1e-3, 1.5)];
    const given = mixedStack({ incidence: air, layers, exit: air }, 5e-7, 0, 1e-4);
    expect(given.layers.map((x) => x.coherent)).toEqual([true, false, false]);
    expect(given.layers[1]?.roundTripOpticalPath_m).toBeCloseTo(3e-3, 15);
    const forced = layers.map((x, i) => ({ ...x, coherent: i === 2 }));
    const other = mixedStack({ incidence: air, layers: forced, exit: air }, 5e-7, 0, 1e-4);
    // A film of less than a wavelength round trip stays coherent even where the opposite was asked.
    expect(other.layers.map((x) => x.coherent)).toEqual([true, false, true]);
  });

  it('is kept where the wave dies within a wavelength: there is no fringe', () => {
    const metal = slab(layerFromIndex(1e-2, 0.5, 4));
    expect(mixedStack({ incidence: air, layers: [metal], exit: air }, 5e-7, 0, 0).layers[0]?.coherent).toBe(
      true,
    );
  });

  it('of infinite length gives the coherent stack', () => {
    fc.assert(
      fc.property(path(8, 1e-3), wavelength_m, angle_rad, (stack, wave, angle) => {
        const mixed = mixedStack(stack, wave, angle, Number.POSITIVE_INFINITY);
        const coherent = coherentStack(stack, wave, angle);
        for (const side of sides) {
          expect(mixed[side].R).toBe(coherent[side].R);
          expect(mixed[side].T).toBeCloseTo(coherent[side].T, 14);
          expect(mixed[side].A).toBeCloseTo(coherent[side].A, 14);
        }
      }),
    );
  });
});

describe('energy', () => {
  it('R + T + absorptances = 1 with films and thick slabs mixed at random, lossy slabs included', () => {
    fc.assert(
      fc.property(
        dielectric,
        fc.array(fc.oneof(layer(1e-6), layer(1e-7), thick), { maxLength: 14 }),
        substance,
        wavelength_m,
        between(0, 1.55),
        (incidence, layers, exit, wave, angle) => {
          const result = mixedStack({ incidence, layers, exit }, wave, angle, 1e-5);
          for (const side of sides) {
            const { R, T, A, layerAbsorptance } = result[side];
            expect(Math.abs(R + T + A - 1)).toBeLessThan(1e-11);
            expect(Math.min(R, T, ...layerAbsorptance)).toBeGreaterThan(-1e-12);
          }
        },
      ),
      { numRuns: 400 },
    );
  });

  it('a weakly absorbing slab keeps its digits', () => {
    const at = (k: number): number =>
      mixedStack({ incidence: air, layers: [slab(layerFromIndex(1e-3, 1.5, k))], exit: air }, 1e-6, 0.4, 0)
        .unpolarized.A;
    // Small enough for A to be proportional to k.
    expect(at(1e-16) / 1e-16 / (at(1e-15) / 1e-15)).toBeCloseTo(1, 10);
  });
});

describe('one slab is the average of the coherent stack over a fringe', () => {
  it('lossless slab with coated faces: thickness run through one fringe', () => {
    fc.assert(
      fc.property(
        fc.array(layer(3e-7), { maxLength: 3 }),
        fc.array(layer(3e-7), { maxLength: 3 }),
        between(1.3, 3),
        wavelength_m,
        between(0, 1.3),
        (above, below, n, wave, angle) => {
          const thickness = 40 * wave;
          // The mean of N steps misses the true one by about (r1 r2)^N: keep the finesse moderate.
          const inside = substanceFromIndex(n);
          const face = (layers: readonly Layer[]) =>
            coherentStack({ incidence: inside, layers, exit: air }, wave, Math.asin(Math.sin(angle) / n));
          const [top, bottom] = [face([...above].reverse()), face(below)];
          fc.pre(sides.every((side) => top[side].R * bottom[side].R < 0.9));
          const path = (d: number, coherent: boolean) => ({
            incidence: air,
            layers: [...above, { ...layerFromIndex(d, n), coherent }, ...below],
            exit: air,
          });
          const fringe = wave / (2 * Math.sqrt(n * n - Math.sin(angle) ** 2));
          const mean = { s: { R: 0, T: 0, A: 0 }, p: { R: 0, T: 0, A: 0 } };
          // Equal steps through a period: the mean of a rational function of exp(i phase) converges geometrically.
          const steps = 1024;
          for (let i = 0; i < steps; i++) {
            const one = coherentStack(path(thickness + (fringe * i) / steps, true), wave, angle);
            for (const side of sides) {
              for (const q of ['R', 'T', 'A'] as const) mean[side][q] += one[side][q] / steps;
            }
          }
          const mixed = mixedStack(path(thickness, false), wave, angle, Number.POSITIVE_INFINITY);
          for (const side of sides) {
            for (const q of ['R', 'T', 'A'] as const) {
              expect(Math.abs(mixed[side][q] - mean[side][q])).toBeLessThan(1e-7);
            }
          }
        },
      ),
      { numRuns: 15 },
    );
  });

  it('absorbing slab: the closed form t1 t2 exp(iD)/(1 - r1 r2 exp(2iD)) run through the phase alone', () => {
    fc.assert(
      fc.property(
        between(1.2, 3),
        logarithmic(1e-5, 0.5),
        wavelength_m,
        between(0, 1.3),
        (n, k, wave, angle) => {
          const of = substanceFromIndex(n, k);
          const thickness = (0.3 * wave) / (4 * Math.PI * k) + 3 * wave;
          const q2 = Math.sin(angle) ** 2;
          const kappa2 = complex(of.eps.re - q2, of.eps.im);
          const kappa = principalRoot(kappa2);
          const mixed = mixedStack(
            { incidence: air, layers: [slab({ ...of, thickness_m: thickness })], exit: air },
            wave,
            angle,
            0,
          );
          for (const side of sides) {
            const face = characteristicMatrix({ incidence: air, layers: [], exit: of }, wave, angle, side);
            const y0 = side === 's' ? complex(Math.cos(angle)) : complex(1 / Math.cos(angle));
            const y = side === 's' ? kappa : div(of.eps, kappa);
            const r2 = div(sub(y, y0), add(y, y0));
            const t2 = div(scale(y, 2), add(y, y0));
            const decay = Math.exp((-2 * Math.PI * kappa.im * thickness) / wave);
            let R = 0;
            let T = 0;
            const steps = 500;
            for (let i = 0; i < steps; i++) {
              const e = scale(exp(complex(0, (2 * Math.PI * i) / steps)), decay * decay);
              const inner = sub(complex(1), mul(mul(r2, r2), e));
              T += abs2(div(mul(face.tTangential, t2), inner)) * decay * decay;
              R += abs2(add(face.rTangential, div(mul(mul(face.tTangential, t2), mul(r2, e)), inner)));
            }
            expect(Math.abs(mixed[side].T - T / steps)).toBeLessThan(1e-11);
            expect(Math.abs(mixed[side].R - R / steps)).toBeLessThan(1e-11);
          }
        },
      ),
    );
    function principalRoot(z: Complex): Complex {
      const m = Math.hypot(z.re, z.im);
      const re = Math.sqrt((m + z.re) / 2);
      return complex(re, z.im / (2 * re));
    }
  });
});

describe('closed forms', () => {
  it('m equal plates: T = (1 - R)/(1 + (2 m - 1) R), each polarization on its own', () => {
    for (const m of [1, 2, 5, 10]) {
      const layers = Array.from({ length: 2 * m - 1 }, (_, i) => slab(layerFromIndex(1e-3, i % 2 ? 1 : 1.5)));
      const angle = 0.7;
      const pile = mixedStack({ incidence: air, layers, exit: air }, 5e-7, angle, 0);
      const face = coherentStack({ incidence: air, layers: [], exit: substanceFromIndex(1.5) }, 5e-7, angle);
      for (const side of sides) {
        const { R } = face[side];
        expect(pile[side].T).toBeCloseTo((1 - R) / (1 + (2 * m - 1) * R), 13);
        expect(pile[side].R_back).toBeCloseTo(pile[side].R, 13);
      }
    }
  });

  it('R_back and T are those of the reversed path', () => {
    fc.assert(
      fc.property(
        fc.array(fc.oneof(layer(3e-7), thick), { maxLength: 8 }),
        between(1, 2),
        wavelength_m,
        between(0, 0.4),
        (layers, nExit, wave, angle) => {
          const stack = { incidence: air, layers, exit: substanceFromIndex(nExit) };
          const there = mixedStack(stack, wave, angle, 1e-5);
          const back = mixedStack(reversedPath(stack), wave, Math.asin(Math.sin(angle) / nExit), 1e-5);
          fc.pre(there.layers.every((x, i) => x.coherent === back.layers[layers.length - 1 - i]?.coherent));
          for (const side of sides) {
            expect(Math.abs((there[side].R_back ?? -1) - back[side].R)).toBeLessThan(1e-9);
            expect(Math.abs(there[side].T - back[side].T)).toBeLessThan(1e-9);
          }
        },
      ),
    );
  });

  it('R_back is null where nothing arrives from behind', () => {
    const layers = [slab(layerFromIndex(1e-3, 1.5))];
    expect(
      mixedStack({ incidence: air, layers, exit: substanceFromIndex(1, 3) }, 5e-7, 0, 0).s.R_back,
    ).toBeNull();
    const prism = { incidence: substanceFromIndex(1.5), layers, exit: air };
    expect(mixedStack(prism, 5e-7, 1, 0).p.R_back).toBeNull();
  });

  it('a slab exactly at its critical angle reflects all', () => {
    const prism = substanceFromIndex(2);
    const { s, p } = mixedStack(
      { incidence: prism, layers: [slab(layerFromIndex(1e-3, 1))], exit: prism },
      5e-7,
      Math.asin(0.5),
      0,
    );
    for (const one of [s, p]) {
      expect(one.R).toBeGreaterThan(1 - 1e-5);
      expect(one.R + one.T).toBeCloseTo(1, 8);
    }
  });
});
