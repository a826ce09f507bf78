/**
 * A standard output for tests: it keeps every write and shows them on a terminal model.
 */
import { EventEmitter } from 'node:events';
import { TerminalModel } from './terminal-model.ts';

export class RecordedOutput extends EventEmitter {
  readonly writes: string[] = [];
  readonly model: TerminalModel;
  /** What `write` returns: false plays a terminal that does not read. */
  accepts = true;
  columns: number;
  rows: number;

  constructor(columns: number, rows: number) {
    super();
    this.columns = columns;
    this.rows = rows;
    this.model = new TerminalModel(columns, rows);
  }

  readonly size = (): { columns: number; rows: number } => ({ columns: this.columns, rows: this.rows });

  write(text: string): boolean {
    this.writes.push(text);
    void this.model.write(text);
    return this.accepts;
  }

  /** Changes the size as a terminal does: the screen first, then the program hears of it. */
  resize(columns: number, rows: number): void {
    this.columns = columns;
    this.rows = rows;
    this.model.resize(columns, rows);
    this.emit('resize');
  }

  /** Resolves when all writes are on the model's screen. */
  settled(): Promise<void> {
    return this.model.write('');
  }

  /** Bytes of the writes since number `from`. */
  bytesSince(from: number): number {
    return Buffer.byteLength(this.writes.slice(from).join(''));
  }
}
