import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { coherentStack } from '../../src/stack/coherent-stack.ts';
import {
  fieldAt,
  fieldAtPosition,
  fieldProfile,
  frontField,
  layerMaximum,
  solveField,
  stackMaximum,
} from '../../src/stack/field-profile.ts';
import { layerFromIndex, substanceFromIndex } from '../../src/stack/layered-path.ts';
import { angle_rad, path, wavelength_m } from './random-path.ts';

const sides = ['s', 'p'] as const;
const air = substanceFromIndex(1);

describe('field inside', () => {
  it('is continuous across every interface in s', () => {
    fc.assert(
      fc.property(path(8, 1e-6), wavelength_m, angle_rad, (stack, wave, angle) => {
        const field = solveField(stack, wave, angle, 's');
        let above = fieldAt(field, -1, 0).intensity;
        for (let j = 0; j <= stack.layers.length; j++) {
          const below = fieldAt(field, j, 0).intensity;
          expect(Math.abs(below - above)).toBeLessThan(1e-10 * (1 + below));
          const thickness = stack.layers[j]?.thickness_m;
          if (thickness !== undefined) above = fieldAt(field, j, thickness).intensity;
        }
      }),
    );
  });

  it('at the first face equals |1 + r|^2 in s and its p counterpart', () => {
    fc.assert(
      fc.property(path(8, 1e-6), wavelength_m, angle_rad, (stack, wave, angle) => {
        const { s, p } = coherentStack(stack, wave, angle);
        const atFace = (side: 's' | 'p') => fieldAt(solveField(stack, wave, angle, side), -1, 0).intensity;
        expect(atFace('s')).toBeCloseTo((1 + s.r.re) ** 2 + s.r.im ** 2, 10);
        // r_p = -r_tan: tangential part cos (1 - r_p), normal part sin (1 + r_p).
        const [cos2, sin2] = [Math.cos(angle) ** 2, Math.sin(angle) ** 2];
        expect(atFace('p')).toBeCloseTo(
          cos2 * ((1 - p.r.re) ** 2 + p.r.im ** 2) + sin2 * ((1 + p.r.re) ** 2 + p.r.im ** 2),
          10,
        );
      }),
    );
  });

  it('normal E jumps in p by the ratio of permittivities at grazing-dominated incidence', () => {
    const angle = 1.2;
    const field = solveField({ incidence: air, layers: [], exit: substanceFromIndex(1.5) }, 5e-7, angle, 'p');
    const { r } = coherentStack({ incidence: air, layers: [], exit: substanceFromIndex(1.5) }, 5e-7, angle).p;
    const tangential2 = (Math.cos(angle) * (1 - r.re)) ** 2;
    const normalAbove2 = (Math.sin(angle) * (1 + r.re)) ** 2;
    expect(fieldAt(field, -1, 0).intensity).toBeCloseTo(tangential2 + normalAbove2, 13);
    expect(fieldAt(field, 0, 0).intensity).toBeCloseTo(tangential2 + normalAbove2 / 1.5 ** 4, 13);
  });

  it('absorbed power per length integrates to the absorptance of each layer', () => {
    fc.assert(
      fc.property(path(5, 3e-7), wavelength_m, angle_rad, (random, wave, angle) => {
        // Thin enough for the steps below to follow the decay in a metal.
        const layers = random.layers.map((x) => ({ ...x, thickness_m: Math.min(x.thickness_m, 2e-7) }));
        const stack = { ...random, layers };
        const result = coherentStack(stack, wave, angle);
        for (const side of sides) {
          const field = solveField(stack, wave, angle, side);
          stack.layers.forEach((layer, j) => {
            const share = (x: number) => fieldAt(field, j, x * layer.thickness_m).absorbed_per_m;
            const n = 4000;
            let sum = share(0) + share(1);
            for (let i = 1; i < n; i++) sum += (i % 2 ? 4 : 2) * share(i / n);
            expect((sum * layer.thickness_m) / (3 * n)).toBeCloseTo(result[side].layerAbsorptance[j] ?? 0, 5);
          });
        }
      }),
      { numRuns: 15 },
    );
  });

  it('beyond total reflection falls to 1/e of the amplitude within lambda/(2 pi sqrt(n1^2 sin^2 - n2^2))', () => {
    const glass = substanceFromIndex(1.5);
    const depth = 1e-6 / (2 * Math.PI * Math.sqrt(1.5 ** 2 / 2 - 1));
    for (const side of sides) {
      const field = solveField({ incidence: glass, layers: [], exit: air }, 1e-6, Math.PI / 4, side);
      expect(fieldAt(field, 0, depth).intensity / fieldAt(field, 0, 0).intensity).toBeCloseTo(
        Math.exp(-2),
        12,
      );
    }
  });

  it('a metre of metal: finite everywhere, nothing behind', () => {
    const stack = {
      incidence: air,
      layers: [layerFromIndex(1, 0.1, 4), layerFromIndex(1e-7, 1.5)],
      exit: air,
    };
    const field = solveField(stack, 5e-7, 0.4, 'p');
    for (const point of fieldProfile(field, { front_m: 1e-6, behind_m: 1e-6 })) {
      expect(point.intensity).toBeGreaterThanOrEqual(0);
      expect(Number.isFinite(point.absorbed_per_m)).toBe(true);
    }
    expect(fieldAt(field, 2, 0).intensity).toBe(0);
    expect(layerMaximum(field, 0).position_m).toBe(0);
  });
});

describe('maxima', () => {
  it('in front: never exceeded by samples, and reached at the place given', () => {
    fc.assert(
      fc.property(
        path(6, 1e-6),
        wavelength_m,
        angle_rad,
        fc.constantFrom(...sides),
        (stack, wave, angle, side) => {
          const field = solveField(stack, wave, angle, side);
          const front = frontField(field);
          expect(front.position_m).toBeLessThanOrEqual(0);
          expect(front.position_m).toBeGreaterThan(-front.period_m * (1 + 1e-12));
          expect(fieldAtPosition(field, front.position_m - 1e-30).intensity).toBeCloseTo(front.intensity, 9);
          for (let i = 0; i < 40; i++) {
            const here = fieldAtPosition(field, (-(i + 0.5) / 40) * front.period_m).intensity;
            expect(here).toBeLessThanOrEqual(front.intensity * (1 + 1e-12));
          }
        },
      ),
    );
  });

  it('in a layer: never exceeded by dense samples', () => {
    fc.assert(
      fc.property(
        path(4, 2e-5),
        wavelength_m,
        angle_rad,
        fc.constantFrom(...sides),
        (stack, wave, angle, side) => {
          const field = solveField(stack, wave, angle, side);
          stack.layers.forEach((layer, j) => {
            const top = layerMaximum(field, j);
            expect(top.region).toBe(j);
            for (let i = 0; i <= 1000; i++) {
              const here = fieldAt(field, j, (layer.thickness_m * i) / 1000).intensity;
              expect(here).toBeLessThanOrEqual(top.intensity * (1 + 1e-9));
            }
          });
        },
      ),
      { numRuns: 60 },
    );
  });

  it('perfect mirror: four times the incident at a quarter wave, nothing at the surface', () => {
    const mirror = { eps: { re: 1, im: 1e22 }, mu: { re: 1, im: 0 } };
    const field = solveField({ incidence: air, layers: [], exit: mirror }, 1e-6, 0, 's');
    const front = frontField(field);
    expect(front.intensity).toBeCloseTo(4, 9);
    expect(front.position_m).toBeCloseTo(-2.5e-7, 15);
    expect(front.period_m).toBeCloseTo(5e-7, 18);
    expect(fieldAt(field, -1, 0).intensity).toBeCloseTo(0, 9);
  });

  it('quarter-wave mirror, high index outermost: highest at the first interface inside, falling pair by pair', () => {
    const [wave, nH, nL] = [1e-6, 2.25, 1.45];
    const layers = Array.from({ length: 31 }, (_, i) => {
      const n = i % 2 ? nL : nH;
      return layerFromIndex(wave / (4 * n), n);
    });
    const field = solveField({ incidence: air, layers, exit: substanceFromIndex(1.5) }, wave, 0, 's');
    // First interface inside the stack: |E|^2 = 4/nH^2, and each pair lowers it by (nL/nH)^2 (many-pair limit).
    expect(layerMaximum(field, 0).intensity).toBeCloseTo(4 / nH ** 2, 4);
    expect(layerMaximum(field, 2).intensity).toBeCloseTo((4 / nH ** 2) * (nL / nH) ** 2, 4);
    expect(stackMaximum(field).position_m).toBeCloseTo(wave / (4 * nH), 12);
  });
});
