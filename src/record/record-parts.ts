/** What the forms of a record share: texts made harmless, links to sources, numbers by their path, the lines of versions. */
import type { SourceLine } from '../answer/answer.ts';
import { toAscii } from '../units/to-ascii.ts';
import { isJsonObject, type JsonValue } from './plain-json.ts';
import type { LogRecord, RecordRow } from './record.ts';

/** How a form is written. */
export interface FormStyle {
  /** In the bytes 0x20 to 0x7E (and newlines). */
  readonly ascii?: boolean;
  /** With every number of the answer to the last bit, below the rounded ones. */
  readonly precise?: boolean;
}

const UNSAFE = /[\p{Cc}\p{Cs}\u200b-\u200f\u2028-\u202e\u2060-\u2069\ufeff]/gu;

/** One line of harmless text: no control characters, so no escape codes and no newlines; no bidirectional marks. */
export function harmless(text: string, style: FormStyle = {}): string {
  const clean = text.replace(/\s+/gu, ' ').replace(UNSAFE, '?').trim();
  return style.ascii ? toAscii(clean) : clean;
}

/** The words of the command likewise; there every space means something and stays. To be quoted afterwards. */
export function harmlessWords(words: readonly string[], style: FormStyle = {}): readonly string[] {
  return words.map((word) => {
    const clean = word.replace(UNSAFE, '?');
    return style.ascii ? toAscii(clean) : clean;
  });
}

/** Rows under their headings, in the order met. */
export function byHeading(rows: readonly RecordRow[]): ReadonlyMap<string, readonly RecordRow[]> {
  const groups = new Map<string, RecordRow[]>();
  for (const row of rows) {
    const group = groups.get(row.about);
    if (group) group.push(row);
    else groups.set(row.about, [row]);
  }
  return groups;
}

/** The link of a DOI; characters that no link may have are written as %XX. */
export function doiLink(doi: string): string {
  return `https://doi.org/${doi.replace(/[^\w\-.~:/()+;,=@!*'[\]&]/gu, encodeURIComponent)}`;
}

/** The source with its link at the end, once. */
export function sourceText(source: SourceLine): string {
  const { doi } = source;
  return doi === null ? source.text : `${unlinked(source)} ${doiLink(doi)}`;
}

/** The words of a source without the link that some of them end with: each form writes the link in its own way. */
export function unlinked({ text, doi }: SourceLine): string {
  if (doi === null) return text;
  const link = `https://doi.org/${doi}`;
  return text.toLowerCase().endsWith(link.toLowerCase())
    ? text.slice(0, -link.length).replace(/[\s,;:]+(?:doi:?\s*)?$/i, '')
    : text;
}

export function versionsText({ program, catalogue }: LogRecord): string {
  return `${program.name} ${program.version}, catalogue of ${catalogue.date}, hash ${catalogue.hash}`;
}

/** A number with the fewest digits that read back as the same double; 17 at most. */
export interface ExactNumber {
  /** "interface.rs.re". */
  readonly path: string;
  readonly text: string;
}

export function exactNumbers(answer: JsonValue, path = ''): readonly ExactNumber[] {
  if (typeof answer === 'number') return [{ path, text: String(answer) }];
  const children = Array.isArray(answer)
    ? answer.map((value: JsonValue, i) => [String(i), value] as const)
    : isJsonObject(answer)
      ? Object.entries(answer)
      : [];
  return children.flatMap(([key, value]) => exactNumbers(value, path === '' ? key : `${path}.${key}`));
}
