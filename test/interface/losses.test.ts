import { describe, expect, it } from 'vitest';
import { reflectionLoss_dB, returnLoss_dB, standingWaveRatio } from '../../src/interface/losses.ts';

/** Reflectance of a standing-wave ratio: ((S - 1)/(S + 1))^2. */
const reflectanceOf = (ratio: number) => ((ratio - 1) / (ratio + 1)) ** 2;

describe('losses', () => {
  // Ratio, return loss and mismatch loss: as printed in every conversion table of the microwave trade (common practice, from memory).
  it.each<[number, number, number]>([
    [1.2, 20.83, 0.036],
    [1.5, 13.98, 0.177],
    [2, 9.54, 0.512],
    [3, 6.02, 1.249],
  ])('of a standing-wave ratio %d', (ratio, returned_dB, mismatch_dB) => {
    const R = reflectanceOf(ratio);
    expect(standingWaveRatio(R)).toBeCloseTo(ratio, 12);
    expect(Math.abs((returnLoss_dB(R) ?? Number.NaN) - returned_dB)).toBeLessThan(0.006);
    expect(Math.abs((reflectionLoss_dB(R) ?? Number.NaN) - mismatch_dB)).toBeLessThan(0.0006);
  });

  it('are zero, not minus zero, where nothing is lost', () => {
    expect(reflectionLoss_dB(0)).toBe(0);
    expect(returnLoss_dB(1)).toBe(0);
    expect(standingWaveRatio(0)).toBe(1);
  });

  it('are null where they are infinite', () => {
    expect(reflectionLoss_dB(1)).toBeNull();
    expect(returnLoss_dB(0)).toBeNull();
    expect(standingWaveRatio(1)).toBeNull();
  });
});
