/**
 * The one place that takes the terminal over and gives it back: alternate screen, raw mode, cursor, autowrap, paste mode.
 *
 * Promises: however the program ends, short of SIGKILL, the terminal is as it was: normal screen, cursor shown, echo
 * and line editing on, autowrap on, paste mode off. The handlers that restore it are in place before the first mode is
 * switched on. Endings and their exit status: `exit(code)` as given, SIGHUP 129, SIGINT 130, SIGQUIT 131, SIGTERM 143,
 * an uncaught exception, an unhandled rejection or `fail(error)` 1 with the error's text on the normal screen, a
 * terminal that went away 129. Order: unmount, leave the screen, raw mode off, hooks, error text, exit.
 * Special cases: `suspend` (Ctrl-Z) and a stop from outside give the terminal back and take it again on `fg`, with a
 * full repaint; a part that throws while ending does not keep the others from running.
 */
import { writeSync } from 'node:fs';
import { constants } from 'node:os';
import { errorText } from './error-text.ts';

const ENTER = '\x1b[?1049h\x1b[?7l\x1b[?2004h\x1b[?25l';
const LEAVE = '\x1b[?2026l\x1b[m\x1b[?2004l\x1b[?7h\x1b[?1049l\x1b[?25h';

const FATAL_SIGNALS = ['SIGHUP', 'SIGINT', 'SIGQUIT', 'SIGTERM'] as const;
const STATUS_OF_LOST_TERMINAL = 129;
/** Where the process cannot be stopped (no shell above it does job control) the screen comes back after this time. */
const STOP_FAILED_AFTER_MS = 150;
const WRITE_RETRIES = 100;
const WRITE_RETRY_MS = 2;

export interface GuardOptions {
  /** The program's name, before the text of an error. */
  readonly program: string;
  /** Print the stack of an unexpected error, not only its message. */
  readonly showStack: boolean;
}

export class TerminalGuard {
  readonly #options: GuardOptions;
  readonly #exitHooks: ((status: number) => void)[] = [];
  readonly #unmounts: (() => void)[] = [];
  #pause: () => void = () => {};
  #repaint: () => void = () => {};
  #isInside = false;
  #isSuspended = false;
  #isEnding = false;

  /** Puts the handlers in place; nothing is switched on yet. One guard per process. */
  constructor(options: GuardOptions) {
    this.#options = options;
    for (const signal of FATAL_SIGNALS) process.on(signal, () => this.exit(128 + constants.signals[signal]));
    process.on('uncaughtException', (error) => this.fail(error));
    process.on('unhandledRejection', (reason) => this.fail(reason));
    process.on('exit', () => this.#giveBack());
    process.on('SIGTSTP', this.#onStop);
    process.on('SIGCONT', () => this.#comeBack());
    process.on('SIGWINCH', () => {
      if (this.#isInside) attempt(this.#repaint);
    });
    process.stdout.on('error', this.#onStreamError);
    process.stderr.on('error', this.#onStreamError);
    process.stdin.on('error', this.#onLost);
    process.stdin.on('end', this.#onLost);
  }

  /** Takes the terminal over. */
  enter(): void {
    if (this.#isInside || this.#isEnding) return;
    this.#isInside = true;
    setRawMode(true);
    put(1, ENTER);
  }

  /** Adds a step that takes the picture down before the terminal is given back; steps run in the order given. */
  onUnmount(step: () => void): void {
    this.#unmounts.push(step);
  }

  /** What stops drawing while the program is suspended, and what draws everything anew. */
  onSuspend(pause: () => void, repaint: () => void): void {
    this.#pause = pause;
    this.#repaint = repaint;
  }

  /** Adds something to be done at every ending, after the terminal was given back, such as saving. Must be synchronous. */
  onExit(hook: (status: number) => void): void {
    this.#exitHooks.push(hook);
  }

  /** Ends the program with the given status. */
  exit(status: number): void {
    this.#end(status, '');
  }

  /** Ends the program with status 1 and the error's text on the normal screen. */
  fail(error: unknown): void {
    const { program, showStack } = this.#options;
    this.#end(1, errorText(error, program, showStack));
  }

  /** Gives the terminal to the shell and stops, as Ctrl-Z does in a program without a picture. */
  suspend(): void {
    if (!this.#isInside || this.#isSuspended || this.#isEnding) return;
    this.#isSuspended = true;
    attempt(this.#pause);
    this.#giveBack();
    // Without a handler the signal has its usual effect: it stops the whole foreground group.
    process.off('SIGTSTP', this.#onStop);
    process.kill(0, 'SIGTSTP');
    // After a real stop this timer is overdue as well: SIGCONT, read before an immediate runs, goes first.
    setTimeout(() => setImmediate(() => this.#isSuspended && this.#comeBack()), STOP_FAILED_AFTER_MS);
  }

  #comeBack(): void {
    if (this.#isEnding) return;
    if (this.#isSuspended) {
      this.#isSuspended = false;
      process.on('SIGTSTP', this.#onStop);
      // In the background raw mode cannot be set: the process is stopped again here until `fg`.
      this.enter();
    } else if (this.#isInside) {
      // Stopped from outside: the shell has set its own modes meanwhile.
      setRawMode(false);
      setRawMode(true);
      put(1, ENTER);
    } else return;
    attempt(this.#repaint);
  }

  #end(status: number, message: string): void {
    // A second signal, or an error of a hook, while the program is ending.
    if (this.#isEnding) return;
    this.#isEnding = true;
    for (const step of this.#unmounts) attempt(step);
    this.#giveBack();
    for (const hook of this.#exitHooks) attempt(() => hook(status));
    if (message !== '') put(2, message);
    process.exit(status);
  }

  #giveBack(): void {
    if (!this.#isInside) return;
    this.#isInside = false;
    put(1, LEAVE);
    setRawMode(false);
  }

  readonly #onStop = (): void => this.suspend();

  readonly #onStreamError = (error: NodeJS.ErrnoException): void => {
    const { code } = error;
    if (code === 'EPIPE' || code === 'EIO') this.#onLost();
    else this.fail(error);
  };

  readonly #onLost = (): void => this.exit(STATUS_OF_LOST_TERMINAL);
}

function attempt(action: () => void): void {
  try {
    action();
  } catch {
    // The program is ending or suspended: the rest of the way back matters more than why this part failed.
  }
}

function setRawMode(isRaw: boolean): void {
  attempt(() => {
    if (process.stdin.isTTY) process.stdin.setRawMode(isRaw);
  });
}

/** Writes at once, whatever the streams still hold; a terminal that is gone is no error. */
function put(descriptor: number, text: string): void {
  let bytes: Uint8Array = Buffer.from(text);
  for (let tries = 0; bytes.length > 0 && tries < WRITE_RETRIES; tries++) {
    try {
      bytes = bytes.subarray(writeSync(descriptor, bytes));
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== 'EAGAIN') return;
      Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, WRITE_RETRY_MS);
    }
  }
}
