/**
 * |E|^2 along the normal, over that of the incident wave: in front of the path, through its layers, behind it. Only where
 * everything is summed as amplitudes is there one such curve; else the refusal says what to change.
 */

import { LOSSY_INCIDENCE } from '../interface/special-angles.ts';
import { lengthText } from '../medium/range-text.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { fieldAt, frontField, type StackField, solveField } from '../stack/field-profile.ts';
import { StackRefusal } from '../stack/stack-refusal.ts';
import type { Answer } from './answer.ts';
import type { SourceOf } from './medium-side.ts';
import { layeredPath, type Path, readEnds, readPath } from './path.ts';
import type { Question } from './question.ts';
import { bothReferences } from './wave.ts';

export interface FieldCurve {
  readonly kind: 'field';
  /** Behind the first face; negative in front of it. Ascending; a face stands there twice, once from either side. */
  readonly position_m: readonly number[];
  /** 0 in front, then the layers, one more behind the last. */
  readonly layer: readonly number[];
  /** Null for a polarization that was not asked for. */
  readonly s: readonly number[] | null;
  readonly p: readonly number[] | null;
  /** Where a medium begins. */
  readonly faces: readonly { readonly position_m: number; readonly name: string }[];
}

interface Region {
  readonly region: number;
  readonly from_m: number;
  readonly to_m: number;
  readonly points: number;
}

const POINTS_PER_WAVE = 32;
const LEAST_POINTS = 9;
const MOST_POINTS = 12_000;
/** In front: so many fringes of the standing wave. */
const FRINGES_BEFORE = 2;
/** Behind: to a share of exp(-5) of what enters, within these many fringes of the front. */
const DECAYS = 5;
const FEWEST_FRINGES_BEHIND = 0.5;
const MOST_FRINGES_BEHIND = 3;

export function fieldCurve(question: Question, answer: Answer, sourceOf: SourceOf): FieldCurve | Refusal {
  const path = pathOf(question, sourceOf);
  if (isRefusal(path)) return path;
  const lossy = path.from.optics.n.im > LOSSY_INCIDENCE * Math.abs(path.from.optics.n.re);
  if (lossy) {
    return refuse(
      'lossy-incidence',
      3,
      `${path.from.name} absorbs too much for incident and reflected wave to be told apart`,
      'start the path in a transparent medium',
    );
  }
  const { stack } = answer;
  if (stack && stack.coherence !== 'coherent') return notCoherent(answer);
  const { polarization, incidenceAngle_rad } = question;
  const { vacuumWavelength_m } = answer.wave;
  const layered = layeredPath(path);
  const solve = (p: 's' | 'p'): StackField => solveField(layered, vacuumWavelength_m, incidenceAngle_rad, p);
  try {
    const s = polarization === 'p' ? null : solve('s');
    const p = polarization === 's' ? null : solve('p');
    return sampled(path, s, p, vacuumWavelength_m, incidenceAngle_rad);
  } catch (error) {
    if (error instanceof StackRefusal) return refuse(error.code, 3, error.message, error.remedy);
    throw error;
  }
}

function pathOf(question: Question, sourceOf: SourceOf): Path | Refusal {
  const wave = bothReferences(question.wave);
  if (isRefusal(wave)) return wave;
  const ends = readEnds(question, wave, sourceOf);
  return isRefusal(ends) ? ends : readPath(question, wave, ends, sourceOf);
}

function notCoherent({ layers, stack }: Answer): Refusal {
  const longest_m = Math.max(...layers.map((l) => Math.abs(l.roundTripOpticalPath_m)));
  const taken = lengthText((stack?.coherenceLength_m ?? 0) * 1e6, 3);
  return refuse(
    'field-not-coherent',
    3,
    `layers of this path are summed as intensities (coherence length ${taken}): no one field stands in them`,
    `state --coherence ${lengthText(2.2 * longest_m * 1e6, 2).replace(' ', '')} or a --linewidth if the light is that coherent`,
  );
}

function sampled(
  path: Path,
  s: StackField | null,
  p: StackField | null,
  vacuumWavelength_m: number,
  angle_rad: number,
): FieldCurve {
  const field = (s ?? p) as StackField;
  const { period_m } = frontField(field);
  const regions = regionsOf(path, period_m, vacuumWavelength_m, angle_rad);
  const position_m: number[] = [];
  const layer: number[] = [];
  const [ofS, ofP]: [number[], number[]] = [[], []];
  let face_m = 0;
  for (const { region, from_m, to_m, points } of regions) {
    for (let i = 0; i < points; i++) {
      const depth_m = from_m + ((to_m - from_m) * i) / (points - 1);
      position_m.push(region < 0 ? -depth_m : face_m + depth_m);
      layer.push(region + 1);
      if (s) ofS.push(fieldAt(s, region, depth_m).intensity);
      if (p) ofP.push(fieldAt(p, region, depth_m).intensity);
    }
    if (region >= 0) face_m += to_m;
  }
  return { kind: 'field', position_m, layer, s: s ? ofS : null, p: p ? ofP : null, faces: facesOf(path) };
}

function regionsOf(
  path: Path,
  period_m: number,
  vacuumWavelength_m: number,
  angle_rad: number,
): readonly Region[] {
  const front_m = FRINGES_BEFORE * period_m;
  const ends: readonly [number, number, number, number][] = [
    [-1, front_m, 0, path.from.optics.n.re],
    ...path.layers.map(({ side, thickness_m }, i): [number, number, number, number] => [
      i,
      0,
      thickness_m,
      side.optics.n.re,
    ]),
    [path.layers.length, 0, behind(path, period_m, vacuumWavelength_m, angle_rad), path.into.optics.n.re],
  ];
  const wanted = ends.map(([, from_m, to_m, n]) =>
    Math.max(
      LEAST_POINTS,
      Math.ceil((POINTS_PER_WAVE * 2 * n * Math.abs(to_m - from_m)) / vacuumWavelength_m),
    ),
  );
  const all = wanted.reduce((sum, x) => sum + x, 0);
  const share = Math.min(1, MOST_POINTS / all);
  return ends.map(([region, from_m, to_m], i) => ({
    region,
    from_m,
    to_m,
    points: Math.max(LEAST_POINTS, Math.floor((wanted[i] ?? 0) * share)),
  }));
}

/** How far the picture goes behind the last face: as far as the field reaches, where it dies away. */
function behind(path: Path, period_m: number, vacuumWavelength_m: number, angle_rad: number): number {
  const { re, im } = path.into.optics.n;
  const q = path.from.optics.n.re * Math.sin(angle_rad);
  // kappa^2 = n^2 - q^2; the power falls as exp(-2 k0 Im kappa z).
  const real = re * re - im * im - q * q;
  const size = Math.hypot(real, 2 * re * im);
  const decay_per_m = ((4 * Math.PI) / vacuumWavelength_m) * Math.sqrt(Math.max(0, (size - real) / 2));
  const most = MOST_FRINGES_BEHIND * period_m;
  const reaches = decay_per_m > 0 ? DECAYS / decay_per_m : Number.POSITIVE_INFINITY;
  return Math.max(FEWEST_FRINGES_BEHIND * period_m, Math.min(most, reaches));
}

function facesOf({ layers, into }: Path): FieldCurve['faces'] {
  let at_m = 0;
  const faces = layers.map(({ side, thickness_m }) => {
    const face = { position_m: at_m, name: side.name };
    at_m += thickness_m;
    return face;
  });
  return [...faces, { position_m: at_m, name: into.name }];
}
