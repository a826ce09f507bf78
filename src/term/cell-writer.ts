/**
 * A stand-in for standard output that takes whole frames and writes only the cells that changed.
 * Made for Ink in `debug: true` mode, which writes each frame as one text with '\n' between its rows.
 *
 * Promises: at most one `write` to the terminal per frame and none while nothing changes; bursts are drawn at most once
 * per `MIN_FRAME_GAP_MS`, the first of a burst at once; frames are clipped to the screen; no line or screen is erased
 * after the first frame (`ESC[J` once, on the alternate screen) and scrollback is never touched; after a resize or
 * `repaint` the screen equals a fresh drawing.
 * Special cases: writes that are no frames (empty, cursor and synchronisation sequences of Ink's own) are dropped;
 * a large change is bracketed by synchronized-update marks; while the terminal's buffer is full only the newest frame
 * is kept. Expects the alternate screen with autowrap off, as `guard.ts` sets it up.
 */
import { EventEmitter } from 'node:events';
import { type CellRow, EMPTY_ROW, parseRow } from './cells.ts';
import { cursorMove, UNKNOWN } from './cursor-move.ts';
import { diffFrames, type Pen, unknownRow } from './frame-diff.ts';
import { PLAIN } from './sgr.ts';

/** What the writer needs of the real standard output; `process.stdout` has it. */
export interface TerminalOutput {
  write(text: string): boolean;
  on(event: 'resize' | 'drain', listener: () => void): unknown;
  off(event: 'resize' | 'drain', listener: () => void): unknown;
}

export interface ScreenSize {
  readonly columns: number;
  readonly rows: number;
}

/** A cell, counted from 0. */
export interface CellPosition {
  readonly column: number;
  readonly row: number;
}

/** About 60 frames per second: more cannot be seen, and over a slow link each frame costs. */
export const MIN_FRAME_GAP_MS = 16;
/** After a change of size the frames of the new size follow within this time; until then nothing is drawn. */
const RESIZE_SETTLE_MS = 25;
/** `repaint` waits this long, so that a change of size reported at the same moment is drawn in one go. */
const REPAINT_DELAY_MS = 4;
/** From this many characters on the 16 bytes of synchronized-update marks are worth it. */
const SYNC_FROM_LENGTH = 512;

const NO_FRAME = /^(?:\x1b\[[0-?]*[ -/]*[@-ln-~])*$/;

export class CellWriter {
  /** The stand-in to hand to Ink as its `stdout`. */
  readonly stream: NodeJS.WriteStream;

  readonly #out: TerminalOutput;
  readonly #size: () => ScreenSize;
  readonly #events = new EventEmitter();
  #frame: string | undefined;
  #lines: readonly string[] = [];
  #rows: readonly CellRow[] = [];
  #painted: ScreenSize = { columns: 0, rows: 0 };
  #pen: Pen = { x: UNKNOWN, y: UNKNOWN, style: PLAIN };
  #cursor: CellPosition | null = null;
  #cursorShown = false;
  #state: 'untouched' | 'known' | 'unknown' = 'untouched';
  #hold: 'none' | 'paused' | 'full' | 'finished' = 'none';
  #dirty = false;
  #timer: NodeJS.Timeout | undefined;
  #lastFlush_ms = Number.NEGATIVE_INFINITY;

  /**
   * @param out the real standard output
   * @param size the size of the screen now; asked again for every frame
   */
  constructor(out: TerminalOutput, size: () => ScreenSize) {
    this.#out = out;
    this.#size = size;
    this.stream = this.#standIn();
    out.on('resize', this.#onResize);
    out.on('drain', this.#onDrain);
  }

  /** Takes one frame: rows separated by '\n', styled with SGR sequences only. */
  draw(frame: string): void {
    this.#frame = frame;
    this.#dirty = true;
    this.#request(0);
  }

  /** Shows the terminal's cursor at a cell after each frame, or hides it (`null`, as at the start). */
  setCursor(cell: CellPosition | null): void {
    if (cell?.column === this.#cursor?.column && cell?.row === this.#cursor?.row) return;
    this.#cursor = cell;
    this.#dirty = true;
    this.#request(0);
  }

  /** Draws every cell anew, whatever the terminal shows; also ends a `pause`. */
  repaint(): void {
    if (this.#hold === 'paused') this.#hold = 'none';
    this.#forget();
    this.#request(REPAINT_DELAY_MS);
  }

  /** Draws nothing until `repaint`: the terminal belongs to somebody else, as after Ctrl-Z. */
  pause(): void {
    if (this.#hold !== 'finished') this.#hold = 'paused';
    this.#cancelTimer();
  }

  /** Ends drawing for good and leaves the cursor below the picture, in the default style. */
  finish(): void {
    if (this.#hold === 'finished') return;
    this.#hold = 'finished';
    this.#cancelTimer();
    this.#out.off('resize', this.#onResize);
    this.#out.off('drain', this.#onDrain);
    if (this.#state !== 'untouched') this.#out.write(`\x1b[m\x1b[${this.#painted.rows}H\r\n`);
  }

  readonly #onResize = (): void => {
    this.#forget();
    this.#request(RESIZE_SETTLE_MS);
    this.#events.emit('resize');
  };

  readonly #onDrain = (): void => {
    if (this.#hold !== 'full') return;
    this.#hold = 'none';
    this.#request(0);
  };

  #forget(): void {
    if (this.#state === 'known') this.#state = 'unknown';
    this.#dirty = true;
  }

  #request(delay_ms: number): void {
    if (this.#hold !== 'none' || this.#timer !== undefined || !this.#dirty) return;
    const wait_ms = Math.max(delay_ms, this.#lastFlush_ms + MIN_FRAME_GAP_MS - performance.now());
    if (wait_ms <= 0) this.#flush();
    else this.#timer = setTimeout(this.#flush, wait_ms);
  }

  #cancelTimer(): void {
    clearTimeout(this.#timer);
    this.#timer = undefined;
  }

  readonly #flush = (): void => {
    this.#timer = undefined;
    if (this.#frame === undefined) return;
    this.#dirty = false;
    const text = this.#paint(this.#frame);
    if (text === '') return;
    this.#lastFlush_ms = performance.now();
    const marked = text.length > SYNC_FROM_LENGTH ? `\x1b[?2026h${text}\x1b[?2026l` : text;
    if (!this.#out.write(marked)) this.#hold = 'full';
  };

  #paint(frame: string): string {
    const size = this.#size();
    const resized = size.columns !== this.#painted.columns || size.rows !== this.#painted.rows;
    if (resized) {
      this.#forget();
      this.#lines = [];
    }
    this.#painted = size;
    const lines = frame.split('\n', size.rows);
    const rows = lines.map((line, y) =>
      line === this.#lines[y] ? (this.#rows[y] ?? EMPTY_ROW) : parseRow(line, size.columns),
    );
    let out = '';
    let before = this.#rows;
    if (this.#state !== 'known') {
      const isFirst = this.#state === 'untouched';
      out = isFirst ? '\x1b[?25l\x1b[m\x1b[H\x1b[J' : '\x1b[?25l\x1b[m';
      before = isFirst ? [] : new Array<CellRow>(size.rows).fill(unknownRow(size.columns));
      this.#pen = isFirst ? { x: 0, y: 0, style: PLAIN } : { x: UNKNOWN, y: UNKNOWN, style: PLAIN };
      this.#cursorShown = false;
      this.#state = 'known';
    }
    this.#lines = lines;
    this.#rows = rows;
    out += diffFrames(before, rows, this.#pen, size.columns);
    return out + this.#placeCursor(size);
  }

  #placeCursor(size: ScreenSize): string {
    const cell = this.#cursor;
    if (cell === null) {
      const hide = this.#cursorShown ? '\x1b[?25l' : '';
      this.#cursorShown = false;
      return hide;
    }
    const x = Math.max(0, Math.min(cell.column, size.columns - 1));
    const y = Math.max(0, Math.min(cell.row, size.rows - 1));
    const move = cursorMove(this.#pen, { x, y });
    this.#pen = { x, y, style: this.#pen.style };
    const show = this.#cursorShown ? '' : '\x1b[?25h';
    this.#cursorShown = true;
    return move + show;
  }

  #standIn(): NodeJS.WriteStream {
    const size = this.#size;
    const write = (chunk: unknown, ...rest: unknown[]): boolean => {
      const text = typeof chunk === 'string' ? chunk : Buffer.from(chunk as Uint8Array).toString('utf8');
      if (!NO_FRAME.test(text)) this.draw(text);
      const callback = rest.find((argument) => typeof argument === 'function');
      if (typeof callback === 'function') queueMicrotask(() => callback());
      return true;
    };
    const stream = Object.assign(this.#events, { isTTY: true, writable: true, write });
    Object.defineProperty(stream, 'columns', { get: () => size().columns });
    Object.defineProperty(stream, 'rows', { get: () => size().rows });
    // Ink uses the listed parts of a WriteStream and nothing else.
    return stream as unknown as NodeJS.WriteStream;
  }
}
