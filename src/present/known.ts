/**
 * How well the index of a medium is known, for the digits of everything derived from it.
 *   stated     the source gives an accuracy: parentheses
 *   guided     it does not: as many digits as agree with the published values, no parentheses
 *   exact      vacuum and media given by their numbers
 */
import type { MediumAnswer } from '../answer/answer.ts';
import { decimalOf, leadingPlace } from '../units/decimal.ts';
import { lastPlace } from '../units/digits.ts';
import type { Precision } from '../units/format-number.ts';

export interface Known {
  readonly kind: 'stated' | 'guided' | 'exact';
  /** Standard uncertainty of n, or what stands in for it; 0 where exact. */
  readonly uncertainty: number;
}

const UNKNOWN_SHARE = 1e-3;

export function howKnown(medium: MediumAnswer): Known {
  const u = medium.n_uncertainty;
  if (u !== null && u > 0) return { kind: 'stated', uncertainty: u };
  if (medium.fit === null || u === 0) return { kind: 'exact', uncertainty: 0 };
  return { kind: 'guided', uncertainty: medium.n_digitsGuide ?? UNKNOWN_SHARE * medium.n };
}

/** Digits of a value known to `uncertainty`, where no parentheses are due; `most` where it is exact. */
export function precisionFor(value: number | null, uncertainty: number, most: number): Precision {
  const place = lastPlace(uncertainty);
  if (place === undefined || value === null || value === 0 || !Number.isFinite(value))
    return { significant: most };
  return { significant: Math.max(1, Math.min(most, leadingPlace(decimalOf(value)) - place + 1)) };
}
