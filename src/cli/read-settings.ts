/**
 * The settings file as `config` shows it: where it is, what it holds, what is wrong with it. Only the full-screen program
 * writes it; the values that a person may put there are checked here just as far as they are shown.
 */
import { readFileSync } from 'node:fs';
import { isAbsolute, join } from 'node:path';
import { brokenJsonLine } from '../units/broken-json-line.ts';

export interface SettingsContent {
  /** Undefined where there is no home to keep it in. */
  readonly path: string | undefined;
  readonly state: 'absent' | 'read' | 'broken';
  readonly value: Readonly<Record<string, unknown>>;
  /** One line each, naming line or key. */
  readonly problems: readonly string[];
}

type Environment = Readonly<Record<string, string | undefined>>;

export const GLYPH_SETTINGS = ['auto', 'braille', 'blocks', 'ascii'] as const;
export const COLOR_SETTINGS = ['auto', 'always', 'never'] as const;

/** What a person may set, then what the program keeps, then the mark of the library that writes the file. */
const KNOWN: readonly string[] = ['glyphs', 'color', 'keys', 'last', 'recent', '__internal__'];

/** `$XDG_CONFIG_HOME/halfspace/config.json`, by default in `~/.config`; relative values of the variable are ignored. */
export function settingsPath(env: Environment): string | undefined {
  const stated = env['XDG_CONFIG_HOME'];
  const home = env['HOME'];
  const base =
    stated !== undefined && isAbsolute(stated)
      ? stated
      : home !== undefined && isAbsolute(home)
        ? join(home, '.config')
        : undefined;
  return base === undefined ? undefined : join(base, 'halfspace', 'config.json');
}

export function readSettingsContent(env: Environment): SettingsContent {
  const path = settingsPath(env);
  const none = { path, value: {}, problems: [] };
  if (path === undefined) return { ...none, state: 'absent' };
  let text: string;
  try {
    text = readFileSync(path, 'utf8');
  } catch (error) {
    const { code = 'unknown error' } = error as NodeJS.ErrnoException;
    if (code === 'ENOENT' || code === 'ENOTDIR') return { ...none, state: 'absent' };
    return { ...none, state: 'broken', problems: [`it cannot be read (${code})`] };
  }
  return { path, ...parseSettings(text) };
}

function parseSettings(text: string): Omit<SettingsContent, 'path'> {
  let value: unknown;
  try {
    value = text.trim() === '' ? {} : JSON.parse(text);
  } catch {
    return { state: 'broken', value: {}, problems: [`line ${brokenJsonLine(text)}: no valid JSON`] };
  }
  if (typeof value !== 'object' || value === null || Array.isArray(value))
    return { state: 'broken', value: {}, problems: ['it holds no object; write { } for no settings'] };
  const record = value as Readonly<Record<string, unknown>>;
  return { state: 'read', value: record, problems: [...faultsOf(record)] };
}

function* faultsOf(record: Readonly<Record<string, unknown>>): Generator<string> {
  for (const name of Object.keys(record))
    if (!KNOWN.includes(name)) yield `${printable(name)} is no setting; known are glyphs, color and keys`;
  for (const [name, words] of [
    ['glyphs', GLYPH_SETTINGS],
    ['color', COLOR_SETTINGS],
  ] as const) {
    const found = record[name];
    if (found !== undefined && !words.some((word) => word === found))
      yield `${name} is ${printable(JSON.stringify(found))}; write ${words.map((w) => `"${w}"`).join(', ')}`;
  }
}

/** A settings file may hold anything; the terminal must not. */
const printable = (text: string): string => text.replace(/[\p{Cc}\p{Cf}]/gu, '?').slice(0, 60);
