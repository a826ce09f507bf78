/** What `coat` answers: single films, two-layer coatings and high reflectors for one pair of media. */
import type { LowReflectanceBand } from '../stack/coating.ts';
import type { Answer, Caution, MediumAnswer } from './answer.ts';

export interface SkippedFilm {
  readonly key: string;
  readonly name: string;
  /** Why it is not among the designs. */
  readonly reason: string;
}

export interface FilmAnswer {
  readonly key: string;
  readonly name: string;
  readonly n: number;
  readonly k: number;
  /** By how much n varies with the process (else the accuracy of the fit); null where neither is stated. */
  readonly spread: number | null;
  readonly process: string | null;
}

export interface IdealFilm {
  /** For the polarization asked; null where no index removes the reflection. */
  readonly n: number | null;
  readonly n_s: number | null;
  readonly n_p: number | null;
  readonly thickness_m: number | null;
  /** What remains with it: 0 but for unpolarized light off the normal. */
  readonly R: number | null;
}

export interface SingleFilmCoating {
  readonly film: FilmAnswer;
  /** Quarter wave at the angle. */
  readonly thickness_m: number;
  readonly R: number;
  readonly Rs: number;
  readonly Rp: number;
  /** Over the spread of the film's index, thickness kept. */
  readonly R_low: number | null;
  readonly R_high: number | null;
  /** Where R stays at or below the limit; null where it does not at the wave itself. */
  readonly band: LowReflectanceBand | null;
}

export interface TwoLayerSolution {
  readonly outerThickness_m: number;
  readonly innerThickness_m: number;
  readonly R: number;
  readonly R_low: number | null;
  readonly R_high: number | null;
  readonly band: LowReflectanceBand | null;
}

export interface TwoLayerDesign {
  /** Next to the medium of incidence. */
  readonly outer: FilmAnswer;
  /** On the substrate. */
  readonly inner: FilmAnswer;
  /** Broadest first. */
  readonly solutions: readonly TwoLayerSolution[];
}

export interface MirrorRow {
  readonly pairs: number;
  readonly layers: number;
  readonly R: number;
  readonly R_low: number | null;
  readonly R_high: number | null;
}

export interface MirrorDesign {
  readonly high: FilmAnswer;
  readonly low: FilmAnswer;
  readonly highThickness_m: number;
  readonly lowThickness_m: number;
  /** A last high layer on the substrate: (HL)^N H. */
  readonly extraHigh: boolean;
  readonly rows: readonly MirrorRow[];
  readonly wanted: number;
  /** Null where no number of pairs reaches it, as where the films absorb. */
  readonly pairsNeeded: MirrorRow | null;
  /** Of the quarter-wave pairs, for the polarization asked; both in order s, p. Null where p has lost its contrast. */
  readonly stopBand: {
    readonly relativeWidth: number;
    readonly from_m: number;
    readonly to_m: number;
  } | null;
}

export interface CoatingReport {
  readonly wave: Answer['wave'];
  readonly geometry: Answer['geometry'];
  readonly from: MediumAnswer;
  readonly into: MediumAnswer;
  readonly bare: { readonly R: number; readonly Rs: number; readonly Rp: number };
  readonly limit: number;
  readonly ideal: IdealFilm | null;
  /** Least R first. */
  readonly singleFilms: readonly SingleFilmCoating[];
  /** Broadest first. */
  readonly twoLayers: readonly TwoLayerDesign[];
  readonly mirror: MirrorDesign | null;
  readonly skipped: readonly SkippedFilm[];
  readonly cautions: readonly Caution[];
}
