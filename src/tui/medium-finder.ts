/**
 * Search by property for a list that follows every key. Media are measured once at a wave and kept for as long as that wave is
 * asked about; `prepare` measures them in small pieces while nothing else is to be done, so that no key waits for all.
 */
import type { WaveSpec } from '../answer/question.ts';
import { bothReferences } from '../answer/wave.ts';
import type { FitWave } from '../catalog/choose-fit.ts';
import type { IndexedCatalogue } from '../catalog/entries.ts';
import type { Material } from '../catalog/types.ts';
import { isRefusal, type Refusal } from '../medium/refusal.ts';
import type { Candidate } from '../selection/candidate.ts';
import type { Criteria } from '../selection/criteria.ts';
import {
  type CandidatesOf,
  type FindResult,
  findMaterials,
  freshCandidates,
} from '../selection/find-materials.ts';
import { namesOf } from '../selection/material-words.ts';
import { makeSurvey, type Survey } from '../selection/survey.ts';

/** Work at most this long before looking after keys again. */
const PIECE_ms = 4;

export class MediumFinder {
  readonly #catalogue: IndexedCatalogue;
  #survey: Survey | undefined;
  #candidatesOf: CandidatesOf | undefined;
  /** Vacuum wavelength and temperature that the candidates are measured at. */
  #at_um: number | undefined;
  #temperature_K: number | undefined;
  #candidates = new Map<Material, readonly Candidate[]>();
  #waiting: string[] = [];
  #timer: NodeJS.Timeout | undefined;

  constructor(catalogue: IndexedCatalogue) {
    this.#catalogue = catalogue;
  }

  survey(): Survey {
    this.#survey ??= makeSurvey(this.#catalogue);
    return this.#survey;
  }

  /** `among`: media to look at, in the order wanted; all in the order of the catalogue where absent. */
  find(criteria: Criteria, among: readonly Material[] | undefined): FindResult | Refusal {
    const survey = this.survey();
    return findMaterials(
      { ...survey, materials: among ?? survey.materials },
      criteria,
      (material, wave, T) => (wave ? this.#measured(material, wave, T) : this.#fresh()(material, wave, T)),
    );
  }

  prepare(wave: WaveSpec, temperature_K: number | undefined): void {
    const at = bothReferences(wave);
    if (isRefusal(at) || this.#isAt(at, temperature_K)) return;
    this.#moveTo(at, temperature_K);
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
    namesOf(material);
    // Asking for the medium is what measures it.
    for (const candidate of this.#measured(material, at, this.#temperature_K)) void candidate.medium;
  }

  #isAt(at: FitWave, temperature_K: number | undefined): boolean {
    return at.vacuum_um === this.#at_um && temperature_K === this.#temperature_K;
  }

  #moveTo(at: FitWave, temperature_K: number | undefined): void {
    this.stop();
    this.#at_um = at.vacuum_um;
    this.#temperature_K = temperature_K;
    this.#candidates = new Map();
  }

  #fresh(): CandidatesOf {
    this.#candidatesOf ??= freshCandidates(this.survey());
    return this.#candidatesOf;
  }

  #measured(material: Material, wave: FitWave, temperature_K: number | undefined): readonly Candidate[] {
    if (!this.#isAt(wave, temperature_K)) this.#moveTo(wave, temperature_K);
    let candidates = this.#candidates.get(material);
    if (!candidates) {
      candidates = this.#fresh()(material, wave, temperature_K);
      this.#candidates.set(material, candidates);
    }
    return candidates;
  }
}
