/** A search as it is reported: the hits in the order asked for, each with what a buyer compares, and what was left out. */
import type { MediumAnswer } from '../answer/answer.ts';
import { mediumSide } from '../answer/medium-side.ts';
import type { WaveSpec } from '../answer/question.ts';
import type { FitWave } from '../catalog/choose-fit.ts';
import type { Axis } from '../catalog/types.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { abbeNumbers } from './abbe-numbers.ts';
import { type Criteria, conditionWithoutWave } from './criteria.ts';
import { type FindResult, type Found, findMaterials } from './find-materials.ts';
import { type MaterialFacts, materialFacts } from './material-facts.ts';
import { sortFound } from './sort-found.ts';
import type { SortOrder } from './sort-order.ts';
import type { Survey } from './survey.ts';
import { isUndecided, UNDECIDED_WORDS, type Undecided, type UndecidedReason } from './undecided.ts';
import { type Warming, warmingOf } from './warming.ts';

export interface Hit {
  readonly facts: MaterialFacts;
  readonly axis: Axis;
  readonly alsoAxes: readonly Axis[];
  /** At the wave; null where none is given. */
  readonly medium: MediumAnswer | null;
  readonly warming: Warming;
  readonly birefringence: number | null;
  /** At the d and e lines, relative to air. */
  readonly n_d: number | null;
  readonly n_e: number | null;
  readonly Vd: number | null;
  readonly Ve: number | null;
  readonly n_digitsGuide: number | null;
  readonly V_digitsGuide: number | null;
  /** One surface, in air, normal incidence. */
  readonly surfaceReflectance: number | null;
  /** As the criteria define it (see `Criteria.maxLoss`). */
  readonly loss: number | null;
  /** False where `loss` holds the surfaces alone. */
  readonly absorptionKnown: boolean | null;
  /** Why a value is null, by its name. */
  readonly reasons: Readonly<Record<string, string>>;
}

export interface FindReport {
  readonly criteria: Criteria;
  readonly wave: { readonly spec: WaveSpec; readonly at: FitWave } | null;
  readonly examined: number;
  readonly hits: readonly Hit[];
  readonly undecided: readonly { readonly reason: UndecidedReason; readonly count: number }[];
}

export function findReport(survey: Survey, criteria: Criteria, order: SortOrder): FindReport | Refusal {
  const without = conditionWithoutWave(criteria);
  if (without) {
    return refuse(
      'wave-missing',
      2,
      `${CONDITION_NAMES[without]} means nothing without a wave`,
      'give the wave too: --at 633nm, --at 10.6um or --at d-line',
    );
  }
  const result = findMaterials(survey, criteria);
  if (isRefusal(result)) return result;
  return {
    criteria,
    wave: criteria.wave && result.wave ? { spec: criteria.wave, at: result.wave } : null,
    examined: result.examined,
    hits: sortFound(result.found, order, criteria).map((found) => describe(survey, found, criteria)),
    undecided: counts(result),
  };
}

const CONDITION_NAMES = {
  n: 'an index',
  groupIndex: 'a group index',
  gvd_s2_per_m: 'a group-velocity dispersion',
  birefringence: 'a birefringence',
  abbe: 'an Abbe number',
  maxLoss: 'a loss',
} as const;

const counts = ({ undecided }: FindResult): FindReport['undecided'] =>
  [...undecided].map(([reason, count]) => ({ reason, count })).sort((a, b) => b.count - a.count);

function describe(survey: Survey, { candidate, alsoAxes }: Found, criteria: Criteria): Hit {
  const { material, axis, wave, temperature_K } = candidate;
  const reasons: Record<string, string> = {};
  const given = <Value>(name: string, value: Value | Undecided): Value | null => {
    if (!isUndecided(value)) return value;
    reasons[name] = wave ? UNDECIDED_WORDS[value.undecided] : NO_WAVE;
    return null;
  };
  const side =
    wave &&
    mediumSide({ kind: 'catalogue', material, axis }, wave, { temperature_K }, false, survey.sourceOf);
  const medium = side && !isRefusal(side) ? side.answer : null;
  if (!medium) reasons['n'] = NO_WAVE;
  for (const name of ['groupIndex', 'gvd_s2_per_m'] as const) {
    if (!medium) reasons[name] = NO_WAVE;
    else if (medium[name] === null) reasons[name] = UNDECIDED_WORDS['no-dispersion'];
  }
  const { n_d, Vd, n_e, Ve, n_digitsGuide, V_digitsGuide } = abbeNumbers(survey, material, axis);
  if (n_d === null) reasons['n_d'] = 'no data at the d line';
  if (n_e === null) reasons['n_e'] = 'no data at the e line';
  if (Vd === null) reasons['Vd'] = UNDECIDED_WORDS['abbe-lines-not-reached'];
  if (Ve === null) reasons['Ve'] = "no fit that reaches the F', e and C' lines";
  const loss = given('loss', candidate.loss(criteria.thickness_m));
  return {
    facts: materialFacts(material),
    axis,
    alsoAxes,
    medium,
    warming: side && !isRefusal(side) ? warmingOf(side.notes) : 'none',
    birefringence: given('birefringence', candidate.birefringence),
    n_d,
    n_e,
    Vd,
    Ve,
    n_digitsGuide,
    V_digitsGuide,
    surfaceReflectance: given('surfaceReflectance', candidate.surface),
    loss: loss?.fraction ?? null,
    absorptionKnown: loss?.absorptionKnown ?? null,
    reasons,
  };
}

const NO_WAVE = 'no wave given';
