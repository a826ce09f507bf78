/** A program in a pseudo-terminal, timed from this side: when a text arrives, and what a key press sends. */
import { setTimeout as sleep } from 'node:timers/promises';
import { type IPty, spawn } from '@lydell/node-pty';
import { type ModelCell, TerminalModel } from '../test/helpers/terminal-model.ts';

export interface ScreenOptions {
  readonly columns: number;
  readonly rows: number;
  readonly env: Readonly<Record<string, string>>;
}

export interface Pressed {
  /** From the key to the last byte of the answer. */
  readonly ms: number;
  readonly bytes: number;
  /** UTF-8 of the cells that changed, and 8 bytes for every run of them in a row. */
  readonly leastBytes: number;
  readonly changedCells: number;
  readonly text: string;
}

/** After this long without a byte an answer is complete, and a key without an answer has none. */
const QUIET_ms = 60;
const NO_ANSWER_ms = 300;
const BYTES_PER_RUN = 8;

export class Screen {
  readonly exited: Promise<void>;
  readonly #pty: IPty;
  readonly #model: TerminalModel;
  readonly #begin_ms = performance.now();
  #chunks: { at_ms: number; bytes: Buffer }[] = [];
  #onData: () => void = () => {};

  constructor(args: readonly string[], { columns, rows, env }: ScreenOptions) {
    this.#model = new TerminalModel(columns, rows);
    this.#pty = spawn(process.execPath, [...args], {
      cols: columns,
      rows,
      env: { ...env },
      encoding: null,
    } as unknown as Parameters<typeof spawn>[2]);
    this.#pty.onData((data) => {
      // With no encoding set the data are bytes, whatever the type declares.
      this.#chunks.push({ at_ms: performance.now(), bytes: data as unknown as Buffer });
      this.#onData();
    });
    this.exited = new Promise((resolve) => this.#pty.onExit(() => resolve()));
  }

  get pid(): number {
    return this.#pty.pid;
  }

  /** Milliseconds from the start until the text has arrived. */
  sight(text: string): Promise<number> {
    return new Promise((resolve, reject) => {
      const timer = setTimeout(() => reject(new Error(`no ${JSON.stringify(text)} came`)), 20_000);
      this.#onData = () => {
        if (!this.#text().includes(text)) return;
        clearTimeout(timer);
        this.#onData = () => {};
        resolve((this.#chunks.at(-1)?.at_ms ?? Number.NaN) - this.#begin_ms);
      };
      this.#onData();
    });
  }

  /** Waits until nothing has come for a while, and forgets what came; the picture is kept. */
  async settle(quiet_ms = QUIET_ms): Promise<string> {
    for (;;) {
      const last_ms = this.#chunks.at(-1)?.at_ms ?? performance.now();
      const rest_ms = quiet_ms - (performance.now() - last_ms);
      if (rest_ms <= 0 || this.#chunks.length === 0) break;
      await sleep(rest_ms);
    }
    const bytes = Buffer.concat(this.#chunks.map((c) => c.bytes));
    this.#chunks = [];
    await this.#model.write(bytes);
    return bytes.toString('utf8');
  }

  /** Presses a key and waits for the picture after it; undefined where nothing was drawn. */
  async press(keys: string): Promise<Pressed | undefined> {
    const before = this.#cells();
    const begin_ms = performance.now();
    this.#pty.write(keys);
    const answered = await Promise.race([
      new Promise<true>((resolve) => (this.#onData = () => resolve(true))),
      sleep(NO_ANSWER_ms, false),
    ]);
    this.#onData = () => {};
    if (!answered) return undefined;
    let last_ms = 0;
    let seen = -1;
    while (seen !== this.#chunks.length) {
      seen = this.#chunks.length;
      last_ms = this.#chunks.at(-1)?.at_ms ?? begin_ms;
      await sleep(QUIET_ms);
    }
    const text = await this.settle();
    const { bytes, cells } = leastChange(before, this.#cells(), this.#model.columns);
    return {
      ms: last_ms - begin_ms,
      bytes: Buffer.byteLength(text),
      leastBytes: bytes,
      changedCells: cells,
      text,
    };
  }

  type(keys: string): void {
    this.#pty.write(keys);
  }

  end(): void {
    this.#pty.kill('SIGTERM');
  }

  #text(): string {
    return Buffer.concat(this.#chunks.map((c) => c.bytes)).toString('utf8');
  }

  #cells(): ModelCell[] {
    const { columns, rows } = this.#model;
    return Array.from({ length: columns * rows }, (_, i) =>
      this.#model.cell(i % columns, Math.floor(i / columns)),
    );
  }
}

function leastChange(
  before: readonly ModelCell[],
  after: readonly ModelCell[],
  columns: number,
): { bytes: number; cells: number } {
  let bytes = 0;
  let cells = 0;
  let inRun = false;
  for (const [i, cell] of after.entries()) {
    const old = before[i];
    const changed = old?.glyph !== cell.glyph || old.style !== cell.style;
    if (i % columns === 0) inRun = false;
    if (changed) {
      cells++;
      bytes += Buffer.byteLength(cell.glyph) + (inRun ? 0 : BYTES_PER_RUN);
    }
    inRun = changed;
  }
  return { bytes, cells };
}
