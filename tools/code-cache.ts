/**
 * Makes the code caches beside the built scripts: compiled code, taken after the script has done some of its work, so that the
 * functions it uses are in it. Without one a start spends more time compiling than answering. An engine of another version
 * rejects them and compiles as usual.
 */
import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

/** Runs the command lines, the texts they print thrown away, then keeps the cache of the one script. */
const MAKER = `
const fs = require('node:fs'), vm = require('node:vm'), path = require('node:path');
const [, dist, wanted, lines] = process.argv;
let kept;
const start = (name, module) => {
  const file = path.join(dist, name + '.js');
  const script = new vm.Script(fs.readFileSync(file, 'latin1'), { filename: file });
  if (name === wanted) kept = script;
  script.runInThisContext()(require, dist, importPart, loadNow, module);
};
const loaded = new Map();
const loadNow = (name) => {
  if (!loaded.has(name)) {
    const module = { exports: {} };
    loaded.set(name, module);
    start(name, module);
  }
  return loaded.get(name).exports;
};
const importPart = (part) => {
  const name = path.basename(part, '.mjs');
  return fs.existsSync(path.join(dist, name + '.js')) ? Promise.resolve(loadNow(name)) : import(path.join(dist, part));
};
const core = path.join(dist, 'core.js');
const script = new vm.Script(fs.readFileSync(core, 'latin1'), { filename: core });
if (wanted === 'core') kept = script;
process.exit = (status) => {
  process.exitCode = status;
};
const write = fs.writeSync;
fs.writeSync = (to, bytes, ...more) => (to === 1 ? bytes.length : write(to, bytes, ...more));
for (const line of JSON.parse(lines)) {
  process.argv = [process.execPath, 'halfspace', ...line];
  script.runInThisContext()(require, dist, importPart, loadNow);
}
process.once('beforeExit', () => {
  if (process.exitCode || !kept) throw new Error(wanted + ' did not run');
  fs.writeFileSync(path.join(dist, wanted + '.cache'), kept.createCachedData());
});
`;

/**
 * @param name the script, without its ending
 * @param lines command lines that run it and end with status 0; `{rows}` in one names a small file of rows,
 *   `{own}` a folder with an entry of a user's own
 */
export function makeCache(dist: string, name: string, lines: readonly (readonly string[])[]): void {
  const folder = mkdtempSync(path.join(tmpdir(), 'rows-'));
  try {
    const rows = path.join(folder, 'rows.csv');
    const waves = Array.from({ length: 200 }, (_, i) => `${(0.4 + i / 200).toFixed(4)},${i % 80}`);
    writeFileSync(rows, `wave_um,angle\n${waves.join('\n')}\n`);
    const own = path.join(folder, 'own');
    mkdirSync(own);
    writeFileSync(path.join(own, 'an-oil.csv'), 'wavelength_nm,n,k\n400,1.53,0\n700,1.51,1e-6\n');
    const named: Readonly<Record<string, string>> = { '{rows}': rows, '{own}': own };
    const given = lines.map((line) => line.map((word) => named[word] ?? word));
    // Only what a plain start sets counts: other flags of this process would make a cache that plain starts reject.
    const env = { ...process.env, NODE_OPTIONS: '', XDG_DATA_HOME: path.join(dist, 'no-such-folder') };
    const made = spawnSync(process.execPath, ['-e', MAKER, dist, name, JSON.stringify(given)], {
      env,
      encoding: 'utf8',
    });
    if (made.status !== 0) throw new Error(`the code cache of ${name} could not be made: ${made.stderr}`);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
