/**
 * The logbook on disk: a file of JSON lines that only grows. The one module here that touches files.
 *
 * A record is confirmed when its line is on the disk: written by a single call, followed by fsync of the file and of its folder,
 * and read back whole from the file that the path names at that moment. Short of that the caller gets a refusal.
 *
 * There is no lock, so none can be left behind by a killed program. What stands in its place:
 *   - The file is opened for appending, so the system puts the bytes of one write at the end as one piece, also while other
 *     programs append.
 *   - A write that was cut off (killed, disk full) leaves a last line without a newline. It is never taken back, since by then
 *     another program may have appended behind it: it stays as a line of its own, which readers report as unfinished.
 *     The next writer puts a newline before its own line.
 *   - Where a line was cut off between that look and the write, both run together. The reading back sees that and writes the
 *     record again on a fresh line; the glued line cannot be read as a record, since a JSON object cut off anywhere and
 *     followed by another is no JSON.
 * Limit: on a network file system that does not append as one piece, programs on different machines can overwrite each
 * other after the reading back; one machine is safe there too.
 */
import {
  closeSync,
  fstatSync,
  fsyncSync,
  mkdirSync,
  openSync,
  readSync,
  realpathSync,
  type Stats,
  statSync,
  writeSync,
} from 'node:fs';
import path from 'node:path';
import { type Refusal, refuse } from '../medium/refusal.ts';
import { diskTrouble, errorCode, shortWrite } from './disk-trouble.ts';
import { LONGEST_LINE_BYTES, linesBackward, linesForward, type RawLine, type ReadAt } from './line-reader.ts';
import type { LogbookPlace } from './logbook-path.ts';

/** The file calls used, and no others: the bundle would carry the rest along, and a test can stand in a disk that fails. */
const DISK = {
  closeSync,
  fstatSync,
  fsyncSync,
  mkdirSync,
  openSync,
  readSync,
  realpathSync,
  statSync,
  writeSync,
};
export type Files = typeof DISK;

export interface Confirmed {
  readonly confirmed: true;
  readonly path: string;
  /** Byte at which the line starts. */
  readonly offset: number;
  /** True where the line before was cut off by an earlier failure; it stays in the file. */
  readonly afterUnfinishedLine: boolean;
}

const NEWLINE = 0x0a;
const NEWLINE_BYTES = Buffer.from('\n');
/** Each attempt fails only if another write is cut off, or the file replaced, during that very attempt. */
const ATTEMPTS = 8;

/**
 * Appends one line and returns when it is confirmed.
 * @param line JSON text without a newline; throws RangeError for anything with one
 */
export function appendToLogbook(place: LogbookPlace, line: string, files: Files = DISK): Confirmed | Refusal {
  const { file } = place;
  if (line === '' || line.includes('\n')) throw new RangeError('a logbook line is one line of text');
  const bytes = Buffer.from(line, 'utf8');
  if (bytes.length > LONGEST_LINE_BYTES)
    return refuse(
      'record-too-large',
      4,
      `the record takes ${bytes.length} bytes, more than the ${LONGEST_LINE_BYTES} that one line of ${file} may have`,
      'ask a smaller question',
    );
  try {
    makeFolders(place, files);
    for (let attempt = 0; attempt < ATTEMPTS; attempt++) {
      const outcome = tryToAppend(file, bytes, attempt > 0, files);
      if (outcome) return outcome;
    }
  } catch (error) {
    return diskTrouble(error, file, 'write');
  }
  return refuse(
    'logbook-unconfirmed',
    4,
    `something else keeps changing ${file}: the record was written but not found there again`,
    'end the program that rewrites that file, or name another file for the logbook',
  );
}

/** The lines of the logbook; none where there is no such file yet. A refusal, always the last item, where reading fails. */
export function* logbookLines(
  file: string,
  order: 'oldest-first' | 'newest-first',
  files: Files = DISK,
): Generator<RawLine | Refusal, void> {
  let handle: number | undefined;
  try {
    handle = files.openSync(file, 'r');
    const stat = files.fstatSync(handle);
    if (!stat.isFile()) {
      yield notAFile(file, stat);
      return;
    }
    const lines = order === 'oldest-first' ? linesForward : linesBackward;
    yield* lines(readerOf(handle, files), stat.size);
  } catch (error) {
    if (handle === undefined && errorCode(error) === 'ENOENT') return;
    yield diskTrouble(error, file, 'read');
  } finally {
    if (handle !== undefined) files.closeSync(handle);
  }
}

/** One attempt; undefined where the line did not come to stand on its own, or the path names another file by now. */
function tryToAppend(
  file: string,
  line: Buffer,
  again: boolean,
  files: Files,
): Confirmed | Refusal | undefined {
  const handle = files.openSync(file, 'a+');
  try {
    const before = files.fstatSync(handle);
    if (!before.isFile() && !before.isCharacterDevice()) return notAFile(file, before);
    const read = readerOf(handle, files);
    const unended = before.isFile() && before.size > 0 && byteAt(read, before.size - 1) !== NEWLINE;
    const payload = Buffer.concat(
      unended || again ? [NEWLINE_BYTES, line, NEWLINE_BYTES] : [line, NEWLINE_BYTES],
    );
    const written = files.writeSync(handle, payload);
    if (written < payload.length) return shortWrite(file, written, payload.length);
    if (!before.isFile()) return notAFile(file, before);
    files.fsyncSync(handle);
    syncFolder(path.dirname(files.realpathSync(file)), files);

    const found = readBack(file, before, line, files);
    if (!found) return undefined;
    const { offset, behindWhole } = found;
    return { confirmed: true, path: file, offset, afterUnfinishedLine: (unended || again) && !behindWhole };
  } finally {
    files.closeSync(handle);
  }
}

/** Looks for the line in the file that the path names now, which may have been put in the place of the one written to. */
function readBack(
  file: string,
  before: Stats,
  line: Buffer,
  files: Files,
): { readonly offset: number; readonly behindWhole: boolean } | undefined {
  const handle = files.openSync(file, 'r');
  try {
    const now = files.fstatSync(handle);
    const isSame = now.ino === before.ino && now.dev === before.dev;
    const read = readerOf(handle, files);
    const offset = findLine(read, isSame ? Math.max(0, before.size - 1) : 0, now.size, line);
    if (offset === undefined) return undefined;
    if (!isSame) files.fsyncSync(handle);
    return { offset, behindWhole: isWhole(linesBackward(read, offset).next().value ?? undefined) };
  } finally {
    files.closeSync(handle);
  }
}

/** Where the line stands alone between two newlines (or at the start of the file), looking from a byte on. */
function findLine(read: ReadAt, from: number, size: number, line: Buffer): number | undefined {
  const region = Buffer.alloc(Math.max(0, size - from));
  for (let got = 0; got < region.length; ) {
    const more = read(region.subarray(got), from + got);
    if (more === 0) break;
    got += more;
  }
  for (let at = region.indexOf(line); at >= 0; at = region.indexOf(line, at + 1)) {
    const startsLine = at === 0 ? from === 0 : region[at - 1] === NEWLINE;
    if (startsLine && region[at + line.length] === NEWLINE) return from + at;
  }
  return undefined;
}

function isWhole(line: RawLine | undefined): boolean {
  if (!line) return true;
  try {
    JSON.parse(line.text);
    return true;
  } catch {
    return false;
  }
}

function readerOf(handle: number, files: Files): ReadAt {
  return (buffer, position) => files.readSync(handle, buffer, 0, buffer.length, position);
}

function byteAt(read: ReadAt, position: number): number | undefined {
  const byte = Buffer.alloc(1);
  return read(byte, position) === 1 ? byte[0] : undefined;
}

function notAFile(file: string, stat: Stats): Refusal {
  if (stat.isDirectory()) return diskTrouble(Object.assign(new Error(), { code: 'EISDIR' }), file, 'write');
  return refuse(
    'logbook-path',
    4,
    `${file} is a device or a pipe, not a file; nothing is kept there`,
    'name a file for the logbook',
  );
}

/** Makes the missing folders between the base and the file, each of them on disk before the next one. */
function makeFolders({ file, base }: LogbookPlace, files: Files): void {
  const missing: string[] = [];
  for (let at = path.dirname(file); at !== base && !isExistingFolder(at, files); at = path.dirname(at)) {
    if (path.dirname(at) === at) break;
    missing.push(at);
  }
  for (const at of missing.reverse()) {
    try {
      files.mkdirSync(at, { mode: 0o700 });
    } catch (error) {
      // Another program may have made it meanwhile.
      if (!isExistingFolder(at, files)) throw error;
    }
    syncFolder(path.dirname(at), files);
  }
}

function isExistingFolder(folder: string, files: Files): boolean {
  try {
    return files.statSync(folder).isDirectory();
  } catch {
    return false;
  }
}

/** Brings the folder's entries to disk; systems that cannot do that for folders say so by one of these codes. */
function syncFolder(folder: string, files: Files): void {
  const handle = files.openSync(folder, 'r');
  try {
    files.fsyncSync(handle);
  } catch (error) {
    if (!['EINVAL', 'ENOTSUP', 'EPERM', 'EISDIR', 'EBADF'].includes(errorCode(error) ?? '')) throw error;
  } finally {
    files.closeSync(handle);
  }
}
