/**
 * Reflectance over the wavelength, at the angle and polarization of the question: over the part of the spectrum around the
 * present wave that the data of both media cover. The indices come as tables (world.opticsOver), which outlive a change of
 * angle, polarization or wave, so that following a curve costs nothing.
 */
import type { Answer } from '../answer/answer.ts';
import { powerOf } from '../answer/interface-answer.ts';
import { opticsPowers } from '../answer/optics-powers.ts';
import type { Question } from '../answer/question.ts';
import type { Optics } from '../interface/optics.ts';
import { type Curve, clamp } from './reflectance-curves.ts';
import type { World } from './world.ts';

export interface WaveCurve {
  readonly curve: Curve;
  readonly range_m: readonly [number, number];
  /** Largest value on it. */
  readonly top: number;
}

/** Points of a table; between them a curve is straight. */
export const TABLE_POINTS = 80;
/** Two octaves to either side of the octave the wave is in: the window stays while the wave is stepped. */
const OCTAVES = 2;

/** null where a spectrum says nothing (media given by their numbers alone); undefined while the tables are being made. */
export function waveCurve(question: Question, answer: Answer, world: World): WaveCurve | null | undefined {
  const range_m = windowAround(answer);
  if (!range_m) return null;
  const from = world.opticsOver(question.from, question.conditions, range_m);
  const into = world.opticsOver(question.into, question.conditions, range_m);
  const tables = question.layers.map((l) => world.opticsOver(l.medium, question.conditions, range_m));
  const layers = tables.filter((t) => t !== undefined);
  if (!from || !into || layers.length < tables.length) return undefined;
  const values = from.map((optics, i) => {
    const between = layers.map((t) => t[i] ?? null);
    const wavelength_m = wavelengthAt(range_m, i / (from.length - 1));
    return reflectance(optics, between, into[i] ?? null, answer, wavelength_m);
  });
  return {
    curve: { name: '', valueAt: (x) => between(values, x) },
    range_m,
    top: Math.max(0, ...values.map((v) => v ?? 0)),
  };
}

function windowAround({ from, into, wave }: Answer): readonly [number, number] | undefined {
  const ranges = [from.fit?.range_m, into.fit?.range_m].filter((r) => r !== undefined);
  if (ranges.length === 0) return undefined;
  const octave = 2 ** Math.round(Math.log2(wave.vacuumWavelength_m));
  const low = Math.max(octave / 2 ** OCTAVES, ...ranges.map((r) => r[0]));
  const high = Math.min(octave * 2 ** OCTAVES, ...ranges.map((r) => r[1]));
  return high > low * 1.01 ? [low, high] : undefined;
}

/** The wavelength at a place from 0 to 1 along the axis: equal steps are equal ratios. */
export function wavelengthAt([low, high]: readonly [number, number], x: number): number {
  return low * (high / low) ** x;
}

export function placeOfWavelength([low, high]: readonly [number, number], wavelength_m: number): number {
  return Math.log(wavelength_m / low) / Math.log(high / low);
}

/** Null where any of the media has no data. */
function reflectance(
  from: Optics | null,
  between: readonly (Optics | null)[],
  into: Optics | null,
  answer: Answer,
  wavelength_m: number,
): number | null {
  const media = between.filter((m) => m !== null);
  if (!from || !into || media.length < between.length) return null;
  const { incidenceAngle_rad, polarization } = answer.geometry;
  const path = {
    from,
    layers: media.map((optics, i) => ({
      optics,
      thickness_m: answer.layers[i]?.thickness_m ?? 0,
      coherent: answer.layers[i]?.coherent,
    })),
    into,
    coherenceLength_m: answer.stack?.coherenceLength_m ?? 0,
  };
  const powers = opticsPowers(path, wavelength_m, incidenceAngle_rad);
  return powers && clamp(powerOf(polarization, powers.Rs, powers.Rp));
}

function between(values: readonly (number | null)[], x: number): number | null {
  const at = x * (values.length - 1);
  const i = Math.min(values.length - 2, Math.floor(at));
  const left = values[i] ?? null;
  const right = values[i + 1] ?? null;
  return left === null || right === null ? null : left + (right - left) * (at - i);
}
