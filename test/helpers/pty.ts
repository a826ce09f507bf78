/**
 * Runs a program in a real pseudo-terminal, with a terminal emulator as its screen, and inspects both sides: the
 * picture, the bytes, the modes the terminal is left in and the line settings of the device.
 *
 * The program gets a small environment of its own, so that nothing of the machine (CI, colour settings, a surrounding
 * tmux, extra certificates that slow Node down) changes what is tested.
 */
import { execFileSync } from 'node:child_process';
import { tmpdir } from 'node:os';
import { setTimeout as sleep } from 'node:timers/promises';
import { type IPty, spawn } from '@lydell/node-pty';
import { TerminalModel } from './terminal-model.ts';

export interface PtyOptions {
  readonly columns?: number;
  readonly rows?: number;
  readonly cwd?: string;
  /** Added to the small environment; undefined takes a variable out of it. */
  readonly env?: Readonly<Record<string, string | undefined>>;
}

/** What the module gives on Unix beyond its declared type. */
interface UnixPty extends IPty {
  readonly ptsName: string;
  destroy(): void;
}

const WAIT_MS = 15_000;
const POLL_MS = 10;

const baseEnv = (): Record<string, string | undefined> => ({
  PATH: process.env['PATH'],
  HOME: tmpdir(),
  TERM: 'xterm-256color',
  LANG: 'C.UTF-8',
});

export class PtySession {
  readonly model: TerminalModel;
  readonly pid: number;
  /** Resolves with the exit status, or 128 plus the number of the signal that killed the program. */
  readonly exited: Promise<number>;
  readonly #pty: UnixPty;
  readonly #chunks: Buffer[] = [];
  #lastData_ms = performance.now();
  #isOver = false;

  constructor(
    file: string,
    args: readonly string[],
    { columns = 80, rows = 24, cwd, env = {} }: PtyOptions = {},
  ) {
    const merged = Object.entries({ ...baseEnv(), ...env }).filter(([, value]) => value !== undefined);
    this.model = new TerminalModel(columns, rows);
    const options = {
      cols: columns,
      rows,
      cwd: cwd ?? process.cwd(),
      env: Object.fromEntries(merged),
      encoding: null,
    };
    this.#pty = spawn(file, [...args], options) as UnixPty;
    this.pid = this.#pty.pid;
    // With no encoding set the data are bytes, whatever the type declares.
    this.#pty.onData((data) => this.#take(data as unknown as Buffer));
    this.exited = new Promise((resolve) => {
      this.#pty.onExit(({ exitCode, signal }) => {
        this.#isOver = true;
        resolve(signal ? 128 + signal : exitCode);
      });
    });
  }

  #take(data: Buffer): void {
    this.#chunks.push(data);
    this.#lastData_ms = performance.now();
    void this.model.write(data);
  }

  /** Types: sends bytes to the program in one piece. */
  send(keys: string): void {
    this.#pty.write(keys);
  }

  /** Types bytes that are no whole characters. */
  sendBytes(bytes: Buffer): void {
    this.#pty.write(bytes as unknown as string);
  }

  /** Everything the program has written, from byte number `from` on. */
  output(from = 0): string {
    return Buffer.concat(this.#chunks).subarray(from).toString('utf8');
  }

  get byteCount(): number {
    return this.#chunks.reduce((sum, chunk) => sum + chunk.length, 0);
  }

  screen(): string {
    return this.model.text();
  }

  /** Waits until the screen fulfils a condition; fails with the screen's content. */
  async waitFor(
    condition: string | RegExp | ((screen: string) => boolean),
    wait_ms = WAIT_MS,
  ): Promise<void> {
    const holds = (screen: string): boolean => {
      if (typeof condition === 'string') return screen.includes(condition);
      return condition instanceof RegExp ? condition.test(screen) : condition(screen);
    };
    const end_ms = performance.now() + wait_ms;
    for (;;) {
      await this.model.write('');
      const screen = this.screen();
      if (holds(screen)) return;
      if (performance.now() > end_ms)
        throw new Error(`Waited in vain for ${condition}; the screen is:\n${screen}`);
      await sleep(POLL_MS);
    }
  }

  /** Waits until the program has written nothing for a while, and all of it is on the screen. */
  async quiet(quiet_ms = 80): Promise<void> {
    const begin_ms = performance.now();
    while (performance.now() - Math.max(begin_ms, this.#lastData_ms) < quiet_ms) await sleep(POLL_MS);
    await this.model.write('');
  }

  /** Changes the size of the window. */
  resize(columns: number, rows: number): void {
    this.model.resize(columns, rows);
    this.#pty.resize(columns, rows);
  }

  /** The settings of the line: whether typed keys are echoed, and whether lines are collected before they are read. */
  lineSettings(): { echo: boolean; canonical: boolean } {
    return lineSettingsOf(execFileSync('stty', ['-a', '-F', this.#pty.ptsName], { encoding: 'utf8' }));
  }

  signal(name: NodeJS.Signals, pid = this.pid): void {
    process.kill(pid, name);
  }

  /** Cuts the connection: the terminal's own side is closed, as when the network is lost. */
  drop(): void {
    this.#pty.destroy();
  }

  /** Ends the program, whatever state it is in; for the end of a test. */
  async dispose(): Promise<void> {
    if (this.#isOver) return;
    try {
      process.kill(this.pid, 'SIGKILL');
    } catch {
      return;
    }
    await Promise.race([this.exited, sleep(1000)]);
  }
}

/** Reads the two settings out of the output of `stty -a`. */
export function lineSettingsOf(sttyOutput: string): { echo: boolean; canonical: boolean } {
  const isOn = (flag: string): boolean => new RegExp(`(?:^|\\s)${flag}(?:\\s|;|$)`, 'm').test(sttyOutput);
  return { echo: isOn('echo'), canonical: isOn('icanon') };
}

/** True while a process with this number exists. */
export function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch {
    return false;
  }
}
