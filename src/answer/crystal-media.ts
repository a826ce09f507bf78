/**
 * The two principal media of a uniaxial crystal of a question, and which medium of the question is meant by a cut. A medium
 * that has no optic axis, names a principal axis already, or has two optic axes is refused with what would be right.
 */
import { axesOf, type FitWave } from '../catalog/choose-fit.ts';
import type { Axis } from '../catalog/types.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { type MediumSide, mediumSide, type SourceOf } from './medium-side.ts';
import type { MediumSpec, Question } from './question.ts';

export interface UniaxialSides {
  readonly name: string;
  readonly key: string | null;
  readonly ordinary: MediumSide;
  readonly extraordinary: MediumSide;
}

/** The medium with one principal axis picked. */
export function alongAxis(spec: MediumSpec, axis: Axis): MediumSpec {
  if (spec.kind === 'catalogue') return { ...spec, axis };
  const { ne, ...ordinary } = spec.literal;
  const literal = axis === 'extraordinary' && ne ? { ...ordinary, n: ne } : ordinary;
  return { ...spec, literal };
}

/** True for a crystal with one optic axis of which no principal axis was picked. */
export function isUncutUniaxial(spec: MediumSpec): boolean {
  if (spec.kind === 'literal') return spec.literal.ne !== undefined;
  const axes = axesOf(spec.material);
  return spec.axis === undefined && axes.includes('ordinary') && axes.includes('extraordinary');
}

export function uniaxialSides(
  spec: MediumSpec,
  wave: FitWave,
  conditions: Conditions,
  extrapolate: boolean,
  sourceOf: SourceOf,
): UniaxialSides | Refusal {
  const wrong = whyNotUniaxial(spec);
  if (wrong) return wrong;
  const side = (axis: Axis): MediumSide | Refusal =>
    mediumSide(alongAxis(spec, axis), wave, conditions, extrapolate, sourceOf);
  const ordinary = side('ordinary');
  if (isRefusal(ordinary)) return ordinary;
  const extraordinary = side('extraordinary');
  if (isRefusal(extraordinary)) return extraordinary;
  return { name: ordinary.name, key: ordinary.answer.key, ordinary, extraordinary };
}

export function whyNotUniaxial(spec: MediumSpec): Refusal | undefined {
  if (isUncutUniaxial(spec)) return undefined;
  const no = (message: string, remedy: string): Refusal => refuse('no-cut', 2, message, remedy);
  if (spec.kind === 'literal') {
    return no(`${spec.text} is isotropic`, 'give a uniaxial crystal by its two indices: no=1.658,ne=1.486');
  }
  const { material, axis } = spec;
  const { key, name } = material;
  const axes = axesOf(material);
  if (axis !== undefined && axis !== 'isotropic') {
    return no(`${key}:${axis} picks a principal axis already`, `name ${key} alone to state a cut`);
  }
  if (axes.includes('x') || axes.includes('y') || axes.includes('z')) {
    return no(
      `${name} is biaxial: a cut between its principal axes mixes s and p and is not covered`,
      `pick a principal axis: ${axes.map((a) => `${key}:${a}`).join(', ')}`,
    );
  }
  const [only] = axes;
  return only === 'ordinary' || only === 'extraordinary'
    ? no(`of ${name} the catalogue has the ${only} index only`, `ask for ${key}:${only}`)
    : no(`${name} is isotropic: it has no optic axis`, 'leave the cut out, or name a uniaxial crystal');
}

export interface CutMedium {
  readonly spec: MediumSpec;
  /** 0 for the first layer; the number of layers for the last medium. */
  readonly place: number;
}

/** The one medium of the question that a cut can mean: a layer or the last medium. */
export function cutMedium({ layers, into }: Question): CutMedium | Refusal {
  const beyond = [...layers.map((l) => l.medium), into];
  const uncut = beyond.flatMap((spec, place) => (isUncutUniaxial(spec) ? [{ spec, place }] : []));
  const names = new Set(uncut.map(({ spec }) => nameOf(spec)));
  const [first] = uncut;
  if (!first) return whyNotUniaxial(into) ?? refuse('no-cut', 2, 'no crystal to cut', 'name one');
  if (names.size > 1) {
    return refuse(
      'no-cut',
      2,
      `a cut can mean ${[...names].join(' or ')}`,
      'pick a principal axis for all but one of them, as in KEY:o',
    );
  }
  return first;
}

const nameOf = (spec: MediumSpec): string => (spec.kind === 'literal' ? spec.text : spec.material.key);
