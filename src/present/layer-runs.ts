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
  const ids = layers.map(identity);
  const runs: LayerRun[] = [];
  let i = 0;
  while (i < layers.length) {
    const { period, times } = longestRepeat(ids, i);
    const all = layers.slice(i, i + period * times);
    runs.push({
      first: i + 1,
      layers: all.slice(0, period),
      times,
      absorptance: all.reduce((sum, l) => sum + l.absorptance, 0),
    });
    i += all.length;
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
