/**
 * A command line that is not understood, as data and as the few lines shown for it on standard error:
 * `halfspace: what is wrong; what would be right`, then where to read more. Never the whole help.
 */
import { toAscii } from '../units/to-ascii.ts';

export type UsageCode =
  | 'unknown-option'
  | 'unknown-command'
  | 'option-not-here'
  | 'missing-value'
  | 'unexpected-value'
  | 'bad-value'
  | 'given-twice'
  | 'options-conflict'
  | 'option-needs'
  | 'missing-operand'
  | 'extra-operand';

export interface UsageError {
  readonly code: UsageCode;
  readonly message: string;
  readonly remedy: string;
  /** Nearest spellings, at most five. */
  readonly candidates: readonly string[];
  /** Whose help to point at; undefined for the program's. */
  readonly command?: string | undefined;
}

/** At most three lines, each ended. */
export function usageErrorText(error: UsageError, ascii = false): string {
  const topic = error.command === undefined ? '' : ` ${error.command}`;
  const lines = [`halfspace: ${error.message}; ${error.remedy}`, `see halfspace${topic} --help`];
  const text = lines.map((line) => `${line}\n`).join('');
  return ascii ? toAscii(text) : text;
}
