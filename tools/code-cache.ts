/**
 * Makes dist/core.cache: the compiled code of the one-shot path, taken after one question was answered, so that the functions
 * it uses are in it. Without it a start spends more time compiling than answering. An engine of another version rejects it
 * and compiles as usual.
 */
import { spawnSync } from 'node:child_process';
import path from 'node:path';

const MAKER = `
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
  script.runInThisContext()(require, file, () => {});
}
fs.writeSync = quiet;
fs.writeFileSync(path.join(keep, 'core.cache'), script.createCachedData());
`;

export function makeCodeCache(dist: string): void {
  // Only what a plain start sets counts: other flags of this process would make a cache that plain starts reject.
  const env = { ...process.env, NODE_OPTIONS: '', XDG_DATA_HOME: path.join(dist, 'no-such-folder') };
  const made = spawnSync(process.execPath, ['-e', MAKER, dist], { env, encoding: 'utf8' });
  if (made.status !== 0) throw new Error(`the code cache could not be made: ${made.stderr}`);
}
