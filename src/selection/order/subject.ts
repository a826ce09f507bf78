/**
 * What is ordered: the bulk layers of the path, each with its two faces and the films on them; or, where no layer is thick, the
 * medium beyond, of no stated thickness.
 */
import type { Answer, LayerAnswer, MediumAnswer } from '../../answer/answer.ts';
import type { MediumSpec, Question } from '../../answer/question.ts';
import type { Material } from '../../catalog/types.ts';
import { complex } from '../../num/complex.ts';
import { coherentStack } from '../../stack/coherent-stack.ts';
import type { Layer, Substance } from '../../stack/layered-path.ts';

/** Thinner than this is a film. */
const FILM_waves = 20;

export const isFilm = (layer: LayerAnswer): boolean => layer.opticalThickness_waves < FILM_waves;

export interface Face {
  /** The medium on the other side of the films; null where the path does not go on. */
  readonly outside: MediumAnswer;
  /** From outside to the part. */
  readonly films: readonly LayerAnswer[];
  /** Of the wave in `outside`. */
  readonly angle_rad: number;
  /** True where `outside` is a gas or vacuum. */
  readonly isOuter: boolean;
}

export interface Subject {
  readonly material: Material | null;
  readonly spec: MediumSpec;
  readonly medium: MediumAnswer;
  /** Of the path, from 1; null for the medium beyond. */
  readonly layer: { readonly number: number; readonly answer: LayerAnswer } | null;
  readonly front: Face;
  /** Null for the medium beyond. */
  readonly back: Face | null;
}

export function subjectsOf(question: Question, answer: Answer): readonly Subject[] {
  const { layers, into, from, geometry } = answer;
  const tangential = from.n * Math.sin(geometry.incidenceAngle_rad);
  const angleIn = (medium: MediumAnswer): number => Math.asin(Math.min(1, tangential / medium.n));
  const faceOf = (index: number, step: -1 | 1): Face => {
    const films: LayerAnswer[] = [];
    let i = index + step;
    while (i >= 0 && i < layers.length && isFilm(layers[i] as LayerAnswer)) {
      films.push(layers[i] as LayerAnswer);
      i += step;
    }
    const outside = i < 0 ? from : i >= layers.length ? into : (layers[i] as LayerAnswer).medium;
    const spec = i < 0 ? question.from : i >= layers.length ? question.into : question.layers[i]?.medium;
    return { outside, films: films.reverse(), angle_rad: angleIn(outside), isOuter: isThin(spec) };
  };
  const bulk = layers.flatMap((layer, i): readonly Subject[] => {
    const spec = question.layers[i]?.medium;
    if (!spec || isFilm(layer) || isThin(spec)) return [];
    return [
      {
        spec,
        material: materialOf(spec),
        medium: layer.medium,
        layer: { number: i + 1, answer: layer },
        front: faceOf(i, -1),
        back: faceOf(i, 1),
      },
    ];
  });
  if (bulk.length > 0 || isThin(question.into)) return bulk;
  return [
    {
      spec: question.into,
      material: materialOf(question.into),
      medium: into,
      layer: null,
      front: faceOf(layers.length, -1),
      back: null,
    },
  ];
}

export const materialOf = (spec: MediumSpec | undefined): Material | null =>
  spec?.kind === 'catalogue' ? spec.material : null;

/** Gases and vacuum, by their class, or numbers that are those of vacuum. */
function isThin(spec: MediumSpec | undefined): boolean {
  if (!spec) return false;
  if (spec.kind === 'literal') return spec.literal.n?.re === 1 && spec.literal.n.im === 0;
  return spec.material.class === 'gas' || spec.material.key === 'vacuum';
}

export interface FaceFractions {
  readonly R: number;
  /** What the films take. */
  readonly A: number;
}

/** Reflectance of a face seen from outside, its films included, for the polarization of the answer; `films` replaces its own. */
export function faceFractions(
  face: Face,
  medium: MediumAnswer,
  answer: Answer,
  films: readonly Layer[] = face.films.map(layerOf),
): FaceFractions {
  const result = coherentStack(
    { incidence: transparent(face.outside), layers: films, exit: substanceOf(medium) },
    answer.wave.vacuumWavelength_m,
    face.angle_rad,
  );
  const { polarization } = answer.geometry;
  const { R, A } = polarization === 'unpolarized' ? result.unpolarized : result[polarization];
  return { R, A };
}

export const substanceOf = (medium: MediumAnswer): Substance => ({
  eps: medium.relativePermittivity,
  mu: medium.relativePermeability,
});

const transparent = (medium: MediumAnswer): Substance => ({
  eps: complex((medium.n * medium.n) / medium.relativePermeability.re),
  mu: complex(medium.relativePermeability.re),
});

const layerOf = ({ medium, thickness_m }: LayerAnswer): Layer => ({ ...substanceOf(medium), thickness_m });
