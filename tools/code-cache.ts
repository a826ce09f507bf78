/**
 * Makes the code caches beside the built scripts: compiled code, taken after the script has done some of its work, so that the
 * functions it uses are in it. Without one a start spends more time compiling than answering. An engine of another version
 * rejects them and compiles as usual.
 */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

/** The one-shot path: a few questions, their answers thrown away. */
const CORE_MAKER = `
const fs = require('node:fs'), vm = require('node:vm'), path = require('node:path');
const file = path.join(process.argv[1], 'core.js');
const script = new vm.Script(fs.readFileSync(file, 'latin1'), { filename: file });
const keep = process.argv[1];
const quiet = fs.writeSync;
for (const question of [
  ['air', 'n-bk7', '633nm', '--angle', '45', '--pol', 'p'],
  ['air', 'fused-silica', '632.8nm'],
  ['--json', 'vacuum', 'gold', '633nm'],
]) {
  process.argv = [process.execPath, 'halfspace', ...question];
  fs.writeSync = (fd, bytes) => bytes.length;
  script.runInThisContext()(require, keep, () => {});
}
fs.writeSync = quiet;
fs.writeFileSync(path.join(keep, 'core.cache'), script.createCachedData());
`;

/** One part: a command line is run to its end, then the cache of the part alone is kept. */
const PART_MAKER = `
const fs = require('node:fs'), vm = require('node:vm'), path = require('node:path');
const [, dist, part, ...line] = process.argv;
const load = (name) => {
  const file = path.join(dist, name);
  return new vm.Script(fs.readFileSync(file, 'latin1'), { filename: file });
};
let script;
const importPart = (name) => {
  if (path.basename(name, '.mjs') !== part) return import(path.join(dist, name));
  script = load(part + '.js');
  const module = { exports: {} };
  script.runInThisContext()(require, dist, importPart, module);
  return Promise.resolve(module.exports);
};
process.argv = [process.execPath, 'halfspace', ...line];
load('core.js').runInThisContext()(require, dist, importPart);
process.once('beforeExit', () => {
  if (process.exitCode || !script) throw new Error(part + ' did not run');
  fs.writeFileSync(path.join(dist, part + '.cache'), script.createCachedData());
});
`;

export function makeCodeCache(dist: string): void {
  make(CORE_MAKER, dist, []);
}

/** `line` is a command line that runs the part and ends with status 0; `{rows}` in it names a small file of rows. */
export function makePartCache(dist: string, part: string, line: readonly string[]): void {
  const folder = mkdtempSync(path.join(tmpdir(), 'rows-'));
  try {
    const rows = path.join(folder, 'rows.csv');
    const waves = Array.from({ length: 200 }, (_, i) => `${(0.4 + i / 200).toFixed(4)},${i % 80}`);
    writeFileSync(rows, `wave_um,angle\n${waves.join('\n')}\n`);
    make(PART_MAKER, dist, [part, ...line.map((word) => (word === '{rows}' ? rows : word))]);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

function make(maker: string, dist: string, more: readonly string[]): void {
  // Only what a plain start sets counts: other flags of this process would make a cache that plain starts reject.
  const env = { ...process.env, NODE_OPTIONS: '', XDG_DATA_HOME: path.join(dist, 'no-such-folder') };
  const made = spawnSync(process.execPath, ['-e', maker, dist, ...more], { env, encoding: 'utf8' });
  if (made.status !== 0) throw new Error(`the code cache could not be made: ${made.stderr}`);
}
