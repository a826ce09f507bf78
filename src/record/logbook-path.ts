/**
 * Where the logbook is: the file a person names, else `$XDG_STATE_HOME/halfspace/logbook.jsonl`, where an unset, empty or
 * relative variable counts as `~/.local/state` (XDG Base Directory Specification 0.8).
 */
import path from 'node:path';
import { type Refusal, refuse } from '../medium/refusal.ts';

/**
 * @param environment the environment variables
 * @param home the home folder; undefined or empty where there is none
 * @param given path named by the person; relative ones are taken from `workingFolder`
 */
export function logbookPath(
  environment: Readonly<Record<string, string | undefined>>,
  home: string | undefined,
  given: string | undefined,
  workingFolder: string,
): string | Refusal {
  if (given !== undefined && given !== '') return path.resolve(workingFolder, given);
  const stated = environment['XDG_STATE_HOME'];
  if (stated !== undefined && path.isAbsolute(stated)) return path.join(stated, 'halfspace', 'logbook.jsonl');
  if (home !== undefined && path.isAbsolute(home))
    return path.join(home, '.local', 'state', 'halfspace', 'logbook.jsonl');
  return refuse(
    'logbook-no-home',
    4,
    'there is no home folder to keep the logbook in',
    'set HOME or XDG_STATE_HOME to an absolute path, or name a file for the logbook',
  );
}
