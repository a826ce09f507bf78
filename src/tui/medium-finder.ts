/**
 * Search by property for a list that follows every key. Media are measured once at a wave and kept for as long as that wave is
 * asked about; `prepare` measures them in small pieces while nothing else is to be done, so that no key waits for all.
 */
import type { WaveSpec } from '../answer/question.ts';
import { bothReferences } from '../answer/wave.ts';
import { axesOf, type FitWave } from '../catalog/choose-fit.ts';
import type { IndexedCatalogue } from '../catalog/entries.ts';
import type { Axis, Material } from '../catalog/types.ts';
import { isRefusal, type Refusal } from '../medium/refusal.ts';
import { Candidate } from '../selection/candidate.ts';
import type { Criteria } from '../selection/criteria.ts';
import { type FindResult, findMaterials } from '../selection/find-materials.ts';
import { makeSurvey, type Survey } from '../selection/survey.ts';

/** Work at most this long before looking after keys again. */
const PIECE_ms = 4;

export class MediumFinder {
  readonly #catalogue: IndexedCatalogue;
  #survey: Survey | undefined;
  /** Vacuum wavelength in um that the candidates are measured at. */
  #at_um: number | undefined;
  #candidates = new Map<Material, Map<Axis, Candidate>>();
  #waiting: string[] = [];
  #timer: NodeJS.Timeout | undefined;

  constructor(catalogue: IndexedCatalogue) {
    this.#catalogue = catalogue;
  }

  survey(): Survey {
    this.#survey ??= makeSurvey(this.#catalogue);
    return this.#survey;
  }

  /** `among`: keys to look at, in the order wanted; all in the order of the catalogue where absent. */
  find(criteria: Criteria, among: readonly string[] | undefined): FindResult | Refusal {
    const survey = this.survey();
    const materials = among?.flatMap((key) => survey.material(key) ?? []) ?? survey.materials;
    return findMaterials({ ...survey, materials }, criteria, (m, axis, wave) =>
      this.#candidate(m, axis, wave),
    );
  }

  prepare(wave: WaveSpec): void {
    const at = bothReferences(wave);
    if (isRefusal(at) || at.vacuum_um === this.#at_um) return;
    this.#moveTo(at);
    this.#waiting = [...this.#catalogue.keys()];
    this.#schedule(at);
  }

  stop(): void {
    clearTimeout(this.#timer);
    this.#timer = undefined;
    this.#waiting = [];
  }

  #schedule(at: FitWave): void {
    this.#timer ??= setTimeout(() => {
      this.#timer = undefined;
      const end = performance.now() + PIECE_ms;
      while (this.#waiting.length > 0 && performance.now() < end) this.#measure(this.#waiting.pop(), at);
      if (this.#waiting.length > 0) this.#schedule(at);
    }, 1);
  }

  #measure(key: string | undefined, at: FitWave): void {
    const material = key === undefined ? undefined : this.#catalogue.material(key);
    if (!material) return;
    // Asking for the medium is what measures it.
    for (const axis of axesOf(material)) void this.#candidate(material, axis, at).medium;
  }

  #moveTo(at: FitWave): void {
    this.stop();
    this.#at_um = at.vacuum_um;
    this.#candidates = new Map();
  }

  #candidate(material: Material, axis: Axis, wave: FitWave | undefined): Candidate {
    if (wave && wave.vacuum_um !== this.#at_um) this.#moveTo(wave);
    if (!wave) return new Candidate(this.survey(), material, axis, undefined);
    let axes = this.#candidates.get(material);
    if (!axes) {
      axes = new Map();
      this.#candidates.set(material, axes);
    }
    let candidate = axes.get(axis);
    if (!candidate) {
      candidate = new Candidate(this.survey(), material, axis, wave);
      axes.set(axis, candidate);
    }
    return candidate;
  }
}
