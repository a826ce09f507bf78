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
import { type Coating, coatedPart } from './coated-part.ts';
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
  /** Undefined where both faces are bare. */
  readonly coating?: Coating;
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
  /** One surface, in air; the front one, with its films, of a coated part. */
  readonly surfaceReflectance: number;
  /** From the air behind; that of the front where both are bare. */
  readonly backReflectance: number;
  /** By the indices of the films; null for a bare part, where the digits follow its index. */
  readonly R_uncertainty: number | null;
  readonly backR_uncertainty: number | null;
  /** Of one pass; null for a bare medium and where absorption is not known. */
  readonly internalTransmittance: number | null;
  /** 1 - T of the plate; null for a bare medium and where nothing can be said. */
  readonly loss: number | null;
  /** True where `loss` holds the surfaces alone. */
  readonly surfacesOnly: boolean;
  readonly brewsterAngle_rad: number | null;
  readonly dn_dT_per_K: number | null;
  readonly cautions: readonly Caution[];
  readonly films: readonly MediumAnswer[];
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
  /** The wave that quarter waves of coatings are meant for. */
  readonly design: { readonly spec: WaveSpec; readonly at: FitWave };
}

export const FEWEST_PARTS = 2;
export const MOST_PARTS = 6;

/** Refuses a wave out of reach, too few or too many parts, and a comparison of which no column has data. */
export function compareReport(
  survey: Survey,
  parts: readonly Part[],
  waves: readonly WaveSpec[],
  conditions: Conditions,
  designWave: WaveSpec | undefined = waves[0],
): CompareReport | Refusal {
  if (parts.length < FEWEST_PARTS || parts.length > MOST_PARTS) {
    const message = `${parts.length} media or parts cannot be compared`;
    return refuse('part-count', 2, message, `name ${FEWEST_PARTS} to ${MOST_PARTS} of them`);
  }
  if (!designWave) return refuse('wave-missing', 2, 'no wave is given to compare at', 'give one or more');
  const design = bothReferences(designWave);
  if (isRefusal(design)) return design;
  const compared: ComparedWave[] = [];
  for (const spec of waves) {
    const at = bothReferences(spec);
    if (isRefusal(at)) return at;
    compared.push({
      spec,
      at,
      columns: parts.map((part) => columnOf(survey, part, { spec, at, designWave }, conditions)),
    });
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
    design: { spec: designWave, at: design },
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

interface AtWave {
  readonly spec: WaveSpec;
  readonly at: FitWave;
  readonly designWave: WaveSpec;
}

function columnOf(survey: Survey, part: Part, wave: AtWave, conditions: Conditions): PartAtWave | Refusal {
  const { at } = wave;
  const side = mediumSide(part.medium, at, conditions, false, survey.sourceOf);
  if (isRefusal(side)) return side;
  const air = airAround(survey, at);
  const { medium } = part;
  const slope =
    medium.kind === 'catalogue' ? thermalSlope(medium.material, side.answer.axis as Axis, at) : null;
  const R = surfaceReflectance(air, side.optics);
  const bare: Faces = {
    ...plate(survey, part, side, at),
    surfaceReflectance: R,
    backReflectance: R,
    R_uncertainty: null,
    backR_uncertainty: null,
  };
  const films = filmsOf(survey, part, at, conditions);
  if (isRefusal(films)) return films;
  const faces = part.coating ? coated(survey, part, part.coating, wave, conditions, bare) : bare;
  if (isRefusal(faces)) return faces;
  return {
    medium: side.answer,
    ...faces,
    // Films move the angle of least reflection.
    brewsterAngle_rad: part.coating ? null : brewsterAngles(air, side.optics).p,
    dn_dT_per_K: slope?.dn_dT_per_K ?? null,
    cautions: orderCautions(
      [side, ...films].flatMap(({ notes, name }) => notes.map((note) => wordCaution(note, part.text, name))),
    ),
    films: films.map((film) => film.answer),
  };
}

type Faces = PlateOfPart &
  Pick<PartAtWave, 'surfaceReflectance' | 'backReflectance' | 'R_uncertainty' | 'backR_uncertainty'>;

function coated(
  survey: Survey,
  { medium, thickness_m }: Part,
  coating: Coating,
  { spec, at, designWave }: AtWave,
  conditions: Conditions,
  bare: Faces,
): Faces | Refusal {
  const part = coatedPart(survey, {
    medium,
    thickness_m: bare.loss === null ? null : thickness_m,
    coating,
    wave: spec,
    at,
    designWave,
    conditions,
  });
  if (isRefusal(part)) return part;
  const { front, back, loss } = part;
  return {
    ...bare,
    surfaceReflectance: front.R,
    backReflectance: back.R,
    R_uncertainty: front.R_uncertainty,
    backR_uncertainty: back.R_uncertainty,
    loss,
  };
}

/** A refusal where the data of one end. */
function filmsOf(
  survey: Survey,
  { coating }: Part,
  at: FitWave,
  conditions: Conditions,
): readonly MediumSide[] | Refusal {
  const films: MediumSide[] = [];
  for (const { medium } of [...(coating?.front ?? []), ...(coating?.back ?? [])]) {
    const film = mediumSide(medium, at, conditions, false, survey.sourceOf);
    if (isRefusal(film)) return film;
    films.push(film);
  }
  return films;
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
