/** Power ratios in decibels; losses are positive. Null where the loss is infinite. Source: Pozar, Microwave Engineering, 2.3. */

/** What the reflection takes from the transmitted power: -10 log10(1 - R). */
export function reflectionLoss_dB(R: number): number | null {
  return R >= 1 ? null : decibel(1 - R);
}

/** -10 log10 R: large where little returns. */
export function returnLoss_dB(R: number): number | null {
  return R <= 0 ? null : decibel(R);
}

function decibel(ratio: number): number {
  const loss = -10 * Math.log10(ratio);
  return loss === 0 ? 0 : loss;
}

/** Voltage standing-wave ratio of a reflectance: (1 + sqrt R)/(1 - sqrt R). */
export function standingWaveRatio(R: number): number | null {
  return R >= 1 ? null : (1 + Math.sqrt(R)) / (1 - Math.sqrt(R));
}
