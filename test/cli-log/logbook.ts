/** A logbook of its own for each test, and command lines that use it. */
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { isRefusal } from '../../src/medium/refusal.ts';
import { keepRecord, logEntries } from '../../src/record/logbook.ts';
import { placeAt } from '../../src/record/logbook-path.ts';
import { type LogRecord, makeRecord, type RecordInput } from '../../src/record/record.ts';
import { type Outcome, run, type Surroundings } from '../cli/in-process.ts';

export class TestLogbook {
  readonly folder = mkdtempSync(path.join(tmpdir(), 'halfspace-log-'));
  readonly file = path.join(this.folder, 'logbook.jsonl');

  /** Runs a command line with this logbook. */
  run(words: readonly string[], surroundings: Surroundings = {}): Promise<Outcome> {
    return run([...words, '--log-file', this.file], surroundings);
  }

  records(): readonly LogRecord[] {
    return [...logEntries(this.file, 'oldest-first')].flatMap((entry) =>
      entry.kind === 'record' && !entry.altered ? [entry.record] : [],
    );
  }

  last(): LogRecord {
    const record = this.records().at(-1);
    if (!record) throw new Error('the logbook is empty');
    return record;
  }

  text(): string {
    return readFileSync(this.file, 'utf8');
  }

  /** Keeps the first record again with other content, whole and with an id that fits. */
  keepAs(change: Partial<RecordInput>): LogRecord {
    const [first] = this.records();
    if (!first) throw new Error('the logbook is empty');
    const { commandWords, question, asked, answer, rows, cautions, time, catalogue, program } = first;
    const record = makeRecord({
      ...{ commandWords, question, asked, answer, rows, cautions, time, catalogue },
      version: program.version,
      ...change,
    });
    const kept = keepRecord(placeAt(this.file), record);
    if (isRefusal(kept)) throw new Error(kept.message);
    return record;
  }

  remove(): void {
    rmSync(this.folder, { recursive: true, force: true });
  }
}
