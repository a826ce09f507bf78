/**
 * Opens the catalogue: the packed file beside the running program, and the user's own entries beside it. One read and no
 * parsing beyond a short header (see packed.ts). Run from the sources, it takes the file of the last build.
 */
import { existsSync, fstatSync, openSync, readFileSync, readSync } from 'node:fs';
import { join } from 'node:path';
import type { IndexedCatalogue } from './entries.ts';
import { type OwnProblem, readOwnFiles, withOwn } from './own.ts';
import { ownFolderPath, readOwnFolder } from './own-folder.ts';
import { indexLength, openPacked, packedLength } from './packed.ts';
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
  /** The folder of the packed files; that of the program itself where absent. */
  readonly folder?: string;
  /** Where XDG_DATA_HOME is looked up; `process.env` where absent. */
  readonly env?: Readonly<Record<string, string | undefined>>;
}

/**
 * @throws CatalogueFileError if the packed file is missing or damaged. The user's files never throw; a folder that was
 * named but does not exist is among the problems.
 */
export function loadCatalogue(options: LoadOptions = {}): LoadedCatalogue {
  const bundled = openBundled(options.folder);
  const path = options.ownFolder ?? ownFolderPath(options.env ?? process.env);
  const folder = readOwnFolder(path);
  if (!folder)
    return { catalogue: bundled, problems: options.ownFolder === undefined ? [] : [noFolder(path)] };
  const own = readOwnFiles(folder.files, bundled);
  return { catalogue: withOwn(bundled, own), problems: [...folder.problems, ...own.problems] };
}

/** The bundled catalogue alone. */
export function openBundled(folder?: string): IndexedCatalogue {
  const path = pathOf(CATALOGUE_FILE, folder);
  try {
    // Stays open: records are read when they are asked for, and from this file even if another replaces it meanwhile.
    const file = openSync(path, 'r');
    const read = (from: number, length: number): Buffer => {
      const bytes = Buffer.allocUnsafe(length);
      return bytes.subarray(0, readSync(file, bytes, 0, length, from));
    };
    const start = read(0, FIRST_READ);
    const length = indexLength(start);
    const bytes = length <= start.length ? start : read(0, length);
    if (fstatSync(file).size !== packedLength(bytes)) throw new Error('the file is cut short or changed');
    return openPacked(bytes, read);
  } catch (error) {
    throw new CatalogueFileError(`${path}: ${error instanceof Error ? error.message : String(error)}`);
  }
}

/** Holds header and index at once unless the catalogue has grown; reading the whole file would take five times as long. */
const FIRST_READ = 160_000;

/** The check values, one JSON document a line (see pack.ts); only the self-test reads them. */
export function readCheckValues(folder?: string): string {
  const path = pathOf(CHECKS_FILE, folder);
  try {
    return readFileSync(path, 'utf8');
  } catch (error) {
    throw new CatalogueFileError(`${path}: ${error instanceof Error ? error.message : String(error)}`);
  }
}

/** Beside the running program, or, where it runs from its sources, in the folder of the last build. */
function pathOf(name: string, folder: string | undefined): string {
  if (folder !== undefined) return join(folder, name);
  const here = import.meta.dirname;
  const built = join(here, '..', '..', 'dist', name);
  return here.endsWith('catalog') && existsSync(built) ? built : join(here, name);
}

const noFolder = (path: string): OwnProblem => ({
  file: path,
  path: '',
  message: 'is not a folder that exists',
  remedy: 'name the folder that holds your .json and .csv files',
});
