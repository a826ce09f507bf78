/** The text of a file a person names, or of standard input (`-`); trouble is a refusal with exit status 4. */
import { closeSync, fstatSync, openSync, readSync } from 'node:fs';
import { type Refusal, refuse } from '../medium/refusal.ts';

/** A table of a million points is smaller than this. */
const MAX_BYTES = 64_000_000;

export function readTextFile(path: string): string | Refusal {
  const name = path === '-' ? 'standard input' : path;
  let fd: number | undefined;
  try {
    fd = path === '-' ? 0 : openSync(path, 'r');
    if (fstatSync(fd).isDirectory())
      return refuse('file-is-folder', 4, `${name} is a folder`, 'name a file in it');
    const chunks: Buffer[] = [];
    let total = 0;
    for (;;) {
      const chunk = readSome(fd);
      if (chunk.length === 0) break;
      total += chunk.length;
      if (total > MAX_BYTES) {
        const most = `${MAX_BYTES / 1e6} MB`;
        return refuse('file-too-large', 4, `${name} holds more than ${most}`, 'thin the table out');
      }
      chunks.push(chunk);
    }
    return Buffer.concat(chunks).toString('utf8');
  } catch (error) {
    const { code } = error as NodeJS.ErrnoException;
    const why = WHY[code ?? ''] ?? `(${code ?? 'unknown error'})`;
    return refuse(
      'file-not-read',
      4,
      `${name} cannot be read ${why}`,
      'check the name and that you may read it',
    );
  } finally {
    if (fd !== undefined && fd !== 0) closeSync(fd);
  }
}

/** The next bytes; none at the end. A pipe that is empty for a moment is waited for. */
function readSome(fd: number): Buffer {
  const bytes = Buffer.allocUnsafe(65_536);
  for (;;) {
    try {
      return bytes.subarray(0, readSync(fd, bytes, 0, bytes.length, null));
    } catch (error) {
      const { code } = error as NodeJS.ErrnoException;
      if (code === 'EOF') return bytes.subarray(0, 0);
      if (code !== 'EAGAIN') throw error;
      Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, 10);
    }
  }
}

const WHY: Readonly<Record<string, string>> = {
  ENOENT: '(there is no such file)',
  ENOTDIR: '(part of its path is a file)',
  EACCES: '(not permitted)',
  EPERM: '(not permitted)',
};
