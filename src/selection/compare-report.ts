/**
 * Media or parts side by side at one or several waves. A part is a plane plate of the medium in air, uncoated; everything is at
 * normal incidence. Where the data of a medium do not reach a wave its column says why, and the others stand.
 */
import type { Caution, MediumAnswer } from '../answer/answer.ts';
import { orderCautions, wordCaution } from '../answer/caution-text.ts';
import { type MediumSide, mediumSide } from '../answer/medium-side.ts';
import type { MediumSpec, WaveSpec } from '../answer/question.ts';
import { bothReferences } from '../answer/wave.ts';
import { defaultAxis, type FitWave } from '../catalog/choose-fit.ts';
import type { Axis } from '../catalog/types.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
import { brewsterAngles } from '../interface/special-angles.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { type AbbeNumbers, abbeNumbers } from './abbe-numbers.ts';
import { type MaterialFacts, materialFacts } from './material-facts.ts';
import { airAround, plateFractions, surfaceReflectance } from './plate-loss.ts';
import type { Survey } from './survey.ts';
import { thermalSlope } from './thermal-slope.ts';

export interface Part {
  readonly medium: MediumSpec;
  /** As typed. */
  readonly text: string;
  /** Null for a bare medium. */
  readonly thickness_m: number | null;
}

export interface ComparedPart {
  readonly part: Part;
  readonly axis: Axis;
  /** Null for a medium given by its numbers. */
  readonly facts: MaterialFacts | null;
  readonly abbe: AbbeNumbers | null;
}

export interface PartAtWave {
  readonly medium: MediumAnswer;
  /** One surface, in air. */
  readonly surfaceReflectance: number;
  /** Of one pass; null for a bare medium and where absorption is not known. */
  readonly internalTransmittance: number | null;
  /** 1 - T of the plate; null for a bare medium and where nothing can be said. */
  readonly loss: number | null;
  /** True where `loss` holds the surfaces alone. */
  readonly surfacesOnly: boolean;
  readonly brewsterAngle_rad: number | null;
  readonly dn_dT_per_K: number | null;
  readonly cautions: readonly Caution[];
}

export interface ComparedWave {
  readonly spec: WaveSpec;
  readonly at: FitWave;
  /** In the order of the parts. */
  readonly columns: readonly (PartAtWave | Refusal)[];
}

export interface CompareReport {
  readonly parts: readonly ComparedPart[];
  readonly waves: readonly ComparedWave[];
}

export const FEWEST_PARTS = 2;
export const MOST_PARTS = 6;

/** Refuses a wave out of reach, too few or too many parts, and a comparison of which no column has data. */
export function compareReport(
  survey: Survey,
  parts: readonly Part[],
  waves: readonly WaveSpec[],
  conditions: Conditions,
): CompareReport | Refusal {
  if (parts.length < FEWEST_PARTS || parts.length > MOST_PARTS) {
    const message = `${parts.length} media or parts cannot be compared`;
    return refuse('part-count', 2, message, `name ${FEWEST_PARTS} to ${MOST_PARTS} of them`);
  }
  const compared: ComparedWave[] = [];
  for (const spec of waves) {
    const at = bothReferences(spec);
    if (isRefusal(at)) return at;
    compared.push({ spec, at, columns: parts.map((part) => columnOf(survey, part, at, conditions)) });
  }
  const refusals = compared.flatMap(({ columns }) => columns).filter(isRefusal);
  const [first] = refusals;
  if (first && refusals.length === parts.length * waves.length) {
    return refuse(first.code, 3, first.message, 'choose a wave at which one of them at least has data');
  }
  const [wave] = compared;
  return {
    parts: parts.map((part) => describe(survey, part, wave?.at)),
    waves: compared,
  };
}

function describe(survey: Survey, part: Part, at: FitWave | undefined): ComparedPart {
  const { medium } = part;
  if (medium.kind === 'literal') return { part, axis: 'isotropic', facts: null, abbe: null };
  const axis = medium.axis ?? (at && defaultAxis(medium.material, at)) ?? 'isotropic';
  return {
    part,
    axis,
    facts: materialFacts(medium.material),
    abbe: abbeNumbers(survey, medium.material, axis),
  };
}

function columnOf(survey: Survey, part: Part, at: FitWave, conditions: Conditions): PartAtWave | Refusal {
  const side = mediumSide(part.medium, at, conditions, false, survey.sourceOf);
  if (isRefusal(side)) return side;
  const air = airAround(survey, at);
  const { medium } = part;
  const slope =
    medium.kind === 'catalogue' ? thermalSlope(medium.material, side.answer.axis as Axis, at) : null;
  return {
    medium: side.answer,
    surfaceReflectance: surfaceReflectance(air, side.optics),
    ...plate(survey, part, side, at),
    brewsterAngle_rad: brewsterAngles(air, side.optics).p,
    dn_dT_per_K: slope?.dn_dT_per_K ?? null,
    cautions: orderCautions(side.notes.map((note) => wordCaution(note, part.text, side.name))),
  };
}

type PlateOfPart = Pick<PartAtWave, 'internalTransmittance' | 'loss' | 'surfacesOnly'>;

function plate(survey: Survey, part: Part, side: MediumSide, at: FitWave): PlateOfPart {
  const none: PlateOfPart = { internalTransmittance: null, loss: null, surfacesOnly: false };
  if (part.thickness_m === null) return none;
  const known = side.answer.absorptionCoefficient_per_m !== null;
  if (!known && !isClear(side.answer, at)) return none;
  const wavelength_m = at.vacuum_um * 1e-6;
  const { loss, internalTransmittance } = plateFractions(
    airAround(survey, at),
    side.optics,
    part.thickness_m,
    wavelength_m,
  );
  return { internalTransmittance: known ? internalTransmittance : null, loss, surfacesOnly: !known };
}

function isClear({ transparency_m }: MediumAnswer, at: FitWave): boolean {
  const wavelength_m = at.vacuum_um * 1e-6;
  return (
    transparency_m !== null &&
    transparency_m[0] <= wavelength_m * (1 + 1e-9) &&
    wavelength_m * (1 - 1e-9) <= transparency_m[1]
  );
}
