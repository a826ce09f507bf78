/**
 * What a fit stores: one record per dispersion model, told apart by `model`. Coefficients stand as the source prints them
 * (squared or unsquared poles, nm or um, eV or 1/cm); signs that a source writes in front of a coefficient go into its value.
 * Names that carry a unit end in it; `um2` is um^2, `per_um2` is um^-2. All arrays of polynomial coefficients start with the
 * constant term. The file beside this one named after the model states its equation, source and special cases.
 *
 * A model that honours the temperature (see `registry.ts`) holds it in its own formula: such a fit has no `thermal` part.
 * Tables of mere reflectance are no fits: they have no optical constants and stand in `Material.reflectanceTables`.
 */
import type {
  BrendelBormannParameters,
  ConductorParameters,
  IceRadioParameters,
  OscillatorParameters,
  PowerLawParameters,
  WaterRelaxationParameters,
  WidebandDebyeParameters,
} from './parameters-absorbing.ts';
import type {
  CompositionTableParameters,
  MagneticTableParameters,
  TableParameters,
} from './parameters-table.ts';
import type {
  AluminiumGalliumArsenideParameters,
  CauchyParameters,
  ConstantParameters,
  ExponentialThermalParameters,
  GasParameters,
  HerzbergerParameters,
  MoistAirParameters,
  ParametricSellmeierParameters,
  RadioAirParameters,
  SeaWaterOpticalParameters,
  SellmeierParameters,
  WaterOpticalParameters,
} from './parameters-transparent.ts';

export type * from './parameters-absorbing.ts';
export type * from './parameters-table.ts';
export type * from './parameters-transparent.ts';

export type ModelParameters =
  | ConstantParameters
  | SellmeierParameters
  | CauchyParameters
  | HerzbergerParameters
  | ParametricSellmeierParameters
  | ExponentialThermalParameters
  | AluminiumGalliumArsenideParameters
  | GasParameters
  | MoistAirParameters
  | RadioAirParameters
  | OscillatorParameters
  | BrendelBormannParameters
  | WaterRelaxationParameters
  | WidebandDebyeParameters
  | PowerLawParameters
  | ConductorParameters
  | IceRadioParameters
  | TableParameters
  | MagneticTableParameters
  | CompositionTableParameters
  | WaterOpticalParameters
  | SeaWaterOpticalParameters;

export type ModelName = ModelParameters['model'];
