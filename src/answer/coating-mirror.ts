/**
 * High reflectors of quarter-wave pairs, the high index outermost: (HL)^N, with one more high layer on the substrate where that
 * adds to R (a dielectric), without it on a metal. R of every row is that of the very stack, absorption and angle included;
 * the number of pairs for a wanted R starts from the closed form of stack/quarter-wave-mirror.ts and ends with the very stack.
 */
import { abs2 } from '../num/complex.ts';
import { tiltedAdmittance } from '../stack/oblique-film.ts';
import { pairsForReflectance, stopBand } from '../stack/quarter-wave-mirror.ts';
import { StackRefusal } from '../stack/stack-refusal.ts';
import {
  type CoatedLayer,
  type CoatScene,
  type Film,
  rangeOverSpread,
  reflectance,
} from './coating-scene.ts';
import type { MirrorDesign, MirrorRow } from './coating-shape.ts';
import { filmAnswer, quarterWave_m } from './coating-single.ts';
import type { InSteps } from './in-steps.ts';

/** More pairs are no mirror anybody makes. */
const MOST_PAIRS = 200;
/** Rows shown up to the number of pairs asked. */
const MOST_ROWS = 24;

export interface MirrorAsked {
  readonly high: Film;
  readonly low: Film;
  readonly wanted: number;
  /** Null: as many as the wanted R needs. */
  readonly pairs: number | null;
}

export function* mirrorDesign(scene: CoatScene, asked: MirrorAsked): InSteps<MirrorDesign> {
  const { high, low, wanted } = asked;
  const nH = high.side.optics.n.re;
  const H: CoatedLayer = { film: high, thickness_m: quarterWave_m(scene, nH) };
  const L: CoatedLayer = { film: low, thickness_m: quarterWave_m(scene, low.side.optics.n.re) };
  const extraHigh = nH * nH > abs2(scene.into.optics.n);
  const layers = (pairs: number): readonly CoatedLayer[] => [
    ...Array.from({ length: pairs }, () => [H, L]).flat(),
    ...(extraHigh ? [H] : []),
  ];
  const row = (pairs: number): MirrorRow => {
    const stack = layers(pairs);
    return { pairs, layers: stack.length, R: reflectance(scene, stack), ...rangeOverSpread(scene, stack) };
  };
  const needed = pairsNeeded(scene, high, low, wanted, extraHigh, (pairs) =>
    reflectance(scene, layers(pairs)),
  );
  yield;
  const rows: MirrorRow[] = [];
  for (const pairs of rowNumbers(asked.pairs ?? needed ?? 10)) {
    rows.push(row(pairs));
    yield;
  }
  return {
    high: filmAnswer(high),
    low: filmAnswer(low),
    highThickness_m: H.thickness_m,
    lowThickness_m: L.thickness_m,
    extraHigh,
    rows,
    wanted,
    pairsNeeded: needed === null ? null : row(needed),
    stopBand: band(scene, high, low),
  };
}

/** 1 to the last; evenly thinned out where they are many, the last one kept. */
function rowNumbers(last: number): readonly number[] {
  const every = Math.max(1, Math.ceil(last / MOST_ROWS));
  const numbers = Array.from({ length: Math.floor(last / every) }, (_, i) => (i + 1) * every);
  return numbers.at(-1) === last ? numbers : [...numbers, last];
}

/** Null where absorption keeps R below the wanted one. */
function pairsNeeded(
  scene: CoatScene,
  high: Film,
  low: Film,
  wanted: number,
  extraLayer: boolean,
  R: (pairs: number) => number,
): number | null {
  let pairs = 1;
  try {
    const closed = pairsForReflectance(
      {
        outsideIndex: scene.from.optics.n.re,
        high: high.side.optics.n.re,
        low: low.side.optics.n.re,
        substrate: scene.into.optics.n,
        outermost: 'high',
        extraLayer,
      },
      wanted,
    );
    pairs = Math.max(1, closed.pairs - 2);
  } catch (error) {
    if (!(error instanceof StackRefusal)) throw error;
  }
  while (pairs > 1 && R(pairs - 1) >= wanted) pairs--;
  while (pairs <= MOST_PAIRS && R(pairs) < wanted) pairs++;
  return pairs <= MOST_PAIRS ? pairs : null;
}

/** Of s, p or the narrower of the two for unpolarized light. */
function band(scene: CoatScene, high: Film, low: Film): MirrorDesign['stopBand'] {
  const q = scene.tangentialIndex;
  const one = (polarization: 's' | 'p'): MirrorDesign['stopBand'] => {
    const [yH, yL] = [high, low].map((f) => tiltedAdmittance(f.side.optics.n.re, q, polarization)) as [
      number,
      number,
    ];
    return yH > yL ? stopBand(yH, yL, scene.vacuumWavelength_m) : null;
  };
  if (scene.polarization !== 'unpolarized') return one(scene.polarization);
  const [s, p] = [one('s'), one('p')];
  return s && p && p.relativeWidth < s.relativeWidth ? p : p && s;
}
