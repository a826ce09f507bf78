/** Reading the logbook for a command: records as they come, and what is to be said of the lines that are none. */
import { isRefusal, type Refusal, refuse } from '../../medium/refusal.ts';
import { type LogEntry, logEntries, type RecordEntry, recordsOf } from '../../record/logbook.ts';
import { harmless } from '../../record/record-parts.ts';

export class Reading {
  readonly file: string;
  /** Why reading ended before the end of the file. */
  trouble: Refusal | undefined;
  #records = 0;
  #unfinished = 0;
  #foreign = 0;

  constructor(file: string) {
    this.file = file;
  }

  /** Every line of the file, counted on the way. */
  *entries(order: 'oldest-first' | 'newest-first'): Generator<LogEntry, void> {
    this.#records = 0;
    this.#unfinished = 0;
    this.#foreign = 0;
    for (const entry of logEntries(this.file, order)) {
      if (entry.kind === 'record') this.#records += 1;
      else if (entry.kind === 'unfinished') this.#unfinished += 1;
      else if (entry.kind === 'foreign') this.#foreign += 1;
      yield entry;
    }
  }

  *records(order: 'oldest-first' | 'newest-first'): Generator<RecordEntry, void> {
    yield* this.only(recordsOf(this.entries(order)));
  }

  /** The records of a selection; a refusal among them becomes the trouble. */
  *only(found: Iterable<RecordEntry | Refusal>): Generator<RecordEntry, void> {
    for (const entry of found) {
      if (isRefusal(entry)) this.trouble = entry;
      else yield entry;
    }
  }

  /** Of the lines read so far. */
  notes(ascii: boolean): readonly string[] {
    const file = harmless(this.file, { ascii });
    const lines = (count: number): string => (count === 1 ? '1 line' : `${count} lines`);
    return [
      ...(this.#unfinished === 0
        ? []
        : [`${lines(this.#unfinished)} of ${file} cut off while being written, never confirmed`]),
      ...(this.#foreign === 0 ? [] : [`${lines(this.#foreign)} of ${file} not written by halfspace`]),
    ];
  }

  /** Whether no record was met. */
  get isEmpty(): boolean {
    return this.#records === 0;
  }
}

export function emptyLogbook(file: string): Refusal {
  return refuse('logbook-empty', 2, `there is no record in ${file}`, 'add --log to a question to keep one');
}
