/**
 * Opens the catalogue: the packed file beside the running program, and the user's own entries beside it. One read and no
 * parsing beyond a short header (see packed.ts). Run from the sources, it takes the file of the last build.
 */
import { readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { IndexedCatalogue } from './entries.ts';
import { type OwnProblem, readOwnFiles, withOwn } from './own.ts';
import { ownFolderPath, readOwnFolder } from './own-folder.ts';
import { openPacked } from './packed.ts';
import { CATALOGUE_FILE, CHECKS_FILE } from './packed-header.ts';

export interface LoadedCatalogue {
  readonly catalogue: IndexedCatalogue;
  /** What was wrong with the user's own files; the rest of them is loaded. */
  readonly problems: readonly OwnProblem[];
}

/** The program's own data file is missing or damaged: nothing can be answered. */
export class CatalogueFileError extends Error {
  readonly remedy = 'install the program again, or run its build';
}

export interface LoadOptions {
  /** The folder that the user names in place of the default one. */
  readonly ownFolder?: string | undefined;
  /** Where XDG_DATA_HOME is looked up; `process.env` where absent. */
  readonly env?: Readonly<Record<string, string | undefined>>;
}

/**
 * @throws CatalogueFileError if the packed file is missing or damaged. The user's files never throw; a folder that was
 * named but does not exist is among the problems.
 */
export function loadCatalogue(options: LoadOptions = {}): LoadedCatalogue {
  const bundled = openBundled();
  const path = options.ownFolder ?? ownFolderPath(options.env ?? process.env);
  const folder = readOwnFolder(path);
  if (!folder)
    return { catalogue: bundled, problems: options.ownFolder === undefined ? [] : [noFolder(path)] };
  const own = readOwnFiles(folder.files, bundled);
  return { catalogue: withOwn(bundled, own), problems: [...folder.problems, ...own.problems] };
}

/** The bundled catalogue alone. */
export function openBundled(): IndexedCatalogue {
  const bytes = readPacked(CATALOGUE_FILE);
  try {
    return openPacked(bytes);
  } catch (error) {
    throw new CatalogueFileError(
      `${CATALOGUE_FILE}: ${error instanceof Error ? error.message : String(error)}`,
    );
  }
}

/** The check values, one JSON document a line (see pack.ts); only the self-test reads them. */
export function readCheckValues(): string {
  return readPacked(CHECKS_FILE).toString('utf8');
}

function readPacked(name: string): Buffer {
  const here = dirname(fileURLToPath(import.meta.url));
  const beside = join(here, name);
  for (const path of [beside, join(here, '..', '..', 'dist', name)]) {
    try {
      return readFileSync(path);
    } catch {
      // Not there: try the next place, then say where it should have been.
    }
  }
  throw new CatalogueFileError(`${beside} cannot be read`);
}

const noFolder = (path: string): OwnProblem => ({
  file: path,
  path: '',
  message: 'is not a folder that exists',
  remedy: 'name the folder that holds your .json and .csv files',
});
