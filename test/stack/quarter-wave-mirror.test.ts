import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { complex } from '../../src/num/complex.ts';
import { coherentStack } from '../../src/stack/coherent-stack.ts';
import { layerFromIndex, substanceFromIndex } from '../../src/stack/layered-path.ts';
import {
  pairsForReflectance,
  type QuarterWaveMirror,
  quarterWaveMirrorReflectance,
  stopBand,
} from '../../src/stack/quarter-wave-mirror.ts';
import { StackRefusal } from '../../src/stack/stack-refusal.ts';
import { between } from './random-path.ts';

const wave = 1e-6;

function asStack(
  { outsideIndex, high, low, substrate, outermost, extraLayer }: QuarterWaveMirror,
  pairs: number,
) {
  const [outer, inner] = outermost === 'high' ? [high, low] : [low, high];
  const quarter = (n: number) => layerFromIndex(wave / (4 * n), n);
  const layers = Array.from({ length: pairs }, () => [quarter(outer), quarter(inner)]).flat();
  if (extraLayer) layers.push(quarter(outer));
  return {
    incidence: substanceFromIndex(outsideIndex),
    layers,
    exit: substanceFromIndex(substrate.re, substrate.im),
  };
}

const mirror: fc.Arbitrary<QuarterWaveMirror> = fc
  .record({
    outsideIndex: between(1, 2),
    low: between(1.2, 2),
    step: between(0.1, 2),
    substrate: fc.record({ re: between(0.1, 4), im: fc.oneof(fc.constant(0), between(0, 8)) }),
    outermost: fc.constantFrom('high' as const, 'low' as const),
    extraLayer: fc.boolean(),
  })
  .map(({ step, ...rest }) => ({ ...rest, high: rest.low + step }));

describe('quarter-wave mirror', () => {
  it('is the stack at its wavelength, metal substrates included', () => {
    fc.assert(
      fc.property(mirror, fc.nat(15), (m, pairs) => {
        expect(quarterWaveMirrorReflectance(m, pairs)).toBeCloseTo(
          coherentStack(asStack(m, pairs), wave, 0).s.R,
          12,
        );
      }),
    );
  });

  it('the number of pairs is enough, one less is not, and the real number is exact', () => {
    fc.assert(
      fc.property(mirror, between(0.3, 0.99999), (m, R) => {
        const needed = pairsForReflectance(m, R);
        expect(needed.R).toBeGreaterThanOrEqual(R - 1e-12);
        expect(needed.R).toBeCloseTo(quarterWaveMirrorReflectance(m, needed.pairs), 15);
        if (needed.exact > 0) expect(quarterWaveMirrorReflectance(m, needed.exact)).toBeCloseTo(R, 9);
        if (needed.pairs > 0) {
          expect(quarterWaveMirrorReflectance(m, needed.pairs - 1)).toBeLessThan(R);
          expect(needed.pairs - needed.exact).toBeLessThan(1);
        }
      }),
    );
  });

  it('stop band: the edges are where the eigenvalues of a pair reach the unit circle', () => {
    const [nH, nL] = [2.3, 1.38];
    const { from_m, to_m, relativeWidth } = stopBand(nH, nL, wave);
    // Half the trace of a pair: cos^2 D - (nH/nL + nL/nH)/2 sin^2 D = -1 at the edges.
    for (const edge of [from_m, to_m]) {
      const D = ((Math.PI / 2) * wave) / edge;
      const half = Math.cos(D) ** 2 - ((nH / nL + nL / nH) / 2) * Math.sin(D) ** 2;
      expect(half).toBeCloseTo(-1, 12);
    }
    expect(wave / from_m - wave / to_m).toBeCloseTo(relativeWidth, 14);
  });

  it('refuses', () => {
    const good: QuarterWaveMirror = {
      outsideIndex: 1,
      high: 2.3,
      low: 1.4,
      substrate: complex(1.5),
      outermost: 'high',
      extraLayer: false,
    };
    expect(() => pairsForReflectance(good, 1)).toThrow(StackRefusal);
    expect(() => quarterWaveMirrorReflectance(good, -1)).toThrow(StackRefusal);
    expect(() => stopBand(1.4, 2.3, wave)).toThrow(StackRefusal);
    expect(() => quarterWaveMirrorReflectance({ ...good, substrate: complex(1, -1) }, 3)).toThrow(
      StackRefusal,
    );
    expect(quarterWaveMirrorReflectance(good, 1e6)).toBe(1);
  });
});
