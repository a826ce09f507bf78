/**
 * Files and pipes as chunks of bytes, for batches: read ahead and written behind in the background, in order, whole. A pipe
 * that is full or empty for a moment is asked again; a reader that has gone is told, not thrown.
 */
import { close, constants, fstatSync, ftruncateSync, open, read, statSync, write } from 'node:fs';
import { promisify } from 'node:util';
import type { ByteSink, ByteSource } from '../batch/run-batch.ts';

const openFile = promisify(open);
const closeFile = promisify(close);
/** As much as a pipe gives at once. */
const CHUNK = 1 << 16;
const AGAIN_AFTER_ms = 5;

export interface OpenFile {
  readonly descriptor: number;
  readonly close: () => Promise<void>;
}

/** `-` is standard input, which stays open. Throws the error of the system. */
export async function openInput(path: string): Promise<OpenFile> {
  if (path === '-') return { descriptor: 0, close: () => Promise.resolve() };
  return opened(await openFile(path, 'r'));
}

/** `-` is standard output, which stays open. A file keeps what it holds until `emptyFile`. Throws the error of the system. */
export async function openOutput(path: string): Promise<OpenFile> {
  if (path === '-') return { descriptor: 1, close: () => Promise.resolve() };
  return opened(await openFile(path, constants.O_WRONLY | constants.O_CREAT, 0o666));
}

const opened = (descriptor: number): OpenFile => ({ descriptor, close: () => closeFile(descriptor) });

/** Takes out what the file holds; a pipe or a device has nothing to take. */
export function emptyFile(descriptor: number): void {
  if (fstatSync(descriptor).isFile()) ftruncateSync(descriptor, 0);
}

/** True where the input is the very file that is open for writing; a path that names no file is none. */
export function isSameFile(path: string, descriptor: number): boolean {
  const input = path === '-' ? fstatSync(0) : statSync(path, { throwIfNoEntry: false });
  const output = fstatSync(descriptor);
  return input?.isFile() === true && output.isFile() && input.dev === output.dev && input.ino === output.ino;
}

export function byteSource(descriptor: number): ByteSource {
  // The reader of rows holds one buffer while the other fills.
  const buffers = [Buffer.allocUnsafe(CHUNK), Buffer.allocUnsafe(CHUNK)];
  let turn = 0;
  let plenty = false;
  return {
    plenty: () => plenty,
    async read() {
      turn = 1 - turn;
      const buffer = buffers[turn]!;
      const length = await readSome(descriptor, buffer);
      plenty = length === CHUNK;
      return length === 0 ? undefined : buffer.subarray(0, length);
    },
  };
}

function readSome(descriptor: number, buffer: Buffer): Promise<number> {
  return new Promise((resolve, reject) => {
    const attempt = (): void => {
      read(descriptor, buffer, 0, buffer.length, null, (error, length) => {
        if (!error) resolve(length);
        else if (error.code === 'EAGAIN') setTimeout(attempt, AGAIN_AFTER_ms);
        else if (error.code === 'EOF') resolve(0);
        else reject(error);
      });
    };
    attempt();
  });
}

export function byteSink(descriptor: number): ByteSink {
  return {
    write: (bytes) =>
      new Promise((resolve, reject) => {
        let done = 0;
        const attempt = (): void => {
          write(descriptor, bytes, done, bytes.length - done, null, (error, length) => {
            if (error?.code === 'EAGAIN') setTimeout(attempt, AGAIN_AFTER_ms);
            else if (error?.code === 'EPIPE') resolve(false);
            else if (error) reject(error);
            else {
              done += length;
              if (done < bytes.length) attempt();
              else resolve(true);
            }
          });
        };
        if (bytes.length === 0) resolve(true);
        else attempt();
      }),
  };
}
