/**
 * The settings file as data: what a person may put there, what the program keeps there, and what is wrong with it.
 *   glyphs  "auto", "braille", "blocks" or "ascii"          color  "auto", "always" or "never"
 *   keys    { "swap": ["x"], ... }, names of actions as in the help      last, recent   kept by the program
 */
import type { ColorChoice, GlyphLevel } from '../../term/ability.ts';
import { ACTION_IDS, type ActionId } from '../keys/actions.ts';
import type { KeyMap } from '../keys/bindings.ts';
import { isRecord } from './plain-question.ts';

export interface Settings {
  /** undefined: as the terminal allows. */
  readonly glyphs: GlyphLevel | undefined;
  readonly color: ColorChoice | undefined;
  readonly keys: KeyMap;
  /** The last question, not looked into yet. */
  readonly last: unknown;
  readonly recent: readonly string[];
}

export const NO_SETTINGS: Settings = {
  glyphs: undefined,
  color: undefined,
  keys: {},
  last: undefined,
  recent: [],
};

export interface ReadSettings {
  readonly settings: Settings;
  /** One line each, naming the key. */
  readonly problems: readonly string[];
}

const GLYPHS: readonly string[] = ['braille', 'blocks', 'ascii'];
const COLORS: readonly string[] = ['auto', 'always', 'never'];
const KNOWN: readonly string[] = ['glyphs', 'color', 'keys', 'last', 'recent', '__internal__'];

export function readSettings(value: unknown): ReadSettings {
  if (!isRecord(value))
    return { settings: NO_SETTINGS, problems: ['the file holds no object; write { } for no settings'] };
  const problems: string[] = [];
  for (const name of Object.keys(value)) {
    if (!KNOWN.includes(name)) problems.push(`${name} is no setting; known are glyphs, color and keys`);
  }
  const word = (name: string, words: readonly string[]): string | undefined => {
    const found = value[name];
    if (found === undefined || found === 'auto') return undefined;
    if (typeof found === 'string' && words.includes(found)) return found;
    problems.push(
      `${name} is ${JSON.stringify(found)}; write ${['"auto"', ...words.map((w) => `"${w}"`)].join(', ')}`,
    );
    return undefined;
  };
  return {
    settings: {
      glyphs: word('glyphs', GLYPHS) as GlyphLevel | undefined,
      color: word('color', COLORS.slice(1)) as ColorChoice | undefined,
      keys: readKeys(value['keys'], problems),
      last: value['last'],
      recent: readRecent(value['recent'], problems),
    },
    problems,
  };
}

function readKeys(value: unknown, problems: string[]): KeyMap {
  if (value === undefined) return {};
  if (!isRecord(value)) {
    problems.push('keys is no object; write { "swap": ["x"] }');
    return {};
  }
  const keys: Partial<Record<ActionId, readonly string[]>> = {};
  for (const [name, chords] of Object.entries(value)) {
    const id = ACTION_IDS.find((known) => known === name);
    const list = typeof chords === 'string' ? [chords] : chords;
    if (id === undefined) problems.push(`keys.${name} is no action`);
    else if (!Array.isArray(list) || !list.every((c) => typeof c === 'string'))
      problems.push(`keys.${name} is no list of keys; write ["x"]`);
    else keys[id] = list as string[];
  }
  return keys;
}

function readRecent(value: unknown, problems: string[]): readonly string[] {
  if (value === undefined) return [];
  if (Array.isArray(value) && value.every((k) => typeof k === 'string')) return value as string[];
  problems.push('recent is no list of names');
  return [];
}
