/** What a person looks for in a material, as data. Empty criteria fit everything. */
import type { WaveSpec } from '../answer/question.ts';
import type { ValueRange } from './value-range.ts';

/** What a range may be asked of; in the units of the names. */
export const RANGE_MEASURES = ['n', 'groupIndex', 'gvd_s2_per_m', 'birefringence', 'abbe'] as const;
export type RangeMeasure = (typeof RANGE_MEASURES)[number];

/** Those that hold at one wave and mean nothing without it. */
export const NEEDS_WAVE: ReadonlySet<RangeMeasure | 'maxLoss'> = new Set([
  'n',
  'groupIndex',
  'gvd_s2_per_m',
  'birefringence',
  'maxLoss',
]);

/** What may be excluded beside a class. */
export const EXCLUDABLE = ['hygroscopic', 'toxic', 'hazardous'] as const;
export type Excludable = (typeof EXCLUDABLE)[number];

export type Exclusion =
  | { readonly kind: 'property'; readonly property: Excludable }
  | { readonly kind: 'class'; readonly text: string };

export interface Criteria {
  readonly wave?: WaveSpec;
  /** That of every medium; where absent each fit answers at the one it holds for. Abbe numbers stay those of the fits. */
  readonly temperature_K?: number | undefined;
  /** Each must begin a word of the material's names, formula or class, or stand inside one. */
  readonly words: readonly string[];
  readonly ranges: Readonly<Partial<Record<RangeMeasure, ValueRange>>>;
  /** Vacuum wavelengths, shorter first, that the transparency range on file must cover. */
  readonly clear_m?: readonly [number, number];
  /** As typed; one of them must fit. */
  readonly classes: readonly string[];
  readonly not: readonly Exclusion[];
  /**
   * Greatest loss at normal incidence, in air, uncoated, as a fraction: with a thickness that of a plane plate (two surfaces and
   * the absorption between them), without one the reflectance of a single surface.
   */
  readonly maxLoss?: number;
  readonly thickness_m?: number;
}

export const NO_CRITERIA: Criteria = { words: [], ranges: {}, classes: [], not: [] };

/** First condition that has no meaning until a wave is given; undefined if there is none. */
export function conditionWithoutWave(criteria: Criteria): RangeMeasure | 'maxLoss' | undefined {
  if (criteria.wave) return undefined;
  const ranged = RANGE_MEASURES.find((m) => criteria.ranges[m] !== undefined && NEEDS_WAVE.has(m));
  return ranged ?? (criteria.maxLoss === undefined ? undefined : 'maxLoss');
}
