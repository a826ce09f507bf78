/** Runs the writer program as a process of its own, bundled beforehand so that it starts fast. */
import { type ChildProcess, spawn } from 'node:child_process';
import { chmodSync, mkdtempSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

/** A folder for the files of one test, in the folder for temporary files. */
export function testFolder(): string {
  return mkdtempSync(path.join(os.tmpdir(), 'halfspace-logbook-'));
}

/** The path of the bundled program, in a folder that everybody may read. */
export async function bundleWriter(folder: string): Promise<string> {
  const outfile = path.join(folder, 'writer.cjs');
  await build({
    entryPoints: [fileURLToPath(new URL('./writer-program.ts', import.meta.url))],
    outfile,
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'cjs',
  });
  chmodSync(folder, 0o755);
  return outfile;
}

export interface Ended {
  /** Whole lines of output. */
  readonly lines: readonly string[];
  readonly status: number | null;
  readonly signal: NodeJS.Signals | null;
  readonly errors: string;
}

/** Starts a command; `whileRunning` is given the process as soon as its first output has come. */
export function runUntilEnd(
  command: string,
  words: readonly string[],
  options: { readonly uid?: number; readonly onFirstOutput?: (child: ChildProcess) => void } = {},
): Promise<Ended> {
  return new Promise((resolve, reject) => {
    const { NODE_EXTRA_CA_CERTS: _, ...env } = process.env;
    const identity = options.uid === undefined ? {} : { uid: options.uid, gid: options.uid };
    const child = spawn(command, words, { env, stdio: ['ignore', 'pipe', 'pipe'], ...identity });
    let output = '';
    let errors = '';
    child.stdout.on('data', (data) => {
      if (output === '') options.onFirstOutput?.(child);
      output += data;
    });
    child.stderr.on('data', (data) => {
      errors += data;
    });
    child.on('error', reject);
    child.on('close', (status, signal) => {
      resolve({ lines: output.split('\n').slice(0, -1), status, signal, errors });
    });
  });
}
