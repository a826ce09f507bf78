/** Where the logbook of this run is: the file named, else the one of the person. */
import { homedir } from 'node:os';
import type { Refusal } from '../medium/refusal.ts';
import { type LogbookPlace, logbookPlace } from './logbook-path.ts';

export function placeOfLogbook(
  env: Readonly<Record<string, string | undefined>>,
  given: string | undefined,
): LogbookPlace | Refusal {
  return logbookPlace(env, env['HOME'] || homeOfAccount(), given, process.cwd());
}

/** Where HOME is unset: what the system knows, if it knows the account. */
function homeOfAccount(): string | undefined {
  try {
    return homedir();
  } catch {
    return undefined;
  }
}
