/**
 * Makes the code caches beside the built scripts: compiled code, taken after the script has done some of its work, so that the
 * functions it uses are in it. Without one a start spends more time compiling than answering. An engine of another version
 * rejects them and compiles as usual.
 */
import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { spawn } from '@lydell/node-pty';

/** Starts the program by its entry, command line after command line, then keeps the caches of the scripts asked for. */
const MAKER = `
const fs = require('node:fs'), vm = require('node:vm'), path = require('node:path');
const [, dist, wanted, lines, isScreen] = process.argv;
// Every start runs the same compiled scripts, so that what each of them used comes together.
const scripts = new Map();
const { Script } = vm;
vm.Script = function (source, { filename }) {
  if (!scripts.has(filename)) scripts.set(filename, new Script(source, { filename }));
  return scripts.get(filename);
};
const keep = (status) => {
  for (const name of JSON.parse(wanted)) {
    const script = scripts.get(dist + '/' + name + '.js');
    if (status || !script) throw new Error(name + ' did not run');
    fs.writeFileSync(path.join(dist, name + '.cache'), script.createCachedData());
  }
};
const exit = process.exit;
process.exit = (status) => {
  process.exitCode = status;
  if (!isScreen) return;
  keep(status);
  exit(status);
};
process.once('beforeExit', () => keep(process.exitCode));
const write = fs.writeSync;
if (!isScreen) fs.writeSync = (to, bytes, ...more) => (to === 1 ? bytes.length : write(to, bytes, ...more));
const entry = path.join(dist, 'halfspace.js');
for (const line of JSON.parse(lines)) {
  process.argv = [process.execPath, entry, ...line];
  delete require.cache[entry];
  require(entry);
}
`;

/** Only what a plain start sets counts: other flags of this process would make a cache that plain starts reject. */
const plainEnvironment = (folder: string): Record<string, string> => {
  const { CI, NODE_OPTIONS, ...others } = process.env as Record<string, string>;
  return { ...others, XDG_DATA_HOME: folder, XDG_CONFIG_HOME: folder, XDG_STATE_HOME: folder };
};

/**
 * @param name the script, without its ending
 * @param lines command lines that run it and end with status 0; `{rows}` in one names a small file of rows,
 *   `{own}` a folder with an entry of a user's own
 */
export function makeCache(dist: string, name: string, lines: readonly (readonly string[])[]): void {
  withFolder((folder) => {
    const rows = path.join(folder, 'rows.csv');
    const waves = Array.from({ length: 200 }, (_, i) => `${(0.4 + i / 200).toFixed(4)},${i % 80}`);
    writeFileSync(rows, `wave_um,angle\n${waves.join('\n')}\n`);
    const own = path.join(folder, 'own');
    mkdirSync(own);
    writeFileSync(path.join(own, 'an-oil.csv'), 'wavelength_nm,n,k\n400,1.53,0\n700,1.51,1e-6\n');
    const named: Readonly<Record<string, string>> = { '{rows}': rows, '{own}': own };
    const given = lines.map((line) => line.map((word) => named[word] ?? word));
    const made = spawnSync(
      process.execPath,
      ['-e', MAKER, dist, JSON.stringify([name]), JSON.stringify(given)],
      { env: plainEnvironment(path.join(folder, 'none')), encoding: 'utf8' },
    );
    if (made.status !== 0) throw new Error(`the code cache of ${name} could not be made: ${made.stderr}`);
  });
}

/** The scripts of the full-screen program, after its first frame and the keys given one by one. The last key leaves it. */
export async function makeScreenCaches(
  dist: string,
  names: readonly string[],
  keys: readonly string[],
): Promise<void> {
  await withFolder(async (folder) => {
    const args = ['-e', MAKER, dist, JSON.stringify(names), '[[]]', 'screen'];
    const env = { ...plainEnvironment(folder), LANG: 'C.UTF-8', TERM: 'xterm-256color' };
    const screen = spawn(process.execPath, args, { cols: 80, rows: 24, env });
    let text = '';
    const left = [...keys];
    let timer: NodeJS.Timeout | undefined;
    const pressWhenQuiet = (): void => {
      clearTimeout(timer);
      timer = setTimeout(() => {
        const key = left.shift();
        if (key === undefined) return;
        screen.write(key);
        pressWhenQuiet();
      }, QUIET_ms);
    };
    screen.onData((data) => {
      text += data;
      pressWhenQuiet();
    });
    const giveUp = setTimeout(() => screen.kill('SIGKILL'), LONGEST_ms);
    const status = await new Promise<number>((resolve) =>
      screen.onExit(({ exitCode, signal }) => resolve(signal || exitCode)),
    );
    clearTimeout(timer);
    clearTimeout(giveUp);
    if (status !== 0) throw new Error(`the code cache of the screen could not be made: ${text}`);
  });
}

/** After so long without output a frame is complete. */
const QUIET_ms = 250;
const LONGEST_ms = 20_000;

function withFolder<Result>(use: (folder: string) => Result): Result {
  const folder = mkdtempSync(path.join(tmpdir(), 'cache-'));
  const remove = (): void => rmSync(folder, { recursive: true, force: true });
  const result = use(folder);
  if (result instanceof Promise) return result.finally(remove) as Result;
  remove();
  return result;
}
