/**
 * Standard input as keys and pastes: decoding, waiting for torn sequences, and the silent input that Ink gets instead.
 *
 * Promises: listeners get one call per key, in order, all keys of one read in the same tick; UTF-8 torn between two
 * reads is put together; a lone Escape acts within 60 ms; keys typed before anybody listens are kept for the first
 * listener, so that nothing typed during the start is lost.
 * Special case: `intercept` sees every key first, from the very start: the place for Ctrl-C, Ctrl-Z and Ctrl-L.
 */
import { EventEmitter } from 'node:events';
import { StringDecoder } from 'node:string_decoder';
import type { Key } from './key.ts';
import { type InputEvent, KeyParser } from './key-parser.ts';

/** What the stream needs of the real standard input; `process.stdin` has it. */
export interface TerminalInput {
  on(event: 'data', listener: (chunk: Buffer | string) => void): unknown;
  off(event: 'data', listener: (chunk: Buffer | string) => void): unknown;
  resume(): unknown;
  pause(): unknown;
}

export interface KeyStreamOptions {
  /** Sees each key before the listeners; returns true where the key is dealt with. */
  readonly intercept?: (key: Key) => boolean;
}

type Unsubscribe = () => void;

const MAX_BACKLOG = 1000;

export class KeyStream {
  /** A terminal input that never sends anything, for Ink's `stdin`: the program gets its keys from here instead. */
  readonly silentStdin: NodeJS.ReadStream = silentInput();

  readonly #input: TerminalInput;
  readonly #intercept: (key: Key) => boolean;
  readonly #keyListeners = new Set<(key: Key) => void>();
  readonly #pasteListeners = new Set<(text: string) => void>();
  readonly #parser = new KeyParser();
  readonly #decoder = new StringDecoder('utf8');
  #backlog: InputEvent[] = [];
  #timer: NodeJS.Timeout | undefined;
  #immediate: NodeJS.Immediate | undefined;

  constructor(input: TerminalInput, { intercept = () => false }: KeyStreamOptions = {}) {
    this.#input = input;
    this.#intercept = intercept;
  }

  /** Begins to read. */
  start(): void {
    this.#input.on('data', this.#onData);
    this.#input.resume();
  }

  /** Ends reading; what is held back or waiting is forgotten. */
  stop(): void {
    this.#input.off('data', this.#onData);
    this.#input.pause();
    this.#stopWaiting();
    this.#backlog = [];
  }

  /** Calls `listener` for each key; returns the function that ends it. */
  onKey(listener: (key: Key) => void): Unsubscribe {
    this.#keyListeners.add(listener);
    // Not at once: the caller may be in the middle of setting itself up.
    if (this.#backlog.length > 0) queueMicrotask(this.#deliverBacklog);
    return () => this.#keyListeners.delete(listener);
  }

  /** Calls `listener` with each pasted text, line ends as '\n'; returns the function that ends it. */
  onPaste(listener: (text: string) => void): Unsubscribe {
    this.#pasteListeners.add(listener);
    return () => this.#pasteListeners.delete(listener);
  }

  readonly #onData = (chunk: Buffer | string): void => {
    this.#stopWaiting();
    this.#receive(this.#parser.push(typeof chunk === 'string' ? chunk : this.#decoder.write(chunk)));
    const hold_ms = this.#parser.hold_ms;
    if (hold_ms !== null) this.#timer = setTimeout(this.#onSilence, hold_ms);
  };

  readonly #onSilence = (): void => {
    // The rest may have arrived while the program was busy: one more look at the input before deciding.
    this.#immediate = setImmediate(() => this.#receive(this.#parser.expire()));
  };

  #stopWaiting(): void {
    clearTimeout(this.#timer);
    clearImmediate(this.#immediate);
  }

  #receive(events: readonly InputEvent[]): void {
    for (const event of events) {
      if (event.kind === 'key' && this.#intercept(event.key)) continue;
      if (this.#keyListeners.size > 0) this.#deliver(event);
      else if (this.#backlog.length < MAX_BACKLOG) this.#backlog.push(event);
    }
  }

  #deliver(event: InputEvent): void {
    if (event.kind === 'key') for (const listener of this.#keyListeners) listener(event.key);
    else for (const listener of this.#pasteListeners) listener(event.text);
  }

  readonly #deliverBacklog = (): void => {
    for (const event of this.#backlog.splice(0)) this.#deliver(event);
  };
}

/** Ink asks its input for raw mode and for data; the one belongs to the guard, the other never comes. */
function silentInput(): NodeJS.ReadStream {
  const input = Object.assign(new EventEmitter(), {
    isTTY: true,
    setRawMode: () => input,
    setEncoding: () => input,
    ref: () => input,
    unref: () => input,
    resume: () => input,
    pause: () => input,
    read: () => null,
  });
  return input as unknown as NodeJS.ReadStream;
}
