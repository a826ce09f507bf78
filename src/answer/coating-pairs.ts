/**
 * Coatings of two layers whose thicknesses remove the reflection (V-coats), from pairs of films: both solutions of each pair,
 * ranked by the mean of R a little off the design wave, which tells the broad ones.
 *
 * One polarization off the normal goes by admittances (stack/oblique-film.ts). Unpolarized light off the normal has no zero:
 * the thicknesses start between those for s and p and go downhill in the mean of R.
 */

import { twoLayerCoating } from '../stack/coating.ts';
import type { Polarization as OnePolarization } from '../stack/layered-path.ts';
import { normalIndex, tiltedAdmittance } from '../stack/oblique-film.ts';
import { StackRefusal } from '../stack/stack-refusal.ts';
import {
  bandBelow,
  type CoatedLayer,
  type CoatScene,
  type Film,
  rangeOverSpread,
  reflectance,
} from './coating-scene.ts';
import type { TwoLayerDesign, TwoLayerSolution } from './coating-shape.ts';
import { CLEAR_SUBSTRATE, filmAnswer } from './coating-single.ts';
import type { InSteps } from './in-steps.ts';

/** How far off the wave a design is looked at, over the wave. */
const OFF_WAVE = 0.03;
const MOST_DESIGNS = 12;
/** Thicker or thinner layers are no coating anybody makes: over the wave. */
const THINNEST = 1 / 400;

interface Candidate {
  readonly outer: Film;
  readonly inner: Film;
  readonly thicknesses: readonly (readonly [number, number])[];
  readonly merit: number;
}

export function* twoLayerDesigns(
  scene: CoatScene,
  films: readonly Film[],
  limit: number,
): InSteps<readonly TwoLayerDesign[]> {
  const { n } = scene.into.optics;
  if (n.im > CLEAR_SUBSTRATE * n.re || !(normalIndex(n.re, scene.tangentialIndex) > 0)) return [];
  const candidates: Candidate[] = [];
  for (const outer of films) {
    candidates.push(...films.flatMap((inner) => candidateOf(scene, outer, inner) ?? []));
    yield;
  }
  const designs: TwoLayerDesign[] = [];
  for (const candidate of candidates.sort((a, b) => a.merit - b.merit).slice(0, MOST_DESIGNS)) {
    designs.push(yield* design(scene, candidate, limit));
  }
  return designs;
}

function candidateOf(scene: CoatScene, outer: Film, inner: Film): Candidate | undefined {
  if (outer === inner) return undefined;
  const thicknesses = solutionsOf(scene, outer, inner).filter((t) =>
    t.every((d) => d > THINNEST * scene.vacuumWavelength_m),
  );
  if (thicknesses.length === 0) return undefined;
  const merits = thicknesses.map((t) => offWave(scene, layersOf(outer, inner, t)));
  return { outer, inner, thicknesses, merit: Math.min(...merits) };
}

const layersOf = (outer: Film, inner: Film, [a, b]: readonly [number, number]): readonly CoatedLayer[] => [
  { film: outer, thickness_m: a },
  { film: inner, thickness_m: b },
];

/** R on both sides of the wave, with the one side that has data where the other has none. */
function offWave(scene: CoatScene, layers: readonly CoatedLayer[]): number {
  const sides = [1 - OFF_WAVE, 1 + OFF_WAVE]
    .map((x) => reflectance(scene, layers, scene.vacuumWavelength_m * x))
    .filter((R) => !Number.isNaN(R));
  return sides.length === 0 ? Number.POSITIVE_INFINITY : sides.reduce((a, b) => a + b) / sides.length;
}

function* design(
  scene: CoatScene,
  { outer, inner, thicknesses }: Candidate,
  limit: number,
): InSteps<TwoLayerDesign> {
  const oblique = scene.tangentialIndex > 0 && scene.polarization === 'unpolarized';
  const solutions: TwoLayerSolution[] = [];
  for (const start of thicknesses) {
    const [outerThickness_m, innerThickness_m] = oblique ? downhill(scene, outer, inner, start) : start;
    const layers = layersOf(outer, inner, [outerThickness_m, innerThickness_m]);
    solutions.push({
      outerThickness_m,
      innerThickness_m,
      R: reflectance(scene, layers),
      ...rangeOverSpread(scene, layers),
      band: bandBelow(scene, layers, limit),
    });
    yield;
  }
  const width = ({ band }: TwoLayerSolution): number => (band ? band.to_m - band.from_m : -1);
  return {
    outer: filmAnswer(outer),
    inner: filmAnswer(inner),
    solutions: solutions.sort((a, b) => width(b) - width(a)),
  };
}

/** Thicknesses of both solutions; empty where the pair has none. */
function solutionsOf(scene: CoatScene, outer: Film, inner: Film): readonly (readonly [number, number])[] {
  if (scene.polarization !== 'unpolarized') return zeroOf(scene, outer, inner, scene.polarization);
  const s = zeroOf(scene, outer, inner, 's');
  if (scene.tangentialIndex === 0) return s;
  const p = zeroOf(scene, outer, inner, 'p');
  if (s.length === 0 || p.length === 0) return s.length > 0 ? s : p;
  return s.map(([a, b], i) => {
    const [c, d] = p[i] ?? [a, b];
    return [(a + c) / 2, (b + d) / 2] as const;
  });
}

function zeroOf(
  scene: CoatScene,
  outer: Film,
  inner: Film,
  polarization: OnePolarization,
): readonly (readonly [number, number])[] {
  const q = scene.tangentialIndex;
  const y = (n: number): number => tiltedAdmittance(n, q, polarization);
  const [n1, n2] = [outer.side.optics.n.re, inner.side.optics.n.re];
  const lambda_m = scene.vacuumWavelength_m;
  try {
    const found = twoLayerCoating(
      y(scene.from.optics.n.re),
      y(n1),
      y(n2),
      y(scene.into.optics.n.re),
      lambda_m,
    );
    return found.map(
      ({ outerWaves, innerWaves }) =>
        [(outerWaves * lambda_m) / normalIndex(n1, q), (innerWaves * lambda_m) / normalIndex(n2, q)] as const,
    );
  } catch (error) {
    if (error instanceof StackRefusal) return [];
    throw error;
  }
}

/** Steps of both thicknesses that lower R, halved where none does. */
function downhill(
  scene: CoatScene,
  outer: Film,
  inner: Film,
  start: readonly [number, number],
): readonly [number, number] {
  let best = start;
  let least = reflectance(scene, layersOf(outer, inner, best));
  let step_m = scene.vacuumWavelength_m / 50;
  while (step_m > scene.vacuumWavelength_m * 1e-6) {
    const tries = [
      [step_m, 0],
      [-step_m, 0],
      [0, step_m],
      [0, -step_m],
    ].map(([a = 0, b = 0]) => [Math.max(0, best[0] + a), Math.max(0, best[1] + b)] as const);
    const next = tries.find((t) => reflectance(scene, layersOf(outer, inner, t)) < least);
    if (next) {
      best = next;
      least = reflectance(scene, layersOf(outer, inner, best));
    } else step_m /= 2;
  }
  return best;
}
