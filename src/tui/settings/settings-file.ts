/**
 * The settings file: where it is, read directly (fast) and written through conf (whole or not at all), which is loaded only
 * when there is something to write. A file that cannot be read is named and never written over.
 */
import { accessSync, constants, existsSync, mkdirSync, readFileSync } from 'node:fs';
import { dirname, isAbsolute, join } from 'node:path';
import type { Environment } from '../../term/ability.ts';
import { brokenJsonLine } from '../../units/broken-json-line.ts';

const FILE = 'config.json';

/** `$XDG_CONFIG_HOME/halfspace`, by default `~/.config/halfspace`; undefined where there is no home. */
export function settingsFolder(env: Environment): string | undefined {
  const configured = env['XDG_CONFIG_HOME'];
  if (configured && isAbsolute(configured)) return join(configured, 'halfspace');
  const home = env['HOME'];
  return home && isAbsolute(home) ? join(home, '.config', 'halfspace') : undefined;
}

export interface FileContent {
  /** What the file holds; an empty object where there is none. */
  readonly value: unknown;
  /** Why it could not be read, with the place. */
  readonly problem?: string;
}

export function readSettingsFile(folder: string | undefined): FileContent {
  if (folder === undefined) return { value: {} };
  const path = join(folder, FILE);
  let text: string;
  try {
    text = readFileSync(path, 'utf8');
  } catch (error) {
    const { code } = error as NodeJS.ErrnoException;
    if (code === 'ENOENT' || code === 'ENOTDIR') return { value: {} };
    return { value: {}, problem: `${path} cannot be read (${code ?? 'unknown error'})` };
  }
  try {
    return { value: text.trim() === '' ? {} : JSON.parse(text) };
  } catch {
    return {
      value: {},
      problem: `${path}, line ${brokenJsonLine(text)}: no valid JSON; it is left as it is and not used`,
    };
  }
}

/** Keeps values in the file; undefined, or why it could not. */
export class SettingsFile {
  readonly #folder: string | undefined;
  #conf: { set(values: Readonly<Record<string, unknown>>): void } | undefined;
  #hasFailed = false;

  /** @param canWrite false where the present content could not be read */
  constructor(folder: string | undefined, canWrite: boolean) {
    this.#folder = folder;
    this.#hasFailed = !canWrite;
  }

  get isOpen(): boolean {
    return this.#conf !== undefined;
  }

  /** Loads what writing takes, some 50 ms; the first failure is reported, later ones are silent. */
  async open(): Promise<string | undefined> {
    if (this.#conf || this.#hasFailed) return undefined;
    const folder = this.#folder;
    if (folder === undefined || !canWriteTo(folder)) {
      this.#hasFailed = true;
      return `settings are not kept: ${folder ?? 'a home folder'} cannot be written`;
    }
    try {
      const { default: Conf } = await import('conf');
      mkdirSync(folder, { recursive: true });
      this.#conf = new Conf({
        cwd: folder,
        configName: 'config',
        projectSuffix: '',
        projectName: 'halfspace',
      });
      return undefined;
    } catch (error) {
      return this.#fail(error);
    }
  }

  /** Writes at once; the rest of the file stays. */
  write(values: Readonly<Record<string, unknown>>): string | undefined {
    if (!this.#conf || this.#hasFailed) return undefined;
    try {
      this.#conf.set(values);
      return undefined;
    } catch (error) {
      return this.#fail(error);
    }
  }

  #fail(error: unknown): string {
    this.#hasFailed = true;
    const { code } = error as NodeJS.ErrnoException;
    return `settings are not kept: ${join(this.#folder ?? '', FILE)} cannot be written (${code ?? 'unknown error'})`;
  }
}

/** Asks before writing: the write itself would try again and again for a second. */
function canWriteTo(folder: string): boolean {
  let place = folder;
  while (!existsSync(place) && dirname(place) !== place) place = dirname(place);
  try {
    accessSync(place, constants.W_OK);
    const file = join(folder, FILE);
    if (existsSync(file)) accessSync(file, constants.W_OK);
    return true;
  } catch {
    return false;
  }
}
