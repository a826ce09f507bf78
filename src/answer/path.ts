/**
 * The path of a question at its wave: ends and layers as media, thicknesses as lengths, ready for the laws of src/stack.
 * A medium of incidence that absorbs a little counts as transparent here (the laws need power fractions); one that absorbs
 * more is refused.
 */
import type { FitWave } from '../catalog/choose-fit.ts';
import { K, N } from '../dispersion/evaluator.ts';
import { LOSSY_INCIDENCE } from '../interface/special-angles.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { complex } from '../num/complex.ts';
import {
  type DispersiveLayer,
  type DispersivePath,
  type DispersiveSubstance,
  dispersiveFromWavelength,
} from '../stack/group-delay.ts';
import type { LayeredPath, Substance } from '../stack/layered-path.ts';
import { type MediumSide, mediumSide, type SourceOf } from './medium-side.ts';
import type { Layer, Question } from './question.ts';
import { bothReferences } from './wave.ts';

export interface PathLayer {
  readonly side: MediumSide;
  readonly thickness_m: number;
}

export interface Path {
  readonly from: MediumSide;
  readonly layers: readonly PathLayer[];
  readonly into: MediumSide;
}

export type PathEnds = Pick<Path, 'from' | 'into'>;

/** The first and the last medium of a question at a wave. */
export function readEnds(question: Question, wave: FitWave, sourceOf: SourceOf): PathEnds | Refusal {
  const { conditions, extrapolate } = question;
  const from = mediumSide(question.from, wave, conditions, extrapolate, sourceOf);
  if (isRefusal(from)) return from;
  const into = mediumSide(question.into, wave, conditions, extrapolate, sourceOf);
  return isRefusal(into) ? into : { from, into };
}

/** A path without layers is its ends: any medium may be the first one there. */
export function readPath(
  question: Question,
  wave: FitWave,
  { from, into }: PathEnds,
  sourceOf: SourceOf,
): Path | Refusal {
  if (question.layers.length === 0) return { from, layers: [], into };
  if (from.optics.n.im > LOSSY_INCIDENCE * Math.abs(from.optics.n.re)) {
    return refuse(
      'lossy-incidence',
      3,
      `${from.name} absorbs too much to be the first medium of a path of layers`,
      'start the path in a transparent medium',
    );
  }
  const design = designOf(question, sourceOf);
  if (isRefusal(design)) return design;
  const now: Design = { wave, n0: from.optics.n.re };
  const layers: PathLayer[] = [];
  // Groups that repeat share their layers: each is worked out once.
  const known = new Map<Layer, PathLayer>();
  for (const layer of question.layers) {
    const before = known.get(layer);
    if (before) {
      layers.push(before);
      continue;
    }
    const side = mediumSide(layer.medium, wave, question.conditions, question.extrapolate, sourceOf);
    if (isRefusal(side)) return side;
    const thickness_m = thicknessOf(layer, side, question, design, now, sourceOf);
    if (typeof thickness_m !== 'number') return thickness_m;
    const read = { side, thickness_m };
    known.set(layer, read);
    layers.push(read);
  }
  return { from, layers, into };
}

/** The wave for which parts of a wave are meant, and the index of the first medium there. */
interface Design {
  readonly wave: FitWave;
  readonly n0: number;
}

function designOf(question: Question, sourceOf: SourceOf): Design | Refusal | undefined {
  const { designWave, conditions, extrapolate, layers } = question;
  if (!designWave || layers.every((layer) => layer.thickness.kind === 'length')) return undefined;
  const wave = bothReferences(designWave);
  if (isRefusal(wave)) return wave;
  const before = mediumSide(question.from, wave, conditions, extrapolate, sourceOf);
  return isRefusal(before) ? before : { wave, n0: before.optics.n.re };
}

/** A part of a wave is meant in the layer, along its normal component, at the design wave: waves lambda/(n cos inside). */
function thicknessOf(
  layer: Layer,
  side: MediumSide,
  question: Question,
  design: Design | undefined,
  now: Design,
  sourceOf: SourceOf,
): number | Refusal {
  const { thickness } = layer;
  if (thickness.kind === 'length') return thickness.thickness_m;
  const { wave, n0 } = design ?? now;
  const { conditions, extrapolate } = question;
  const there = design ? mediumSide(layer.medium, wave, conditions, extrapolate, sourceOf) : side;
  if (isRefusal(there)) return there;
  const n = there.optics.n.re;
  const normal2 = n * n - (n0 * Math.sin(question.incidenceAngle_rad)) ** 2;
  if (!(normal2 > 0)) {
    return refuse(
      'no-wave-in-layer',
      2,
      `no wave runs through ${side.name} at this angle, so it has no quarter wave`,
      'give its thickness as a length',
    );
  }
  return (thickness.waves * wave.vacuum_um * 1e-6) / Math.sqrt(normal2);
}

const substance = (side: MediumSide): Substance => ({ eps: side.optics.eps, mu: side.optics.mu });

/** Without the weak absorption of the first medium. */
export function transparentIncidence(side: MediumSide): Substance {
  const { n, mu } = side.optics;
  return { eps: complex((n.re * n.re) / mu.re), mu: complex(mu.re) };
}

export function layeredPath(path: Path): LayeredPath {
  return {
    incidence: transparentIncidence(path.from),
    layers: path.layers.map(({ side, thickness_m }) => ({ ...substance(side), thickness_m })),
    exit: substance(path.into),
  };
}

export function dispersivePath(path: Path, vacuumWavelength_m: number): DispersivePath {
  const dispersive = (side: MediumSide): DispersiveSubstance => ({
    ...dispersiveFromWavelength(
      side.optics.n,
      complex(side.jet[N + 1]! * 1e6, side.jet[K + 1]! * 1e6),
      complex(side.jet[N + 2]! * 1e12, side.jet[K + 2]! * 1e12),
      vacuumWavelength_m,
    ),
    mu: side.optics.mu,
  });
  const incidence = dispersive(path.from);
  const known = new Map<PathLayer, DispersiveLayer>();
  return {
    incidence: {
      ...incidence,
      n: complex(incidence.n.re),
      dn_domega_s: complex(incidence.dn_domega_s.re),
      d2n_domega2_s2: complex(incidence.d2n_domega2_s2.re),
    },
    layers: path.layers.map((layer) => {
      const made = known.get(layer) ?? { ...dispersive(layer.side), thickness_m: layer.thickness_m };
      known.set(layer, made);
      return made;
    }),
    exit: dispersive(path.into),
  };
}
