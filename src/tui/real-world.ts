/** The world of the running program: the catalogue on disk, the one answer function, tables made in the background. */
import type { Answer } from '../answer/answer.ts';
import { answerQuestion } from '../answer/answer-question.ts';
import type { SourceOf } from '../answer/medium-side.ts';
import type { Layer, Question } from '../answer/question.ts';
import type { CatalogueEntry, IndexedCatalogue } from '../catalog/entries.ts';
import { foldTight } from '../catalog/fold.ts';
import { type Refusal, refuse } from '../medium/refusal.ts';
import { problem } from '../units/problem.ts';
import { Charts } from './charts.ts';
import { CoatingDesigns } from './coating-designs.ts';
import { IndexTables } from './index-tables.ts';
import type { Bindings } from './keys/bindings.ts';
import { MediumFinder } from './medium-finder.ts';
import type { World } from './world.ts';

/** How the program around reads layers; a refusal comes with the name it is about. */
export type LayerReader = (
  words: readonly string[],
  catalogue: IndexedCatalogue,
) => readonly Layer[] | { readonly refusal: Refusal; readonly name: string };

type SearchEntries = (text: string) => readonly CatalogueEntry[];

export interface RealWorld extends World {
  /** Loads the forgiving search; until then names are found by their letters alone. */
  loadSearch(): Promise<void>;
  /** Gets ready, a little at a time, for conditions at a wave: the list of media has been opened. */
  prepareFind(question: Question): void;
  stop(): void;
}

/** Texts whose hits are kept, for the views of one frame and a letter taken back; lists of thousands are heavy to keep. */
const MOST_TEXTS = 4;

export function realWorld(
  catalogue: IndexedCatalogue,
  bindings: Bindings,
  readLayers: LayerReader,
  record: World['record'],
  onReady: () => void,
): RealWorld {
  const tables = new IndexTables(onReady);
  const finder = new MediumFinder(catalogue);
  const designs = new CoatingDesigns(catalogue, onReady);
  const sourceOf = catalogue.source.bind(catalogue);
  const charts = new Charts(sourceOf);
  let find: SearchEntries = (text) => plainSearch(catalogue.entries(), text);
  let found = new Map<string, readonly CatalogueEntry[]>();
  // Read when first asked for: the first frame shows none.
  let all: readonly CatalogueEntry[] | undefined;
  return {
    answer: (question) => answerOrReport(question, sourceOf),
    search: (text) => {
      if (text === '') {
        all ??= catalogue.entries();
        return all;
      }
      const known = found.get(text);
      if (known) return known;
      const entries = find(text);
      if (found.size >= MOST_TEXTS) found.clear();
      found.set(text, entries);
      return entries;
    },
    find: (criteria, among) => finder.find(criteria, among),
    coatings: (question) => designs.get(question),
    survey: () => finder.survey(),
    prepareFind: ({ wave, conditions }) => finder.prepare(wave, conditions.temperature_K),
    lookup: (name) => catalogue.lookup(name),
    material: (key) => catalogue.material(key),
    source: sourceOf,
    record,
    chart: (kind, question, answer) => charts.get(kind, question, answer),
    readLayers: (text) => {
      const words = text.trim().split(/\s+/);
      const read = readLayers(words, catalogue);
      if (!('refusal' in read)) return read;
      const [name] = find(read.name);
      const near = read.refusal.code === 'unknown-medium' && name ? `did you mean ${name.key}?` : undefined;
      return problem('not-a-medium', read.refusal.message, near ?? read.refusal.remedy);
    },
    opticsOver: (medium, conditions, range_m) => tables.get(medium, conditions, range_m),
    bindings,
    loadSearch: async () => {
      const { makeSearch } = await import('../catalog/search.ts');
      const search = makeSearch(catalogue.entries());
      find = (text) => search(text).map((hit) => hit.entry);
      found = new Map();
      // Another list, so that whoever keeps hits sees that they are to be made anew.
      all = [...catalogue.entries()];
    },
    stop: () => {
      tables.stop();
      finder.stop();
      designs.stop();
    },
  };
}

/** A fault of the program costs the answer to this question, not the session. */
function answerOrReport(question: Question, sourceOf: SourceOf): Answer | Refusal {
  try {
    return answerQuestion(question, sourceOf);
  } catch (error) {
    const why = error instanceof Error ? error.message : String(error);
    return refuse('internal-error', 2, `the program fails on this question (${why})`, 'please report it');
  }
}

function plainSearch(entries: readonly CatalogueEntry[], text: string): readonly CatalogueEntry[] {
  const typed = foldTight(text);
  return entries.filter((e) =>
    [e.key, e.name, e.formula ?? '', ...e.aliases].some((name) => foldTight(name).includes(typed)),
  );
}
