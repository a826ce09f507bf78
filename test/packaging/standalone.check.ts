/**
 * The standalone executable as on a machine without Node: an empty PATH, an empty home, an empty working folder. What it prints
 * is compared with the built program under Node.
 */
import { spawnSync } from 'node:child_process';
import { chownSync, mkdirSync, mkdtempSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { COMMAND_NAMES } from '../../src/cli/command-table.ts';
import { INPUT, LINES, POINTS } from '../cli/command-lines.ts';
import { PROGRAM } from '../helpers/built-program.ts';
import { PtySession } from '../helpers/pty.ts';

const EXECUTABLE = process.env['HALFSPACE_STANDALONE'] ?? '';
let base = '';
let home = '';
let work = '';
beforeAll(() => {
  base = mkdtempSync(path.join(os.tmpdir(), 'halfspace-standalone-'));
});
afterAll(() => rmSync(base, { recursive: true }));
beforeEach(() => {
  home = mkdtempSync(path.join(base, 'home-'));
  work = mkdtempSync(path.join(base, 'work-'));
});

const environment = (more: Readonly<Record<string, string>> = {}): Record<string, string> => ({
  PATH: '',
  HOME: home,
  LANG: 'C.UTF-8',
  ...more,
});

function run(
  words: readonly string[],
  more: { input?: string; env?: Readonly<Record<string, string>> } = {},
) {
  const { status, stdout, stderr } = spawnSync(EXECUTABLE, words, {
    encoding: 'utf8',
    cwd: work,
    env: environment(more.env),
    input: more.input ?? '',
  });
  return { status, stdout, stderr };
}

function underNode(words: readonly string[], input = '') {
  const { status, stdout, stderr } = spawnSync(process.execPath, [PROGRAM, ...words], {
    encoding: 'utf8',
    cwd: work,
    env: environment(),
    input,
  });
  return { status, stdout, stderr };
}

/** The self-test says how long it took. */
const withoutTimes = (text: string): string => text.replace(/in [\d.]+ m?s$/m, 'in some time');

const unpacked = (): string => {
  const [id = '', ...others] = readdirSync(path.join(home, '.cache/halfspace'));
  expect(others).toEqual([]);
  return path.join(home, '.cache/halfspace', id);
};

describe('the standalone executable', () => {
  it.each(COMMAND_NAMES)('runs %s as the program under Node does', (name) => {
    const words = LINES[name];
    writeFileSync(path.join(work, 'oil.csv'), POINTS);
    const want = underNode(words, INPUT[name]);
    expect(want.status).toBe(0);
    expect((want.stdout + want.stderr).length).toBeGreaterThan(20);
    const got = run(words, { input: INPUT[name] ?? '' });
    expect({ ...got, stdout: withoutTimes(got.stdout) }).toEqual({
      ...want,
      stdout: withoutTimes(want.stdout),
    });
  });

  it('sweeps, plots, and refuses what is wrong with the same words and status', () => {
    for (const words of [
      ['air', 'n-bk7', '--sweep', 'wave=400nm..700nm:50nm'],
      ['air', 'n-bk7', '633nm', '--plot', 'angle'],
      ['air', 'n-bk8', '633nm'],
      ['air', 'n-bk7', '10.6um'],
    ])
      expect(run(words)).toEqual(underNode(words));
  });

  it('leaves nothing behind but its own folder in the cache, and that for its owner alone', () => {
    expect(run(['--version']).status).toBe(0);
    expect(readdirSync(work)).toEqual([]);
    expect(readdirSync(home)).toEqual(['.cache']);
    expect(statSync(unpacked()).mode & 0o777).toBe(0o700);
    const before = statSync(unpacked()).ino;
    expect(run(['--version']).status).toBe(0);
    expect(statSync(unpacked()).ino).toBe(before);
  });

  it('unpacks again what has been cleaned away or cut short', () => {
    const want = run(['find', 'n 1.5..1.52', 'at', '633nm']);
    for (const [name, change] of [
      ['catalog.dat', (file: string) => writeFileSync(file, 'x')],
      ['core.js', (file: string) => rmSync(file)],
    ] as const) {
      change(path.join(unpacked(), name));
      expect(run(['find', 'n 1.5..1.52', 'at', '633nm'])).toEqual(want);
    }
    unpacked();
  });

  it('starts many at a time for the first time', async () => {
    const line = Array.from(
      { length: 6 },
      () => '"$0" air n-bk7 633nm --plain >/dev/null || echo failed',
    ).join(' & ');
    const { stdout, stderr } = spawnSync('/bin/sh', ['-c', `${line} & wait`, EXECUTABLE], {
      encoding: 'utf8',
      cwd: work,
      env: environment(),
    });
    expect(stdout + stderr).toBe('');
    unpacked();
  });

  it('takes a temporary folder where the cache cannot be written', () => {
    const file = path.join(home, 'file');
    writeFileSync(file, '');
    const temporary = path.join(home, 'tmp');
    mkdirSync(temporary);
    const { status, stdout } = run(['air', 'n-bk7', '633nm', '--plain'], {
      env: { XDG_CACHE_HOME: file, TMPDIR: temporary },
    });
    expect(status).toBe(0);
    expect(stdout).toContain('N-BK7');
    expect(readdirSync(temporary)).toEqual([`halfspace-${process.getuid?.()}`]);
  });

  it('says in one line where it could not be unpacked', () => {
    const file = path.join(home, 'file');
    writeFileSync(file, '');
    const { status, stdout, stderr } = run(['--version'], { env: { XDG_CACHE_HOME: file, TMPDIR: file } });
    expect([status, stdout]).toEqual([4, '']);
    expect(stderr).toMatch(/^halfspace: the program could not be unpacked \(.+\); set XDG_CACHE_HOME .+\n$/);
  });

  it.runIf(process.getuid?.() === 0)('runs nothing from a folder of somebody else', () => {
    const temporary = path.join(home, 'tmp');
    const theirs = path.join(temporary, 'halfspace-0');
    mkdirSync(theirs, { recursive: true });
    chownSync(theirs, 65534, 65534);
    const file = path.join(home, 'file');
    writeFileSync(file, '');
    const { status, stderr } = run(['--version'], { env: { XDG_CACHE_HOME: file, TMPDIR: temporary } });
    expect(status).toBe(4);
    expect(stderr).toContain(`others can write to ${theirs}`);
    expect(readdirSync(theirs)).toEqual([]);
  });

  it('opens the screen, takes keys, and leaves the terminal as it was', async () => {
    const session = new PtySession(EXECUTABLE, [], { columns: 100, rows: 30, cwd: work, env: environment() });
    try {
      await session.waitFor('keys');
      await session.quiet(300);
      session.send('ign-bk7\r');
      await session.waitFor('N-BK7');
      session.send('\x03');
      expect(await session.exited).toBe(130);
      await session.quiet();
      expect(session.model.modes()).toMatchObject({ alternateScreen: false, cursorShown: true });
    } finally {
      await session.dispose();
    }
  });
});
