/**
 * A source as one line of text: authors, title, where it stands, year, address. What the source lacks is left out.
 * `I. H. Malitson, "Interspecimen comparison ...", J. Opt. Soc. Am. 55, 1205-1209 (1965), https://doi.org/10.1364/...`
 */
import type { Source } from '../catalog/types.ts';
import { isAscii } from '../num/ascii.ts';

/** More authors than this become "et al.". */
const MAX_AUTHORS = 4;

export function sourceText(source: Source): string {
  const year = yearOf(source);
  const place = placeText(source);
  const parts = [
    authorText(source),
    source.title === undefined ? undefined : `"${source.title}"`,
    [place, year === undefined ? undefined : `(${year})`].filter((s) => s !== undefined).join(' '),
    addressText(source),
    source.note,
  ];
  const line = parts.filter((s) => s !== undefined && s !== '').join(', ');
  // Whatever the record holds, a citation is one line.
  return inOneLine(line === '' ? source.id : line);
}

function inOneLine(text: string): string {
  const isPlain = isAscii(text) && !text.includes('  ');
  return (isPlain ? text : text.replace(/\s+/g, ' ')).trim();
}

/** Year of issue, if the record has one. */
export function yearOf(source: Source): number | undefined {
  return source.issued?.['date-parts'][0]?.[0];
}

/** The persistent address of the publication, else that of its page with the day it was read. */
export function addressText(source: Source): string | undefined {
  if (source.DOI !== undefined) return doiAddress(source.DOI);
  if (source.URL === undefined) return undefined;
  const day = dateText(source.accessed?.['date-parts'][0]);
  return day === undefined ? source.URL : `${source.URL} (accessed ${day})`;
}

export const doiAddress = (doi: string): string => `https://doi.org/${doi}`;

/** An ISO 8601 date of the precision given. */
export function dateText(parts: readonly number[] | undefined): string | undefined {
  if (!parts || parts.length === 0) return undefined;
  return parts.map((n, i) => String(n).padStart(i === 0 ? 4 : 2, '0')).join('-');
}

function authorText(source: Source): string | undefined {
  const names = (source.author ?? []).map((a) => a.literal ?? [a.given, a.family].filter(Boolean).join(' '));
  if (names.length === 0) return undefined;
  return names.length > MAX_AUTHORS ? `${names[0]} et al.` : names.join(', ');
}

function placeText(source: Source): string | undefined {
  const container = source['container-title'] ?? source.publisher;
  const issue = source.issue === undefined ? '' : `(${source.issue})`;
  const volume = source.volume === undefined ? undefined : `${source.volume}${issue}`;
  const head = [container, volume].filter((s) => s !== undefined).join(' ');
  const parts = [head === '' ? undefined : head, source.page];
  const text = parts.filter((s) => s !== undefined).join(', ');
  return text === '' ? undefined : text;
}
