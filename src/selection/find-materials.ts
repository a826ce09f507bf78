/**
 * Search by property. Every condition says yes, no or "the catalogue cannot tell"; a material is found where an axis of it meets
 * all conditions, and counted as undecided where none does but for want of data.
 */

import { bothReferences } from '../answer/wave.ts';
import { axesOf, type FitWave } from '../catalog/choose-fit.ts';
import type { Axis, Material } from '../catalog/types.ts';
import { hazardLevel } from '../medium/hazard-level.ts';
import { isRefusal, type Refusal } from '../medium/refusal.ts';
import { Candidate } from './candidate.ts';
import { type Criteria, type Excludable, RANGE_MEASURES, type RangeMeasure } from './criteria.ts';
import { matchesClass } from './material-class.ts';
import { wordTest } from './material-words.ts';
import type { Survey } from './survey.ts';
import { isUndecided, type Undecided, type UndecidedReason, undecided } from './undecided.ts';
import { within } from './value-range.ts';

export interface Found {
  readonly candidate: Candidate;
  /** Further axes that meet the conditions. */
  readonly alsoAxes: readonly Axis[];
}

export interface FindResult {
  readonly wave: FitWave | null;
  /** In the order of the catalogue. */
  readonly found: readonly Found[];
  /** How many materials were looked at. */
  readonly examined: number;
  /** Materials that no known fact speaks against, by the first condition that cannot be decided. */
  readonly undecided: ReadonlyMap<UndecidedReason, number>;
}

/** Media at a wave and a temperature, each on each of its axes; `place` is that among the materials of the survey. */
export type CandidatesAt = (
  wave: FitWave | undefined,
  temperature_K: number | undefined,
) => (material: Material, place: number) => readonly Candidate[];

/** Nothing measured before. */
export const freshCandidates =
  (survey: Survey): CandidatesAt =>
  (wave, temperature_K) =>
  (material) => {
    const described = axesOf(material);
    // An entry of measured reflectances alone has no axis, and no data at any wave.
    const axes: readonly Axis[] = described.length > 0 ? described : ['isotropic'];
    return axes.map((axis) => new Candidate(survey, material, axis, wave, temperature_K));
  };

/**
 * Refuses only a wave outside what the program covers.
 * @param candidatesAt hands out candidates measured before, where the same wave is searched again and again.
 */
export function findMaterials(
  survey: Survey,
  criteria: Criteria,
  candidatesAt: CandidatesAt = freshCandidates(survey),
): FindResult | Refusal {
  const wave = criteria.wave && bothReferences(criteria.wave);
  if (isRefusal(wave)) return wave;
  const found: Found[] = [];
  const reasons = new Map<UndecidedReason, number>();
  const isAmong = classTest(survey.classes, criteria);
  const hasWords = wordTest(criteria.words);
  const asksHygroscopic = excludesHygroscopic(criteria);
  const candidatesOf = candidatesAt(wave, criteria.temperature_K);
  const { materials } = survey;
  // Thousands at a time, for a list that follows every key: no iterator, no list of its own for each.
  for (let place = 0; place < materials.length; place++) {
    const material = materials[place]!;
    if (!isAmong(material.class) || !hasWords(material) || hasExcluded(material, criteria)) continue;
    const verdict = judge(candidatesOf(material, place), criteria);
    if (verdict === false) continue;
    const open = isUndecided(verdict) ? verdict.undecided : undefined;
    const reason = open ?? (asksHygroscopic && !hygroscopicOnFile(material) ? 'not-on-file' : undefined);
    if (reason) reasons.set(reason, (reasons.get(reason) ?? 0) + 1);
    else if (!isUndecided(verdict)) found.push(verdict);
  }
  return { wave: wave ?? null, found, examined: materials.length, undecided: reasons };
}

type Verdict = boolean | Undecided;

/** Whether media of a class are looked at; the classes are few and the media many. */
function classTest(all: readonly string[], { classes, not }: Criteria): (materialClass: string) => boolean {
  const excluded = not.flatMap((exclusion) => (exclusion.kind === 'class' ? [exclusion.text] : []));
  const looked = new Set(
    all.filter(
      (name) =>
        (classes.length === 0 || classes.some((typed) => matchesClass(typed, name))) &&
        !excluded.some((typed) => matchesClass(typed, name)),
    ),
  );
  return (materialClass) => looked.has(materialClass);
}

function hasExcluded(material: Material, { not }: Criteria): boolean {
  for (const exclusion of not) {
    if (exclusion.kind === 'property' && hasProperty(material, exclusion.property)) return true;
  }
  return false;
}

/** False too where the fact is not on file. */
function hasProperty(material: Material, property: Excludable): boolean {
  switch (property) {
    case 'toxic':
      return hazardLevel(material) === 'toxic';
    case 'hazardous':
      return hazardLevel(material) !== 'none-on-file';
    case 'hygroscopic':
      return (material.handling?.hygroscopic ?? 'no') !== 'no';
  }
}

/** The first axis that meets the conditions with the others that do; else what cannot be decided on the first such axis. */
function judge(candidates: readonly Candidate[], criteria: Criteria): Found | false | Undecided {
  let first: Candidate | undefined;
  let open: Undecided | undefined;
  let alsoAxes = NO_AXES;
  for (const candidate of candidates) {
    const verdict = judgeAxis(candidate, criteria);
    if (isUndecided(verdict)) open ??= verdict;
    else if (verdict && first) alsoAxes = [...alsoAxes, candidate.axis];
    else if (verdict) first = candidate;
  }
  return first ? { candidate: first, alsoAxes } : (open ?? false);
}

const NO_AXES: readonly Axis[] = [];

const hygroscopicOnFile = (material: Material): boolean => material.handling?.hygroscopic !== undefined;

const excludesHygroscopic = (criteria: Criteria): boolean =>
  criteria.not.some((x) => x.kind === 'property' && x.property === 'hygroscopic');

/** False as soon as one condition fails, the cheapest first; else the first that cannot be decided; else true. */
function judgeAxis(candidate: Candidate, criteria: Criteria): Verdict {
  const { clear_m, ranges, maxLoss, thickness_m } = criteria;
  let open: Undecided | undefined;
  const clear = clear_m ? candidate.isClear(clear_m) : true;
  if (clear === false) return false;
  if (criteria.wave && !candidate.medium) open = undecided('no-data-at-wave');
  if (clear === undefined) open ??= undecided('no-transparency-on-file');
  for (const measure of RANGE_MEASURES) {
    const range = ranges[measure];
    if (!range) continue;
    const value = measured(candidate, measure);
    if (isUndecided(value)) open ??= value;
    else if (!within(range, value)) return false;
  }
  if (maxLoss !== undefined) {
    const loss = candidate.loss(thickness_m);
    if (isUndecided(loss)) open ??= loss;
    else if (!within({ to: maxLoss }, loss.fraction)) return false;
  }
  return open ?? true;
}

/** A birefringence is asked by its size, whichever its sign. */
function measured(candidate: Candidate, measure: RangeMeasure): number | Undecided {
  const value = candidate[measure];
  return measure === 'birefringence' && typeof value === 'number' ? Math.abs(value) : value;
}
