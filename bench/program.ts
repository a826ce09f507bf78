/** Where the built program is, and how it is started so that nothing of this machine gets into the figures. */
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

export const ROOT = path.dirname(path.dirname(fileURLToPath(import.meta.url)));
export const DIST = path.join(ROOT, 'dist');
export const PROGRAM = path.join(DIST, 'halfspace.js');

/** Empty: no settings, no entries of one's own, no logbook. */
export const HOME = mkdtempSync(path.join(os.tmpdir(), 'halfspace-bench-'));

/**
 * A small environment. Of what it leaves out, NODE_EXTRA_CA_CERTS slows every start of Node down and makes ratios look
 * better than they are, and CI keeps the screen library from drawing.
 */
export const ENVIRONMENT: Readonly<Record<string, string>> = {
  PATH: process.env['PATH'] ?? '',
  HOME,
  TERM: 'xterm-256color',
  LANG: 'C.UTF-8',
};

export const isBuilt = (): boolean => existsSync(PROGRAM);

/** Starts Node with arguments, waits for its end; milliseconds. Throws if it fails. */
export function timeNode(args: readonly string[]): number {
  const begin = process.hrtime.bigint();
  const { status, stderr } = spawnSync(process.execPath, args, {
    env: ENVIRONMENT,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const taken_ms = Number(process.hrtime.bigint() - begin) / 1e6;
  if (status !== 0) throw new Error(`${args.join(' ')} ended with ${status}: ${stderr.toString()}`);
  return taken_ms;
}

/** True where a command of this name is installed. */
export const isInstalled = (command: string): boolean =>
  spawnSync('sh', ['-c', `command -v ${command}`], { env: ENVIRONMENT }).status === 0;
