/**
 * Tables of the optical constants of media over a range of wavelengths, made in small pieces while nothing else is to be done,
 * so that no key ever waits for one. A table that is not ready is begun by asking for it.
 */
import type { MediumSpec } from '../answer/question.ts';
import { bothReferences } from '../answer/wave.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
import type { Optics } from '../interface/optics.ts';
import { literalOptics } from '../medium/literal.ts';
import { mediumAtWave } from '../medium/optics-at.ts';
import { isRefusal } from '../medium/refusal.ts';
import { TABLE_POINTS, wavelengthAt } from './wave-curve.ts';

type Range_m = readonly [number, number];
export type IndexTable = readonly (Optics | null)[];

const MOST_TABLES = 24;
/** Work at most this long before looking after keys again. */
const PIECE_ms = 4;
/** Nothing is begun while keys come thick and fast. */
const WAIT_ms = 60;

export class IndexTables {
  readonly #done = new Map<string, IndexTable>();
  readonly #waiting = new Map<string, () => Optics | null>();
  readonly #onReady: () => void;
  readonly #growing = new Map<string, (Optics | null)[]>();
  #timer: NodeJS.Timeout | undefined;

  constructor(onReady: () => void) {
    this.#onReady = onReady;
  }

  /** The table, or undefined while it is being made. */
  get(medium: MediumSpec, conditions: Conditions, range_m: Range_m): IndexTable | undefined {
    const id = tableId(medium, conditions, range_m);
    const table = this.#done.get(id);
    if (table) return table;
    if (!this.#waiting.has(id)) {
      const points: (Optics | null)[] = [];
      this.#growing.set(id, points);
      this.#waiting.set(id, () => opticsAtPoint(medium, conditions, range_m, points.length));
      this.#schedule(WAIT_ms);
    }
    return undefined;
  }

  /** Forgets what is not done yet. */
  stop(): void {
    clearTimeout(this.#timer);
    this.#timer = undefined;
    this.#waiting.clear();
    this.#growing.clear();
  }

  #schedule(delay_ms: number): void {
    this.#timer ??= setTimeout(() => {
      this.#timer = undefined;
      this.#work();
    }, delay_ms);
  }

  #work(): void {
    const end = performance.now() + PIECE_ms;
    let hasFinished = false;
    for (const [id, next] of this.#waiting) {
      const points = this.#growing.get(id) ?? [];
      while (points.length < TABLE_POINTS && performance.now() < end) points.push(next());
      if (points.length < TABLE_POINTS) break;
      this.#finish(id, points);
      hasFinished = true;
    }
    if (this.#waiting.size > 0) this.#schedule(1);
    else if (hasFinished) this.#onReady();
  }

  #finish(id: string, points: IndexTable): void {
    this.#waiting.delete(id);
    this.#growing.delete(id);
    this.#done.set(id, points);
    const [oldest] = this.#done.keys();
    if (this.#done.size > MOST_TABLES && oldest !== undefined) this.#done.delete(oldest);
  }
}

function tableId(medium: MediumSpec, conditions: Conditions, range_m: Range_m): string {
  const what = medium.kind === 'literal' ? `=${medium.text}` : `${medium.material.key}:${medium.axis ?? ''}`;
  return JSON.stringify([what, conditions, range_m]);
}

/** All points at once. */
export function indexTable(medium: MediumSpec, conditions: Conditions, range_m: Range_m): IndexTable {
  return Array.from({ length: TABLE_POINTS }, (_, i) => opticsAtPoint(medium, conditions, range_m, i));
}

function opticsAtPoint(
  medium: MediumSpec,
  conditions: Conditions,
  range_m: Range_m,
  point: number,
): Optics | null {
  const wavelength_m = wavelengthAt(range_m, point / (TABLE_POINTS - 1));
  if (medium.kind === 'literal') return literalOptics(medium.literal, wavelength_m);
  const wave = bothReferences({ wavelength_m, inAir: false, text: '' });
  if (isRefusal(wave)) return null;
  const at = mediumAtWave(medium.material, medium.axis, wave, conditions, false);
  return isRefusal(at) ? null : at.optics;
}
