/** The world of the running program: the catalogue on disk, the one answer function, tables made in the background. */
import { answerQuestion } from '../answer/answer-question.ts';
import type { CatalogueEntry, IndexedCatalogue } from '../catalog/entries.ts';
import { foldTight } from '../catalog/fold.ts';
import { IndexTables } from './index-tables.ts';
import type { Bindings } from './keys/bindings.ts';
import type { World } from './world.ts';

type SearchEntries = (text: string) => readonly CatalogueEntry[];

export interface RealWorld extends World {
  /** Loads the forgiving search; until then names are found by their letters alone. */
  loadSearch(): Promise<void>;
  stop(): void;
}

/** Texts whose hits are kept: typing and deleting go over the same ones. */
const MOST_TEXTS = 64;

export function realWorld(catalogue: IndexedCatalogue, bindings: Bindings, onReady: () => void): RealWorld {
  const tables = new IndexTables(onReady);
  const sourceOf = catalogue.source.bind(catalogue);
  let find: SearchEntries = (text) => plainSearch(catalogue.entries(), text);
  let found = new Map<string, readonly CatalogueEntry[]>();
  return {
    answer: (question) => answerQuestion(question, sourceOf),
    search: (text) => {
      const known = found.get(text);
      if (known) return known;
      const entries = find(text);
      if (found.size >= MOST_TEXTS) found.clear();
      found.set(text, entries);
      return entries;
    },
    lookup: (name) => catalogue.lookup(name),
    material: (key) => catalogue.material(key),
    source: sourceOf,
    opticsOver: (medium, conditions, range_m) => tables.get(medium, conditions, range_m),
    bindings,
    loadSearch: async () => {
      const { makeSearch } = await import('../catalog/search.ts');
      const search = makeSearch(catalogue.entries());
      find = (text) => search(text).map((hit) => hit.entry);
      found = new Map();
    },
    stop: () => tables.stop(),
  };
}

function plainSearch(entries: readonly CatalogueEntry[], text: string): readonly CatalogueEntry[] {
  const typed = foldTight(text);
  return entries.filter((e) =>
    [e.key, e.name, e.formula ?? '', ...e.aliases].some((name) => foldTight(name).includes(typed)),
  );
}
