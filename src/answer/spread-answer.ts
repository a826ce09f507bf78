/** The spread of R and T as the answer states it, and what must be said where it is large. */
import type { CautionNote } from '../medium/caution.ts';
import type { InterfaceAnswer } from './answer.ts';
import type { PowerSpread } from './power-spread.ts';
import type { Spread } from './uncertainty.ts';

export type UncertaintyPart = Pick<
  InterfaceAnswer,
  | 'R_uncertainty'
  | 'R_uncertaintyFrom'
  | 'R_mean'
  | 'T_uncertainty'
  | 'T_uncertaintyFrom'
  | 'T_mean'
  | 'R_digitsGuide'
  | 'T_digitsGuide'
>;

export function uncertaintyPart({ R, T, stated }: PowerSpread): UncertaintyPart {
  return {
    R_uncertainty: stated ? (R?.standardUncertainty ?? null) : null,
    R_uncertaintyFrom: stated ? (R?.dominant ?? null) : null,
    R_mean: stated ? (R?.mean ?? null) : null,
    T_uncertainty: stated ? (T?.standardUncertainty ?? null) : null,
    T_uncertaintyFrom: stated ? (T?.dominant ?? null) : null,
    T_mean: stated ? (T?.mean ?? null) : null,
    R_digitsGuide: R?.standardUncertainty ?? null,
    T_digitsGuide: T?.standardUncertainty ?? null,
  };
}

/** A caution where a sampled distribution lies off the value shown. */
export function spreadNotes(
  spread: PowerSpread,
  { R, T }: { readonly R: number; readonly T: number | null },
): readonly CautionNote[] {
  if (!spread.stated) return [];
  return [...offCentre('R', R, spread.R), ...(T === null ? [] : offCentre('T', T, spread.T))];
}

function offCentre(name: string, value: number, spread: Spread | null): readonly CautionNote[] {
  if (!spread || spread.mean === null || spread.standardUncertainty < 1e-6) return [];
  const percent = (x: number): string => `${Number((100 * x).toPrecision(3))} %`;
  const text =
    `${name} bends too much within the uncertainties for an expansion: sampled over them its mean is ` +
    `${percent(spread.mean)} and its standard deviation ${percent(spread.standardUncertainty)}, mostly from the ${spread.dominant}`;
  return Math.abs(spread.mean - value) > spread.standardUncertainty / 2
    ? [{ code: 'approximation', details: { text } }]
    : [];
}
