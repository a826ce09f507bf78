/**
 * A quantity as every face shows it: name, symbol and the rounded text with its unit. The digits are chosen in this folder
 * and nowhere else, so that all faces agree digit for digit.
 */
import type { NumberStyle } from '../units/number-style.ts';

export interface Shown {
  /** Stable name, e.g. "groupIndex"; the key of the answer it was made from. */
  readonly id: string;
  /** As printed in formulas; ASCII in the ASCII style. */
  readonly symbol: string;
  /** In words, for people who do not read symbols. */
  readonly label: string;
  /** Rounded value and unit. */
  readonly text: string;
}

export type PresentStyle = NumberStyle;
