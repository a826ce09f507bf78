/** Milliseconds per key of typing into the search, letter by letter, over 300 and over 10,000 entries. */

import type { CatalogueEntry } from '../../src/catalog/entries.ts';
import { openBundled } from '../../src/catalog/load.ts';
import { makeSearch } from '../../src/catalog/search.ts';

const TYPED = [
  ...['fused silica', 'sapphire', 'n-bk7', 'sio2', 'germanium', 'zinc selenide', 'water', 'calcium flouride'],
  ...['gold', 'lithium niobate', 'acrylic', 'sapphrie', 'silicon', 'bk-7', 'heavy flint', 'xqzzy'],
];

const entries = openBundled(process.argv[2]).entries();

/** More entries of the same kind than the catalogue has: keys and names told apart by a syllable. */
function grown(count: number): readonly CatalogueEntry[] {
  const syllables = [
    '',
    'al',
    'be',
    'co',
    'du',
    'em',
    'fi',
    'go',
    'ha',
    'io',
    'ju',
    'ko',
    'lu',
    'me',
    'no',
    'op',
  ];
  return Array.from({ length: count }, (_, i) => {
    const entry = entries[i % entries.length]!;
    const round = Math.floor(i / entries.length);
    if (round === 0) return entry;
    const extra = `${syllables[round % 16]}${syllables[Math.floor(round / 16) % 16]}${round}`;
    return {
      ...entry,
      key: `${entry.key}-${extra}`,
      name: `${entry.name} ${extra}`,
      aliases: entry.aliases.map((alias) => `${alias} ${extra}`),
    };
  });
}

function msPerKey(count: number): number[] {
  const search = makeSearch(grown(count));
  const taken: number[] = [];
  // The first time through warms the code up.
  for (let round = 0; round < 4; round++) {
    for (const text of TYPED) {
      for (let end = 1; end <= text.length; end++) {
        const begin = performance.now();
        search(text.slice(0, end), 50);
        if (round > 0) taken.push(performance.now() - begin);
      }
    }
  }
  return taken;
}

process.stdout.write(`${JSON.stringify({ 300: msPerKey(300), 10000: msPerKey(10_000) })}\n`);
