/**
 * Which inputs of a question are uncertain, and by how much: accuracy of the fits, and the tolerances a person states for
 * wave, angle, index, thickness and temperature. One material is one input wherever it occurs in the path, since its index is
 * off by the same everywhere; thicknesses of layers are independent of each other.
 */
import type { FitWave } from '../catalog/choose-fit.ts';
import { N } from '../dispersion/evaluator.ts';
import type { MediumSide } from './medium-side.ts';
import type { Offsets } from './moved.ts';
import type { PathLayer } from './path.ts';
import type { Question } from './question.ts';
import type { ThermalSlope } from './thermal-slope.ts';
import type { UncertainInput } from './uncertainty.ts';

export interface MovableInput extends UncertainInput {
  /** Adds what a shift of this input means. */
  readonly move: (offsets: Offsets, shift: number) => void;
}

/** A medium of the path with how it changes with temperature; null where that is not known or not asked. */
export interface ThermalSide {
  readonly side: MediumSide;
  readonly slope: ThermalSlope | null;
}

/** Spread taken for the digits shown where neither an accuracy nor a disagreement with published values is known. */
const UNKNOWN_ACCURACY = 1e-3;
/** With more layers their thicknesses are moved together, in this many sets of random signs: the same variance on average. */
const MOST_SINGLE_LAYERS = 48;
const SIGN_SETS = 48;

/** `media`: the first medium, the layers, the last one. */
export function movableInputs(
  question: Question,
  wave: FitWave,
  media: readonly ThermalSide[],
  layers: readonly PathLayer[],
): readonly MovableInput[] {
  const { tolerances } = question;
  const inputs: MovableInput[] = [];
  const add = (name: string, u: number | undefined, move: MovableInput['move']): void => {
    if (u) inputs.push({ name, standardUncertainty: u, move });
  };
  for (const { name, places, accuracy } of distinctMedia(media.map((m) => m.side))) {
    add(`index of ${name}`, accuracy, (o, x) => addTo(o.n, places, x));
    const between = places.filter((i) => i > 0 && i < media.length - 1);
    if (between.length > 0) {
      add(`stated index tolerance of ${name}`, tolerances.indexLayers, (o, x) => addTo(o.n, between, x));
    }
  }
  const last = media.length - 1;
  const nameOf = (i: number): string => media[i]?.side.name ?? '';
  add(`stated index tolerance of ${nameOf(0)}`, tolerances.indexFrom, (o, x) => addTo(o.n, [0], x));
  add(`stated index tolerance of ${nameOf(last)}`, tolerances.index, (o, x) => addTo(o.n, [last], x));
  const toVacuum = question.wave.inAir ? wave.vacuum_um / wave.air_um : 1;
  add('wavelength', (tolerances.wavelength_m ?? 0) * 1e6 * toVacuum, (o, x) => {
    o.wavelength_um += x;
  });
  add('angle of incidence', tolerances.angle_rad, (o, x) => {
    o.angle_rad += x;
  });
  for (const { u, signs } of thicknessMoves(question, layers)) {
    add('thickness', u, (o, x) => {
      for (const [i, share] of signs) o.thickness_m[i] = (o.thickness_m[i] ?? 0) + share * x;
    });
  }
  if (media.some((m) => m.slope)) {
    add('temperature', tolerances.temperature_K, (o, x) => warm(o, media, layers, x));
  }
  return inputs;
}

function addTo(target: Float64Array, places: readonly number[], x: number): void {
  for (const i of places) target[i] = (target[i] ?? 0) + x;
}

interface DistinctMedium {
  readonly name: string;
  readonly places: readonly number[];
  readonly accuracy: number;
}

function distinctMedia(sides: readonly MediumSide[]): readonly DistinctMedium[] {
  const found = new Map<string, { side: MediumSide; places: number[] }>();
  sides.forEach((side, i) => {
    const { key, name, axis } = side.answer;
    const id = key === null ? `=${name}` : `${key}:${axis}`;
    const same = found.get(id);
    if (same) same.places.push(i);
    else found.set(id, { side, places: [i] });
  });
  return [...found.values()].map(({ side, places }) => {
    const layer = places.length === 1 && places[0] !== 0 && places[0] !== sides.length - 1;
    return {
      name: layer ? `${side.name} (layer ${places[0]})` : side.name,
      places,
      accuracy: side.accuracy ?? side.answer.n_digitsGuide ?? UNKNOWN_ACCURACY * side.optics.n.re,
    };
  });
}

/** A standard uncertainty, and what a unit of it does to which layers. */
interface ThicknessMove {
  readonly u: number;
  readonly signs: readonly (readonly [layer: number, share: number])[];
}

function thicknessMoves({ tolerances }: Question, layers: readonly PathLayer[]): readonly ThicknessMove[] {
  const each = layers.map(({ thickness_m }) =>
    Math.hypot(tolerances.thickness_m ?? 0, (tolerances.thicknessShare ?? 0) * thickness_m),
  );
  if (each.every((u) => u === 0)) return [];
  if (layers.length <= MOST_SINGLE_LAYERS) return each.map((u, i) => ({ u, signs: [[i, 1]] }));
  const largest = Math.max(...each);
  return Array.from({ length: SIGN_SETS }, (_, set) => ({
    u: largest / Math.sqrt(SIGN_SETS),
    signs: each.map((u, i) => [i, (u / largest) * randomSign(set, i)] as const),
  }));
}

/** One bit of a mixed integer: the same signs every time. */
function randomSign(set: number, layer: number): 1 | -1 {
  let h = Math.imul(set + 1, 0x9e3779b1) ^ Math.imul(layer + 1, 0x85ebca6b);
  h = Math.imul(h ^ (h >>> 15), 0x2c1b3c6d);
  h = Math.imul(h ^ (h >>> 12), 0x297a2d39);
  return ((h ^ (h >>> 15)) & 1) === 0 ? 1 : -1;
}

function warm(
  offsets: Offsets,
  media: readonly ThermalSide[],
  layers: readonly PathLayer[],
  by_K: number,
): void {
  media.forEach(({ slope }, i) => {
    if (!slope) return;
    offsets.n[i] = (offsets.n[i] ?? 0) + slope.dn_per_K * by_K;
    offsets.k[i] = (offsets.k[i] ?? 0) + slope.dk_per_K * by_K;
    const layer = layers[i - 1];
    if (layer) {
      const before = offsets.thickness_m[i - 1] ?? 0;
      offsets.thickness_m[i - 1] = before + slope.expansion_per_K * layer.thickness_m * by_K;
    }
  });
}

/** Fit accuracy, stated tolerances of index, wave and temperature together; null where the fit states none and nothing else does. */
export function indexUncertainty(
  { side, slope }: ThermalSide,
  question: Question,
  stated: number | undefined,
): number | null {
  const { tolerances } = question;
  const byWave = tolerances.wavelength_m ? side.jet[N + 1]! * tolerances.wavelength_m * 1e6 : 0;
  const byTemperature = (slope?.dn_per_K ?? 0) * (tolerances.temperature_K ?? 0);
  if (side.accuracy === null && stated === undefined) return null;
  const total = Math.hypot(side.accuracy ?? 0, stated ?? 0, byWave, byTemperature);
  return side.isLiteral && total === 0 ? null : total;
}
