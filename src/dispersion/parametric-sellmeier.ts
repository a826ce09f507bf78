/**
 * Sellmeier whose coefficients are polynomials of one control variable X: a temperature (K), T^2 - T0^2, the product
 * (t - t0)(t + t1) of lithium niobate fits, or the share of a second constituent.
 *
 *   n^2 = offset(X) + sum B(X) L^m/(L^2 - C(X)) + sum c(X) L^e;  C squared after the polynomial where printed in um.
 *
 * L in um, in the fit's own reference. Sources: G. J. Edwards, M. Lawrence, Opt. Quantum Electron. 16, 373 (1984) for the
 * product; D. B. Leviton, B. J. Frey, Proc. SPIE 6273 (2006) for polynomials in T; J. W. Fleming, Appl. Opt. 23, 4486 (1984)
 * for mixtures; the coefficients' source is the fit's.
 * Special case: binding fixes X, so that evaluation is that of an ordinary Sellmeier.
 */
import { polynomial } from '../num/polynomial.ts';
import type { BoundModel, ConditionName, Conditions } from './evaluator.ts';
import type { Controlled, ControlVariable, ParametricSellmeierParameters, Pole } from './parameters.ts';
import { bindSellmeier } from './sellmeier.ts';

export const controlCondition = (control: ControlVariable): ConditionName =>
  control.kind === 'composition' ? 'composition' : 'temperature_K';

/** c0 + c1 X + ..., or the straight line between two compositions. */
export function controlled(c: Controlled, X: number): number {
  if (typeof c === 'number') return c;
  if ('at0' in c) return c.at0 + X * (c.at1 - c.at0);
  return polynomial(c, X);
}

function state(control: ControlVariable, conditions: Conditions): { X: number; used: Conditions } {
  if (control.kind === 'composition') {
    const composition = conditions.composition ?? control.default;
    return { X: composition, used: { composition } };
  }
  const T = conditions.temperature_K ?? control.default_K;
  const used = { temperature_K: T };
  if (control.kind === 'temperature-K') return { X: T, used };
  if (control.kind === 'temperature-K-squared') return { X: T * T - control.reference_K ** 2, used };
  const t = T - 273.15;
  return { X: (t - control.minus_C) * (t + control.plus_C), used };
}

export function bindParametricSellmeier(
  p: ParametricSellmeierParameters,
  conditions: Conditions,
): BoundModel {
  const { X, used } = state(p.control, conditions);
  const poles = (p.poles ?? []).map((pole): Pole => {
    const numeratorPower = pole.numeratorPower ?? 2;
    const B = controlled(pole.B, X);
    return 'C_um' in pole
      ? { B, C_um: controlled(pole.C_um, X), numeratorPower }
      : { B, C_um2: controlled(pole.C_um2, X), numeratorPower };
  });
  const terms = (p.terms ?? []).map(({ c, power }) => ({ c: controlled(c, X), power }));
  return {
    ...bindSellmeier({ model: 'sellmeier', offset: controlled(p.offset, X), poles, terms }),
    used,
  };
}
