/** Each setting, the value in force and where it comes from. The order of decision is stated for each; pure. */
import type { ColorChoice, Environment, GlyphLevel } from '../term/ability.ts';
import { decideColor, decideGlyphs, decideLinear } from '../term/ability.ts';
import type { OptionValues } from './options.ts';
import { COLOR_SETTINGS, GLYPH_SETTINGS, type SettingsContent } from './read-settings.ts';

export type Origin = 'flag' | 'environment' | 'config' | 'default';

export interface SettingInForce {
  readonly name: string;
  readonly value: string | number | boolean | readonly string[];
  readonly from: Origin;
  /** The flag, the variable or the key that decides; undefined for a default. */
  readonly where?: string;
  readonly meaning: string;
}

export interface SettingFacts {
  readonly options: OptionValues;
  readonly env: Environment;
  readonly file: SettingsContent;
  readonly stdoutIsTTY: boolean;
}

export function settingsInForce(facts: SettingFacts): readonly SettingInForce[] {
  return [colour(facts), glyphs(facts), linear(facts), keys(facts), last(facts), recent(facts)];
}

type Decided = Pick<SettingInForce, 'from' | 'where'>;

const by = (from: Origin, where?: string): Decided => (where === undefined ? { from } : { from, where });
const fromConfig = (key: string): Decided => by('config', key);

/** Flag, settings file, NO_COLOR, FORCE_COLOR, TERM=dumb, whether the output is a terminal. */
function colour({ options, env, file, stdoutIsTTY }: SettingFacts): SettingInForce {
  const flag = options.noColor ? 'never' : options.color;
  const configured = COLOR_SETTINGS.find((word) => word === file.value['color']);
  const chosen: ColorChoice | undefined = configured === 'auto' ? undefined : configured;
  const isOn = decideColor({ flag, configured: chosen, env, isTTY: stdoutIsTTY });
  const variable =
    ['NO_COLOR', 'FORCE_COLOR'].find((name) => env[name]) ?? (env['TERM'] === 'dumb' ? 'TERM' : undefined);
  let decided: Decided = variable === undefined ? by('default') : by('environment', variable);
  if (chosen !== undefined) decided = fromConfig('color');
  if (flag === 'always' || flag === 'never') decided = by('flag', options.noColor ? '--no-color' : '--color');
  return {
    name: 'color',
    value: isOn,
    ...decided,
    meaning: 'colour on the screen',
  };
}

/** Flag, settings file, locale, the kind of terminal. */
function glyphs({ options, env, file }: SettingFacts): SettingInForce {
  const configured = GLYPH_SETTINGS.find((word) => word === file.value['glyphs']);
  const chosen: GlyphLevel | undefined = configured === 'auto' ? undefined : configured;
  const value = decideGlyphs(env, options.ascii ? 'ascii' : chosen);
  const locale = ['LC_ALL', 'LC_CTYPE', 'LANG'].find((name) => env[name]);
  let decided =
    locale === undefined ? by('default') : by('environment', value === 'blocks' ? 'TERM' : locale);
  if (chosen !== undefined) decided = fromConfig('glyphs');
  if (options.ascii) decided = by('flag', '--ascii');
  return { name: 'glyphs', value, ...decided, meaning: 'characters of the screen' };
}

/** Flag, then the three variables. */
function linear({ options, env }: SettingFacts): SettingInForce {
  const value = decideLinear(env, options.linear === true);
  const variable = ['HALFSPACE_ACCESSIBLE', 'ACCESSIBLE', 'INK_SCREEN_READER'].find((name) =>
    decideLinear({ [name]: env[name] }),
  );
  const decided = variable === undefined ? by('default') : by('environment', variable);
  return {
    name: 'linear',
    value,
    ...(options.linear ? by('flag', '--linear') : decided),
    meaning: 'plain lines, no picture',
  };
}

function keys({ file }: SettingFacts): SettingInForce {
  const mapped = file.value['keys'];
  const names = typeof mapped === 'object' && mapped !== null ? Object.keys(mapped) : [];
  return {
    name: 'keys',
    value: names,
    ...(names.length === 0 ? by('default') : fromConfig('keys')),
    meaning: 'keys of your own',
  };
}

function last({ file }: SettingFacts): SettingInForce {
  const isKept = file.value['last'] !== undefined;
  return {
    name: 'last',
    value: isKept,
    ...(isKept ? fromConfig('last') : by('default')),
    meaning: 'question kept for the start',
  };
}

function recent({ file }: SettingFacts): SettingInForce {
  const kept = file.value['recent'];
  const count = Array.isArray(kept) ? kept.length : 0;
  return {
    name: 'recent',
    value: count,
    ...(count === 0 ? by('default') : fromConfig('recent')),
    meaning: 'media used lately',
  };
}
