/** End to end: what every command of the program keeps to, whatever it prints. */
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { hostname, tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { COMMAND_NAMES, type CommandName } from '../../src/cli/command-table.ts';
import { INPUT, LINES, POINTS } from './command-lines.ts';
import { halfspace, type Run } from './program.ts';

let home = '';
let work = '';
beforeAll(() => {
  home = mkdtempSync(join(tmpdir(), 'halfspace-home-'));
  work = mkdtempSync(join(tmpdir(), 'halfspace-work-'));
  writeFileSync(join(work, 'oil.csv'), POINTS);
  const someone = { USER: 'nobody-of-that-name', LOGNAME: 'nobody-of-that-name' };
  expect(run('answer', ['--log', '--quiet'], someone)).toMatchObject({ status: 0, err: '' });
});
afterAll(() => {
  for (const folder of [home, work]) rmSync(folder, { recursive: true, force: true });
});

function run(
  name: CommandName,
  more: readonly string[] = [],
  env: Readonly<Record<string, string>> = {},
): Run {
  const places = { HOME: home, TZ: 'UTC' };
  return halfspace([...LINES[name], ...more], {
    cwd: work,
    input: INPUT[name] ?? '',
    env: { ...places, ...env },
  });
}

/** The self-test says how long it took. */
const withoutTimes = (text: string): string => text.replace(/in [\d.]+ m?s$/m, 'in some time');
/** What a terminal window, a person's colours and a language say of themselves. */
const OTHERWISE = {
  COLUMNS: '20',
  LINES: '5',
  TERM: 'xterm-256color',
  FORCE_COLOR: '3',
  LANGUAGE: 'de',
  LC_ALL: 'de_DE.UTF-8',
  LC_NUMERIC: 'de_DE.UTF-8',
};

describe('every command', { timeout: 60_000 }, () => {
  it.each(COMMAND_NAMES)(
    '%s prints whole lines of plain text, the same in any window and language',
    (name) => {
      const { status, out, err } = run(name);
      expect([status, err]).toEqual([0, '']);
      expect(out).toMatch(/[^\n]\n$/);
      // Neither escapes nor carriage returns nor a byte order mark, and no blanks at the ends of lines.
      expect(out).not.toMatch(/[\x1b\r\ufeff]|[ \t]$/m);
      expect(out).not.toMatch(/\bNaN\b|\bInfinity\b|\bundefined\b|\[object/);
      // What is drawn for a window of its own width would be cut or wrapped here. `config` tells of the surroundings.
      if (name === 'config') return;
      expect(withoutTimes(run(name, [], OTHERWISE).out)).toBe(withoutTimes(out));
    },
  );

  it('leaves nothing behind in the home folder or the working folder but what was logged', () => {
    expect(readdirSync(home)).toEqual(['.local']);
    expect(readdirSync(join(home, '.local', 'state'))).toEqual(['halfspace']);
    expect(readdirSync(work)).toEqual(['oil.csv']);
  });

  it('logs who asked and where only if told to', () => {
    const logged = readFileSync(join(home, '.local', 'state', 'halfspace', 'logbook.jsonl'), 'utf8');
    expect(logged).toContain('"commandWords"');
    for (const name of ['nobody-of-that-name', hostname(), home]) expect(logged).not.toContain(name);
  });

  it.each(['--json', '--csv', '--markdown', '--plain'])(
    'answers by %s in any window and language alike',
    (form) => {
      const { status, out, err } = run('answer', [form], OTHERWISE);
      expect([status, err]).toEqual([0, '']);
      expect(out).toBe(run('answer', [form]).out);
    },
  );

  it.each(COMMAND_NAMES)('%s explains itself on standard output, whatever else is wrong', (name) => {
    const words = name === 'answer' ? [] : [name];
    const { status, out, err } = halfspace([...words, '--help', '--no-such-option', 'no-such-thing']);
    expect([status, err]).toEqual([0, '']);
    expect(out).toContain('Examples\n');
    expect(out.endsWith('\n')).toBe(true);
  });
});
