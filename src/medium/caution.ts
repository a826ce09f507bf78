/**
 * Cautions as data: a code and the facts of the case. The sentence is made in one place (answer/caution-text.ts), so every
 * face says the same.
 */
export type CautionCode =
  | 'outside-fit-range'
  | 'range-edge'
  | 'outside-confirmed-range'
  | 'absorbs-here'
  | 'absorption-not-known'
  | 'estimate-between-bands'
  | 'film-process'
  | 'hygroscopic'
  | 'toxic'
  | 'hazardous-material'
  | 'recalled-data'
  | 'accuracy-not-stated'
  | 'source-erratum'
  | 'source-retracted'
  | 'sources-disagree'
  | 'contradicted'
  | 'own-entry'
  | 'temperature-not-modelled'
  | 'temperature-first-order'
  | 'condition-not-used'
  | 'no-dispersion'
  | 'lossy-incidence'
  | 'coherent-sum-not-included'
  | 'no-reflection'
  | 'infinite-value'
  | 'momentum-convention'
  | 'laser-hazard'
  | 'stray-reflection'
  | 'invisible-beam'
  | 'rf-exposure'
  | 'damage-definition'
  | 'pulse-train'
  | 'ideal-surface'
  | 'axis-assumed'
  | 'crystal-cut'
  | 'near-critical'
  | 'tolerance-incomplete'
  | 'approximation'
  | 'coherence'
  | 'self-focusing';

export interface CautionNote {
  readonly code: CautionCode;
  readonly details: Readonly<Record<string, string | number>>;
}
