/** Where the program keeps and looks for files, whether something is there, and what decided it. Reads nothing but that. */
import { existsSync } from 'node:fs';
import { homedir } from 'node:os';
import { isAbsolute } from 'node:path';
import { ownFolderPath } from '../catalog/own-folder.ts';
import { isRefusal } from '../medium/refusal.ts';
import { logbookPlace } from '../record/logbook-path.ts';
import type { OptionValues } from './options.ts';
import { settingsPath } from './read-settings.ts';
import type { Origin } from './settings-in-force.ts';

export interface Place {
  readonly name: 'settings' | 'entries' | 'logbook';
  /** Undefined where there is no home to keep it in. */
  readonly path: string | undefined;
  readonly exists: boolean;
  readonly from: Origin;
  readonly where?: string;
  readonly meaning: string;
}

type Environment = Readonly<Record<string, string | undefined>>;

export function places(options: OptionValues, env: Environment): readonly Place[] {
  const logbook = logbookPlace(env, env['HOME'] ?? homedir(), undefined, process.cwd());
  return [
    place(
      'settings',
      settingsPath(env),
      'settings of the full-screen program',
      variable(env, 'XDG_CONFIG_HOME'),
    ),
    place(
      'entries',
      options.catalog ?? ownFolderPath(env),
      'entries of your own',
      options.catalog === undefined ? variable(env, 'XDG_DATA_HOME') : { from: 'flag', where: '--catalog' },
    ),
    place(
      'logbook',
      isRefusal(logbook) ? undefined : logbook.file,
      'records kept',
      variable(env, 'XDG_STATE_HOME'),
    ),
  ];
}

function place(
  name: Place['name'],
  path: string | undefined,
  meaning: string,
  decided: Pick<Place, 'from' | 'where'>,
): Place {
  return { name, path, exists: path !== undefined && existsSync(path), ...decided, meaning };
}

/** A relative or empty value of the variable counts as unset. */
function variable(env: Environment, name: string): Pick<Place, 'from' | 'where'> {
  const value = env[name];
  return value !== undefined && isAbsolute(value)
    ? { from: 'environment', where: name }
    : { from: 'default' };
}
