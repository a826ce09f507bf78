/**
 * What lifts one fit above its equals for a question (see `chooseFit`): complex data where the medium absorbs, a fit that can
 * honour the temperature asked where the others can't.
 */
import { type FitWave, fitWavelength_um, isRecommended } from '../catalog/choose-fit.ts';
import type { Fit, Material } from '../catalog/types.ts';
import { type BoundModel, type Conditions, JET_LENGTH, K, N } from '../dispersion/evaluator.ts';
import { bindModel, honours } from '../dispersion/registry.ts';

/** From this ratio k/n on a medium counts as absorbing where complex data compete with real ones. */
export const ABSORBING = 1e-4;
/** Over this step of temperature a single dn/dT serves as well as a second fit. */
const FIRST_ORDER_K = 10;
const ZERO_CELSIUS_K = 273.15;

/** `bind` gives the model of a fit under the conditions; pass one that remembers where many waves are asked in turn. */
export function fitPreference(
  fit: Fit,
  material: Material,
  wave: FitWave,
  conditions: Conditions,
  bind: (fit: Fit) => BoundModel = ({ parameters }) => bindModel(parameters, conditions),
): number {
  let score = 0;
  if (conditions.temperature_K !== undefined) {
    const fit_K = fit.temperature_C === undefined ? undefined : fit.temperature_C + ZERO_CELSIUS_K;
    const step_K =
      fit_K === undefined ? Number.POSITIVE_INFINITY : Math.abs(fit_K - conditions.temperature_K);
    const canHonour =
      fit.thermal !== undefined ||
      honours(fit.parameters).includes('temperature_K') ||
      step_K < 0.5 ||
      (step_K <= FIRST_ORDER_K && material.handling?.dn_dT_1e6_per_K !== undefined);
    if (canHonour) score += 2;
  }
  if (isRecommended(fit, wave) && givesAbsorption(fit, wave, bind)) score += 1;
  return score;
}

function givesAbsorption(fit: Fit, wave: FitWave, bind: (fit: Fit) => BoundModel): boolean {
  const bound = bind(fit);
  if (!bound.complex) return false;
  const jet = new Float64Array(JET_LENGTH);
  bound.evaluate(fitWavelength_um(fit, wave), jet);
  return jet[K]! > ABSORBING * jet[N]!;
}
