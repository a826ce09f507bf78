/**
 * Coatings for a question, designed in small pieces after the page that asks for them has been drawn, so that no key ever waits
 * for them. Each question is worked out once; the last one asked goes first.
 */
import { coatAsked, FILM_CLASS } from '../answer/coating-defaults.ts';
import { coatingReportInSteps } from '../answer/coating-report.ts';
import type { CoatingReport } from '../answer/coating-shape.ts';
import { type InSteps, runToEnd } from '../answer/in-steps.ts';
import type { Question } from '../answer/question.ts';
import type { IndexedCatalogue } from '../catalog/entries.ts';
import type { Material } from '../catalog/types.ts';
import { type Refusal, refuse } from '../medium/refusal.ts';

type Designed = CoatingReport | Refusal;

/** Time for the page to be drawn. */
const WAIT_ms = 5;
/** Work at most this long before looking after keys again. */
const PIECE_ms = 4;

export class CoatingDesigns {
  readonly #catalogue: IndexedCatalogue;
  readonly #onReady: () => void;
  readonly #done = new WeakMap<Question, Designed>();
  #asked: Question | undefined;
  #steps: InSteps<Designed> | undefined;
  #timer: NodeJS.Timeout | undefined;

  constructor(catalogue: IndexedCatalogue, onReady: () => void) {
    this.#catalogue = catalogue;
    this.#onReady = onReady;
  }

  /** Undefined while they are being designed; `onReady` is called then. */
  get(question: Question): Designed | undefined {
    const known = this.#done.get(question);
    if (known) return known;
    if (this.#asked !== question) {
      this.#asked = question;
      this.#steps = inSteps(question, this.#catalogue);
    }
    this.#schedule(WAIT_ms);
    return undefined;
  }

  stop(): void {
    clearTimeout(this.#timer);
    this.#timer = undefined;
    this.#asked = undefined;
    this.#steps = undefined;
  }

  #schedule(delay_ms: number): void {
    this.#timer ??= setTimeout(() => {
      this.#timer = undefined;
      this.#work();
    }, delay_ms);
  }

  #work(): void {
    const { question, steps } = { question: this.#asked, steps: this.#steps };
    if (!question || !steps) return;
    const end_ms = performance.now() + PIECE_ms;
    do {
      const step = stepOrReport(steps);
      if (step.done) {
        this.stop();
        this.#done.set(question, step.value);
        this.#onReady();
        return;
      }
    } while (performance.now() < end_ms);
    this.#schedule(1);
  }
}

/** With every film of the catalogue. */
function* inSteps(question: Question, catalogue: IndexedCatalogue): InSteps<Designed> {
  const films: Material[] = [];
  for (const { key } of catalogue.entries().filter((entry) => entry.class === FILM_CLASS)) {
    const film = catalogue.material(key);
    if (film) films.push(film);
    yield;
  }
  return yield* coatingReportInSteps(coatAsked(question, films), (id) => catalogue.source(id));
}

/** At once. */
export const designCoatings = (question: Question, catalogue: IndexedCatalogue): Designed =>
  runToEnd(inSteps(question, catalogue));

/** A fault of the program costs this page, not the session. */
function stepOrReport(steps: InSteps<Designed>): IteratorResult<undefined, Designed> {
  try {
    return steps.next();
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    const value = refuse(
      'internal-error',
      2,
      `the program fails on these coatings (${why})`,
      'please report it',
    );
    return { done: true, value };
  }
}
