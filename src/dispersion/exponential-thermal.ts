/**
 * Silicon after H. H. Li: n^2 = e(T) + exp(-3 x(T)) g(T)/L^2, where x is the thermal expansion relative to 293 K; L in um, T in K.
 * Source: H. H. Li, J. Phys. Chem. Ref. Data 9, 561 (1980). Special case: x has one polynomial below and one from `switch_K` on.
 */
import { polynomial } from '../num/polynomial.ts';
import type { BoundModel, Conditions } from './evaluator.ts';
import type { ExponentialThermalParameters } from './parameters.ts';
import { bindSellmeier } from './sellmeier.ts';

export function bindExponentialThermal(p: ExponentialThermalParameters, conditions: Conditions): BoundModel {
  const T = conditions.temperature_K ?? p.default_K;
  const x = polynomial(T < p.switch_K ? p.xBelow : p.xFrom, T);
  const c = Math.exp(-3 * x) * polynomial(p.g, T);
  return {
    ...bindSellmeier({ model: 'sellmeier', offset: polynomial(p.e, T), terms: [{ c, power: -2 }] }),
    used: { temperature_K: T },
  };
}
