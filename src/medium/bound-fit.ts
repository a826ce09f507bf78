/**
 * One fit of a material fixed to its conditions: when it reaches a wave, how it ranks among others, and its n and k. Cheap
 * enough for a million waves; used by `bound-medium.ts`.
 */
import { type FitWave, reachOf } from '../catalog/choose-fit.ts';
import type { Fit, Material } from '../catalog/types.ts';
import { SHORTEST_um, STANDARD_AIR } from '../dispersion/ciddor.ts';
import { type BoundModel, type Conditions, JET_LENGTH, K, N } from '../dispersion/evaluator.ts';
import { bindModel, honours } from '../dispersion/registry.ts';
import { applyThermalForm, describesAbsoluteIndex } from '../dispersion/thermal.ts';
import type { ThermalForm } from '../dispersion/thermal-form.ts';
import { bindAbsorption } from './absorption.ts';
import { ABSORBING, fitPreference } from './fit-preference.ts';
import { thermalForm } from './optics-at.ts';

export interface BoundFit {
  readonly fit: Fit;
  readonly inAir: boolean;
  /** Limits of the fit and of the part it is recommended for. */
  readonly shortest_um: number;
  readonly longest_um: number;
  readonly recommendedFrom_um: number;
  readonly recommendedTo_um: number;
  /** `fitPreference` without the share of the absorption, which depends on the wave. */
  readonly preference: number;
  readonly accuracy: number;
  readonly grade: number;
  /** Writes n and k relative to vacuum into `out[at]` and `out[at + 1]`. */
  readonly evaluate: (vacuum_um: number, air_um: number, out: Float64Array, at: number) => void;
  readonly model: () => BoundModel;
}

/** The preference of a fit apart from its absorption asks nothing of its model. */
const SILENT: BoundModel = {
  evaluate: () => undefined,
  used: {},
  hasDerivative: false,
  derivativeOrder: 0,
  complex: false,
};
const ANY_WAVE: FitWave = { vacuum_um: 1, air_um: 1 };

/** The model itself is bound when the fit first answers. */
export function bindFit(fit: Fit, material: Material, conditions: Conditions): BoundFit {
  let bound: BoundModel | undefined;
  const model = (): BoundModel => {
    bound ??= bindModel(fit.parameters, conditions);
    return bound;
  };
  let evaluate: BoundFit['evaluate'] | undefined;
  const [shortest_um, longest_um] = reachOf(fit.range_um);
  const [recommendedFrom_um, recommendedTo_um] = fit.recommendedRange_um
    ? reachOf(fit.recommendedRange_um)
    : fit.recommended
      ? [0, Number.POSITIVE_INFINITY]
      : [1, 0];
  return {
    fit,
    inAir: fit.reference === 'air',
    shortest_um,
    longest_um,
    recommendedFrom_um,
    recommendedTo_um,
    preference: fitPreference(fit, material, ANY_WAVE, conditions, () => SILENT),
    accuracy: -(fit.accuracy_n ?? Number.POSITIVE_INFINITY),
    grade: fit.grade === 'A' ? 2 : fit.grade === 'B' ? 1 : 0,
    evaluate(vacuum_um, air_um, out, at) {
      evaluate ??= evaluator(fit, material, conditions, model());
      evaluate(vacuum_um, air_um, out, at);
    },
    model,
  };
}

const within = (from_um: number, to_um: number, vacuum_um: number, air_um: number): boolean =>
  (vacuum_um >= from_um && vacuum_um <= to_um) || (air_um >= from_um && air_um <= to_um);

/** `inRange`, on the limits worked out. */
export const reaches = (fit: BoundFit, vacuum_um: number, air_um: number): boolean =>
  within(fit.shortest_um, fit.longest_um, vacuum_um, air_um);

/** The order of `chooseFit`: preference, recommended, accuracy, grade; of equals the first. */
export function bestFit(fits: readonly BoundFit[], vacuum_um: number, air_um: number): BoundFit | undefined {
  let best: BoundFit | undefined;
  let bestPreference = 0;
  let bestRecommended = false;
  for (let i = 0; i < fits.length; i++) {
    const fit = fits[i]!;
    if (!reaches(fit, vacuum_um, air_um)) continue;
    const recommended = within(fit.recommendedFrom_um, fit.recommendedTo_um, vacuum_um, air_um);
    const absorbs = recommended && fits.length > 1 && givesAbsorption(fit, vacuum_um, air_um);
    const preference = absorbs ? fit.preference + 1 : fit.preference;
    if (best === undefined || outranks(fit, preference, recommended, best, bestPreference, bestRecommended)) {
      best = fit;
      bestPreference = preference;
      bestRecommended = recommended;
    }
  }
  return best;
}

function outranks(
  a: BoundFit,
  preferenceA: number,
  recommendedA: boolean,
  b: BoundFit,
  preferenceB: number,
  recommendedB: boolean,
): boolean {
  if (preferenceA !== preferenceB) return preferenceA > preferenceB;
  if (recommendedA !== recommendedB) return recommendedA;
  return a.accuracy !== b.accuracy ? a.accuracy > b.accuracy : a.grade > b.grade;
}

const scratch = new Float64Array(JET_LENGTH);

function givesAbsorption({ model, inAir }: BoundFit, vacuum_um: number, air_um: number): boolean {
  const bound = model();
  if (!bound.complex) return false;
  bound.evaluate(inAir ? air_um : vacuum_um, scratch);
  return scratch[K]! > ABSORBING * scratch[N]!;
}

/** n and k of one fit, combined in the order of `optics-at.ts`, so that they are its numbers to the last bit. */
function evaluator(
  fit: Fit,
  material: Material,
  conditions: Conditions,
  bound: BoundModel,
): BoundFit['evaluate'] {
  const jet = new Float64Array(JET_LENGTH);
  const absorption = bound.complex ? undefined : bindAbsorption(material.absorption);
  const warm = warming(fit, material, conditions);
  const inAir = fit.reference === 'air';
  return (vacuum_um, air_um, out, at) => {
    const L_um = inAir ? air_um : vacuum_um;
    bound.evaluate(L_um, jet);
    if (warm && !warm.absolute) applyThermalForm(warm.form, warm.from_K, warm.to_K, L_um, jet);
    if (inAir) {
      const air = airIndex(vacuum_um);
      jet[N] = jet[N]! * air;
      jet[K] = jet[K]! * air;
    }
    if (warm?.absolute) applyThermalForm(warm.form, warm.from_K, warm.to_K, vacuum_um, jet);
    if (absorption && jet[N]! > 0) absorption(vacuum_um, jet);
    out[at] = jet[N]!;
    out[at + 1] = jet[K]!;
  };
}

/** The first part of `standardAirIndexJet` and nothing else, worked out in its order. */
function airIndex(vacuum_um: number): number {
  const L = Math.max(vacuum_um, SHORTEST_um);
  const x = L * L;
  const { offset, poles } = STANDARD_AIR;
  let refractivity = offset;
  for (let i = 0; i < poles.length; i += 4) {
    refractivity += (poles[i]! * x + poles[i + 1]!) * (1 / (x - poles[i + 2]!));
  }
  return 1 + refractivity;
}

interface Warming {
  readonly form: ThermalForm;
  readonly absolute: boolean;
  readonly from_K: number;
  readonly to_K: number;
}

const ZERO_CELSIUS_K = 273.15;

/** The thermal form to apply, where the model itself takes no temperature and another one than that of the fit is asked. */
function warming(fit: Fit, material: Material, { temperature_K }: Conditions): Warming | undefined {
  const fit_K = fit.temperature_C === undefined ? undefined : fit.temperature_C + ZERO_CELSIUS_K;
  if (temperature_K === undefined || temperature_K === fit_K) return undefined;
  if (honours(fit.parameters).includes('temperature_K')) return undefined;
  const form = thermalForm(fit, material);
  return (
    form && {
      form,
      absolute: describesAbsoluteIndex(form),
      from_K: fit_K ?? temperature_K,
      to_K: temperature_K,
    }
  );
}
