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
  type CandidatesAt,
  type FindResult,
  findMaterials,
  freshCandidates,
} from '../selection/find-materials.ts';
import { namesOf } from '../selection/material-words.ts';
import { makeSurvey, type Survey } from '../selection/survey.ts';

/** Work at most this long before looking after keys again. */
const PIECE_ms = 4;
/** Waves kept measured: that of the question and the one being typed. */
const MOST_WAVES = 2;

/** The media of a survey at one wave and temperature, each measured when it is first asked about. */
class MeasuredMedia {
  readonly vacuum_um: number;
  readonly temperature_K: number | undefined;
  readonly #measure: (material: Material, place: number) => readonly Candidate[];
  readonly #materials: readonly Material[];
  readonly #lists: (readonly Candidate[] | undefined)[];

  constructor(survey: Survey, wave: FitWave, temperature_K: number | undefined) {
    this.vacuum_um = wave.vacuum_um;
    this.temperature_K = temperature_K;
    this.#materials = survey.materials;
    // Filled from its end: an array that grows so would become a slow one.
    this.#lists = survey.materials.map(() => undefined);
    this.#measure = freshCandidates(survey)(wave, temperature_K);
  }

  at(place: number): readonly Candidate[] {
    const known = this.#lists[place];
    if (known) return known;
    const material = this.#materials[place];
    const list = material ? this.#measure(material, place) : [];
    this.#lists[place] = list;
    return list;
  }
}

export class MediumFinder {
  readonly #catalogue: IndexedCatalogue;
  #survey: Survey | undefined;
  #places: ReadonlyMap<Material, number> | undefined;
  /** The one asked about last first. */
  #measured: readonly MeasuredMedia[] = [];
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
    const candidatesAt: CandidatesAt = (wave, temperature_K) => {
      if (!wave) return freshCandidates(survey)(wave, temperature_K);
      const measured = this.#measuredAt(wave, temperature_K);
      if (!among) return (_, place) => measured.at(place);
      const places = this.#placesIn(survey);
      return (material) => measured.at(places.get(material) ?? -1);
    };
    return findMaterials({ ...survey, materials: among ?? survey.materials }, criteria, candidatesAt);
  }

  prepare(wave: WaveSpec, temperature_K: number | undefined): void {
    const at = bothReferences(wave);
    if (isRefusal(at) || this.#known(at, temperature_K)) return;
    this.stop();
    const survey = this.survey();
    this.#schedule(survey, this.#measuredAt(at, temperature_K), survey.materials.length);
  }

  stop(): void {
    clearTimeout(this.#timer);
    this.#timer = undefined;
  }

  /** Measures the media before the place `end`, the last ones first. */
  #schedule(survey: Survey, measured: MeasuredMedia, end: number): void {
    this.#timer = setTimeout(() => {
      this.#timer = undefined;
      const until = performance.now() + PIECE_ms;
      let place = end;
      while (place > 0 && performance.now() < until) {
        place--;
        const material = survey.materials[place];
        if (material) namesOf(material);
        // Asking for the medium is what measures it.
        for (const candidate of measured.at(place)) void candidate.medium;
      }
      if (place > 0) this.#schedule(survey, measured, place);
    }, 1);
  }

  #known(wave: FitWave, temperature_K: number | undefined): MeasuredMedia | undefined {
    return this.#measured.find((m) => m.vacuum_um === wave.vacuum_um && m.temperature_K === temperature_K);
  }

  #measuredAt(wave: FitWave, temperature_K: number | undefined): MeasuredMedia {
    const measured =
      this.#known(wave, temperature_K) ?? new MeasuredMedia(this.survey(), wave, temperature_K);
    this.#measured = [measured, ...this.#measured.filter((m) => m !== measured)].slice(0, MOST_WAVES);
    return measured;
  }

  #placesIn({ materials }: Survey): ReadonlyMap<Material, number> {
    this.#places ??= new Map(materials.map((material, place) => [material, place]));
    return this.#places;
  }
}
