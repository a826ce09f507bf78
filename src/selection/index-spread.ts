/** How far an index may be off: its stated uncertainty, else its disagreement with published values, else a thousandth of it. */
import type { MediumAnswer } from '../answer/answer.ts';

const UNKNOWN_SHARE = 1e-3;

export function indexSpread(medium: MediumAnswer): number {
  if (medium.fit === null) return medium.n_uncertainty ?? 0;
  return medium.n_uncertainty ?? medium.n_digitsGuide ?? UNKNOWN_SHARE * Math.abs(medium.n);
}
