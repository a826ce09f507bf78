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
    if (String(file).startsWith(process.env.WATCHED)) fs.writeSync(2, 'read ' + String(file).slice(process.env.WATCHED.length + 1) + '\\n');
    return plain(file, ...more);
  };
}
process.on('exit', () => {
  for (const name of process.moduleLoadList) fs.writeSync(2, 'loaded ' + name.replace('NativeModule ', '') + '\\n');
});
process.argv.splice(1, 1);
require(process.argv[1]);
`;

interface Started {
  readonly files: readonly string[];
  /** Modules of Node. */
  readonly modules: readonly string[];
}

function start(...args: readonly string[]): Started {
  const { stderr, status } = spawnSync(process.execPath, ['-e', WATCH, '--', entry, entry, ...args], {
    encoding: 'utf8',
    env: { ...process.env, WATCHED: dist, HOME: join(dist, 'none'), XDG_DATA_HOME: '' },
  });
  expect(status, stderr).toBe(0);
  const after = (word: string): readonly string[] => [
    ...new Set(
      stderr.split('\n').flatMap((line) => (line.startsWith(word) ? [line.slice(word.length)] : [])),
    ),
  ];
  return { files: after('read '), modules: after('loaded ') };
}

/** Modules of Node that take long to load. */
const LATE = ['tty', 'net', 'stream', 'os', 'crypto', 'child_process'];
const FIRST = ['halfspace.js', 'core.js', 'core.cache', 'catalog.dat'];

describe.skipIf(!existsSync(entry))('a start of the program', () => {
  it.each<[string, readonly string[]]>([
    ['air fused-silica 632.8nm', []],
    ['air zinc-selenide 10.6um', []],
    ['air n-bk7 633nm --angle 45 --pol p', ['arguments']],
    ['n-bk7 air 550nm --angle 60 --pol s --ascii', ['arguments']],
    ['--json vacuum gold 633nm', ['arguments']],
  ])('reads for one surface only what it needs: %s', (line, parts) => {
    const { files, modules } = start(...line.split(' '));
    const needed = parts.flatMap((part) => [`late-${part}.js`, `late-${part}.cache`]);
    expect([...files].sort()).toEqual([...FIRST, ...needed].sort());
    expect(modules).toContain('fs');
    expect(modules.filter((name) => LATE.includes(name))).toEqual([]);
  });

  it('reads the part for paths where there is a layer', () => {
    const { files } = start('air', 'magnesium-fluoride-film@qw', 'n-bk7', '550nm');
    expect(files).toContain('late-path.js');
    expect(files).not.toContain('late-own.js');
  });

  it('reads the part for typed media where one is typed in numbers', () => {
    expect(start('air', 'n=1.5', '550nm').files).toContain('late-words.js');
  });
});
