/**
 * Which inputs of a question are uncertain, by how much, and what that does to R and T: accuracy of the fits, and the
 * tolerances a person states for wave, angle and index.
 */
import type { FitWave } from '../catalog/choose-fit.ts';
import { K, N } from '../dispersion/evaluator.ts';
import { type Optics, opticsFromIndex } from '../interface/optics.ts';
import type { MediumSide } from './medium-side.ts';
import type { Question } from './question.ts';
import { propagate, type Spread } from './uncertainty.ts';

interface Move {
  readonly from?: number;
  readonly into?: number;
  readonly wavelength_um?: number;
  readonly angle?: number;
  readonly thickness_m?: number;
  /** Offset of the index of one layer. */
  readonly layer?: LayerOffset;
}

export interface LayerOffset {
  readonly number: number;
  readonly n: number;
}

interface MovedInput {
  readonly name: string;
  readonly u: number;
  readonly move: (x: number) => Move;
}

/** Spread taken for the digits shown where neither an accuracy nor a disagreement with published values is known. */
const UNKNOWN_ACCURACY = 1e-3;

function uncertainInputs(
  question: Question,
  wave: FitWave,
  from: MediumSide,
  into: MediumSide,
  layers: readonly MediumSide[],
): readonly MovedInput[] {
  const { tolerances } = question;
  const inputs: MovedInput[] = [];
  const add = (name: string, u: number | undefined, move: MovedInput['move']): void => {
    if (u) inputs.push({ name, u, move });
  };
  const accuracy = (side: MediumSide): number =>
    side.accuracy ?? side.answer.n_digitsGuide ?? UNKNOWN_ACCURACY * side.optics.n.re;
  add(`index of ${from.name}`, accuracy(from), (x) => ({ from: x }));
  add(`index of ${into.name}`, accuracy(into), (x) => ({ into: x }));
  add(`stated index tolerance of ${from.name}`, tolerances.indexFrom, (x) => ({ from: x }));
  add(`stated index tolerance of ${into.name}`, tolerances.index, (x) => ({ into: x }));
  const toVacuum = question.wave.inAir ? wave.vacuum_um / wave.air_um : 1;
  add('wavelength', (tolerances.wavelength_m ?? 0) * 1e6 * toVacuum, (x) => ({ wavelength_um: x }));
  add('angle of incidence', tolerances.angle_rad, (x) => ({ angle: x }));
  for (const [number, side] of layers.entries()) {
    const name = `index of ${side.name} (layer ${number + 1})`;
    add(name, accuracy(side), (n) => ({ layer: { number, n } }));
  }
  if (layers.length > 0) {
    add('thickness', tolerances.thickness_m, (x) => ({ thickness_m: x }));
  }
  return inputs;
}

/** What the uncertain inputs were moved to: both media's optics and the angle. */
export interface Moved {
  readonly from: Optics;
  readonly into: Optics;
  readonly angle_rad: number;
  /** Shift of the vacuum wavelength, um; layers follow it by themselves. */
  readonly shift_um: number;
  /** Offset added to the thickness of every layer. */
  readonly thickness_m: number;
  readonly layer: LayerOffset | null;
}

/** Spread of a power that `power` computes from the moved inputs. */
export interface PowerSpread {
  of(value: number, power: (inputs: Moved) => number): Spread | null;
  /** False where an accuracy that matters is not stated: the spread then guides digits and is no uncertainty. */
  readonly stated: boolean;
}

export function powerSpread(
  question: Question,
  wave: FitWave,
  from: MediumSide,
  into: MediumSide,
  layers: readonly MediumSide[] = [],
): PowerSpread {
  const inputs = uncertainInputs(question, wave, from, into, layers);
  const at = (move: Move): Moved => {
    const shift_um = move.wavelength_um ?? 0;
    return {
      from: movedOptics(from, move.from ?? 0, shift_um),
      into: movedOptics(into, move.into ?? 0, shift_um),
      // |angle|: a beam tilted past the normal comes from the other side. Grazing is the far limit.
      angle_rad: Math.min(Math.abs(question.incidenceAngle_rad + (move.angle ?? 0)), Math.PI / 2 - 1e-9),
      shift_um,
      thickness_m: move.thickness_m ?? 0,
      layer: move.layer ?? null,
    };
  };
  const givenByPerson = Object.keys(question.tolerances).length > 0;
  return {
    stated: givenByPerson || [from, ...layers, into].every((side) => side.accuracy !== null),
    of: (value, power) =>
      propagate(
        value,
        inputs.map((i) => ({ name: i.name, standardUncertainty: i.u, at: (x) => power(at(i.move(x))) })),
      ),
  };
}

/** The medium with its index moved: by an offset of n, and along its dispersion by a shift of wavelength. */
export function movedOptics(side: MediumSide, dn: number, shift_um: number): Optics {
  if (dn === 0 && shift_um === 0) return side.optics;
  const { optics, jet } = side;
  const n = optics.n.re + jet[N + 1]! * shift_um + dn;
  const k = Math.max(0, optics.n.im + jet[K + 1]! * shift_um);
  return opticsFromIndex({ re: n, im: k }, optics.mu);
}

/** Fit accuracy, stated tolerance of the index and of the wave together; null where the fit states none and nothing else does. */
export function indexUncertainty(
  side: MediumSide,
  question: Question,
  which: 'from' | 'into',
): number | null {
  const { tolerances } = question;
  const stated = which === 'into' ? tolerances.index : tolerances.indexFrom;
  const byWave = tolerances.wavelength_m ? side.jet[N + 1]! * tolerances.wavelength_m * 1e6 : 0;
  if (side.accuracy === null && stated === undefined) return null;
  const total = Math.hypot(side.accuracy ?? 0, stated ?? 0, byWave);
  return side.isLiteral && total === 0 ? null : total;
}
