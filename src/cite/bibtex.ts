/**
 * A source as a BibTeX entry that any BibTeX reads: pure ASCII, special characters escaped, words with capitals braced so
 * that styles which lower-case titles keep formulas and names, page ranges with two hyphens. The citation key is the id of
 * the source in the bibliography, which never changes.
 */
import type { Source } from '../catalog/types.ts';
import { latexText } from './latex-text.ts';
import { dateText, yearOf } from './source-text.ts';

const ENTRY_TYPES: Readonly<Record<string, string>> = {
  'article-journal': 'article',
  'article-magazine': 'article',
  book: 'book',
  chapter: 'incollection',
  'paper-conference': 'inproceedings',
  report: 'techreport',
  thesis: 'phdthesis',
};

const MONTHS = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];

export function bibtexEntry(source: Source): string {
  const type = ENTRY_TYPES[source.type] ?? 'misc';
  const fields = fieldsOf(source, type).map(([name, value]) => `  ${name} = ${value}`);
  return `@${type}{${bibtexKey(source)},\n${fields.join(',\n')}\n}`;
}

/** The citation key: the id, with every character that BibTeX does not take in a key made a hyphen. */
export const bibtexKey = (source: Source): string => source.id.replace(/[^A-Za-z0-9:_.+-]/g, '-');

function fieldsOf(source: Source, type: string): readonly (readonly [string, string])[] {
  const fields: (readonly [string, string])[] = [];
  const add = (name: string, value: string | undefined): void => {
    if (value !== undefined && value !== '') fields.push([name, `{${value}}`]);
  };
  add('author', authorField(source));
  add('title', source.title === undefined ? undefined : latexText(source.title, 'title'));
  add(containerField(type), textOf(source['container-title']));
  add('volume', textOf(source.volume));
  add('number', textOf(source.issue));
  add('pages', source.page === undefined ? undefined : pageField(source.page));
  add(publisherField(type), textOf(source.publisher));
  add('year', yearOf(source)?.toString());
  const month = MONTHS[(source.issued?.['date-parts'][0]?.[1] ?? 0) - 1];
  if (month !== undefined) fields.push(['month', month]);
  // Addresses are taken as they are: the packages that print them expect no escapes, and braces in them are percent-coded.
  add('doi', source.DOI === undefined ? undefined : verbatim(source.DOI));
  add('url', source.URL === undefined ? undefined : verbatim(source.URL));
  const read = dateText(source.accessed?.['date-parts'][0]);
  add('urldate', read);
  add('note', textOf(source.note));
  return fields;
}

const textOf = (text: string | undefined): string | undefined =>
  text === undefined ? undefined : latexText(text, 'plain');

/** `Family, Given and Family, Given`; bodies are braced so that they are not taken apart. */
function authorField(source: Source): string {
  return (source.author ?? [])
    .map((a) => {
      if (a.literal !== undefined) return `{${latexText(a.literal, 'plain')}}`;
      return [a.family, a.given]
        .filter((s) => s !== undefined)
        .map((s) => latexText(s, 'plain'))
        .join(', ');
    })
    .join(' and ');
}

function containerField(type: string): string {
  if (type === 'article') return 'journal';
  if (type === 'misc') return 'howpublished';
  return type === 'book' || type === 'techreport' || type === 'phdthesis' ? 'series' : 'booktitle';
}

function publisherField(type: string): string {
  if (type === 'techreport') return 'institution';
  return type === 'phdthesis' ? 'school' : 'publisher';
}

/** `1205-1209` and `1205–1209` become `1205--1209`. */
const pageField = (page: string): string =>
  latexText(page, 'plain').replace(/(?<=[A-Za-z0-9])\s*-{1,3}\s*(?=[A-Za-z0-9])/g, '--');

const verbatim = (address: string): string =>
  address.replace(/[{}\\\s]/g, (c) => `%${c.charCodeAt(0).toString(16).padStart(2, '0')}`);
