/**
 * Media by how little the interface with a target reflects: R at normal incidence of target to medium, with the difference of
 * the indices, and the temperature at which dn/dT would make them equal.
 */
import type { MediumAnswer } from '../answer/answer.ts';
import { type MediumSide, mediumSide } from '../answer/medium-side.ts';
import type { MediumSpec, WaveSpec } from '../answer/question.ts';
import { bothReferences } from '../answer/wave.ts';
import type { FitWave } from '../catalog/choose-fit.ts';
import type { Axis } from '../catalog/types.ts';
import { fresnel } from '../interface/fresnel.ts';
import { returnLoss_dB } from '../interface/losses.ts';
import { opticsFromIndex } from '../interface/optics.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import type { Candidate } from './candidate.ts';
import type { Criteria } from './criteria.ts';
import { type FindResult, findMaterials } from './find-materials.ts';
import { indexSpread } from './index-spread.ts';
import { type MaterialFacts, materialFacts } from './material-facts.ts';
import { type MixtureReport, mixtureReport } from './mixture-report.ts';
import type { Survey } from './survey.ts';
import { standsTemperature, type ThermalMatch, thermalMatch } from './thermal-match.ts';
import { type ThermalSlope, thermalSlope } from './thermal-slope.ts';
import type { UndecidedReason } from './undecided.ts';
import { type Warming, warmingOf } from './warming.ts';

export interface Match {
  readonly facts: MaterialFacts;
  readonly medium: MediumAnswer;
  readonly warming: Warming;
  /** n of this medium minus n of the target. */
  readonly difference: number;
  readonly difference_uncertainty: number;
  /** Of the interface from target to medium, normal incidence. */
  readonly R: number;
  /** Largest R that the uncertainty of the difference allows. */
  readonly R_upTo: number;
  /** False where the difference is smaller than its uncertainty: R is then no more than `R_upTo`. */
  readonly resolved: boolean;
  readonly returnLoss_dB: number | null;
  readonly dn_dT_per_K: number | null;
  readonly thermal: ThermalMatch | null;
}

export interface MatchReport {
  readonly target: {
    readonly medium: MediumAnswer;
    readonly slope: ThermalSlope | null;
    readonly warming: Warming;
  };
  readonly wave: { readonly spec: WaveSpec; readonly at: FitWave };
  readonly within: number | null;
  /** Least reflecting first. */
  readonly matches: readonly Match[];
  /** How many media were ranked, listed or not. */
  readonly ranked: number;
  readonly examined: number;
  readonly undecided: readonly { readonly reason: UndecidedReason; readonly count: number }[];
  readonly mixtures: MixtureReport | null;
}

export interface MatchQuestion {
  readonly target: MediumSpec;
  readonly wave: WaveSpec;
  /** Greatest difference of the indices; the nearest few where absent. */
  readonly within?: number | undefined;
  readonly mix: boolean;
  /** Narrows the media; its wave is the one above. */
  readonly criteria: Criteria;
}

const NEAREST = 12;

export function matchReport(survey: Survey, question: MatchQuestion): MatchReport | Refusal {
  const { target, wave: spec, within } = question;
  const at = bothReferences(spec);
  if (isRefusal(at)) return at;
  const { temperature_K } = question.criteria;
  const side = mediumSide(target, at, { temperature_K }, false, survey.sourceOf);
  if (isRefusal(side)) return refuse(side.code, side.exit, side.message, 'choose a wave inside');
  const result = findMaterials(survey, { ...question.criteria, wave: spec });
  if (isRefusal(result)) return result;
  const candidates = everyAxis(result).filter((c) => !isTarget(c, side));
  const ranked = candidates
    .map((candidate) => ({ candidate, R: quickReflectance(side, candidate) }))
    .sort((a, b) => a.R - b.R);
  const near =
    within === undefined ? ranked : ranked.filter(({ candidate }) => isWithin(candidate, side, within));
  const listed = within === undefined ? near.slice(0, NEAREST) : near;
  const slope =
    target.kind === 'catalogue'
      ? thermalSlope(target.material, side.answer.axis as Axis, at, temperature_K)
      : null;
  return {
    target: { medium: side.answer, slope, warming: warmingOf(side.notes) },
    wave: { spec, at },
    within: within ?? null,
    matches: listed.flatMap(({ candidate }) => describe(survey, side, slope, candidate, at) ?? []),
    ranked: ranked.length,
    examined: result.examined,
    undecided: [...result.undecided].map(([reason, count]) => ({ reason, count })),
    mixtures: question.mix ? mixtureReport(survey, side, candidates, at, temperature_K) : null,
  };
}

/** Each axis of a found material that meets the conditions is a medium of its own. */
function everyAxis({ found }: FindResult): readonly Candidate[] {
  return found.flatMap(({ candidate, alsoAxes }) => [
    candidate,
    ...alsoAxes.map((axis) => candidate.onAxis(axis)),
  ]);
}

const isTarget = ({ material, axis }: Candidate, { answer }: MediumSide): boolean =>
  material.key === answer.key && axis === answer.axis;

function isWithin(candidate: Candidate, side: MediumSide, limit: number): boolean {
  const n = candidate.medium?.n;
  // The limit is a printed number: the last bit of a difference does not count.
  return n !== undefined && Math.abs(n - side.optics.n.re) <= limit * (1 + 1e-12) + 1e-15;
}

function quickReflectance(side: MediumSide, candidate: Candidate): number {
  const { optics } = candidate;
  return optics ? fresnel(side.optics, optics, 0).Rs : Number.POSITIVE_INFINITY;
}

function describe(
  survey: Survey,
  side: MediumSide,
  slope: ThermalSlope | null,
  { material, axis, temperature_K }: Candidate,
  at: FitWave,
): Match | undefined {
  const other = mediumSide(
    { kind: 'catalogue', material, axis },
    at,
    { temperature_K },
    false,
    survey.sourceOf,
  );
  if (isRefusal(other)) return undefined;
  const difference = other.optics.n.re - side.optics.n.re;
  const u = Math.hypot(indexSpread(side.answer), indexSpread(other.answer));
  const further = { re: other.optics.n.re + (difference < 0 ? -u : u), im: other.optics.n.im };
  const R = fresnel(side.optics, other.optics, 0).Rs;
  const ownSlope = thermalSlope(material, axis, at, temperature_K);
  const thermal = thermalMatch({ n: side.optics.n.re, slope }, { n: other.optics.n.re, slope: ownSlope }, u);
  return {
    facts: materialFacts(material),
    medium: other.answer,
    warming: warmingOf(other.notes),
    difference,
    difference_uncertainty: u,
    R,
    R_upTo: fresnel(side.optics, opticsFromIndex(further, other.optics.mu), 0).Rs,
    resolved: Math.abs(difference) > u,
    returnLoss_dB: returnLoss_dB(R),
    dn_dT_per_K: ownSlope?.dn_dT_per_K ?? null,
    thermal: thermal && standsTemperature(material, thermal.temperature_K) ? thermal : null,
  };
}
