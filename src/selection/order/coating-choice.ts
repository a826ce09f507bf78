/**
 * Single quarter-wave films for a face: the ideal index, and the catalogue's films by what they would leave, reflected and
 * absorbed together, at the wave, angle and polarization asked.
 */
import type { Answer, MediumAnswer } from '../../answer/answer.ts';
import { mediumSide } from '../../answer/medium-side.ts';
import { defaultAxis, type FitWave } from '../../catalog/choose-fit.ts';
import type { Material } from '../../catalog/types.ts';
import { isRefusal } from '../../medium/refusal.ts';
import { idealFilmIndex, quarterWaveThickness_m } from '../../stack/coating.ts';
import type { Survey } from '../survey.ts';
import { type Face, faceFractions, substanceOf } from './subject.ts';

export interface FilmChoice {
  readonly material: Material;
  readonly medium: MediumAnswer;
  readonly thickness_m: number;
  /** With this film alone on the face. */
  readonly R: number;
  readonly A: number;
}

export interface CoatingChoice {
  /** sqrt(n0 n), of normal incidence. */
  readonly idealIndex: number;
  readonly idealThickness_m: number;
  readonly bareR: number;
  /** Best first; empty where no film on file has data at the wave. */
  readonly films: readonly FilmChoice[];
}

/** A film that absorbs more than this is none for an antireflection coating. */
const CLEAR = 1e-2;

/** Null for an absorbing or a thinner medium and in total reflection, where no single film serves. */
export function coatingChoice(
  survey: Survey,
  face: Face,
  medium: MediumAnswer,
  answer: Answer,
): CoatingChoice | null {
  const n0 = face.outside.n;
  const grazing = face.angle_rad > Math.PI / 2 - 1e-9;
  if (grazing || n0 * Math.sin(face.angle_rad) >= medium.n) return null;
  if (!(medium.n > n0) || medium.k > CLEAR * medium.n) return null;
  const wavelength_m = answer.wave.vacuumWavelength_m;
  const at: FitWave = { vacuum_um: wavelength_m * 1e6, air_um: answer.wave.airWavelength_m * 1e6 };
  const idealIndex = idealFilmIndex(n0, medium.n);
  const films = survey.materials
    .filter((material) => material.class === 'thin film')
    .flatMap((material) => filmOn(survey, material, face, medium, answer, at) ?? [])
    .sort((a, b) => a.R + a.A - (b.R + b.A));
  return {
    idealIndex,
    idealThickness_m: quarterWaveThickness_m(wavelength_m, idealIndex),
    bareR: faceFractions(face, medium, answer, []).R,
    films,
  };
}

function filmOn(
  survey: Survey,
  material: Material,
  face: Face,
  medium: MediumAnswer,
  answer: Answer,
  at: FitWave,
): FilmChoice | undefined {
  const spec = { kind: 'catalogue' as const, material, axis: defaultAxis(material, at) };
  const side = mediumSide(spec, at, {}, false, survey.sourceOf);
  if (isRefusal(side) || side.optics.n.im > CLEAR * side.optics.n.re) return undefined;
  const tangential = face.outside.n * Math.sin(face.angle_rad);
  if (!(side.optics.n.re > tangential)) return undefined;
  const range = side.answer.transparency_m;
  const wavelength_m = at.vacuum_um * 1e-6;
  if (range && (wavelength_m < range[0] || wavelength_m > range[1])) return undefined;
  const thickness_m = quarterWaveThickness_m(wavelength_m, side.optics.n.re, tangential);
  const { R, A } = faceFractions(face, medium, answer, [{ ...substanceOf(side.answer), thickness_m }]);
  return { material, medium: side.answer, thickness_m, R, A };
}
