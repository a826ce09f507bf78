/**
 * The part of the answer that most batches ask for, computed with nothing around it: wave, n and k of both media, R, T and the
 * angle of refraction of one surface. The numbers are those of `answerQuestion` to the last bit; where it would refuse,
 * `evaluate` returns false and the words are left to it.
 */
import { type SurfacePowers, surfacePowers } from '../answer/powers.ts';
import type { Polarization } from '../answer/question.ts';
import type { Waves } from '../medium/bound-fit.ts';
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

/** The surface that rows ask about. */
export interface LeanSurface {
  /** Undefined where it was left out and no column asks for it. */
  from: BoundMedium | undefined;
  into: BoundMedium | undefined;
  fromIsLiteral: boolean;
  polarization: Polarization;
  /** The wavelengths given are those in standard air. */
  inAir: boolean;
}

/** Several rows of numbers: waves and angles in, the values behind the answer columns out. */
export interface LeanRows extends Waves {
  readonly angle_rad: Float64Array;
  /** The wavelengths as given, in metres. */
  readonly given_m: Float64Array;
  /** One array a slot. */
  readonly values: readonly Float64Array[];
}

export function makeRows(count: number): LeanRows {
  const numbers = (): Float64Array => new Float64Array(count);
  return {
    vacuum_um: numbers(),
    air_um: numbers(),
    angle_rad: numbers(),
    given_m: numbers(),
    values: Array.from({ length: SLOTS }, numbers),
  };
}

export interface LeanAnswers {
  readonly needsFrom: boolean;
  readonly needsInto: boolean;
  /** Answers row `i`; false where the question is not answered in this way. */
  readonly evaluate: (surface: LeanSurface, rows: LeanRows, i: number) => boolean;
  /** Answers the first rows, up to `count` or the first that is not answered in this way; how many. */
  readonly evaluateBlock: (surface: LeanSurface, rows: LeanRows, count: number) => number;
  /** Values of a column by row, once evaluated, to be multiplied with the column's factor; NaN where there is none. */
  readonly valuesOf: (rows: LeanRows, column: number) => Float64Array;
  /** The sides that row `i` answered outside the range of their fits: "", "from", "into", "from into". */
  readonly outside: (surface: LeanSurface, rows: LeanRows, i: number) => string;
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
  const onlyN2 = slotOf.every((slot) => slot === N2);
  const pair = new Float64Array(2);
  /** n and k of a side into its slots. */
  const put = (side: BoundMedium, rows: LeanRows, i: number, slot: number): boolean => {
    if (side.indexAt(rows, i, pair, 0) === REFUSED) return false;
    rows.values[slot]![i] = pair[0]!;
    rows.values[slot + 1]![i] = pair[1]!;
    return true;
  };
  const before = ({ from, fromIsLiteral }: LeanSurface, rows: LeanRows, i: number): boolean => {
    if (from === undefined) return true;
    if (!index1 && !fromIsLiteral) return from.reachAt(rows, i) !== REFUSED;
    return put(from, rows, i, N1) && rows.values[N1]![i] !== 0;
  };
  const beyond = ({ into }: LeanSurface, rows: LeanRows, i: number): boolean => {
    if (into === undefined) return true;
    return index2 ? put(into, rows, i, N2) : into.reachAt(rows, i) !== REFUSED;
  };
  const evaluate = (surface: LeanSurface, rows: LeanRows, i: number): boolean => {
    if (wave) putMeasures(rows, i, surface.inAir);
    if (!powers) return before(surface, rows, i) && beyond(surface, rows, i);
    const from = surface.from?.opticsAt(rows, i);
    const into = surface.into?.opticsAt(rows, i);
    if (!from || !into || from.n.re === 0) return false;
    const { values } = rows;
    values[N1]![i] = from.n.re;
    values[N1 + 1]![i] = from.n.im;
    values[N2]![i] = into.n.re;
    values[N2 + 1]![i] = into.n.im;
    putPowers(surfacePowers(from, into, rows.angle_rad[i]!, surface.polarization), values, i);
    return true;
  };

  return {
    needsFrom: powers || index1,
    needsInto: powers || index2,
    valuesOf: ({ values }, column) => values[slotOf[column]!]!,
    outside({ from, into }, rows, i) {
      const sides = [
        from?.reachAt(rows, i) === EXTRAPOLATED ? ['from'] : [],
        into?.reachAt(rows, i) === EXTRAPOLATED ? ['into'] : [],
      ];
      return sides.flat().join(' ');
    },
    evaluate,
    evaluateBlock(surface, rows, count) {
      let answered = 0;
      if (onlyN2 && surface.into && !surface.fromIsLiteral) {
        // Only the index beyond is asked: the medium takes the block as a whole.
        while (answered < count && before(surface, rows, answered)) answered++;
        return surface.into.indexBlock(rows, answered, rows.values[N2]!);
      }
      while (answered < count && evaluate(surface, rows, answered)) answered++;
      return answered;
    },
  };
}

/** As `waveAnswer`: the wavelength given comes back to the last bit. */
function putMeasures({ vacuum_um, air_um, given_m, values }: LeanRows, i: number, inAir: boolean): void {
  const wavelength_m = inAir ? vacuum_um[i]! / 1e6 : given_m[i]!;
  values[WAVE]![i] = wavelength_m;
  values[AIR_WAVE]![i] = inAir ? given_m[i]! : air_um[i]! / 1e6;
  values[FREQUENCY]![i] = frequencyFromWavelength(wavelength_m);
  values[ENERGY]![i] = photonEnergyFromWavelength(wavelength_m);
  values[WAVENUMBER]![i] = 1 / wavelength_m;
}

function putPowers(p: SurfacePowers, values: readonly Float64Array[], i: number): void {
  values[RS]![i] = p.Rs;
  values[RP]![i] = p.Rp;
  values[R]![i] = p.R;
  values[TS]![i] = p.Ts ?? Number.NaN;
  values[TP]![i] = p.Tp ?? Number.NaN;
  values[T]![i] = p.T ?? Number.NaN;
  values[REFRACTION]![i] = p.refractionAngle_rad ?? Number.NaN;
}
