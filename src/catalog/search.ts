/**
 * Search as a person types: over key, name, formula, aliases, glass code and class of every entry. Loaded only by the
 * full-screen program and, once a name has failed, for "did you mean".
 *
 * Order: entries one of whose names is the text, then those of which one begins with it, then those with a word that begins
 * with it (several words: each begins one), then those that contain it, then those that come close to it (found by Fuse,
 * ordered by the number of typing slips). Within a step: key before name before alias and code before formula, then the order of the entries given. So
 * equal input gives equal output, and typing on never moves an exact hit from the top.
 *
 * A key press must not be felt over 10,000 entries: letter pairs choose the entries looked at, and only those of few enough
 * slips reach Fuse, which alone would take some 10 ms.
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
  // Generous: `countSlips` has judged before.
  threshold: 0.5,
  minMatchCharLength: 2,
};

/** Entries whose slips are counted per search. */
const SIMILAR_POOL = 160;
/** Shorter texts hold too few letters to tell a slip from another word. */
const SIMILAR_FROM = 3;

/** @param entries in the order in which equals are to be listed. */
export function makeSearch(entries: readonly CatalogueEntry[]): Search {
  const docs = entries.map(searchable);
  const pairs = createPairIndex(docs.map((d) => d.tight));
  const all = docs.map((_, index) => index);
  const classes = [...new Set(entries.map((entry) => entry.class))].map(wordLines);
  const { keys, records } = Fuse.createIndex<Searchable>(FUSE_OPTIONS.keys, docs).toJSON();

  return (text, limit = entries.length) => {
    const tight = foldTight(text);
    if (tight === '') return entries.slice(0, limit).map((entry) => ({ entry, closeness: 'beginning' }));
    const hits = directHits(docs, candidates(wordsOf(text)), soughtIn(tight, text));
    if (hits.length < limit && tight.length >= SIMILAR_FROM) {
      const taken = new Set(hits.map(({ index }) => index));
      hits.push(...similarTo(tight, (index) => !taken.has(index)));
    }
    const listed: SearchHit[] = [];
    for (const { index, closeness } of hits) {
      const entry = entries[index];
      if (entry && listed.length < limit) listed.push({ entry, closeness });
    }
    return listed;
  };

  /** Entries beside which there is no direct hit. The pairs are those of the names: a word that may be one of a class opens all. */
  function candidates(words: readonly string[]): readonly number[] {
    const mayBeClass = words.some((word) => classes.some((lines) => lines.includes(`\n${word}`)));
    return mayBeClass ? all : (pairs.holdingRarest(words) ?? all);
  }

  function similarTo(tight: string, admit: (index: number) => boolean): readonly Hit[] {
    const most = allowedSlips(tight);
    const pool = pairs.closest(tight, SIMILAR_POOL, admit).flatMap((index) => {
      const item = docs[index];
      const slips = item ? slipsTo(tight, item, most) : most + 1;
      return item && slips <= most ? [{ index, item, slips }] : [];
    });
    // The prepared records of the pool, renumbered: no text is indexed again.
    const index = Fuse.parseIndex<Searchable>({
      keys,
      records: pool.flatMap((from, i) => {
        const record = records[from.index];
        return record ? [{ ...record, i }] : [];
      }),
    } as Parameters<typeof Fuse.parseIndex<Searchable>>[0]);
    return new Fuse(
      pool.map(({ item }) => item),
      FUSE_OPTIONS,
      index,
    )
      .search(tight)
      .flatMap(({ refIndex, score = 1 }) => {
        const hit = pool[refIndex];
        return hit ? [{ index: hit.index, closeness: 'similar' as const, slips: hit.slips, score }] : [];
      })
      .sort((a, b) => a.slips - b.slips || round(a.score) - round(b.score) || a.index - b.index);
  }
}

/** A slip in three letters is still the same word; two in three is another one. */
const allowedSlips = (tight: string): number => Math.max(1, Math.floor(tight.length / 3));

/** Fewest slips to a whole name of the entry, or, half a slip worse, to the beginning of one; infinite beyond `most`. */
function slipsTo(tight: string, { key, name, other, formula }: Searchable, most: number): number {
  let fewest = Number.POSITIVE_INFINITY;
  const against = (text: string): void => {
    const { whole, beginning } = countSlips(tight, text, most);
    fewest = Math.min(fewest, whole, beginning + 0.5);
  };
  against(key);
  against(name);
  other.forEach(against);
  against(formula);
  return fewest;
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
    words: texts.map(wordLines).join(''),
  };
}

const wordsOf = (text: string): readonly string[] =>
  foldLoose(text)
    .split(/[^\p{L}\p{N}+*%]+/u)
    .filter((word) => word !== '');

/** Each word of a text after a line break. */
const wordLines = (text: string): string =>
  wordsOf(text)
    .map((word) => `\n${word}`)
    .join('');

const WORD = 8;
const RANKS = 13;

/** What is typed, in the forms that the entries are asked for. */
interface Sought {
  readonly tight: string;
  /** With the line break that stands before a text, and before and after it. */
  readonly beginning: string;
  readonly whole: string;
  readonly words: readonly string[];
}

const soughtIn = (tight: string, text: string): Sought => ({
  tight,
  beginning: `\n${tight}`,
  whole: `\n${tight}\n`,
  words: wordsOf(text).map((word) => `\n${word}`),
});

/** Four steps times four kinds of text, but words of any kind together: one list each keeps the order without a sort. */
function directHits(docs: readonly Searchable[], among: readonly number[], sought: Sought): Hit[] {
  const lists: Hit[][] = Array.from({ length: RANKS }, () => []);
  for (const index of among) {
    const doc = docs[index];
    const rank = doc ? rankOf(doc, sought) : RANKS;
    if (rank < RANKS) lists[rank]?.push({ index, closeness: closenessOf(rank) });
  }
  return lists.flat();
}

const closenessOf = (rank: number): Closeness =>
  rank < 4 ? 'exact' : rank < WORD ? 'beginning' : rank === WORD ? 'word' : 'part';

/** Place of an entry among the direct hits; `RANKS` where it is none. */
function rankOf(doc: Searchable, { tight, beginning, whole, words }: Sought): number {
  const beginsWords = (): boolean => words.length > 0 && words.every((word) => doc.words.includes(word));
  if (!doc.tight.includes(tight)) return beginsWords() ? WORD : RANKS;
  if (!doc.tight.includes(beginning))
    return beginsWords() ? WORD : WORD + 1 + kindOf(doc, (s) => s.includes(tight));
  return doc.tight.includes(whole)
    ? kindOf(doc, (s) => s === tight)
    : 4 + kindOf(doc, (s) => s.startsWith(tight));
}

function kindOf(doc: Searchable, matches: (text: string) => boolean): number {
  if (matches(doc.key)) return 0;
  if (matches(doc.name)) return 1;
  return doc.other.some(matches) ? 2 : 3;
}
