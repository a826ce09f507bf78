/** Layers for people: groups that repeat are told once, with how often, so that a mirror of forty layers is two lines. */
import type { LayerAnswer } from '../answer/answer.ts';

export interface LayerRun {
  /** Number of the first layer, from 1. */
  readonly first: number;
  /** One round of the group. */
  readonly layers: readonly LayerAnswer[];
  readonly times: number;
  /** Share of the incident power that all rounds absorb. */
  readonly absorptance: number;
}

/** Groups of more layers are not looked for. */
const LONGEST_GROUP = 12;
const FEWEST_TIMES = 3;

export function layerRuns(layers: readonly LayerAnswer[]): readonly LayerRun[] {
  return repeatedRuns(layers.map(identity)).map(({ start, period, times }) => {
    const all = layers.slice(start, start + period * times);
    const absorptance = all.reduce((sum, l) => sum + l.absorptance, 0);
    return { first: start + 1, layers: all.slice(0, period), times, absorptance };
  });
}

export interface RepeatedRun {
  /** Counted from 0. */
  readonly start: number;
  readonly period: number;
  readonly times: number;
}

/** The same for anything that is known by a text. */
export function repeatedRuns(ids: readonly string[]): readonly RepeatedRun[] {
  const runs: RepeatedRun[] = [];
  for (let start = 0; start < ids.length; ) {
    const { period, times } = longestRepeat(ids, start);
    runs.push({ start, period, times });
    start += period * times;
  }
  return runs;
}

/** What repeats the most layers from here on; one layer once where nothing does. */
function longestRepeat(
  ids: readonly string[],
  from: number,
): { readonly period: number; readonly times: number } {
  let best = { period: 1, times: 1 };
  for (let period = 1; period <= LONGEST_GROUP; period++) {
    let times = 1;
    while (repeats(ids, from, from + period * times, period)) times++;
    if (times >= FEWEST_TIMES && period * times > best.period * best.times) best = { period, times };
  }
  return best;
}

function repeats(ids: readonly string[], a: number, b: number, count: number): boolean {
  for (let j = 0; j < count; j++) {
    if (ids[b + j] === undefined || ids[a + j] !== ids[b + j]) return false;
  }
  return true;
}

function identity({ medium, thickness_m, coherent }: LayerAnswer): string {
  return [medium.key, medium.name, medium.axis, thickness_m, coherent].join('|');
}
