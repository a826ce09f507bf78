/** A refusal in words on standard error (or as JSON there), standard output left empty; gives the exit status. */
import type { Refusal } from '../medium/refusal.ts';
import { toAscii } from '../units/to-ascii.ts';
import type { Context, ExitStatus } from './context.ts';

export function reportRefusal(refusal: Refusal, json: boolean, context: Context): ExitStatus {
  const { code, message, remedy, candidates = [] } = refusal;
  if (json) {
    context.warn(`${JSON.stringify({ schema: 1, error: { code, message, remedy, candidates } })}\n`);
    return refusal.exit;
  }
  const line = `halfspace: ${message}; ${remedy}\n`;
  context.warn(context.ascii ? toAscii(line.trimEnd()) + '\n' : line);
  return refusal.exit;
}
