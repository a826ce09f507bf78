/**
 * Writes a file whole or not at all: to a file beside it, then renamed in its place. What is no regular file (a device, a
 * pipe) is written as it stands; a symbolic link keeps pointing where it does. Never throws for trouble with the disk.
 */
import { linkSync, realpathSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { basename, dirname, join } from 'node:path';
import { type Refusal, refuse } from '../medium/refusal.ts';

export interface SaveOptions {
  /** False: a file that is there stays, and the refusal says so. */
  readonly replace: boolean;
}

/** Undefined where the text is on disk, else why not (exit status 4). */
export function saveFile(path: string, text: string, { replace }: SaveOptions): Refusal | undefined {
  try {
    const stat = statSync(path, { throwIfNoEntry: false });
    if (stat?.isDirectory()) return refuse('file-is-folder', 4, `${path} is a folder`, 'name a file in it');
    if (stat && !replace) return alreadyThere(path);
    if (stat && !stat.isFile()) {
      writeFileSync(path, text);
      return undefined;
    }
    const target = stat ? realpathSync(path) : path;
    writeWhole(target, text, stat?.mode, replace);
    return undefined;
  } catch (error) {
    const code = codeOf(error);
    return code === 'EEXIST' && !replace ? alreadyThere(path) : cannotWrite(path, code);
  }
}

function writeWhole(target: string, text: string, mode: number | undefined, replace: boolean): void {
  const beside = join(dirname(target), `.${basename(target)}.${process.pid}.part`);
  try {
    writeFileSync(beside, text, { flag: 'wx', ...(mode === undefined ? {} : { mode }) });
  } catch (error) {
    // A folder that takes no new files may hold one that can be written.
    if (mode === undefined || codeOf(error) !== 'EACCES') throw error;
    writeFileSync(target, text);
    return;
  }
  try {
    if (replace || !linked(beside, target)) renameSync(beside, target);
  } finally {
    rmSync(beside, { force: true });
  }
}

/** A link fails where a file has come to stand meanwhile; a rename would write over it. False where links are not known. */
function linked(beside: string, target: string): boolean {
  try {
    linkSync(beside, target);
    return true;
  } catch (error) {
    if (codeOf(error) === 'EEXIST') throw error;
    return false;
  }
}

const codeOf = (error: unknown): string | undefined => (error as NodeJS.ErrnoException).code;

const alreadyThere = (path: string): Refusal =>
  refuse(
    'file-exists',
    4,
    `${path} is there already and stays as it is`,
    'name another file, or add --force',
  );

function cannotWrite(path: string, code: string | undefined): Refusal {
  const why = WHY[code ?? ''] ?? `(${code ?? 'unknown error'})`;
  return refuse('file-not-written', 4, `${path} cannot be written ${why}`, 'name a place you may write to');
}

const WHY: Readonly<Record<string, string>> = {
  ENOENT: '(its folder does not exist)',
  ENOTDIR: '(its folder is a file)',
  EACCES: '(not permitted)',
  EPERM: '(not permitted)',
  EROFS: '(the file system is read-only)',
  ENOSPC: '(the disk is full)',
  ENAMETOOLONG: '(the name is too long)',
};
