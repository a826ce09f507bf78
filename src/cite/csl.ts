/**
 * Sources as CSL-JSON (citation style language data schema 1.0). The bibliography is kept in that form, so this only picks
 * the properties the schema knows and puts the DOI in its canonical form.
 */
import type { Source } from '../catalog/types.ts';

const PROPERTIES = [
  'id',
  'type',
  'title',
  'author',
  'issued',
  'container-title',
  'volume',
  'issue',
  'page',
  'publisher',
  'DOI',
  'URL',
  'accessed',
  'note',
] as const satisfies readonly (keyof Source)[];

/** The item with the schema's properties in a fixed order, absent ones left out, the DOI bare and in lower case. */
export function cslItem(source: Source): Source {
  const item = Object.fromEntries(
    PROPERTIES.flatMap((p) => (source[p] === undefined ? [] : [[p, source[p]]])),
  );
  const csl = item as unknown as Source;
  return csl.DOI === undefined ? csl : { ...csl, DOI: bareDoi(csl.DOI) };
}

/** A DOI without resolver or prefix, in lower case. */
export const bareDoi = (doi: string): string =>
  doi
    .trim()
    .replace(/^(https?:\/\/(dx\.)?doi\.org\/|doi:\s*)/i, '')
    .toLowerCase();
