/**
 * n of a solution at one wavelength, tabulated against content and temperature: linear in both between the printed places.
 * L does not enter: the derivatives are written as 0 and `hasDerivative` is false. In the fit's own reference. Source: the fit's.
 * Special cases: outside the table the end pieces continue; an empty place is left out of its column.
 */
import { linear, TableError, taylorAt } from '../num/interpolate.ts';
import type { BoundModel, Conditions } from './evaluator.ts';
import type { CompositionTableParameters } from './parameters.ts';

/** True within the contents and the temperatures of the table; the table says nothing outside. */
export function isInCompositionTable(p: CompositionTableParameters, conditions: Conditions): boolean {
  const { composition, temperature_K } = stateIn(p, conditions);
  const isWithin = (list: readonly number[], value: number): boolean =>
    value >= Math.min(...list) - HAIR && value <= Math.max(...list) + HAIR;
  return isWithin(p.content_percent, composition * 100) && isWithin(p.temperatures_C, temperature_K - 273.15);
}

/** For rounding alone. */
const HAIR = 1e-9;

const stateIn = (p: CompositionTableParameters, conditions: Conditions) => ({
  composition: conditions.composition ?? p.defaultComposition,
  temperature_K: conditions.temperature_K ?? p.default_K,
});

/** Outside of the table the index is NaN. */
export function bindCompositionTable(p: CompositionTableParameters, conditions: Conditions): BoundModel {
  const { composition, temperature_K } = stateIn(p, conditions);
  if (p.n.length !== p.content_percent.length || p.n.some((row) => row.length !== p.temperatures_C.length))
    throw new TableError('the table needs one row per content and one place per temperature');
  const byTemperature = p.temperatures_C.map((_, column) => {
    const filled = p.content_percent.flatMap((content, row) => {
      const n = p.n[row]![column];
      return n === null || n === undefined ? [] : [{ content, n }];
    });
    const f = linear(
      filled.map((place) => place.content),
      filled.map((place) => place.n),
    );
    return taylorAt(f, composition * 100)[0];
  });
  const n = isInCompositionTable(p, conditions)
    ? taylorAt(linear(p.temperatures_C, byTemperature), temperature_K - 273.15)[0]
    : Number.NaN;
  return {
    used: { temperature_K, composition },
    hasDerivative: false,
    derivativeOrder: 0,
    complex: false,
    evaluate(_, out) {
      out.fill(0);
      out[0] = n;
    },
    index: () => n,
  };
}
