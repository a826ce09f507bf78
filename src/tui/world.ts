/**
 * What the full-screen program needs of the rest of the program, as plain functions: the same question gives the same
 * result. The reducer and the views get it handed in, so they are pure and run in tests without files.
 */
import type { Answer } from '../answer/answer.ts';
import type { CoatingReport } from '../answer/coating-shape.ts';
import type { Layer, MediumSpec, Question } from '../answer/question.ts';
import type { Lookup } from '../catalog/catalogue.ts';
import type { CatalogueEntry } from '../catalog/entries.ts';
import type { Material, Source } from '../catalog/types.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
import type { Optics } from '../interface/optics.ts';
import type { Refusal } from '../medium/refusal.ts';
import type { Chart } from '../plot/chart.ts';
import type { LogRecord } from '../record/record.ts';
import type { Criteria } from '../selection/criteria.ts';
import type { FindResult } from '../selection/find-materials.ts';
import type { Survey } from '../selection/survey.ts';
import type { Problem } from '../units/problem.ts';
import type { CurveKind } from './charts.ts';
import type { Bindings } from './keys/bindings.ts';

export interface World {
  answer(question: Question): Answer | Refusal;
  /** Best match first; everything for an empty text. */
  search(text: string): readonly CatalogueEntry[];
  /** The media that meet criteria, among those given or all; measured once at each wave. */
  find(criteria: Criteria, among: readonly Material[] | undefined): FindResult | Refusal;
  /** Coatings for the two media of a question; undefined while they are being designed. */
  coatings(question: Question): CoatingReport | Refusal | undefined;
  /** The whole catalogue, for what compares media. */
  survey(): Survey;
  lookup(name: string): Lookup;
  material(key: string): Material | undefined;
  source(id: string): Source | undefined;
  /** A curve of the answer; each is worked out once. */
  chart(kind: CurveKind, question: Question, answer: Answer): Chart | Refusal;
  /** The answer as the logbook would keep it at this moment. */
  record(question: Question, answer: Answer): LogRecord;
  /** Layers as typed, in the words of the command line. */
  readLayers(text: string): readonly Layer[] | Problem;
  /** Optical constants at equal ratios over a range; undefined while they are being worked out. */
  opticsOver(
    medium: MediumSpec,
    conditions: Conditions,
    range_m: readonly [number, number],
  ): readonly (Optics | null)[] | undefined;
  readonly bindings: Bindings;
}
