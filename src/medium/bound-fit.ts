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

/** Many waves, each in both references; numbers in typed arrays stay numbers from one function to the next. */
export interface Waves {
  readonly vacuum_um: Float64Array;
  readonly air_um: Float64Array;
}

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
  /** Writes n and k of wave `i`, relative to vacuum, into `out[at]` and `out[at + 1]`. */
  readonly evaluate: (waves: Waves, i: number, out: Float64Array, at: number) => void;
  /** n alone of the first waves. */
  readonly indexBlock: (waves: Waves, count: number, n: Float64Array) => void;
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
  let made: Evaluator | undefined;
  const evaluator = (): Evaluator => {
    made ??= makeEvaluator(fit, material, conditions, model());
    return made;
  };
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
    evaluate: (waves, i, out, at) => evaluator().evaluate(waves, i, out, at),
    indexBlock: (waves, count, n) => evaluator().indexBlock(waves, count, n),
    model,
  };
}

const within = (from_um: number, to_um: number, vacuum_um: number, air_um: number): boolean =>
  (vacuum_um >= from_um && vacuum_um <= to_um) || (air_um >= from_um && air_um <= to_um);

/** `inRange`, on the limits worked out. */
export const reaches = (fit: BoundFit, waves: Waves, i: number): boolean =>
  within(fit.shortest_um, fit.longest_um, waves.vacuum_um[i]!, waves.air_um[i]!);

/** The order of `chooseFit`: preference, recommended, accuracy, grade; of equals the first. */
export function bestFit(fits: readonly BoundFit[], waves: Waves, i: number): BoundFit | undefined {
  let best: BoundFit | undefined;
  let bestPreference = 0;
  let bestRecommended = false;
  for (const fit of fits) {
    if (!reaches(fit, waves, i)) continue;
    if (fits.length === 1) return fit;
    const recommended = within(
      fit.recommendedFrom_um,
      fit.recommendedTo_um,
      waves.vacuum_um[i]!,
      waves.air_um[i]!,
    );
    const absorbs = recommended && givesAbsorption(fit, waves, i);
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

function givesAbsorption({ model, inAir }: BoundFit, { vacuum_um, air_um }: Waves, i: number): boolean {
  const bound = model();
  if (!bound.complex) return false;
  bound.evaluate(inAir ? air_um[i]! : vacuum_um[i]!, scratch);
  return scratch[K]! > ABSORBING * scratch[N]!;
}

type Evaluator = Pick<BoundFit, 'evaluate' | 'indexBlock'>;

/** n and k of one fit, combined in the order of `optics-at.ts`, so that they are its numbers to the last bit. */
function makeEvaluator(fit: Fit, material: Material, conditions: Conditions, bound: BoundModel): Evaluator {
  const jet = new Float64Array(JET_LENGTH);
  const absorption = bound.complex ? undefined : bindAbsorption(material.absorption);
  const warm = warming(fit, material, conditions);
  const inAir = fit.reference === 'air';
  // Both write the same n and k.
  const write = bound.evaluateFirst ?? bound.evaluate;
  /** All but the absorption beside the fit. */
  const evaluate = ({ vacuum_um, air_um }: Waves, i: number): void => {
    const L_um = inAir ? air_um[i]! : vacuum_um[i]!;
    write(L_um, jet);
    if (warm && !warm.absolute) applyThermalForm(warm.form, warm.from_K, warm.to_K, L_um, jet);
    if (inAir) {
      const air = airIndex(vacuum_um[i]!);
      jet[N] = jet[N]! * air;
      jet[K] = jet[K]! * air;
    }
    if (warm?.absolute) applyThermalForm(warm.form, warm.from_K, warm.to_K, vacuum_um[i]!, jet);
  };
  const { indexBlock } = bound;
  return {
    evaluate(waves, i, out, at) {
      evaluate(waves, i);
      if (absorption && jet[N]! > 0) absorption(waves.vacuum_um[i]!, jet);
      out[at] = jet[N]!;
      out[at + 1] = jet[K]!;
    },
    indexBlock(waves, count, n) {
      if (indexBlock && !warm) {
        indexBlock(inAir ? waves.air_um : waves.vacuum_um, count, n);
        if (inAir) for (let i = 0; i < count; i++) n[i] = n[i]! * airIndex(waves.vacuum_um[i]!);
        return;
      }
      for (let i = 0; i < count; i++) {
        evaluate(waves, i);
        n[i] = jet[N]!;
      }
    },
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
