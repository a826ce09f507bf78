/**
 * The path of a question made ready for curves: its powers at any angle and any wave, by the laws that made the answer and, at
 * the wave of the question, with its numbers. What the question fixes stays fixed along a curve: the thickness of a quarter wave
 * meant at one angle and one wave, and which layers are coherent. Nothing else is worked out: no cautions, no uncertainties.
 */
import type { Optics } from '../interface/optics.ts';
import type { Waves } from '../medium/bound-fit.ts';
import { type BoundMedium, INSIDE, REFUSED, type Reach } from '../medium/bound-medium.ts';
import { isRefusal, type Refusal } from '../medium/refusal.ts';
import { StackRefusal } from '../stack/stack-refusal.ts';
import { mediumSide, type SourceOf } from './medium-side.ts';
import { readPath } from './path.ts';
import { pathPower, solvePath } from './path-powers.ts';
import { bindMedium, surfacePowers } from './powers.ts';
import type { MediumSpec, Question } from './question.ts';
import { bothReferences } from './wave.ts';

/** Power fractions of both polarizations. */
export interface CurvePowers {
  readonly Rs: number;
  readonly Rp: number;
  /** Null where the medium of incidence absorbs too much for them to mean anything. */
  readonly Ts: number | null;
  readonly Tp: number | null;
}

/** A medium of the path; one that occurs several times stands here once. */
export interface CurveMedium {
  readonly spec: MediumSpec;
  readonly name: string;
  readonly reachAt: (wavelength_m: number) => Reach;
}

export interface CurvePath {
  readonly question: Question;
  /** In vacuum. */
  readonly wavelength_m: number;
  readonly media: readonly CurveMedium[];
  /** n d of the layers that are summed as amplitudes, at the wave of the question. */
  readonly coherentLength_m: number;
  /** Null where a medium has no data, or the laws no answer. */
  readonly powersAt: (wavelength_m: number, angle_rad: number) => CurvePowers | null;
}

/** The furthest an angle goes: grazing itself is the limit of what comes before it. */
const GRAZING_rad = Math.PI / 2 - 1e-9;

/** For questions that have an answer; the refusals are those of the answer. */
export function curvePath(question: Question, sourceOf: SourceOf): CurvePath | Refusal {
  const wave = bothReferences(question.wave);
  if (isRefusal(wave)) return wave;
  const { conditions, extrapolate } = question;
  const wavelength_m = wave.vacuum_um * 1e-6;
  const bound = new Map<MediumSpec, BoundMedium>();
  const bind = (spec: MediumSpec): BoundMedium => {
    const known = bound.get(spec) ?? bindMedium(spec, conditions, extrapolate);
    bound.set(spec, known);
    return known;
  };
  const [from, into] = [bind(question.from), bind(question.into)];
  const inLayers = question.layers.map(({ medium }) => bind(medium));
  const byId = new Map([...bound].map(([spec, medium]) => [idOf(spec), curveMedium(spec, medium)]));
  const media = [...byId.values()];

  if (question.layers.length === 0) {
    return {
      question,
      wavelength_m,
      media,
      coherentLength_m: 0,
      powersAt: (at_m, angle_rad) => {
        const there = referencesAt(at_m);
        const first = there && from.opticsAt(there, 0);
        const last = there && into.opticsAt(there, 0);
        if (!first || !last || !(first.n.re > 0)) return null;
        return surfacePowers(first, last, Math.min(angle_rad, GRAZING_rad), 'unpolarized');
      },
    };
  }

  const sides = [question.from, question.into].map((spec) =>
    mediumSide(spec, wave, conditions, extrapolate, sourceOf),
  );
  const [before, beyond] = sides;
  if (!before || !beyond || isRefusal(before) || isRefusal(beyond)) return sides.find(isRefusal) as Refusal;
  const path = readPath(question, wave, before, beyond, sourceOf);
  if (isRefusal(path)) return path;
  const parts = solvePath(path, question, wavelength_m);
  if (isRefusal(parts)) return parts;
  const power = pathPower(parts, wavelength_m);
  const coherentLength_m = path.layers.reduce(
    (sum, { side, thickness_m }, i) =>
      parts.layers[i]?.coherent ? sum + side.optics.n.re * thickness_m : sum,
    0,
  );
  return {
    question,
    wavelength_m,
    media,
    coherentLength_m,
    powersAt: (at_m, angle_rad) => {
      const there = referencesAt(at_m);
      if (!there) return null;
      const optics = [from, into, ...inLayers].map((m) => m.opticsAt(there, 0));
      const [first, last, ...inner] = optics;
      if (!first || !last || !(first.n.re > 0)) return null;
      const layers: { optics: Optics; thickness_m: number }[] = [];
      for (const [i, layer] of inner.entries()) {
        if (!layer) return null;
        layers.push({ optics: layer, thickness_m: path.layers[i]?.thickness_m ?? 0 });
      }
      const shift_um = (at_m - wavelength_m) * 1e6;
      const angle = Math.min(angle_rad, GRAZING_rad);
      return orNull(() => {
        const { R, T } = power({ from: first, into: last, angle_rad: angle, shift_um, layers });
        return { Rs: R[0], Rp: R[1], Ts: T[0], Tp: T[1] };
      });
    },
  };
}

const idOf = (spec: MediumSpec): string =>
  spec.kind === 'literal' ? `=${spec.text}` : `${spec.material.key}:${spec.axis ?? ''}`;

function curveMedium(spec: MediumSpec, bound: BoundMedium): CurveMedium {
  return {
    spec,
    name: spec.kind === 'literal' ? spec.text : spec.material.name,
    reachAt: (wavelength_m) => {
      const there = referencesAt(wavelength_m);
      return there ? bound.reachAt(there, 0) : REFUSED;
    },
  };
}

/** True where all media have data of their own for a wave. */
export function isCovered(media: readonly CurveMedium[], wavelength_m: number): boolean {
  return media.every((medium) => medium.reachAt(wavelength_m) === INSIDE);
}

/** One wave, as bound media take it. */
function referencesAt(wavelength_m: number): Waves | undefined {
  const there = bothReferences({ wavelength_m, inAir: false, text: '' });
  return isRefusal(there)
    ? undefined
    : { vacuum_um: Float64Array.of(there.vacuum_um), air_um: Float64Array.of(there.air_um) };
}

function orNull<T>(compute: () => T): T | null {
  try {
    return compute();
  } catch (error) {
    if (error instanceof StackRefusal) return null;
    throw error;
  }
}
