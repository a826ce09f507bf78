/**
 * One medium of the question at the question's wave, ready for the laws: optics, dispersion, accuracy, and the part of the
 * answer that describes it. Catalogue and literal media become the same thing here.
 */
import type { FitWave } from '../catalog/choose-fit.ts';
import type { Source } from '../catalog/types.ts';
import { sourceText } from '../cite/source-text.ts';
import { type Conditions, type IndexJet, JET_LENGTH, K, N } from '../dispersion/evaluator.ts';
import type { Optics } from '../interface/optics.ts';
import type { CautionNote } from '../medium/caution.ts';
import { literalOptics } from '../medium/literal.ts';
import { type MediumAtWave, mediumAtWave } from '../medium/optics-at.ts';
import { isRefusal, type Refusal } from '../medium/refusal.ts';
import { div, scale } from '../num/complex.ts';
import { shiftDecimal } from '../num/shift-decimal.ts';
import { SPEED_OF_LIGHT_m_per_s as c, VACUUM_IMPEDANCE_ohm } from '../units/constants.ts';
import type { FitAnswer, MediumAnswer, SourceLine } from './answer.ts';
import type { MediumSpec } from './question.ts';

/** Looks up a bibliography item; the answer names its sources through it. */
export type SourceOf = (id: string) => Source | undefined;

export interface MediumSide {
  readonly name: string;
  readonly optics: Optics;
  /** n, k and derivatives by vacuum wavelength in um; zero derivatives for literal media. */
  readonly jet: IndexJet;
  /** Relative to vacuum. */
  readonly groupIndex: number | null;
  /** Standard uncertainty of n by the fit alone; 0 where exact, null where not stated. */
  readonly accuracy: number | null;
  readonly isLiteral: boolean;
  readonly answer: MediumAnswer;
  readonly notes: readonly CautionNote[];
}

export function mediumSide(
  spec: MediumSpec,
  wave: FitWave,
  conditions: Conditions,
  extrapolate: boolean,
  sourceOf: SourceOf,
): MediumSide | Refusal {
  if (spec.kind === 'literal') return literalSide(spec.literal, spec.text, wave);
  const medium = mediumAtWave(spec.material, spec.axis, wave, conditions, extrapolate);
  return isRefusal(medium) ? medium : catalogueSide(medium, wave, sourceOf);
}

function literalSide(literal: Parameters<typeof literalOptics>[0], text: string, wave: FitWave): MediumSide {
  const optics = literalOptics(literal, wave.vacuum_um * 1e-6);
  const jet = new Float64Array(JET_LENGTH);
  jet[N] = optics.n.re;
  jet[K] = optics.n.im;
  const dispersive = literal.conductivity_S_per_m !== undefined;
  const groupIndex = dispersive ? null : optics.n.re;
  return {
    name: text,
    optics,
    jet,
    groupIndex,
    accuracy: 0,
    isLiteral: true,
    answer: {
      key: null,
      name: text,
      axis: 'isotropic',
      ...waveInMedium(
        { optics, jet, formulaJet: jet, derivativeOrder: dispersive ? 0 : 3, absorptionKnown: true },
        wave,
      ),
      n_published: optics.n.re,
      publishedReference: 'vacuum',
      n_uncertainty: null,
      n_digitsGuide: null,
      temperature_K: null,
      pressure_Pa: null,
      humidity: null,
      co2_ppm: null,
      salinity_g_per_kg: null,
      composition: null,
      transparency_m: null,
      own: false,
      fit: null,
    },
    notes: [],
  };
}

function catalogueSide(medium: MediumAtWave, wave: FitWave, sourceOf: SourceOf): MediumSide {
  const { material, fit, jet, optics, used } = medium;
  const transparency = material.transparency_um;
  const exactVacuum = fit.accuracy_n === 0 && fit.parameters.model === 'constant';
  const parts = waveInMedium({ ...medium, absorptionKnown: medium.absorptionKnown || exactVacuum }, wave);
  return {
    name: material.name,
    optics,
    jet,
    groupIndex: parts.absolute.groupIndex,
    accuracy: fit.accuracy_n ?? null,
    isLiteral: false,
    answer: {
      key: material.key,
      name: material.name,
      axis: medium.axis,
      ...parts,
      n_published: medium.nPublished,
      publishedReference: fit.reference,
      n_uncertainty: fit.accuracy_n ?? null,
      n_digitsGuide: fit.digitsGuide_n ?? null,
      temperature_K: used.temperature_K ?? null,
      pressure_Pa: used.pressure_Pa ?? null,
      humidity: used.humidity ?? null,
      co2_ppm: used.co2_ppm ?? null,
      salinity_g_per_kg: used.salinity_g_per_kg ?? null,
      composition: used.composition ?? null,
      transparency_m: transparency ? metres(transparency) : null,
      own: material.own === true,
      fit: fitAnswer(medium, sourceOf),
    },
    notes: [...medium.notes, ...noticesOf(sourceOf(fit.source))],
  };
}

/** What became of the work behind a fit after it was published. */
function noticesOf(source: Source | undefined): readonly CautionNote[] {
  return [
    ...(source?.erratum ? [{ code: 'source-erratum' as const, details: { notice: source.erratum } }] : []),
    ...(source?.retraction
      ? [{ code: 'source-retracted' as const, details: { notice: source.retraction } }]
      : []),
  ];
}

function fitAnswer({ fit, inRange, secondOpinion }: MediumAtWave, sourceOf: SourceOf): FitAnswer {
  return {
    id: fit.id,
    source: sourceLine(fit.source, sourceOf),
    range_m: metres(fit.range_um),
    inRange,
    accuracy: fit.accuracy_n ?? null,
    model: fit.parameters.model,
    grade: fit.grade,
    film: fit.film ? { process: fit.film.process, spread: fit.film.spread_n ?? null } : null,
    secondOpinion: secondOpinion && {
      source: sourceLine(secondOpinion.fit.source, sourceOf),
      n: secondOpinion.n,
      difference: secondOpinion.difference,
    },
  };
}

function sourceLine(id: string, sourceOf: SourceOf): SourceLine {
  const source = sourceOf(id);
  return { id, text: source ? sourceText(source) : id, doi: source?.DOI ?? null };
}

type Dispersion = Pick<
  MediumAnswer,
  'groupIndex' | 'groupVelocity_m_per_s' | 'gvd_s2_per_m' | 'tod_s3_per_m' | 'dispersion_s_per_m2'
>;

/**
 * n_g = n - L n';  beta2 = L^3 n''/(2 pi c^2);  beta3 = -L^4 (3 n'' + L n''')/(4 pi^2 c^3);  D = -L n''/c
 * (Agrawal, Nonlinear Fiber Optics, 1.2.3). Null from the order on whose derivative the fit does not carry.
 */
function dispersion(jet: IndexJet, derivativeOrder: number, L_um: number): Dispersion {
  const L_m = L_um * 1e-6;
  const groupIndex = derivativeOrder >= 1 ? jet[N]! - L_um * jet[N + 1]! : null;
  const second_per_m2 = jet[N + 2]! * 1e12;
  const third_per_m3 = jet[N + 3]! * 1e18;
  return {
    groupIndex,
    groupVelocity_m_per_s: groupIndex === null || groupIndex === 0 ? null : c / groupIndex,
    gvd_s2_per_m: derivativeOrder >= 2 ? clean((L_m ** 3 * second_per_m2) / (2 * Math.PI * c ** 2)) : null,
    tod_s3_per_m:
      derivativeOrder >= 3
        ? clean((-(L_m ** 4) * (3 * second_per_m2 + L_m * third_per_m3)) / (4 * Math.PI ** 2 * c ** 3))
        : null,
    dispersion_s_per_m2: derivativeOrder >= 2 ? clean((-L_m * second_per_m2) / c) : null,
  };
}

type WavePart = Dispersion &
  Pick<
    MediumAnswer,
    | 'n'
    | 'k'
    | 'absolute'
    | 'wavelength_m'
    | 'phaseVelocity_m_per_s'
    | 'relativePermittivity'
    | 'relativePermeability'
    | 'impedance_ohm'
    | 'lossTangent'
    | 'absorptionCoefficient_per_m'
    | 'penetrationDepth_m'
    | 'skinDepth_m'
  >;

interface WaveInput {
  readonly optics: Optics;
  readonly jet: IndexJet;
  readonly formulaJet: IndexJet;
  readonly derivativeOrder: number;
  readonly absorptionKnown: boolean;
}

/** What the wave is inside a medium: Z = Z0 mu/n; alpha = 4 pi k/L. */
function waveInMedium(input: WaveInput, wave: FitWave): WavePart {
  const { optics, jet, formulaJet, derivativeOrder, absorptionKnown } = input;
  const L_m = wave.vacuum_um * 1e-6;
  const { n, eps, mu } = optics;
  const alpha_per_m = (4 * Math.PI * n.im) / L_m;
  const { dispersion_s_per_m2: _, ...absolute } = dispersion(jet, derivativeOrder, wave.vacuum_um);
  return {
    n: n.re,
    k: n.im,
    ...dispersion(formulaJet, derivativeOrder, wave.vacuum_um),
    absolute,
    wavelength_m: n.re === 0 ? null : L_m / Math.abs(n.re),
    phaseVelocity_m_per_s: n.re === 0 ? null : c / n.re,
    relativePermittivity: eps,
    relativePermeability: mu,
    impedance_ohm: scale(div(mu, n), VACUUM_IMPEDANCE_ohm),
    lossTangent: absorptionKnown && eps.re > 0 ? eps.im / eps.re : null,
    absorptionCoefficient_per_m: absorptionKnown ? alpha_per_m : null,
    penetrationDepth_m: absorptionKnown && n.im > 0 ? 1 / alpha_per_m : null,
    skinDepth_m: absorptionKnown && n.im > 0 ? 2 / alpha_per_m : null,
  };
}

/** Turns -0 into 0. */
const clean = (x: number): number => (x === 0 ? 0 : x);

/** Published ends of a range. */
const metres = ([from_um, to_um]: readonly [number, number]): readonly [number, number] => [
  shiftDecimal(from_um, -6),
  shiftDecimal(to_um, -6),
];
