/**
 * Abbe numbers V_d = (n_d - 1)/(n_F - n_C), V_e = (n_e - 1)/(n_F' - n_C') (ISO 7944), from indices relative to air at the
 * lines' wavelengths in air. All lines of one number come from one fit; where it does not reach them the number does not exist,
 * nor for gases, absorbers and tables under straight lines, whose small difference of indices means nothing.
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
  /** Guide the digits shown: of both indices, of both Abbe numbers. */
  readonly n_digitsGuide: number | null;
  readonly V_digitsGuide: number | null;
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
/** n - 1 of anything condensed is larger. */
const GAS = 0.01;
/** Spread of n taken for the digits where neither an accuracy nor a disagreement with published values is known. */
const UNKNOWN_ACCURACY = 1e-3;
/** The errors of one fit at neighbouring lines go together; this part of each is taken as its own. */
const OWN_ERROR = 0.1;

export function abbeNumbers(survey: Survey, material: Material, axis: Axis): AbbeNumbers {
  const { n: n_d, u: u_d, V: Vd, spread: ofVd } = oneNumber(survey, material, axis, D);
  const { n: n_e, u: u_e, V: Ve, spread: ofVe } = oneNumber(survey, material, axis, E);
  return { n_d, Vd, n_e, Ve, n_digitsGuide: u_d ?? u_e, V_digitsGuide: ofVd ?? ofVe };
}

/** V_d alone, for passes over the catalogue. */
export const abbeVd = (survey: Survey, material: Material, axis: Axis): number | null =>
  oneNumber(survey, material, axis, D).V;

type Lines = typeof D | typeof E;

interface OneNumber {
  /** At the middle line. */
  readonly n: number | null;
  /** How well n is known. */
  readonly u: number | null;
  readonly V: number | null;
  readonly spread: number | null;
}

function oneNumber(survey: Survey, material: Material, axis: Axis, lines: Lines): OneNumber {
  const [middle, short, long] = lines;
  const medium = quickMedium(survey, material, axis, waveOf(middle));
  if (!medium) return { n: null, u: null, V: null, spread: null };
  const n = relativeToAir(medium, middle);
  const { fit, bound } = medium;
  const u = fit.accuracy_n ?? fit.digitsGuide_n ?? UNKNOWN_ACCURACY;
  const without = { n, u, V: null, spread: null };
  const reached = inRange(fit, waveOf(short)) && inRange(fit, waveOf(long));
  if (!reached || !bound.hasDerivative || bound.derivativeOrder < 2 || n < 1 + GAS) return without;
  const { optics } = quickOptics(survey, medium);
  if (optics.n.im > ABSORBING * Math.abs(optics.n.re)) return without;
  const dispersion = relativeToAir(medium, short) - relativeToAir(medium, long);
  if (!(dispersion > 0)) return without;
  const V = (n - 1) / dispersion;
  return { n, u, V, spread: (V * OWN_ERROR * Math.SQRT2 * u) / dispersion };
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
