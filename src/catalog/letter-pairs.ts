/**
 * Which of many texts share letter pairs with a short one: a cheap sieve before an exact comparison. A text that holds another
 * holds all its pairs; a typing slip spoils two or three pairs and leaves the others, so what the sieve drops is no near miss.
 */
export interface PairIndex {
  /**
   * Indices of at most `count` texts, those admitted, that share pairs with the sought one, those with the most first, in the
   * order of the texts among equals.
   */
  closest(sought: string, count: number, admit: (index: number) => boolean): readonly number[];
  /** Texts that hold the pair of the sought words that the fewest hold, in their order; undefined where no word has a pair. */
  holdingRarest(words: readonly string[]): readonly number[] | undefined;
}

export function createPairIndex(texts: readonly string[]): PairIndex {
  const postings = new Map<number, number[]>();
  for (const [index, text] of texts.entries()) {
    for (const pair of pairsOf(text)) {
      const list = postings.get(pair);
      if (list) list.push(index);
      else postings.set(pair, [index]);
    }
  }
  const shared = new Uint16Array(texts.length);
  return {
    closest(sought, count, admit) {
      shared.fill(0);
      const pairs = pairsOf(sought);
      for (const pair of pairs) {
        const list = postings.get(pair) ?? [];
        for (let i = 0; i < list.length; i++) shared[list[i]!]!++;
      }
      // One bucket for each number of pairs shared, best first.
      const buckets: number[][] = Array.from({ length: pairs.size + 1 }, () => []);
      for (let index = 0; index < shared.length; index++) {
        const n = shared[index]!;
        const bucket = n > 0 ? buckets[pairs.size - n] : undefined;
        if (bucket && bucket.length < count && admit(index)) bucket.push(index);
      }
      const out: number[] = [];
      for (const bucket of buckets) {
        if (out.length >= count) break;
        out.push(...bucket.slice(0, count - out.length));
      }
      return out;
    },
    holdingRarest(words) {
      let rarest: readonly number[] | undefined;
      for (const word of words) {
        for (const pair of pairsOf(word)) {
          const list = postings.get(pair) ?? [];
          if (!rarest || list.length < rarest.length) rarest = list;
        }
      }
      return rarest;
    },
  };
}

/** The distinct pairs of neighbouring characters as one number each; pairs across a line break are none. */
function pairsOf(text: string): ReadonlySet<number> {
  const pairs = new Set<number>();
  for (let i = 1; i < text.length; i++) {
    const a = text.charCodeAt(i - 1);
    const b = text.charCodeAt(i);
    if (a !== 10 && b !== 10) pairs.add(a * 65536 + b);
  }
  return pairs;
}
