/**
 * The flow of a batch: read a chunk, answer its rows, write what has been answered. The next chunk is read and the last bytes
 * are written while rows are answered; a reader that is slow to take them holds everything up, so that memory does not grow.
 */
import type { BatchFormat } from './batch-format.ts';
import type { ByteWriter } from './byte-writer.ts';

export interface ByteSource {
  /** The next bytes, good until the next but one are asked for; undefined at the end. */
  readonly read: () => Promise<Buffer | undefined>;
  /** True where more bytes were there when the last were read: worth reading ahead. */
  readonly plenty: () => boolean;
}

export interface ByteSink {
  /** False where nobody reads any more. */
  readonly write: (bytes: Uint8Array) => Promise<boolean>;
}

export interface BatchControl {
  /** Asked between rows: true ends the batch after the rows answered so far. */
  readonly interrupted: () => boolean;
  /** Whom to call when that becomes true while the batch waits for input. */
  readonly onInterrupt: (wake: () => void) => void;
  /** Lets signals and streams have their turn. */
  readonly turn: () => Promise<void>;
  /** Told now and then how many rows are done. */
  readonly progress: (rows: number) => void;
}

export type BatchEnd = 'done' | 'interrupted' | 'reader-gone' | 'fatal';

/** Rows answered between two looks at the outside: a moment's work for whole answers, and of no weight for the short way. */
const STRIDE = 64;
/** Bytes worth a write. */
const FULL = 1 << 16;
/** Rows between two turns of the event loop while rows go the short way. */
const ROWS_PER_TURN = 1 << 14;

export async function runBatch(
  format: BatchFormat,
  writer: ByteWriter,
  sources: AsyncIterable<ByteSource>,
  sink: ByteSink,
  control: BatchControl,
): Promise<BatchEnd> {
  let writing: Promise<boolean> = Promise.resolve(true);
  let turnAt = 0;
  /** Hands on what is there once the bytes before it are out. */
  const flush = async (): Promise<boolean> => {
    if (!(await writing)) return false;
    if (writer.length > 0) writing = sink.write(writer.take());
    return true;
  };
  const rows = async (): Promise<BatchEnd | undefined> => {
    for (;;) {
      const stepped = format.run(STRIDE);
      const step = stepped instanceof Promise ? await stepped : stepped;
      if (format.fatal) return 'fatal';
      if (writer.length >= FULL && !(await flush())) return 'reader-gone';
      if (control.interrupted()) return 'interrupted';
      if (step === 'hungry') return undefined;
      if (format.rows >= turnAt) {
        turnAt = format.rows + (format.slow ? STRIDE : ROWS_PER_TURN);
        control.progress(format.rows);
        if (format.slow && !(await flush())) return 'reader-gone';
        await control.turn();
      }
    }
  };
  let wake: () => void = () => undefined;
  control.onInterrupt(() => wake());
  /** The chunk, or nothing as soon as the batch is interrupted. */
  const wait = (reading: Promise<Buffer | undefined>): Promise<Buffer | undefined> =>
    new Promise((resolve, reject) => {
      wake = () => resolve(undefined);
      reading.then(resolve, reject);
    });
  const all = async (): Promise<BatchEnd> => {
    for await (const source of sources) {
      let next = source.read();
      for (;;) {
        const chunk = await wait(next);
        if (control.interrupted()) return 'interrupted';
        if (!chunk) break;
        format.push(chunk);
        const ahead = source.plenty();
        if (ahead) next = source.read();
        const end = await rows();
        if (end) return end;
        control.progress(format.rows);
        if (!ahead) {
          // Somebody may be waiting for these answers before asking more.
          if (!(await flush()) || !(await writing)) return 'reader-gone';
          next = source.read();
        }
      }
      format.end();
      const end = await rows();
      if (end) return end;
    }
    return 'done';
  };
  const end = await all();
  const out = (await flush()) && (await writing);
  return out ? end : 'reader-gone';
}
