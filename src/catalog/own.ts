/**
 * Entries of the user's own: checks the texts of their files and lays them beside the bundled catalogue.
 *
 * A faulty file is reported (file, place in it, what is wrong, what would be right) and skipped; the others still load.
 * Own entries never displace bundled ones: a key that is already a spelling of a bundled material is refused, and a name,
 * alias or formula shared with a bundled material ranks as the bundled one does, so that the look-up reports both.
 * Pure: own-folder.ts reads the files.
 */
import { checkMaterial } from './check-material.ts';
import { checkShape, type Fault } from './check-shape.ts';
import type { CatalogueEntry, IndexedCatalogue, Spelling } from './entries.ts';
import { entryOf } from './entries.ts';
import { foldTight } from './fold.ts';
import { lookupIn } from './lookup.ts';
import { ownMaterialShape, sourceShape } from './material-shape.ts';
import { SPELLING_RANK, spellingsOf } from './names.ts';
import { once } from './once.ts';
import { readOwnCsv } from './own-csv.ts';
import { list } from './shape.ts';
import type { Fit, Material, Source } from './types.ts';

/** A file of the user's folder, as text. */
export interface OwnFile {
  /** As messages should name it. */
  readonly path: string;
  /** Without folder. */
  readonly name: string;
  readonly text: string;
}

/** Something wrong with one file; `path` is the place in it and may be empty. */
export interface OwnProblem extends Fault {
  readonly file: string;
}

export interface OwnEntries {
  readonly materials: readonly Material[];
  readonly sources: readonly Source[];
  readonly problems: readonly OwnProblem[];
}

/** One line for a person: where, what, remedy. */
export function problemText(p: OwnProblem): string {
  return `${p.file}${p.path === '' ? '' : `: ${p.path}`} ${p.message}; ${p.remedy}`;
}

export const OWN_BIBLIOGRAPHY = 'bibliography.json';

/** Reads every file it can. Never throws, whatever the texts hold. */
export function readOwnFiles(files: readonly OwnFile[], bundled: IndexedCatalogue): OwnEntries {
  const materials = new Map<string, Material>();
  /** Keys by their tight folds: two that differ in case or hyphens alone are one to a person. */
  const keys = new Map<string, string>();
  const sources = new Map<string, Source>();
  const problems: OwnProblem[] = [];
  const report = (file: OwnFile, faults: readonly Fault[]): void => {
    for (const fault of faults) problems.push({ file: file.path, ...fault });
  };
  const addSources = (items: readonly Source[], place: string): readonly Fault[] =>
    items.flatMap((item, i) => {
      const id = `${place}[${i}].id`;
      const used = { path: id, message: `"${item.id}" is already used`, remedy: 'choose another id' };
      if (bundled.source(item.id) || sources.has(item.id)) return [used];
      sources.set(item.id, item);
      return [];
    });
  const hasSource = (id: string): boolean => sources.has(id) || bundled.source(id) !== undefined;

  const bibliography = files.find((f) => f.name === OWN_BIBLIOGRAPHY);
  if (bibliography) {
    const items = parse(bibliography.text, list(sourceShape()));
    if (items.faults) report(bibliography, items.faults);
    else report(bibliography, addSources(items.value as readonly Source[], ''));
  }
  for (const file of files) {
    if (file === bibliography) continue;
    const read = file.name.toLowerCase().endsWith('.csv') ? readCsv(file) : readJson(file);
    if ('faults' in read) {
      report(file, read.faults);
      continue;
    }
    const taken = takenBy(read.material.key, bundled, keys);
    if (taken) {
      report(file, [
        { path: 'key', message: `"${read.material.key}" ${taken}`, remedy: 'choose a key of its own' },
      ]);
      continue;
    }
    const faults = [...addSources(read.sources, 'sources'), ...checkMaterial(read.material, hasSource)];
    report(file, faults);
    if (faults.length > 0) continue;
    materials.set(read.material.key, read.material);
    keys.set(foldTight(read.material.key), read.material.key);
  }
  return { materials: [...materials.values()], sources: [...sources.values()], problems };
}

type Read =
  | { readonly material: Material; readonly sources: readonly Source[] }
  | { readonly faults: readonly Fault[] };

function readCsv(file: OwnFile): Read {
  const table = readOwnCsv(file.name.replace(/\.csv$/i, ''), file.text);
  return 'material' in table ? { material: table.material, sources: [table.source] } : { faults: table };
}

function readJson(file: OwnFile): Read {
  const parsed = parse(file.text, ownMaterialShape());
  if (parsed.faults) return { faults: parsed.faults };
  const { sources = [], ...raw } = parsed.value as OwnMaterial;
  return { material: completed(raw), sources };
}

type OwnFit = Pick<Fit, 'parameters' | 'range_um' | 'reference' | 'source'> & Partial<Fit>;
type OwnMaterial = Pick<Material, 'key' | 'name'> &
  Partial<Omit<Material, 'fits'>> & {
    readonly fits: readonly OwnFit[];
    readonly sources?: readonly Source[];
  };

/** Fills in what an own file may leave out; the first fit of an axis is the recommended one where none is named. */
function completed(raw: OwnMaterial): Material {
  const axis = (fit: OwnFit) => fit.axis ?? 'isotropic';
  return {
    aliases: [],
    class: 'own entry',
    ...raw,
    own: true,
    fits: raw.fits.map((fit, i) => {
      const peers = raw.fits.filter((f) => axis(f) === axis(fit));
      return {
        id: `fit-${i + 1}`,
        axis: 'isotropic',
        recommended: peers.some((f) => f.recommended) ? false : peers[0] === fit,
        grade: 'B',
        recalled: false,
        checks: [],
        ...fit,
      };
    }),
  };
}

type Parsed =
  | { readonly value: unknown; readonly faults?: undefined }
  | { readonly faults: readonly Fault[] };

function parse(text: string, shape: Parameters<typeof checkShape>[1]): Parsed {
  let value: unknown;
  try {
    value = JSON.parse(text.replace(/^\ufeff/, ''));
  } catch (error) {
    const why = error instanceof Error ? error.message.replace(/\p{Cc}/gu, ' ') : String(error);
    return { faults: [{ path: '', message: `is not JSON (${why})`, remedy: 'correct it there' }] };
  }
  const faults = [...checkShape(value, shape), ...controlCharacters(value)];
  return faults.length > 0 ? { faults } : { value };
}

/** Texts reach the terminal, so none may carry an escape code, in whatever corner of the file it stands. */
function controlCharacters(root: unknown): readonly Fault[] {
  const waiting: unknown[] = [root];
  while (waiting.length > 0) {
    const value = waiting.pop();
    if (typeof value === 'string' && /\p{Cc}/u.test(value))
      return [
        {
          path: '',
          message: `holds a control character in the text ${JSON.stringify(value.slice(0, 40))}`,
          remedy: 'remove it',
        },
      ];
    if (typeof value === 'object' && value !== null)
      waiting.push(...Object.keys(value), ...Object.values(value));
  }
  return [];
}

/** Why a key is not free, as the end of a sentence. */
function takenBy(
  key: string,
  bundled: IndexedCatalogue,
  ownKeys: ReadonlyMap<string, string>,
): string | undefined {
  const tight = foldTight(key);
  const [first] = bundled.spellings(tight);
  if (first) return `names the bundled entry ${first.key}, which stays`;
  const twin = ownKeys.get(tight);
  return twin === undefined ? undefined : `is the key of another file (${twin})`;
}

/** The bundled catalogue with own entries beside it. Hash, date and version remain those of the bundled content. */
export function withOwn(bundled: IndexedCatalogue, own: OwnEntries): IndexedCatalogue {
  if (own.materials.length === 0 && own.sources.length === 0) return bundled;
  const materials = new Map(own.materials.map((m) => [m.key, m]));
  const sources = new Map(own.sources.map((s) => [s.id, s]));
  const ownEntries = new Map(own.materials.map((m) => [m.key, entryOf(m)]));
  const all = once((): readonly CatalogueEntry[] => [...bundled.entries(), ...ownEntries.values()]);
  const ownSpellings = once(() => byTightForm(own.materials.flatMap(spellingsOf)));
  const merged: IndexedCatalogue = {
    version: bundled.version,
    hash: bundled.hash,
    date: bundled.date,
    size: bundled.size + materials.size,
    lookup: (name) => lookupIn(name, merged),
    material: (key) => materials.get(key) ?? bundled.material(key),
    keys: () => [...bundled.keys(), ...materials.keys()],
    source: (id) => bundled.source(id) ?? sources.get(id),
    entries: all,
    entry: (key) => ownEntries.get(key) ?? bundled.entry(key),
    spellings(tight) {
      const base = bundled.spellings(tight);
      const mine = ownSpellings().get(tight) ?? [];
      return mine.length === 0 ? base : [...base, ...mine.map((s) => notAbove(base, s))];
    },
    sourceIds: () => [...bundled.sourceIds(), ...sources.keys()],
  };
  return merged;
}

function byTightForm(spellings: readonly Spelling[]): ReadonlyMap<string, readonly Spelling[]> {
  const forms = new Map<string, Spelling[]>();
  for (const spelling of spellings) {
    const same = forms.get(spelling.tight);
    if (same) same.push(spelling);
    else forms.set(spelling.tight, [spelling]);
  }
  return forms;
}

/** An own spelling, weakened to the strongest bundled kind of the same loose form (or tight form, where none has that). */
function notAbove(base: readonly Spelling[], own: Spelling): Spelling {
  const close = base.filter((s) => s.loose === own.loose);
  const rivals = [...(close.length > 0 ? close : base)];
  const [strongest] = rivals.sort((a, b) => SPELLING_RANK[a.kind] - SPELLING_RANK[b.kind]);
  return strongest && SPELLING_RANK[strongest.kind] > SPELLING_RANK[own.kind]
    ? { ...own, kind: strongest.kind }
    : own;
}
