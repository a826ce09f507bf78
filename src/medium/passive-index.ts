/**
 * What a formula gives far outside its range may be no medium: a negative index, gain, or next to no index where nothing
 * absorbs. Inside its range a fit is taken at its word.
 */

/** Of a transparent medium of the catalogue; where a formula passes through 0, it means nothing. */
const LEAST_INDEX = 1e-3;

/** @param n relative to vacuum */
export const isPassiveIndex = (n: number, k: number): boolean =>
  n >= 0 && k >= 0 && (n > LEAST_INDEX || k > 0);
