/** A refusal in words on standard error, standard output left empty; gives the exit status. The same under --json. */
import type { Refusal } from '../medium/refusal.ts';
import { toAscii } from '../units/to-ascii.ts';
import type { Context, ExitStatus } from './context.ts';

export function reportRefusal({ message, remedy, exit }: Refusal, context: Context): ExitStatus {
  const line = `halfspace: ${message}; ${remedy}`;
  context.warn(`${context.ascii ? toAscii(line) : line}\n`);
  return exit;
}
