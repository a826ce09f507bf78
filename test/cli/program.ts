/**
 * The program as users start it, in a process of its own: the build where it is as new as its sources, else the sources.
 * Each run has a small environment of its own, so that nothing of the machine changes what is tested.
 */
import { type ChildProcessWithoutNullStreams, spawn, spawnSync } from 'node:child_process';
import { readdirSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../..', import.meta.url));
const built = join(root, 'dist', 'halfspace.js');

function newest_ms(place: string): number {
  const stat = statSync(place, { throwIfNoEntry: false });
  if (!stat) return 0;
  if (!stat.isDirectory()) return stat.mtimeMs;
  return readdirSync(place).reduce((latest, name) => Math.max(latest, newest_ms(join(place, name))), 0);
}

export const isBuilt =
  newest_ms(built) > Math.max(newest_ms(join(root, 'src')), newest_ms(join(root, 'catalog', 'materials')));

/** What node is given before the arguments of the program. */
export const PROGRAM: readonly string[] = isBuilt
  ? [built]
  : ['--import', import.meta.resolve('tsx'), join(root, 'src', 'main.ts')];

export interface Run {
  readonly status: number | null;
  readonly out: string;
  readonly err: string;
}

export interface RunOptions {
  /** Added to the small environment; undefined takes a variable out of it. */
  readonly env?: Readonly<Record<string, string | undefined>>;
  readonly input?: string;
  readonly cwd?: string;
}

function environment(env: RunOptions['env'] = {}): NodeJS.ProcessEnv {
  const all = { PATH: process.env['PATH'], HOME: tmpdir(), LANG: 'C.UTF-8', ...env };
  return Object.fromEntries(Object.entries(all).filter(([, value]) => value !== undefined));
}

/** Runs it to its end; output as text, of any length. */
export function halfspace(args: readonly string[], { env, input = '', cwd = root }: RunOptions = {}): Run {
  const { status, stdout, stderr } = spawnSync(process.execPath, [...PROGRAM, ...args], {
    encoding: 'utf8',
    env: environment(env),
    input,
    cwd,
    maxBuffer: 64_000_000,
    timeout: 60_000,
  });
  return { status, out: stdout, err: stderr };
}

/** Starts it with pipes for all three streams. */
export function startHalfspace(args: readonly string[]): ChildProcessWithoutNullStreams {
  return spawn(process.execPath, [...PROGRAM, ...args], { env: environment(), cwd: root });
}

/** Runs a line of bash in which `"$@"` is the program; what the line prints. */
export function inShell(line: string, options: Pick<RunOptions, 'env'> = {}): Run {
  const { status, stdout, stderr } = spawnSync(
    'bash',
    ['--norc', '-c', line, 'bash', process.execPath, ...PROGRAM],
    { encoding: 'utf8', env: environment(options.env), cwd: root, timeout: 60_000, maxBuffer: 64_000_000 },
  );
  return { status, out: stdout, err: stderr };
}

/** The list of modules that the build put in the program proper and in its parts; undefined where nothing is built. */
export const inputsFile = join(root, 'dist', 'inputs.json');
