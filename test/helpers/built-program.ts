/** The built program, run as a process of its own. Another one can be tested by naming it in HALFSPACE_PROGRAM. */
import { type ChildProcess, spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

export const PROGRAM =
  process.env['HALFSPACE_PROGRAM'] ?? fileURLToPath(new URL('../../dist/halfspace.js', import.meta.url));

export interface ProcessEnd {
  readonly status: number | null;
  readonly signal: NodeJS.Signals | null;
  readonly out: string;
  readonly err: string;
}

export interface ProcessOptions {
  readonly env?: Readonly<Record<string, string>>;
  readonly cwd?: string;
  /** Another built program. */
  readonly program?: string;
  readonly onStart?: (child: ChildProcess) => void;
}

/** Runs `halfspace` with words; nothing of the environment but PATH gets in. */
export function runBuilt(words: readonly string[], options: ProcessOptions = {}): Promise<ProcessEnd> {
  const { program = PROGRAM } = options;
  if (!existsSync(program)) throw new Error(`${program} is not there: build the program first`);
  return runProcess(process.execPath, [program, ...words], options);
}

/** Runs a line in `sh`, in which `halfspace` is the built program. */
export function runInShell(line: string, options: ProcessOptions = {}): Promise<ProcessEnd> {
  const start = `halfspace() { "$NODE" "$PROGRAM" "$@"; }\n${line}\n`;
  const env = { ...options.env, NODE: process.execPath, PROGRAM };
  return runProcess('sh', ['-c', start], { ...options, env });
}

function runProcess(
  command: string,
  words: readonly string[],
  { env = {}, cwd, onStart }: ProcessOptions,
): Promise<ProcessEnd> {
  return new Promise((resolve, reject) => {
    const child = spawn(command, words, {
      env: { PATH: process.env['PATH'] ?? '', LANG: 'C.UTF-8', ...env },
      stdio: ['ignore', 'pipe', 'pipe'],
      ...(cwd === undefined ? {} : { cwd }),
    });
    let out = '';
    let err = '';
    child.stdout.setEncoding('utf8').on('data', (text: string) => {
      out += text;
    });
    child.stderr.setEncoding('utf8').on('data', (text: string) => {
      err += text;
    });
    child.on('error', reject);
    child.on('close', (status, signal) => resolve({ status, signal, out, err }));
    onStart?.(child);
  });
}
