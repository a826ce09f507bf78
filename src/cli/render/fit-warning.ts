/** What is doubtful about a fit, in words. */
import type { FitWarning } from '../../catalog/fit-points.ts';
import { lengthAt } from '../../present/length-text.ts';
import type { NumberStyle } from '../../units/number-style.ts';

/** One line each; coefficients that share a doubt share a line. */
export function fitWarningTexts(warnings: readonly FitWarning[], style: NumberStyle): readonly string[] {
  const named = (code: 'negative-strength' | 'undetermined'): string =>
    warnings.flatMap((w) => (w.code === code ? [symbolOf(w.coefficient)] : [])).join(', ');
  const once = new Set<string>();
  return warnings.flatMap((warning) => {
    if (warning.code === 'pole-in-range' || warning.code === 'no-freedom')
      return [fitWarningText(warning, style)];
    if (once.has(warning.code)) return [];
    once.add(warning.code);
    return [fitWarningText({ ...warning, coefficient: named(warning.code) }, style)];
  });
}

export function fitWarningText(warning: FitWarning, style: NumberStyle): string {
  switch (warning.code) {
    case 'pole-in-range':
      return `a pole lies at ${lengthAt(Number(warning.pole_um.toPrecision(4)), style)}, among the points or within 5 % of them: the formula runs away there; use fewer terms, or points further from it`;
    case 'negative-strength':
      return `negative, as no resonance is: ${symbolOf(warning.coefficient)}; the formula holds between the points and nowhere else`;
    case 'no-freedom':
      return 'as many coefficients as points: the formula goes through all of them, and the residuals say nothing about its accuracy';
    case 'undetermined':
      return `smaller than twice the uncertainty: ${symbolOf(warning.coefficient)}; fewer terms would do`;
  }
}

/** Without the unit. */
const symbolOf = (coefficient: string): string => coefficient.split('_')[0] ?? coefficient;
