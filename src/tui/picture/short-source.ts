/** A source in a word or two, as people cite it in passing: "Malitson 1965", "Bond et al. 1966", "Ciddor 1996". */
import type { Source } from '../../catalog/types.ts';
import { yearOf } from '../../cite/source-text.ts';

export function shortSource(source: Source | undefined): string | undefined {
  if (!source) return undefined;
  const authors = (source.author ?? []).map((a) => a.family ?? a.literal ?? '').filter((name) => name !== '');
  const name = namesText(authors) ?? source.publisher ?? source.title;
  const year = yearOf(source);
  if (name === undefined) return undefined;
  return year === undefined ? name : `${name} ${year}`;
}

function namesText(authors: readonly string[]): string | undefined {
  const [first, second] = authors;
  if (first === undefined) return undefined;
  if (second === undefined) return first;
  return authors.length === 2 ? `${first} & ${second}` : `${first} et al.`;
}
