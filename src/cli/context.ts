/** What a command may use of the outside; `main.ts` fills it in, tests fill in their own. */
import type { IndexedCatalogue } from '../catalog/entries.ts';
import type { Invocation } from './arguments.ts';

export interface Context {
  readonly version: string;
  readonly env: Readonly<Record<string, string | undefined>>;
  readonly stdoutIsTTY: boolean;
  readonly stderrIsTTY: boolean;
  readonly stdinIsTTY: boolean;
  /** True where the terminal's locale is not UTF-8 or `--ascii` was given. */
  readonly ascii: boolean;
  /** Result; goes to the file of `--output` where one is given. */
  readonly write: (text: string) => void;
  /** To standard output, whatever `--output` says. False where the reader has gone. */
  readonly print: (text: string) => boolean;
  /** Warnings and errors, to standard error. */
  readonly warn: (text: string) => void;
  /**
   * Opens the catalogue (once), with the user's own entries, those of another folder where one is named; reports what is wrong
   * with those on standard error.
   */
  readonly catalogue: (ownFolder?: string) => IndexedCatalogue;
  readonly clock: () => Moment;
}

/** A moment with the offset of local time, minutes east of UTC. */
export interface Moment {
  readonly now_ms: number;
  readonly offset_min: number;
}

/** Process status of a command. */
export type ExitStatus = number;

export type Command = (invocation: Invocation, context: Context) => ExitStatus | Promise<ExitStatus>;
