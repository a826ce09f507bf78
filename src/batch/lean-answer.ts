/**
 * The part of the answer that most batches ask for, computed with nothing around it: wave, n and k of both media, R, T and the
 * angle of refraction of one surface. The numbers are those of `answerQuestion` to the last bit; where it would refuse,
 * `evaluate` returns false and the words are left to it.
 */
import { type SurfacePowers, surfacePowers } from '../answer/powers.ts';
import type { Polarization } from '../answer/question.ts';
import { type BoundMedium, EXTRAPOLATED, REFUSED } from '../medium/bound-medium.ts';
import { frequencyFromWavelength, photonEnergyFromWavelength } from '../units/wave.ts';
import type { AnswerColumn } from './answer-columns.ts';

const N1 = 0;
const N2 = 2;
const RS = 4;
const RP = 5;
const R = 6;
const TS = 7;
const TP = 8;
const T = 9;
const REFRACTION = 10;
const WAVE = 11;
const AIR_WAVE = 12;
const FREQUENCY = 13;
const ENERGY = 14;
const WAVENUMBER = 15;
const SLOTS = 16;

/** Where each key of the answer is found; k stands behind its n. */
const SLOT_OF: Readonly<Record<string, number>> = {
  'from.n': N1,
  'from.k': N1 + 1,
  'into.n': N2,
  'into.k': N2 + 1,
  'interface.Rs': RS,
  'interface.Rp': RP,
  'interface.R': R,
  'interface.Ts': TS,
  'interface.Tp': TP,
  'interface.T': T,
  'interface.refractionAngle_rad': REFRACTION,
  'wave.vacuumWavelength_m': WAVE,
  'wave.airWavelength_m': AIR_WAVE,
  'wave.frequency_Hz': FREQUENCY,
  'wave.photonEnergy_eV': ENERGY,
  'wave.wavenumber_per_m': WAVENUMBER,
};

export const LEAN_KEYS: readonly string[] = Object.keys(SLOT_OF);

/** One surface at one wave, as the laws take it; angle from the normal. */
export interface LeanQuestion {
  /** Undefined where it was left out and no column asks for it. */
  from: BoundMedium | undefined;
  into: BoundMedium | undefined;
  fromIsLiteral: boolean;
  vacuum_um: number;
  air_um: number;
  angle_rad: number;
  polarization: Polarization;
}

export interface LeanAnswers {
  readonly needsFrom: boolean;
  readonly needsInto: boolean;
  /** False where the question is not answered in this way. */
  readonly evaluate: (question: LeanQuestion) => boolean;
  /** Value of column `i` of the question last evaluated; NaN where there is none. */
  readonly value: (i: number) => number;
  /** The sides that were answered outside the range of their fits: "", "from", "into", "from into". */
  readonly outside: (question: LeanQuestion) => string;
}

/** Undefined where a column asks for more than this. */
export function leanAnswers(columns: readonly AnswerColumn[]): LeanAnswers | undefined {
  const slotOf: number[] = [];
  for (const { key } of columns) {
    const slot = SLOT_OF[key];
    if (slot === undefined) return undefined;
    slotOf.push(slot);
  }
  const needs = (first: number, last: number): boolean =>
    slotOf.some((slot) => slot >= first && slot <= last);
  const powers = needs(RS, REFRACTION);
  const wave = needs(WAVE, WAVENUMBER);
  const index1 = needs(N1, N1 + 1);
  const index2 = needs(N2, N2 + 1);
  const slots = new Float64Array(SLOTS);
  const order = Uint8Array.from(slotOf);
  const factors = Float64Array.from(columns, ({ factor }) => factor);

  return {
    needsFrom: powers || index1,
    needsInto: powers || index2,
    value: (i) => slots[order[i]!]! * factors[i]!,
    outside({ from, into, vacuum_um, air_um }) {
      const sides = [
        from?.reachAt(vacuum_um, air_um) === EXTRAPOLATED ? ['from'] : [],
        into?.reachAt(vacuum_um, air_um) === EXTRAPOLATED ? ['into'] : [],
      ];
      return sides.flat().join(' ');
    },
    evaluate(question) {
      const { from, into, vacuum_um, air_um } = question;
      if (wave) writeWave(vacuum_um, air_um, slots);
      if (!powers) {
        return (
          (from === undefined ||
            (index1 || question.fromIsLiteral
              ? from.indexAt(vacuum_um, air_um, slots, N1) !== REFUSED && slots[N1] !== 0
              : from.reachAt(vacuum_um, air_um) !== REFUSED)) &&
          (into === undefined ||
            (index2
              ? into.indexAt(vacuum_um, air_um, slots, N2) !== REFUSED
              : into.reachAt(vacuum_um, air_um) !== REFUSED))
        );
      }
      const before = from?.opticsAt(vacuum_um, air_um);
      const beyond = into?.opticsAt(vacuum_um, air_um);
      if (!before || !beyond || before.n.re === 0) return false;
      slots[N1] = before.n.re;
      slots[N1 + 1] = before.n.im;
      slots[N2] = beyond.n.re;
      slots[N2 + 1] = beyond.n.im;
      writePowers(surfacePowers(before, beyond, question.angle_rad, question.polarization), slots);
      return true;
    },
  };
}

function writeWave(vacuum_um: number, air_um: number, slots: Float64Array): void {
  const wavelength_m = vacuum_um * 1e-6;
  slots[WAVE] = wavelength_m;
  slots[AIR_WAVE] = air_um * 1e-6;
  slots[FREQUENCY] = frequencyFromWavelength(wavelength_m);
  slots[ENERGY] = photonEnergyFromWavelength(wavelength_m);
  slots[WAVENUMBER] = 1 / wavelength_m;
}

function writePowers(p: SurfacePowers, slots: Float64Array): void {
  slots[RS] = p.Rs;
  slots[RP] = p.Rp;
  slots[R] = p.R;
  slots[TS] = p.Ts ?? Number.NaN;
  slots[TP] = p.Tp ?? Number.NaN;
  slots[T] = p.T ?? Number.NaN;
  slots[REFRACTION] = p.refractionAngle_rad ?? Number.NaN;
}
