/**
 * Where the logbook is: the file a person names, else `$XDG_STATE_HOME/halfspace/logbook.jsonl`, where an unset, empty or
 * relative variable counts as `~/.local/state` (XDG Base Directory Specification 0.8).
 */
import path from 'node:path';
import { type Refusal, refuse } from '../medium/refusal.ts';

/** Where the logbook is, and which folder must be there already. */
export interface LogbookPlace {
  readonly file: string;
  /**
   * Folders below this one are made where they are missing, this one is not: a disk that is no longer mounted then shows as a
   * missing folder and no record lands in the place it was mounted on.
   */
  readonly base: string;
}

/**
 * @param environment the environment variables
 * @param home the home folder; undefined or empty where there is none
 * @param given path named by the person; relative ones are taken from `workingFolder`. Its folder must exist.
 */
export function logbookPlace(
  environment: Readonly<Record<string, string | undefined>>,
  home: string | undefined,
  given: string | undefined,
  workingFolder: string,
): LogbookPlace | Refusal {
  if (given !== undefined && given !== '') return placeAt(path.resolve(workingFolder, given));
  const stated = environment['XDG_STATE_HOME'];
  if (stated !== undefined && path.isAbsolute(stated))
    return { file: path.join(stated, 'halfspace', 'logbook.jsonl'), base: path.parse(stated).root };
  if (home !== undefined && path.isAbsolute(home))
    return {
      file: path.join(home, '.local', 'state', 'halfspace', 'logbook.jsonl'),
      base: path.normalize(home),
    };
  return refuse(
    'logbook-no-home',
    4,
    'there is no home folder to keep the logbook in',
    'set HOME or XDG_STATE_HOME to an absolute path, or name a file for the logbook',
  );
}

/** A file that a person names: its folder is not made. */
export function placeAt(file: string): LogbookPlace {
  return { file, base: path.dirname(file) };
}
