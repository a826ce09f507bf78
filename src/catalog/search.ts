/**
 * Search as a person types: over key, name, formula, aliases, glass code and class of every entry. Loaded only by the
 * full-screen program and, once a name has failed, for "did you mean".
 *
 * Order: entries one of whose names is the text, then those of which one begins with it, then those with a word that begins
 * with it (several words: each begins one), then those that contain it, then those that come close to it (found by Fuse,
 * ordered by the number of typing slips). Within a step: key before name before alias and code before formula, then the order of the entries given. So
 * equal input gives equal output, and typing on never moves an exact hit from the top.
 *
 * Fuse alone takes some 10 ms over 10,000 entries; only the entries that share most letter pairs with the text reach it.
 */
import Fuse from 'fuse.js';
import type { CatalogueEntry } from './entries.ts';
import { foldLoose, foldTight } from './fold.ts';
import { createPairIndex } from './letter-pairs.ts';
import { countSlips } from './slips.ts';

export type Closeness = 'exact' | 'beginning' | 'word' | 'part' | 'similar';

export interface SearchHit {
  readonly entry: CatalogueEntry;
  readonly closeness: Closeness;
}

export type Search = (text: string, limit?: number) => readonly SearchHit[];

/** What is searched of an entry: tight forms, and the words of all its texts. */
interface Searchable {
  readonly key: string;
  readonly name: string;
  readonly other: readonly string[];
  readonly formula: string;
  /** All tight forms, each between line breaks. */
  readonly tight: string;
  /** All words, each after a line break. */
  readonly words: string;
}

const FUSE_OPTIONS = {
  keys: [
    { name: 'key', weight: 3 },
    { name: 'name', weight: 2 },
    { name: 'other', weight: 2 },
    { name: 'formula', weight: 1 },
  ],
  includeScore: true,
  ignoreLocation: true,
  // Generous: `countSlips` judges what Fuse lets through.
  threshold: 0.5,
  minMatchCharLength: 2,
};

/** Entries handed to Fuse per search. */
const SIMILAR_POOL = 160;
/** Shorter texts hold too few letters to tell a slip from another word. */
const SIMILAR_FROM = 3;

/** @param entries in the order in which equals are to be listed. */
export function makeSearch(entries: readonly CatalogueEntry[]): Search {
  const docs = entries.map(searchable);
  const pairs = createPairIndex(docs.map((d) => d.tight));
  const { keys, records } = Fuse.createIndex<Searchable>(FUSE_OPTIONS.keys, docs).toJSON();

  return (text, limit = entries.length) => {
    const tight = foldTight(text);
    if (tight === '') return entries.slice(0, limit).map((entry) => ({ entry, closeness: 'beginning' }));
    const direct = directHits(docs, tight, wordsOf(text));
    const hits = direct.slice(0, limit);
    const taken = new Set(direct.map((h) => h.index));
    const similar =
      hits.length < limit && tight.length >= SIMILAR_FROM
        ? similarTo(tight, (i) => !taken.has(i)).slice(0, limit - hits.length)
        : [];
    return [...hits, ...similar].flatMap(({ index, closeness }) => {
      const entry = entries[index];
      return entry ? [{ entry, closeness }] : [];
    });
  };

  function similarTo(tight: string, admit: (index: number) => boolean): readonly Hit[] {
    const pool = pairs.closest(tight, SIMILAR_POOL, admit);
    const subset = pool.flatMap((index) => docs[index] ?? []);
    // The prepared records of the pool, renumbered: no text is indexed again.
    const index = Fuse.parseIndex<Searchable>({
      keys,
      records: pool.flatMap((from, i) => {
        const record = records[from];
        return record ? [{ ...record, i }] : [];
      }),
    } as Parameters<typeof Fuse.parseIndex<Searchable>>[0]);
    return new Fuse(subset, FUSE_OPTIONS, index)
      .search(tight)
      .map((r) => ({
        index: pool[r.refIndex] ?? 0,
        closeness: 'similar' as const,
        slips: slipsTo(tight, r.item),
        score: r.score ?? 1,
      }))
      .filter((hit) => hit.slips <= allowedSlips(tight))
      .sort((a, b) => a.slips - b.slips || round(a.score) - round(b.score) || a.index - b.index);
  }
}

/** A slip in three letters is still the same word; two in three is another one. */
const allowedSlips = (tight: string): number => Math.max(1, Math.floor(tight.length / 3));

/** Fewest slips to a whole name of the entry, or, half a slip worse, to the beginning of one. */
function slipsTo(tight: string, doc: Searchable): number {
  const texts = [doc.key, doc.name, ...doc.other, doc.formula];
  return Math.min(
    ...texts
      .map((text) => countSlips(tight, text))
      .map(({ whole, beginning }) => Math.min(whole, beginning + 0.5)),
  );
}

/** Scores closer than this are equal, so that the order of the entries decides and not the last bit. */
const round = (score: number): number => Math.round(score * 1e6);

interface Hit {
  readonly index: number;
  readonly closeness: Closeness;
}

/** Keys of the entries closest to a name that was not found, the closest first. */
export function suggestKeys(name: string, entries: readonly CatalogueEntry[], limit = 5): readonly string[] {
  // A crystal axis is no part of the name.
  const colon = name.lastIndexOf(':');
  const search = makeSearch(entries);
  const hits = search(name, limit);
  const bare = hits.length === 0 && colon > 0 ? search(name.slice(0, colon), limit) : hits;
  return bare.map((hit) => hit.entry.key);
}

function searchable(entry: CatalogueEntry): Searchable {
  const key = foldTight(entry.key);
  const name = foldTight(entry.name);
  const other = [...entry.aliases, ...(entry.glassCode ? [entry.glassCode] : [])].map(foldTight);
  const formula = entry.formula === undefined ? '' : foldTight(entry.formula);
  const texts = [entry.key, entry.name, ...entry.aliases, entry.formula ?? '', entry.class];
  return {
    key,
    name,
    other,
    formula,
    tight: `\n${[key, name, ...other, formula].join('\n')}\n`,
    words: `\n${texts.flatMap(wordsOf).join('\n')}`,
  };
}

const wordsOf = (text: string): readonly string[] =>
  foldLoose(text)
    .split(/[^\p{L}\p{N}+*%]+/u)
    .filter((word) => word !== '');

function directHits(docs: readonly Searchable[], tight: string, words: readonly string[]): readonly Hit[] {
  // Four steps times four kinds of text: one list each keeps the order without a sort.
  const lists: Hit[][] = Array.from({ length: 13 }, () => []);
  const starts = words.map((word) => `\n${word}`);
  for (const [index, doc] of docs.entries()) {
    if (doc.tight.includes(tight)) {
      const whole = doc.tight.includes(`\n${tight}\n`);
      const begins = whole || doc.tight.includes(`\n${tight}`);
      if (whole) lists[kindOf(doc, (s) => s === tight)]?.push({ index, closeness: 'exact' });
      else if (begins)
        lists[4 + kindOf(doc, (s) => s.startsWith(tight))]?.push({ index, closeness: 'beginning' });
      else if (starts.every((s) => doc.words.includes(s))) lists[8]?.push({ index, closeness: 'word' });
      else lists[9 + kindOf(doc, (s) => s.includes(tight))]?.push({ index, closeness: 'part' });
    } else if (starts.length > 0 && starts.every((s) => doc.words.includes(s))) {
      lists[8]?.push({ index, closeness: 'word' });
    }
  }
  return lists.flat();
}

function kindOf(doc: Searchable, matches: (text: string) => boolean): number {
  if (matches(doc.key)) return 0;
  if (matches(doc.name)) return 1;
  return doc.other.some(matches) ? 2 : 3;
}
