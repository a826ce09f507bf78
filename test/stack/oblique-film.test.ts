import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { twoLayerCoating } from '../../src/stack/coating.ts';
import { coherentStack } from '../../src/stack/coherent-stack.ts';
import { layerFromIndex, substanceFromIndex } from '../../src/stack/layered-path.ts';
import { idealFilmIndexAt, normalIndex, tiltedAdmittance } from '../../src/stack/oblique-film.ts';
import { evenly } from '../helpers/evenly.ts';

const index = evenly(1, 4);
const angle = evenly(0, 80).map((deg) => (deg * Math.PI) / 180);
const pol = fc.constantFrom('s' as const, 'p' as const);

describe('films off the normal', () => {
  it('a quarter wave of the ideal index reflects nothing of its polarization', () => {
    fc.assert(
      fc.property(index, angle, pol, (ns, a, polarization) => {
        const q = Math.sin(a);
        const n = idealFilmIndexAt(1, ns, q, polarization);
        fc.pre(n !== null && n > q + 1e-3);
        const thickness_m = 1e-6 / (4 * normalIndex(n ?? 1, q));
        const path = {
          incidence: substanceFromIndex(1),
          layers: [layerFromIndex(thickness_m, n ?? 1)],
          exit: substanceFromIndex(ns),
        };
        expect(coherentStack(path, 1e-6, a)[polarization].R).toBeLessThan(1e-12);
      }),
    );
  });

  it('is sqrt(n0 ns) at the normal for both', () => {
    for (const p of ['s', 'p'] as const)
      expect(idealFilmIndexAt(1.2, 1.9, 0, p)).toBeCloseTo(Math.sqrt(1.2 * 1.9), 14);
  });

  it('V-coats by admittances reflect nothing of their polarization', () => {
    let tried = 0;
    fc.assert(
      fc.property(index, index, index, angle, pol, (n1, n2, ns, a, polarization) => {
        const q = Math.sin(a);
        const y = (n: number): number => tiltedAdmittance(n, q, polarization);
        let designs: ReturnType<typeof twoLayerCoating>;
        try {
          designs = twoLayerCoating(y(1), y(n1), y(n2), y(ns), 1e-6);
        } catch {
          return;
        }
        tried++;
        for (const { outerWaves, innerWaves } of designs) {
          const path = {
            incidence: substanceFromIndex(1),
            layers: [
              layerFromIndex((outerWaves * 1e-6) / normalIndex(n1, q), n1),
              layerFromIndex((innerWaves * 1e-6) / normalIndex(n2, q), n2),
            ],
            exit: substanceFromIndex(ns),
          };
          expect(coherentStack(path, 1e-6, a)[polarization].R).toBeLessThan(1e-9);
        }
      }),
      { numRuns: 300 },
    );
    expect(tried).toBeGreaterThan(30);
  });
});
