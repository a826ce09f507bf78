import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fresnel } from '../../src/interface/fresnel.ts';
import { opticsFromIndex } from '../../src/interface/optics.ts';
import { surfaceWave } from '../../src/interface/surface-wave.ts';
import { complex, ONE } from '../../src/num/complex.ts';
import { evenly } from '../helpers/evenly.ts';

const medium = (n: number, k = 0) => opticsFromIndex(complex(n, k), ONE);
/** Beyond the critical angle of the real parts. */
const steeper = (sinCritical: number, share: number): number => {
  const critical = Math.asin(sinCritical);
  return critical + (Math.PI / 2 - critical) * share;
};

describe('total reflection out of a weak absorber', () => {
  it('returns what came and lets nothing across, where the plain law gives more than all', () => {
    const cases = fc.record({
      n1: evenly(1.3, 4),
      ratio: evenly(0.25, 0.95),
      logLoss: evenly(-12, -3),
      share: evenly(0.01, 0.99),
    });
    fc.assert(
      fc.property(cases, ({ n1, ratio, logLoss, share }) => {
        const k1 = n1 * 10 ** logLoss * 0.999;
        const angle_rad = steeper(ratio, share);
        const met = surfaceWave(medium(n1, k1), medium(n1 * ratio), angle_rad);
        expect(met.totalReflection && met.powersKnown).toBe(true);
        const { Rs, Rp, Ts, Tp } = met.wave;
        expect([Rs, Rp, Ts, Tp]).toEqual([1, 1, 0, 0]);
        expect(fresnel(medium(n1, k1), medium(n1 * ratio), angle_rad).Ts).toBeLessThan(0);
      }),
    );
  });

  it('loses to a weak absorber beyond what crosses: R + T = 1', () => {
    for (const k2 of [1e-9, 1e-7, 1e-5]) {
      const { wave } = surfaceWave(medium(1.5, 1e-7), medium(1.3, k2), 1.2);
      expect(wave.Rs).toBeLessThan(1);
      expect(wave.Rs + wave.Ts).toBeCloseTo(1, 13);
      expect(wave.Rp + wave.Tp).toBeCloseTo(1, 13);
    }
  });

  it('leaves everything else to the law', () => {
    for (const [n1, k1, n2, angle_rad] of [
      [1.5, 1e-7, 1, 0.7],
      [1.5, 0, 1, 1],
      [1.5, 0.01, 1, 1],
      [1, 1e-5, 1.5, 1.2],
    ] as const) {
      expect(surfaceWave(medium(n1, k1), medium(n2), angle_rad).wave).toEqual(
        fresnel(medium(n1, k1), medium(n2), angle_rad),
      );
    }
    expect(surfaceWave(medium(1.5, 0.01), medium(1), 1).powersKnown).toBe(false);
  });
});
