/**
 * Packs a catalogue into the two files the program ships: the catalogue proper and the check values, which only the
 * self-test reads. `packed.ts` is the reader; the layout is stated here.
 *
 *   line 1   "halfspace-catalogue 1 " and the header as JSON (version, date, hash, counts, section offsets and lengths)
 *   names    one line a spelling: tight fold, loose fold, kind, key, spelling
 *   entries  one line a material: key, offset, length, axes, class, name, formula, glass code, aliases
 *   sources  one line a source: id, offset, length
 *   records  one JSON document a line, materials first; offsets count from the start of this section
 *
 * Fields are separated by tabs, aliases by U+001F; every section begins and ends with a newline, so that "\n" + field +
 * "\t" finds a line. Offsets and lengths are bytes. Used at build time and by tests, never by the running program.
 */
import { createHash } from 'node:crypto';
import { type CheckedValue, checkValues } from './check-values.ts';
import { axesOf } from './choose-fit.ts';
import { spellingsOf } from './names.ts';
import { AXIS_LETTERS, MAGIC, type PackedHeader } from './packed-header.ts';
import type { AbbeNumber, CheckGroup, CompositeCheck, Fit, Material, Source } from './types.ts';

export interface CatalogueSources {
  readonly version: string;
  /** ISO 8601 date of the content. */
  readonly date: string;
  readonly materials: readonly Material[];
  readonly sources: readonly Source[];
}

/** Check values of one material as stored; those of a fit under "axis/fit id". */
export interface MaterialChecks {
  readonly key: string;
  readonly checks: Readonly<Record<string, readonly CheckGroup[]>>;
  readonly abbe?: Readonly<Record<string, readonly AbbeNumber[]>>;
  readonly composite?: readonly CompositeCheck[];
}

export interface PackedCatalogue {
  readonly catalogue: Buffer;
  readonly checks: Buffer;
  readonly hash: string;
}

/** Length of the short form of the content hash, hex digits. */
const HASH_DIGITS = 12;

/** Throws an Error naming the entry if a text would break the line format or two entries share a key. */
export function packCatalogue(input: CatalogueSources): PackedCatalogue {
  const materials = [...input.materials].sort((a, b) => compare(a.key, b.key));
  const sources = [...input.sources].sort((a, b) => compare(a.id, b.id));
  refuseDuplicates('material', materials.map(keyOf));
  refuseDuplicates('source', sources.map(idOf));
  const hash = contentHash(materials, sources);

  const records: Buffer[] = [];
  let position = 0;
  /** Appends a record; its offset and length. */
  const place = (record: unknown): readonly [string, string] => {
    const bytes = Buffer.from(JSON.stringify(record));
    records.push(bytes, NEWLINE);
    const offset = position;
    position += bytes.length + 1;
    return [String(offset), String(bytes.length)];
  };
  const entryLines = materials.map((m) =>
    line([
      m.key,
      ...place(forAnswers(m)),
      axesOf(m)
        .map((axis) => AXIS_LETTERS[axis])
        .join(''),
      m.class,
      m.name,
      m.formula ?? '',
      m.glassCode ?? '',
      m.aliases.join('\u001f'),
    ]),
  );
  const sourceLines = sources.map((s) => line([s.id, ...place(s)]));
  const nameLines = materials
    .flatMap(spellingsOf)
    .sort((a, b) => compare(a.tight, b.tight))
    .map((s) => line([s.tight, s.loose, s.kind, s.key, s.text]));

  const sections = {
    names: section(nameLines),
    entries: section(entryLines),
    sources: section(sourceLines),
    records: Buffer.concat(records),
  };
  let offset = 0;
  const spans: Record<string, readonly [number, number]> = {};
  for (const [name, bytes] of Object.entries(sections)) {
    spans[name] = [offset, bytes.length];
    offset += bytes.length;
  }
  const header: PackedHeader = {
    version: input.version,
    date: input.date,
    hash,
    materials: materials.length,
    sources: sources.length,
    sections: spans as PackedHeader['sections'],
  };
  return {
    catalogue: Buffer.concat([
      Buffer.from(`${MAGIC}${JSON.stringify(header)}\n`),
      ...Object.values(sections),
    ]),
    checks: Buffer.from(materials.map((m) => JSON.stringify(checksOf(m)) + '\n').join('')),
    hash,
  };
}

/** SHA-256 over the canonical JSON (keys sorted) of all materials and sources, first twelve hex digits. */
export function contentHash(materials: readonly Material[], sources: readonly Source[]): string {
  const hash = createHash('sha256');
  for (const record of [...materials, ...sources]) hash.update(canonicalJson(record) + '\n');
  return hash.digest('hex').slice(0, HASH_DIGITS);
}

/** JSON with the keys of every object sorted and no white space: equal content gives equal text. */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (typeof value === 'object' && value !== null) {
    const fields = Object.entries(value)
      .filter(([, v]) => v !== undefined)
      .sort(([a], [b]) => compare(a, b))
      .map(([k, v]) => `${JSON.stringify(k)}:${canonicalJson(v)}`);
    return `{${fields.join(',')}}`;
  }
  return JSON.stringify(value);
}

function checksOf(material: Material): MaterialChecks {
  const byFit = <T>(of: (fit: Fit) => readonly T[] | undefined): Record<string, readonly T[]> =>
    Object.fromEntries(
      material.fits.flatMap((fit) => {
        const values = of(fit) ?? [];
        return values.length > 0 ? [[`${fit.axis}/${fit.id}`, values]] : [];
      }),
    );
  const abbe = byFit((fit) => fit.abbe);
  return {
    key: material.key,
    checks: byFit((fit) => fit.checks),
    ...(Object.keys(abbe).length > 0 ? { abbe } : {}),
    ...(material.compositeChecks ? { composite: material.compositeChecks } : {}),
  };
}

/** The record as an answer needs it: without check values, and with what they say about the digits of each fit. */
function forAnswers(material: Material): Material {
  const { compositeChecks: _, ...rest } = material;
  const values = checkValues(material);
  const fits = material.fits.map((fit) => {
    const { abbe: __, ...bare } = fit;
    const guide = fit.accuracy_n === undefined ? digitsGuide_n(fit, values) : undefined;
    return { ...bare, checks: [], ...(guide === undefined ? {} : { digitsGuide_n: guide }) };
  });
  return { ...rest, fits };
}

/**
 * The largest difference between the fit and the values of n it is tested against, and not less than half a unit of the last
 * digit of the most finely printed one: agreement with a coarse value does not make a fit fine.
 */
function digitsGuide_n(fit: Fit, values: readonly CheckedValue[]): number | undefined {
  const mine = values.filter(
    (v) => v.quantity === 'n' && v.fit === fit.id && v.axis === fit.axis && v.tolerance !== undefined,
  );
  const differences = mine.map((v) => Math.abs(v.computed - v.published)).filter(Number.isFinite);
  if (differences.length === 0) return undefined;
  const printed = Math.min(...mine.map((v) => halfUnit(v.published)));
  return Number(Math.max(printed, ...differences).toPrecision(3));
}

/** Half a unit of the last decimal place that a number is written with. */
function halfUnit(value: number): number {
  const decimals = /\.(\d+)$/.exec(value.toString())?.[1]?.length ?? 0;
  return 0.5 * 10 ** -decimals;
}

const keyOf = (material: Material): string => material.key;
const idOf = (source: Source): string => source.id;

const NEWLINE = Buffer.from('\n');

const section = (lines: readonly string[]): Buffer => Buffer.from(`\n${lines.join('\n')}\n`);

function line(fields: readonly string[]): string {
  if (fields.some((field) => /[\n\r\t]/.test(field)))
    throw new Error(`tab or line break in a name of catalogue entry "${fields[0] ?? ''}"`);
  return fields.join('\t');
}

function refuseDuplicates(what: string, keys: readonly string[]): void {
  const twice = keys.find((key, i) => keys.indexOf(key) !== i);
  if (twice !== undefined) throw new Error(`two entries of the catalogue share the ${what} key "${twice}"`);
}

const compare = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);
