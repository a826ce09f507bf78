/**
 * Coatings for a question, designed after the page that asks for them has been drawn: that takes longer than a key may. Each
 * question is worked out once.
 */
import { coatAsked, FILM_CLASS } from '../answer/coating-defaults.ts';
import { coatingReport } from '../answer/coating-report.ts';
import type { CoatingReport } from '../answer/coating-shape.ts';
import type { Question } from '../answer/question.ts';
import type { IndexedCatalogue } from '../catalog/entries.ts';
import { type Refusal, refuse } from '../medium/refusal.ts';

type Designed = CoatingReport | Refusal;

/** Time for the page to be drawn. */
const WAIT_ms = 5;

export class CoatingDesigns {
  readonly #catalogue: IndexedCatalogue;
  readonly #onReady: () => void;
  readonly #done = new WeakMap<Question, Designed>();
  #timer: NodeJS.Timeout | undefined;

  constructor(catalogue: IndexedCatalogue, onReady: () => void) {
    this.#catalogue = catalogue;
    this.#onReady = onReady;
  }

  /** Undefined while they are being designed; `onReady` is called then. */
  get(question: Question): Designed | undefined {
    const known = this.#done.get(question);
    if (known) return known;
    this.#timer ??= setTimeout(() => {
      this.#timer = undefined;
      this.#done.set(question, designOrReport(question, this.#catalogue));
      this.#onReady();
    }, WAIT_ms);
    return undefined;
  }

  stop(): void {
    clearTimeout(this.#timer);
    this.#timer = undefined;
  }
}

/** At once, with every film of the catalogue. */
export function designCoatings(question: Question, catalogue: IndexedCatalogue): Designed {
  const films = catalogue
    .entries()
    .filter((entry) => entry.class === FILM_CLASS)
    .flatMap(({ key }) => catalogue.material(key) ?? []);
  return coatingReport(coatAsked(question, films), (id) => catalogue.source(id));
}

/** A fault of the program costs this page, not the session. */
function designOrReport(question: Question, catalogue: IndexedCatalogue): Designed {
  try {
    return designCoatings(question, catalogue);
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    return refuse('internal-error', 2, `the program fails on these coatings (${why})`, 'please report it');
  }
}
