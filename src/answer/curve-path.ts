/**
 * The path of a question made ready for curves: its powers at any angle and any wave, by the laws that made the answer and, at
 * the wave of the question, with its numbers. What the question fixes stays fixed along a curve: the thickness of a quarter wave
 * meant at one angle and one wave, and which layers are coherent. Nothing else is worked out: no cautions, no uncertainties.
 */
import type { Waves } from '../medium/bound-fit.ts';
import { type BoundMedium, INSIDE, REFUSED, type Reach } from '../medium/bound-medium.ts';
import { isRefusal, type Refusal } from '../medium/refusal.ts';
import type { SourceOf } from './medium-side.ts';
import { type BothPowers, type OpticsLayer, opticsPowers } from './optics-powers.ts';
import { readEnds, readPath } from './path.ts';
import { solvePath } from './path-powers.ts';
import { bindMedium } from './powers.ts';
import type { MediumSpec, Question } from './question.ts';
import { bothReferences } from './wave.ts';

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
  readonly powersAt: (wavelength_m: number, angle_rad: number) => BothPowers | null;
}

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

  const thicknesses = thicknessesOf(question, sourceOf);
  if (isRefusal(thicknesses)) return thicknesses;
  const { layers, coherenceLength_m } = thicknesses;
  return {
    question,
    wavelength_m,
    media,
    coherentLength_m: layers.reduce((sum, l) => sum + (l.coherent ? l.opticalLength_m : 0), 0),
    powersAt: (at_m, angle_rad) => {
      const there = referencesAt(at_m);
      const first = there && from.opticsAt(there, 0);
      const last = there && into.opticsAt(there, 0);
      if (!first || !last) return null;
      const between: OpticsLayer[] = [];
      for (const [i, { thickness_m, coherent }] of layers.entries()) {
        const optics = inLayers[i]?.opticsAt(there, 0);
        if (!optics) return null;
        between.push({ optics, thickness_m, coherent });
      }
      return opticsPowers({ from: first, layers: between, into: last, coherenceLength_m }, at_m, angle_rad);
    },
  };
}

interface FixedLayer {
  readonly thickness_m: number;
  readonly coherent: boolean;
  /** n d at the wave of the question. */
  readonly opticalLength_m: number;
}

/** What stays as the question has it along a curve. */
function thicknessesOf(
  question: Question,
  sourceOf: SourceOf,
): { readonly layers: readonly FixedLayer[]; readonly coherenceLength_m: number } | Refusal {
  if (question.layers.length === 0) return { layers: [], coherenceLength_m: 0 };
  const wave = bothReferences(question.wave);
  if (isRefusal(wave)) return wave;
  const ends = readEnds(question, wave, sourceOf);
  if (isRefusal(ends)) return ends;
  const path = readPath(question, wave, ends, sourceOf);
  if (isRefusal(path)) return path;
  const parts = solvePath(path, question, wave.vacuum_um * 1e-6);
  if (isRefusal(parts)) return parts;
  return {
    layers: path.layers.map(({ side, thickness_m }, i) => ({
      thickness_m,
      coherent: parts.layers[i]?.coherent === true,
      opticalLength_m: side.optics.n.re * thickness_m,
    })),
    coherenceLength_m: parts.stack.coherenceLength_m,
  };
}

const idOf = (spec: MediumSpec): string =>
  spec.kind === 'literal' ? `=${spec.text}` : `${spec.material.key}:${spec.axis ?? ''}`;

/** A medium made ready for curves by itself. */
export function mediumForCurves(
  spec: MediumSpec,
  { conditions, extrapolate }: Pick<Question, 'conditions' | 'extrapolate'>,
): CurveMedium {
  return curveMedium(spec, bindMedium(spec, conditions, extrapolate));
}

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
