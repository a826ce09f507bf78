/**
 * What a coating is designed for: two media, a wave, an angle, a polarization; and the films at hand at that wave. Indices are
 * asked for again at every other wave, so that bands carry the dispersion of all media; where one has no data, R is NaN.
 */
import type { FitWave } from '../catalog/choose-fit.ts';
import { vacuumToAir_um } from '../dispersion/air-index.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
import { isRefusal } from '../medium/refusal.ts';
import { complex } from '../num/complex.ts';
import { type LowReflectanceBand, lowReflectanceBand } from '../stack/coating.ts';
import { coherentStack } from '../stack/coherent-stack.ts';
import type { Polarization as OnePolarization, Substance } from '../stack/layered-path.ts';
import { substanceFromIndex } from '../stack/layered-path.ts';
import { normalIndex } from '../stack/oblique-film.ts';
import type { SkippedFilm } from './coating-shape.ts';
import type { InSteps } from './in-steps.ts';
import { powerOf } from './interface-answer.ts';
import { type MediumSide, mediumSide, type SourceOf } from './medium-side.ts';
import { transparentIncidence } from './path.ts';
import { bindMedium } from './powers.ts';
import type { MediumSpec, Polarization } from './question.ts';

/** A film absorbing more than this, k over n, is no coating material for low loss. */
const MOST_ABSORBING = 0.02;

export interface Film {
  readonly key: string;
  readonly name: string;
  readonly side: MediumSide;
  /** By how much n varies with the process, else the accuracy of the fit; null where neither is stated. */
  readonly spread: number | null;
  readonly substanceAt: SubstanceAt;
}

/** Null where there are no data. */
export type SubstanceAt = (vacuumWavelength_m: number) => Substance | null;

export interface CoatScene {
  readonly from: MediumSide;
  readonly into: MediumSide;
  readonly fromAt: SubstanceAt;
  readonly intoAt: SubstanceAt;
  readonly vacuumWavelength_m: number;
  readonly incidenceAngle_rad: number;
  readonly polarization: Polarization;
  /** n0 sin(theta). */
  readonly tangentialIndex: number;
}

export interface CoatedLayer {
  readonly film: Film;
  readonly thickness_m: number;
  /** Offset of n. */
  readonly dn?: number;
}

export function substanceAt(
  spec: MediumSpec,
  side: MediumSide,
  conditions: Conditions,
  extrapolate: boolean,
  vacuumWavelength_m: number,
): SubstanceAt {
  const bound = bindMedium(spec, conditions, extrapolate);
  const known = new Map<number, Substance | null>();
  const own: Substance = { eps: side.optics.eps, mu: side.optics.mu };
  return (wavelength_m) => {
    if (wavelength_m === vacuumWavelength_m) return own;
    const before = known.get(wavelength_m);
    if (before !== undefined) return before;
    const um = wavelength_m * 1e6;
    const waves = { vacuum_um: Float64Array.of(um), air_um: Float64Array.of(vacuumToAir_um(um)) };
    const optics = bound.opticsAt(waves, 0);
    const found = optics ? { eps: optics.eps, mu: optics.mu } : null;
    known.set(wavelength_m, found);
    return found;
  };
}

/** The films that reach the wave and do not absorb, and why the others are left out. */
export function* filmsAt(
  specs: readonly MediumSpec[],
  wave: FitWave,
  conditions: Conditions,
  extrapolate: boolean,
  tangentialIndex: number,
  sourceOf: SourceOf,
): InSteps<{ readonly films: readonly Film[]; readonly skipped: readonly SkippedFilm[] }> {
  const films: Film[] = [];
  const skipped: SkippedFilm[] = [];
  for (const spec of specs) {
    yield;
    const key = filmKey(spec);
    const name = spec.kind === 'literal' ? spec.text : spec.material.name;
    const side = mediumSide(spec, wave, conditions, extrapolate, sourceOf);
    if (isRefusal(side)) {
      skipped.push({ key, name, reason: side.message });
      continue;
    }
    const { n } = side.optics;
    if (!(n.im <= MOST_ABSORBING * n.re)) {
      skipped.push({ key, name, reason: `it absorbs: n ${short(n.re)}, k ${short(n.im)}` });
    } else if (!(normalIndex(n.re, tangentialIndex) > 0)) {
      skipped.push({ key, name, reason: 'no wave runs in it at this angle' });
    } else {
      const spread = side.answer.fit?.film?.spread ?? side.accuracy;
      films.push({
        key,
        name,
        side,
        spread,
        substanceAt: substanceAt(spec, side, conditions, extrapolate, wave.vacuum_um * 1e-6),
      });
    }
  }
  return { films, skipped };
}

/** The key of the catalogue, with the axis where one was named; else the numbers as typed. */
export function filmKey(spec: MediumSpec): string {
  if (spec.kind === 'literal') return spec.text;
  return spec.axis === undefined ? spec.material.key : `${spec.material.key}:${spec.axis}`;
}

const short = (x: number): string => String(Number(x.toPrecision(3)));

/** Reflectance of each polarization with these layers, in the order the wave meets them; NaN where an index is missing. */
export function reflectances(
  scene: CoatScene,
  layers: readonly CoatedLayer[],
  vacuumWavelength_m = scene.vacuumWavelength_m,
): Readonly<Record<OnePolarization, number>> {
  const missing = { s: Number.NaN, p: Number.NaN };
  const from = scene.fromAt(vacuumWavelength_m);
  const into = scene.intoAt(vacuumWavelength_m);
  if (!from || !into) return missing;
  const made = [];
  for (const { film, thickness_m, dn = 0 } of layers) {
    const substance = film.substanceAt(vacuumWavelength_m);
    if (!substance) return missing;
    made.push({ ...(dn === 0 ? substance : movedBy(substance, film, dn)), thickness_m });
  }
  const incidence = { eps: complex(from.eps.re), mu: complex(from.mu.re) };
  const { s, p } = coherentStack(
    { incidence, layers: made, exit: into },
    vacuumWavelength_m,
    scene.incidenceAngle_rad,
  );
  return { s: s.R, p: p.R };
}

/** Of the polarization asked. */
export function reflectance(
  scene: CoatScene,
  layers: readonly CoatedLayer[],
  vacuumWavelength_m = scene.vacuumWavelength_m,
): number {
  const { s, p } = reflectances(scene, layers, vacuumWavelength_m);
  return powerOf(scene.polarization, s, p);
}

/** n moved, k kept; only at the wave of the design. */
function movedBy(substance: Substance, { side }: Film, dn: number): Substance {
  const { n, mu } = side.optics;
  return mu.re === 1 && mu.im === 0 ? substanceFromIndex(Math.max(1e-3, n.re + dn), n.im) : substance;
}

export interface ReflectanceRange {
  readonly R_low: number | null;
  readonly R_high: number | null;
}

/** Places in the spread of each film, both ends among them. */
const SPREAD_STEPS = [-1, -0.5, 0, 0.5, 1];

/** Least and greatest R while every film's index runs through its spread, thicknesses kept; null where a spread is unknown. */
export function rangeOverSpread(scene: CoatScene, layers: readonly CoatedLayer[]): ReflectanceRange {
  const films = [...new Set(layers.map((l) => l.film))];
  if (films.some((f) => f.spread === null)) return { R_low: null, R_high: null };
  let combinations: (readonly number[])[] = [[]];
  for (const { spread } of films) {
    combinations = combinations.flatMap((c) => SPREAD_STEPS.map((z) => [...c, z * (spread ?? 0)]));
  }
  const all = combinations.map((offsets) =>
    reflectance(
      scene,
      layers.map((l) => ({ ...l, dn: offsets[films.indexOf(l.film)] ?? 0 })),
    ),
  );
  return { R_low: Math.min(...all), R_high: Math.max(...all) };
}

/**
 * The band around the wave in which R stays at or below a limit, an octave either way; `open` where data end before it does.
 * With a medium whose index is printed for one wave alone nothing but that wave can be told.
 */
export function bandBelow(
  scene: CoatScene,
  layers: readonly CoatedLayer[],
  limit: number,
): LowReflectanceBand | null {
  const around_m = scene.vacuumWavelength_m;
  const R = (wavelength_m: number): number => reflectance(scene, layers, wavelength_m);
  if ([scene.from, scene.into, ...layers.map((l) => l.film.side)].some(isPrintedForOneWave)) {
    return R(around_m) <= limit
      ? { from_m: around_m, to_m: around_m, openBelow: true, openAbove: true }
      : null;
  }
  const band = lowReflectanceBand(R, around_m, limit, { from_m: around_m / 2, to_m: around_m * 2 });
  if (!band) return null;
  const endsData = (wavelength_m: number): boolean => Number.isNaN(R(wavelength_m));
  return {
    ...band,
    openBelow: band.openBelow || endsData(band.from_m * (1 - 1e-9)),
    openAbove: band.openAbove || endsData(band.to_m * (1 + 1e-9)),
  };
}

function isPrintedForOneWave({ answer }: MediumSide): boolean {
  const range_m = answer.fit?.range_m;
  return range_m !== undefined && range_m[0] === range_m[1];
}

/** The medium of incidence without its weak absorption. */
export const outsideIndexOf = (side: MediumSide): number => Math.sqrt(transparentIncidence(side).eps.re);
