/**
 * The catalogue read from its sources (catalog/materials/*.json, catalog/bibliography.json, catalog/version.json), for
 * the build, the tests and the tools. The running program reads the packed file instead (load.ts).
 */
import { readdirSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { IndexedCatalogue } from './entries.ts';
import { type CatalogueSources, packCatalogue } from './pack.ts';
import { openPacked } from './packed.ts';
import type { Material, Source } from './types.ts';

/** The catalog/ folder of this working copy. */
export const CATALOG_FOLDER = join(dirname(fileURLToPath(import.meta.url)), '..', '..', 'catalog');

/** Throws an Error naming the file if one is not JSON. */
export function readCatalogueSources(folder: string = CATALOG_FOLDER): CatalogueSources {
  const { version, date } = readJson(join(folder, 'version.json')) as { version: string; date: string };
  return {
    version,
    date,
    materials: materialFiles(folder).map((file) => readJson(file) as Material),
    sources: readJson(join(folder, 'bibliography.json')) as Source[],
  };
}

/** Paths of all material files, in the order of their names. */
export function materialFiles(folder: string = CATALOG_FOLDER): readonly string[] {
  const materials = join(folder, 'materials');
  return readdirSync(materials)
    .filter((name) => name.endsWith('.json'))
    .sort()
    .map((name) => join(materials, name));
}

let cached: IndexedCatalogue | undefined;

/** The catalogue of this working copy, packed in memory once a process. */
export function catalogueFromSources(): IndexedCatalogue {
  cached ??= openPacked(packCatalogue(readCatalogueSources()).catalogue);
  return cached;
}

function readJson(path: string): unknown {
  try {
    return JSON.parse(readFileSync(path, 'utf8'));
  } catch (error) {
    throw new Error(`${path}: ${error instanceof Error ? error.message : String(error)}`);
  }
}
