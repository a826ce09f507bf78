/**
 * The catalogue over the bytes of one packed file (layout: pack.ts). Nothing is parsed up front but a header of a few
 * hundred bytes; a look-up finds its line by a byte search in the index, a tenth of the file, then reads and parses the one
 * record it is about. Pure: the bytes come from load.ts.
 */
import type { Lookup } from './catalogue.ts';
import type { CatalogueEntry, IndexedCatalogue, Spelling, SpellingKind } from './entries.ts';
import { lookupIn } from './lookup.ts';
import { AXIS_LETTERS, MAGIC, type PackedHeader, type SectionName } from './packed-header.ts';
import type { Axis, Material, Source } from './types.ts';

/** Bytes of the records section, from the start of the file. */
export type ReadBytes = (from: number, length: number) => Buffer;

/** How many bytes from the start of the file the header and the index take. Throws as `openPacked` does. */
export const indexLength = (start: Buffer): number =>
  headerLength(start) + readHeader(start).sections.records[0];

/** How long the whole file must be. Throws as `openPacked` does. */
export function packedLength(start: Buffer): number {
  const [offset, length] = readHeader(start).sections.records;
  return headerLength(start) + offset + length;
}

const headerLength = (start: Buffer): number => start.indexOf('\n') + 1;

/**
 * @param bytes the file, or as much of it as holds the index (see `indexLength`); kept, never written to.
 * @param read fetches bytes beyond those; needed unless `bytes` is the whole file.
 * @throws Error if the bytes are not a packed catalogue of this layout.
 */
export function openPacked(
  bytes: Buffer,
  read: ReadBytes = (from, length) => bytes.subarray(from, from + length),
): IndexedCatalogue {
  const header = readHeader(bytes);
  const start = headerLength(bytes);
  const part = (name: SectionName): Buffer => {
    const [offset, length] = header.sections[name];
    return bytes.subarray(start + offset, start + offset + length);
  };
  const names = part('names');
  const entryLines = part('entries');
  const sourceLines = part('sources');
  const recordsAt = start + header.sections.records[0];
  const parsed = new Map<string, Material>();
  let listed: readonly CatalogueEntry[] | undefined;

  const record = (offset: string | undefined, length: string | undefined): unknown =>
    JSON.parse(read(recordsAt + Number(offset), Number(length)).toString('utf8'));
  const catalogue: IndexedCatalogue = {
    version: header.version,
    hash: header.hash,
    date: header.date,
    size: header.materials,
    lookup: (name: string): Lookup => lookupIn(name, catalogue),
    material(key) {
      const known = parsed.get(key);
      if (known) return known;
      const fields = findLine(entryLines, key);
      if (!fields) return undefined;
      const material = record(fields[1], fields[2]) as Material;
      parsed.set(key, material);
      return material;
    },
    keys: () => catalogue.entries().map((entry) => entry.key),
    source(id) {
      const fields = findLine(sourceLines, id);
      return fields ? (record(fields[1], fields[2]) as Source) : undefined;
    },
    entries() {
      listed ??= lines(entryLines).map(readEntry);
      return listed;
    },
    entry(key) {
      const fields = findLine(entryLines, key);
      return fields ? readEntry(fields) : undefined;
    },
    spellings: (tight) => findAll(names, tight).map(readSpelling),
    sourceIds: () => lines(sourceLines).map((fields) => fields[0] ?? ''),
  };
  return catalogue;
}

function readHeader(bytes: Buffer): PackedHeader {
  const end = bytes.indexOf('\n');
  if (end < 0 || bytes.toString('latin1', 0, MAGIC.length) !== MAGIC)
    throw new Error('not a packed catalogue of this program version');
  return JSON.parse(bytes.toString('utf8', MAGIC.length, end)) as PackedHeader;
}

/** Fields of the one line whose first field is `first`. */
function findLine(section: Buffer, first: string): readonly string[] | undefined {
  const at = lineStart(section, first, 0);
  return at < 0 ? undefined : fieldsAt(section, at);
}

/** Fields of all lines whose first field is `first`; they stand together. */
function findAll(section: Buffer, first: string): (readonly string[])[] {
  const out: (readonly string[])[] = [];
  for (let at = lineStart(section, first, 0); at >= 0; at = lineStart(section, first, at)) {
    out.push(fieldsAt(section, at));
  }
  return out;
}

function lineStart(section: Buffer, first: string, from: number): number {
  // A line break or tab inside the sought field would match across fields.
  if (first.includes('\n') || first.includes('\t')) return -1;
  const at = section.indexOf(`\n${first}\t`, from);
  return at < 0 ? -1 : at + 1;
}

const fieldsAt = (section: Buffer, at: number): readonly string[] =>
  section.toString('utf8', at, section.indexOf('\n', at)).split('\t');

const lines = (section: Buffer): (readonly string[])[] =>
  section
    .toString('utf8')
    .split('\n')
    .filter((text) => text !== '')
    .map((text) => text.split('\t'));

const AXIS_OF = new Map(Object.entries(AXIS_LETTERS).map(([axis, letter]) => [letter, axis as Axis]));

function readEntry(fields: readonly string[]): CatalogueEntry {
  const [key = '', , , axes = '', materialClass = '', name = '', formula, glassCode, aliases] = fields;
  return {
    key,
    name,
    aliases: aliases ? aliases.split('\u001f') : [],
    class: materialClass,
    axes: [...axes].flatMap((letter) => AXIS_OF.get(letter) ?? []),
    ...(formula ? { formula } : {}),
    ...(glassCode ? { glassCode } : {}),
  };
}

function readSpelling(fields: readonly string[]): Spelling {
  const [tight = '', loose = '', kind = '', key = '', text = ''] = fields;
  return { tight, loose, kind: kind as SpellingKind, key, text };
}
