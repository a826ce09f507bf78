/** What the built program reads from its own folder for each kind of start. */
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { inputsFile } from './program.ts';

const dist = join(inputsFile, '..');
const entry = join(dist, 'halfspace.js');

/** Names the files of the program's folder that are read, one a line, on standard error. */
const WATCH = `
const fs = require('node:fs');
for (const name of ['readFileSync', 'openSync']) {
  const plain = fs[name];
  fs[name] = (file, ...more) => {
    if (String(file).startsWith(process.env.WATCHED)) console.error('read ' + String(file).slice(process.env.WATCHED.length + 1));
    return plain(file, ...more);
  };
}
process.argv.splice(1, 1);
require(process.argv[1]);
`;

function filesRead(...args: readonly string[]): readonly string[] {
  const { stderr, status } = spawnSync(process.execPath, ['-e', WATCH, '--', entry, entry, ...args], {
    encoding: 'utf8',
    env: { ...process.env, WATCHED: dist, XDG_DATA_HOME: join(dist, 'none') },
  });
  expect(status, stderr).toBe(0);
  const read = stderr.split('\n').flatMap((line) => (line.startsWith('read ') ? [line.slice(5)] : []));
  return [...new Set(read)];
}

const FIRST = ['halfspace.js', 'core.js', 'core.cache', 'catalog.dat'];

describe.skipIf(!existsSync(entry))('a start of the program', () => {
  it.each([
    ['air', 'fused-silica', '632.8nm'],
    ['air', 'n-bk7', '633nm', '--angle', '45', '--pol', 'p'],
    ['--json', 'vacuum', 'gold', '633nm'],
    ['n-bk7', 'air', '550nm', '--angle', '60', '--pol', 's', '--ascii'],
    ['air', 'zinc-selenide', '10.6um', '--quiet'],
  ])('reads the first script and the catalogue only for one surface: %s', (...args) => {
    expect([...filesRead(...args)].sort()).toEqual([...FIRST].sort());
  });

  it('reads the part for paths where there is a layer', () => {
    const files = filesRead('air', 'magnesium-fluoride-film@qw', 'n-bk7', '550nm');
    expect(files).toContain('late-path.js');
    expect(files).not.toContain('late-own.js');
  });

  it('reads the part for typed media where one is typed in numbers', () => {
    expect(filesRead('air', 'n=1.5', '550nm')).toContain('late-words.js');
  });
});
