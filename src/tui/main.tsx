/**
 * Entry of the full-screen program, and of its linear form for screen readers. Takes the terminal over and shows the
 * boundary at once; Ink and the rest are loaded behind it.
 */
import type { IndexedCatalogue } from '../catalog/entries.ts';
import {
  type ColorChoice,
  decideColor,
  decideGlyphs,
  decideLinear,
  decideSize,
  type Environment,
  forgetContinuousIntegration,
  type GlyphLevel,
} from '../term/ability.ts';
import { CellWriter } from '../term/cell-writer.ts';
import { TerminalGuard } from '../term/guard.ts';
import { keyChord } from '../term/key.ts';
import { KeyStream } from '../term/key-stream.ts';
import { ASCII_GLYPHS, SCREEN_GLYPHS } from './glyphs.ts';
import type { LayerReader } from './real-world.ts';
import { readSettings, type Settings } from './settings/settings.ts';
import { readSettingsFile, settingsFolder } from './settings/settings-file.ts';
import { skeletonFrame } from './skeleton.ts';
import type { Preferences } from './state.ts';

/** From the command line. */
export interface TuiOptions {
  readonly ascii?: boolean | undefined;
  readonly linear?: boolean | undefined;
  readonly color?: ColorChoice | undefined;
  readonly noColor?: boolean | undefined;
  readonly catalog?: string | undefined;
  readonly logFile?: string | undefined;
}

/** What the program around it provides. */
export interface TuiHost {
  readonly env: Environment;
  readonly catalogue: () => IndexedCatalogue;
  readonly readLayers: LayerReader;
  readonly version: string;
  /** The time, with the offset of local time in minutes east of UTC. */
  readonly clock: () => { readonly now_ms: number; readonly offset_min: number };
  /** To standard error, before the screen is taken over. */
  readonly warn: (text: string) => void;
}

/** What was found at the start, handed to the part that is loaded later. */
export interface Start {
  readonly host: TuiHost;
  readonly settings: Settings;
  readonly settingsFolder: string | undefined;
  readonly canWriteSettings: boolean;
  /** What was wrong with the settings; one line each. */
  readonly problems: readonly string[];
  readonly preferences: Preferences;
  /** Folder of own entries and logbook, where they were named. */
  readonly catalogFolder: string | undefined;
  readonly logFile: string | undefined;
}

const INTERRUPTED = 130;

export async function runTui(options: TuiOptions, host: TuiHost): Promise<number> {
  // What fails here is said on the normal screen.
  host.catalogue();
  const start = readStart(options, host);
  if (decideLinear(host.env, options.linear === true)) {
    const { runLinear } = await import('./linear/run-linear.ts');
    return runLinear(start);
  }
  return runFullScreen(start);
}

function readStart(options: TuiOptions, host: TuiHost): Start {
  const folder = settingsFolder(host.env);
  const file = readSettingsFile(folder);
  const { settings, problems } = readSettings(file.value);
  const all = file.problem === undefined ? problems : [file.problem, ...problems];
  for (const problem of all) host.warn(`halfspace: settings: ${problem}\n`);
  const asked: GlyphLevel | undefined = options.ascii ? 'ascii' : settings.glyphs;
  return {
    host,
    settings,
    settingsFolder: folder,
    canWriteSettings: file.problem === undefined,
    problems: all,
    catalogFolder: options.catalog,
    logFile: options.logFile,
    preferences: {
      glyphs: decideGlyphs(host.env, asked),
      colour: decideColor({
        flag: options.noColor ? 'never' : options.color,
        configured: settings.color,
        env: host.env,
        isTTY: true,
      }),
    },
  };
}

async function runFullScreen(start: Start): Promise<number> {
  const { env } = start.host;
  // Read by Ink when it is loaded.
  forgetContinuousIntegration(process.env);
  const guard = new TerminalGuard({ program: 'halfspace', showStack: Boolean(env['HALFSPACE_DEBUG']) });
  const size = () => decideSize(process.stdout, env);
  const writer = new CellWriter(process.stdout, size);
  let isReady = false;
  const keys = new KeyStream(process.stdin, {
    intercept: (key) => {
      if (isReady || keyChord(key) !== 'ctrl+c') return false;
      guard.exit(INTERRUPTED);
      return true;
    },
  });
  guard.enter();
  keys.start();
  writer.draw(skeletonFrame(size(), start.preferences.glyphs === 'ascii' ? ASCII_GLYPHS : SCREEN_GLYPHS));
  const { showPicture } = await import('./show-picture.tsx');
  isReady = true;
  return showPicture(start, { guard, writer, keys, size });
}
