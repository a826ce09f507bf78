/**
 * Reads the folder of a user's own entries: $XDG_DATA_HOME/halfspace/materials (by default
 * ~/.local/share/halfspace/materials), or the one the user names. Where it does not exist the cost is one look at the disk.
 */
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import { homedir } from 'node:os';
import { isAbsolute, join } from 'node:path';
import type { OwnFile, OwnProblem } from './own.ts';

export interface OwnFolder {
  readonly files: readonly OwnFile[];
  readonly problems: readonly OwnProblem[];
}

/** A table of a hundred thousand rows is smaller than this. */
const MAX_BYTES = 8_000_000;

/** The default folder. Relative values of XDG_DATA_HOME are ignored, as the XDG base directory specification asks. */
export function ownFolderPath(env: Readonly<Record<string, string | undefined>>): string {
  const data = env['XDG_DATA_HOME'];
  const base =
    data !== undefined && isAbsolute(data) ? data : join(env['HOME'] || homedir(), '.local', 'share');
  return join(base, 'halfspace', 'materials');
}

/** All .json and .csv files of the folder in the order of their names; undefined where there is no such folder. */
export function readOwnFolder(folder: string): OwnFolder | undefined {
  try {
    if (!existsSync(folder) || !statSync(folder).isDirectory()) return undefined;
    const files: OwnFile[] = [];
    const problems: OwnProblem[] = [];
    const names = readdirSync(folder).filter((n) => !n.startsWith('.') && /\.(json|csv)$/i.test(n));
    for (const name of names.sort()) {
      const path = join(folder, name);
      const read = readText(path);
      if (typeof read === 'string') files.push({ path, name, text: read });
      else problems.push({ file: path, path: '', ...read });
    }
    return { files, problems };
  } catch (error) {
    // A path that runs through a file: as good as absent.
    if (codeOf(error) === 'ENOTDIR') return undefined;
    return { files: [], problems: [{ file: folder, path: '', ...unreadable(error) }] };
  }
}

type Unreadable = Pick<OwnProblem, 'message' | 'remedy'>;

function readText(path: string): string | Unreadable {
  try {
    const stat = statSync(path);
    if (!stat.isFile()) return { message: 'is not a regular file', remedy: 'move it elsewhere' };
    if (stat.size > MAX_BYTES)
      return { message: `is larger than ${MAX_BYTES / 1e6} MB`, remedy: 'thin the table out' };
    return readFileSync(path, 'utf8');
  } catch (error) {
    return unreadable(error);
  }
}

function unreadable(error: unknown): Unreadable {
  return {
    message: `cannot be read (${codeOf(error)})`,
    remedy: 'check that it exists and that you may read it',
  };
}

const codeOf = (error: unknown): string =>
  error instanceof Error && 'code' in error ? String(error.code) : 'unknown error';
