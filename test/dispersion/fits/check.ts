/** Published values a fit is recomputed against. A tolerance is the rounding of the printed value or the scatter of the source. */
import type { Conditions } from '../../../src/dispersion/evaluator.ts';
import type { ModelParameters } from '../../../src/dispersion/parameters.ts';

export interface PublishedValue {
  readonly um: number;
  readonly n?: number;
  readonly k?: number;
  /** Normal-incidence reflectance in vacuum. */
  readonly R?: number;
  readonly eps1?: number;
  readonly eps2?: number;
  readonly conditions?: Conditions;
}

export interface PublishedFit {
  readonly name: string;
  readonly parameters: ModelParameters;
  /** Of the values, not of the coefficients. */
  readonly source: string;
  readonly tolerance: number;
  readonly values: readonly PublishedValue[];
}

export const celsius = (t: number): Conditions => ({ temperature_K: t + 273.15 });
