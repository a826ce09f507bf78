/**
 * Abbe numbers V_d = (n_d - 1)/(n_F - n_C), V_e = (n_e - 1)/(n_F' - n_C') (ISO 7944), from indices relative to air at the
 * lines' wavelengths in air. All lines of one number come from one fit; where it does not reach them the number does not exist.
 */
import { type FitWave, inRange } from '../catalog/choose-fit.ts';
import type { Axis, Material } from '../catalog/types.ts';
import { airToVacuum_um } from '../dispersion/air-index.ts';
import { SPECTRAL_LINES } from '../units/spectral-lines.ts';
import { indexOf, type QuickMedium, quickMedium, quickOptics } from './quick-medium.ts';
import type { Survey } from './survey.ts';

export interface AbbeNumbers {
  readonly n_d: number | null;
  readonly Vd: number | null;
  readonly n_e: number | null;
  readonly Ve: number | null;
}

function lineWave(symbol: string): FitWave {
  const line = SPECTRAL_LINES.find((l) => l.symbol === symbol);
  if (!line) throw new RangeError(`no spectral line ${symbol}`);
  // To nine digits, as printed: 587.5618 nm is 0.5875618 um and no neighbour of it.
  const air_um = Number((line.airWavelength_m * 1e6).toPrecision(9));
  return { air_um, vacuum_um: airToVacuum_um(air_um) };
}

const D = ['d', 'F', 'C'] as const;
const E = ['e', "F'", "C'"] as const;
const WAVES = new Map([...D, ...E].map((symbol) => [symbol, lineWave(symbol)]));

/** Above this k/n a medium is no glass, and its Abbe number no measure of anything. */
const ABSORBING = 1e-3;

export function abbeNumbers(survey: Survey, material: Material, axis: Axis): AbbeNumbers {
  const [n_d, Vd] = oneNumber(survey, material, axis, D);
  const [n_e, Ve] = oneNumber(survey, material, axis, E);
  return { n_d, Vd, n_e, Ve };
}

/** V_d alone, for passes over the catalogue. */
export const abbeVd = (survey: Survey, material: Material, axis: Axis): number | null =>
  oneNumber(survey, material, axis, D)[1];

type Lines = typeof D | typeof E;

/** Index at the middle line, and the Abbe number. */
function oneNumber(
  survey: Survey,
  material: Material,
  axis: Axis,
  [middle, short, long]: Lines,
): readonly [number | null, number | null] {
  const medium = quickMedium(survey, material, axis, waveOf(middle));
  if (!medium) return [null, null];
  const n = relativeToAir(medium, middle);
  const { fit, bound } = medium;
  const lines = [short, long].map(waveOf);
  if (!bound.hasDerivative || !lines.every((wave) => inRange(fit, wave))) return [n, null];
  const { optics } = quickOptics(survey, medium);
  if (optics.n.im > ABSORBING * Math.abs(optics.n.re)) return [n, null];
  const dispersion = relativeToAir(medium, short) - relativeToAir(medium, long);
  return [n, dispersion > 0 ? (n - 1) / dispersion : null];
}

function waveOf(symbol: Lines[number]): FitWave {
  const wave = WAVES.get(symbol);
  if (!wave) throw new RangeError(`no spectral line ${symbol}`);
  return wave;
}

function relativeToAir({ fit, bound }: QuickMedium, symbol: Lines[number]): number {
  const wave = waveOf(symbol);
  return indexOf(fit, bound, wave) / (wave.vacuum_um / wave.air_um);
}
