/**
 * Search by property. Every condition says yes, no or "the catalogue cannot tell"; a material is found where an axis of it meets
 * all conditions, and counted as undecided where none does but for want of data.
 */

import { bothReferences } from '../answer/wave.ts';
import { axesOf, type FitWave } from '../catalog/choose-fit.ts';
import { foldLoose, foldTight } from '../catalog/fold.ts';
import type { Axis, Material } from '../catalog/types.ts';
import { hazardLevel } from '../medium/hazard-level.ts';
import { isRefusal, type Refusal } from '../medium/refusal.ts';
import { Candidate } from './candidate.ts';
import { type Criteria, type Exclusion, RANGE_MEASURES, type RangeMeasure } from './criteria.ts';
import { matchesClass } from './material-class.ts';
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

/** How a material on an axis at the wave of the criteria is measured. */
export type CandidateOf = (material: Material, axis: Axis, wave: FitWave | undefined) => Candidate;

/**
 * Refuses only a wave outside what the program covers.
 * @param candidateOf hands out candidates measured before, where the same wave is searched again and again.
 */
export function findMaterials(
  survey: Survey,
  criteria: Criteria,
  candidateOf: CandidateOf = (material, axis, wave) => new Candidate(survey, material, axis, wave),
): FindResult | Refusal {
  const wave = criteria.wave && bothReferences(criteria.wave);
  if (isRefusal(wave)) return wave;
  const found: Found[] = [];
  const reasons = new Map<UndecidedReason, number>();
  for (const material of survey.materials) {
    if (!meetsFacts(material, criteria)) continue;
    const verdict = judge(material, criteria, wave, candidateOf);
    if (verdict === false) continue;
    if (isUndecided(verdict)) reasons.set(verdict.undecided, (reasons.get(verdict.undecided) ?? 0) + 1);
    else found.push(verdict);
  }
  return { wave: wave ?? null, found, examined: survey.materials.length, undecided: reasons };
}

type Verdict = boolean | Undecided;

/** What can be told from the material alone, without data of a wave. */
function meetsFacts(material: Material, { words, classes, not }: Criteria): boolean {
  if (classes.length > 0 && !classes.some((typed) => matchesClass(typed, material.class))) return false;
  if (not.some((exclusion) => isExcluded(material, exclusion) === true)) return false;
  return words.length === 0 || matchesWords(material, words);
}

/** Undefined where the fact is not on file. */
function isExcluded(material: Material, exclusion: Exclusion): boolean | undefined {
  if (exclusion.kind === 'class') return matchesClass(exclusion.text, material.class);
  const level = hazardLevel(material);
  switch (exclusion.property) {
    case 'toxic':
      return level === 'toxic';
    case 'hazardous':
      return level !== 'none-on-file';
    case 'hygroscopic': {
      const degree = material.handling?.hygroscopic;
      return degree === undefined ? undefined : degree !== 'no';
    }
  }
}

/** Every word begins a word of key, name, aliases, formula, code or class, or stands inside key or name. */
export function matchesWords(material: Material, words: readonly string[]): boolean {
  const texts = [
    material.key,
    material.name,
    ...material.aliases,
    material.formula ?? '',
    material.glassCode ?? '',
    material.class,
  ];
  const loose = texts.map((text) => `-${foldLoose(text).replace(/[^\p{L}\p{N}+*%-]+/gu, '-')}`);
  const tight = texts.map(foldTight);
  return words.every((typed) => {
    const word = foldLoose(typed);
    const joined = foldTight(typed);
    return (
      joined === '' ||
      loose.some((text) => text.includes(`-${word}`)) ||
      tight.some((text, i) => text.startsWith(joined) || (i < 2 && text.includes(joined)))
    );
  });
}

function judge(
  material: Material,
  criteria: Criteria,
  wave: FitWave | undefined,
  candidateOf: CandidateOf,
): Found | false | Undecided {
  const fact = material.handling?.hygroscopic === undefined && excludesHygroscopic(criteria);
  const described = axesOf(material);
  // An entry of measured reflectances alone has no axis, and no data at any wave.
  const axes: readonly Axis[] = described.length > 0 ? described : ['isotropic'];
  const candidates = axes.map((axis) => candidateOf(material, axis, wave));
  const verdicts = candidates.map((candidate) => judgeAxis(candidate, criteria));
  const fitting = candidates.filter((_, i) => verdicts[i] === true);
  const [first, ...others] = fitting;
  if (first) {
    return fact ? undecided('not-on-file') : { candidate: first, alsoAxes: others.map((o) => o.axis) };
  }
  return verdicts.find(isUndecided) ?? false;
}

const excludesHygroscopic = (criteria: Criteria): boolean =>
  criteria.not.some((x) => x.kind === 'property' && x.property === 'hygroscopic');

/** False as soon as one condition fails; else the first that cannot be decided; else true. */
function judgeAxis(candidate: Candidate, criteria: Criteria): Verdict {
  let open: Undecided | undefined;
  for (const verdict of verdicts(candidate, criteria)) {
    if (verdict === false) return false;
    if (isUndecided(verdict)) open ??= verdict;
  }
  return open ?? true;
}

/** Cheapest first. */
function* verdicts(candidate: Candidate, criteria: Criteria): Generator<Verdict> {
  const { clear_m, ranges, maxLoss, thickness_m } = criteria;
  const clear = clear_m ? candidate.isClear(clear_m) : true;
  if (clear === false) yield false;
  if (criteria.wave) yield candidate.medium ? true : undecided('no-data-at-wave');
  if (clear === undefined) yield undecided('no-transparency-on-file');
  for (const measure of RANGE_MEASURES) {
    const range = ranges[measure];
    if (!range) continue;
    const value = measured(candidate, measure);
    yield isUndecided(value) ? value : within(range, value);
  }
  if (maxLoss !== undefined) {
    const loss = candidate.loss(thickness_m);
    yield isUndecided(loss) ? loss : within({ to: maxLoss }, loss.fraction);
  }
}

/** A birefringence is asked by its size, whichever its sign. */
function measured(candidate: Candidate, measure: RangeMeasure): number | Undecided {
  const value = candidate[measure];
  return measure === 'birefringence' && typeof value === 'number' ? Math.abs(value) : value;
}
