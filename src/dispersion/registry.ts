/**
 * All dispersion models by name: how to bind one to conditions, and which conditions it honours.
 * A model that honours the temperature holds it in its own formula; a fit's thermal form is for the others.
 */
import { bindAluminiumGalliumArsenide } from './aluminium-gallium-arsenide.ts';
import { bindBrendelBormann } from './brendel-bormann.ts';
import { bindCauchy } from './cauchy.ts';
import { bindCompositionTable } from './composition-table.ts';
import { bindConductor } from './conductor.ts';
import { bindConstant } from './constant.ts';
import type { BoundModel, ConditionName, Conditions } from './evaluator.ts';
import { bindExponentialThermal } from './exponential-thermal.ts';
import { bindGas } from './gas.ts';
import { bindHerzberger } from './herzberger.ts';
import { bindIceRadio } from './ice-radio.ts';
import { bindMagneticTable } from './magnetic-table.ts';
import { bindMoistAir } from './moist-air.ts';
import { bindOscillators } from './oscillators.ts';
import type { ModelName, ModelParameters } from './parameters.ts';
import { bindParametricSellmeier, controlCondition } from './parametric-sellmeier.ts';
import { bindPowerLaw } from './power-law.ts';
import { bindRadioAir } from './radio-air.ts';
import { bindSeaWaterOptical } from './sea-water-optical.ts';
import { bindSellmeier } from './sellmeier.ts';
import { bindTable } from './table.ts';
import { bindWaterOptical } from './water-optical.ts';
import { bindWaterRelaxation } from './water-relaxation.ts';
import { bindWidebandDebye } from './wideband-debye.ts';

type ParametersOf<M extends ModelName> = Extract<ModelParameters, { model: M }>;

interface ModelEntry<M extends ModelName> {
  readonly bind: (parameters: ParametersOf<M>, conditions: Conditions) => BoundModel;
  readonly honours: (parameters: ParametersOf<M>) => readonly ConditionName[];
}

const nothing = (): readonly ConditionName[] => [];
const temperature = (): readonly ConditionName[] => ['temperature_K'];

export const MODELS: { readonly [M in ModelName]: ModelEntry<M> } = {
  constant: { bind: bindConstant, honours: nothing },
  sellmeier: { bind: bindSellmeier, honours: nothing },
  cauchy: { bind: bindCauchy, honours: nothing },
  herzberger: { bind: bindHerzberger, honours: nothing },
  'parametric-sellmeier': {
    bind: bindParametricSellmeier,
    honours: (p) => [controlCondition(p.control)],
  },
  'exponential-thermal': { bind: bindExponentialThermal, honours: temperature },
  'aluminium-gallium-arsenide': { bind: bindAluminiumGalliumArsenide, honours: temperature },
  gas: { bind: bindGas, honours: () => ['temperature_K', 'pressure_Pa'] },
  'moist-air': {
    bind: bindMoistAir,
    honours: (p) =>
      p.form === 'edlen' && !p.co2
        ? ['temperature_K', 'pressure_Pa', 'humidity']
        : ['temperature_K', 'pressure_Pa', 'humidity', 'co2_ppm'],
  },
  'radio-air': { bind: bindRadioAir, honours: () => ['temperature_K', 'pressure_Pa', 'humidity'] },
  oscillators: { bind: bindOscillators, honours: nothing },
  'brendel-bormann': { bind: bindBrendelBormann, honours: nothing },
  'water-relaxation': {
    bind: bindWaterRelaxation,
    honours: (p) =>
      p.form === 'klein-swift' || (p.form === 'meissner-wentz' && p.salt)
        ? ['temperature_K', 'salinity_g_per_kg']
        : ['temperature_K'],
  },
  'wideband-debye': { bind: bindWidebandDebye, honours: nothing },
  'power-law': { bind: bindPowerLaw, honours: nothing },
  conductor: { bind: bindConductor, honours: nothing },
  'ice-radio': { bind: bindIceRadio, honours: temperature },
  table: { bind: bindTable, honours: (p) => (p.warmer ? ['temperature_K'] : []) },
  'magnetic-table': { bind: bindMagneticTable, honours: nothing },
  'composition-table': { bind: bindCompositionTable, honours: () => ['temperature_K', 'composition'] },
  'water-optical': { bind: bindWaterOptical, honours: temperature },
  'sea-water-optical': { bind: bindSeaWaterOptical, honours: () => ['temperature_K', 'salinity_g_per_kg'] },
};

/** The entry of a model; TypeScript cannot see that name and parameters belong together, so that is stated here once. */
const entryOf = (p: ModelParameters): ModelEntry<ModelName> =>
  MODELS[p.model] as unknown as ModelEntry<ModelName>;

/** Fixes a fit to conditions. Throws `TableError` for rows no interpolant exists for, and for nothing else. */
export const bindModel = (parameters: ModelParameters, conditions: Conditions): BoundModel =>
  entryOf(parameters).bind(parameters, conditions);

/** The conditions the fit responds to; all others leave it unchanged. */
export const honours = (parameters: ModelParameters): readonly ConditionName[] =>
  entryOf(parameters).honours(parameters);
