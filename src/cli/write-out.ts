/**
 * Writing to a file descriptor to the last byte: pipes take part of a large text at a time and may be full for a moment.
 * A reader that has gone away (EPIPE) ends the output silently.
 */
import { writeSync } from 'node:fs';

/** False where the reader has gone. Other errors are thrown. */
export function writeOut(fd: number, text: string): boolean {
  const bytes = Buffer.from(text, 'utf8');
  let done = 0;
  while (done < bytes.length) {
    try {
      done += writeSync(fd, bytes, done, bytes.length - done);
    } catch (error) {
      const { code } = error as NodeJS.ErrnoException;
      if (code === 'EPIPE') return false;
      if (code !== 'EAGAIN') throw error;
      // The pipe is full: let the reader catch up.
      Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, 5);
    }
  }
  return true;
}
