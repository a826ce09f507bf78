import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { settingsPath } from '../../src/cli/read-settings.ts';
import { readSettings } from '../../src/tui/settings/settings.ts';
import { settingsFolder } from '../../src/tui/settings/settings-file.ts';
import { run } from './in-process.ts';
import { expectAscii, expectPage } from './page-shape.ts';
import { validDocument } from './schema.ts';

let home = '';
const store = (text: string): void => {
  mkdirSync(join(home, '.config', 'halfspace'), { recursive: true });
  writeFileSync(join(home, '.config', 'halfspace', 'config.json'), text);
};

beforeAll(() => {
  home = mkdtempSync(join(tmpdir(), 'halfspace-config-'));
});
afterAll(() => rmSync(home, { recursive: true, force: true }));

interface Setting {
  readonly name: string;
  readonly value: unknown;
  readonly from: string;
  readonly where: string | null;
}

async function settings(
  env: Record<string, string> = {},
  ...args: readonly string[]
): Promise<Map<string, Setting>> {
  const { status, out, err } = await run(['config', '--json', ...args], { env: { HOME: home, ...env } });
  expect([status, err]).toEqual([0, '']);
  const list = validDocument('config', out)['settings'] as readonly Setting[];
  return new Map(list.map((one) => [one.name, one]));
}

describe('config', () => {
  it('shows each setting with what decides it: flag, settings file, environment, default', async () => {
    store('{}');
    const color = async (...of: Parameters<typeof settings>) => (await settings(...of)).get('color');
    expect(await color()).toMatchObject({ value: false, from: 'default', where: null });
    expect(await color({ FORCE_COLOR: '1' })).toMatchObject({
      value: true,
      from: 'environment',
      where: 'FORCE_COLOR',
    });
    expect(await color({ FORCE_COLOR: '1', NO_COLOR: '1' })).toMatchObject({
      value: false,
      where: 'NO_COLOR',
    });
    expect(await color({ NO_COLOR: '' })).toMatchObject({ from: 'default' });
    expect(await color({ TERM: 'dumb' })).toMatchObject({ value: false, where: 'TERM' });
    store('{ "color": "always" }');
    expect(await color({ NO_COLOR: '1' })).toMatchObject({ value: true, from: 'config', where: 'color' });
    expect(await color({}, '--no-color')).toMatchObject({ value: false, from: 'flag', where: '--no-color' });
    expect(await color({}, '--color=never')).toMatchObject({ value: false, from: 'flag', where: '--color' });
  });

  it('says which characters the screen may draw, and why', async () => {
    store('{}');
    const glyphs = async (...of: Parameters<typeof settings>) => (await settings(...of)).get('glyphs');
    expect(await glyphs()).toMatchObject({ value: 'ascii', from: 'default' });
    expect(await glyphs({ LANG: 'C.UTF-8' })).toMatchObject({ value: 'braille', where: 'LANG' });
    expect(await glyphs({ LC_ALL: 'C', LANG: 'C.UTF-8' })).toMatchObject({ value: 'ascii', where: 'LC_ALL' });
    expect(await glyphs({ LANG: 'C.UTF-8', TERM: 'linux' })).toMatchObject({
      value: 'blocks',
      where: 'TERM',
    });
    store('{ "glyphs": "blocks" }');
    expect(await glyphs({ LANG: 'C' })).toMatchObject({ value: 'blocks', from: 'config' });
    expect(await glyphs({ LANG: 'C.UTF-8' }, '--ascii')).toMatchObject({ value: 'ascii', where: '--ascii' });
  });

  it('says whether plain lines are asked for, and by what', async () => {
    store('{}');
    expect((await settings()).get('linear')).toMatchObject({ value: false, from: 'default' });
    expect((await settings({ ACCESSIBLE: '1' })).get('linear')).toMatchObject({
      value: true,
      where: 'ACCESSIBLE',
    });
    expect((await settings({ ACCESSIBLE: '0' })).get('linear')).toMatchObject({ value: false });
    expect((await settings({}, '--linear')).get('linear')).toMatchObject({ value: true, where: '--linear' });
  });

  it('shows places of files, in 72 columns and in ASCII', async () => {
    store('{ "keys": { "swap": ["x"] }, "recent": ["air", "water"], "last": {} }');
    const { out } = await run(['config'], {
      env: { HOME: home, XDG_DATA_HOME: '/data', XDG_STATE_HOME: 'relative' },
    });
    expectPage(out.replaceAll(home, '/home/me'));
    expect(out).toContain(join(home, '.config', 'halfspace', 'config.json'));
    expect(out).toMatch(
      /entries +\/data\/halfspace\/materials\n +entries of your own; not there; place by XDG_DATA_HOME/,
    );
    expect(out).toContain(join(home, '.local', 'state', 'halfspace', 'logbook.jsonl'));
    expect(out).toMatch(/^keys +1 changed +settings file/m);
    expect(out).toMatch(/^recent +2 /m);
    expectAscii((await run(['config', '--ascii'], { env: { HOME: home } })).out);
  });

  it('names a broken settings file with its line, and a wrong setting with its key', async () => {
    store('{\n  "color": "never"\n  "glyphs": 1\n}');
    const broken = await run(['config'], { env: { HOME: home } });
    expect([broken.status, broken.err]).toEqual([0, '']);
    expect(broken.out).toContain('BROKEN, see below');
    expect(broken.out).toContain('line 3: no valid JSON');
    store('{ "color": "red", "zap\\u001b[31m": 1 }');
    const { out } = await run(['config'], { env: { HOME: home } });
    expect(out).toContain('color is "red"; write "auto", "always", "never"');
    expect(out).toContain('zap?[31m is no setting; known are glyphs, color and keys');
    expectPage(out.replaceAll(home, '/home/me'));
  });

  it('answers without a home folder and with a file in place of the folder', async () => {
    const { status, out } = await run(['config'], { env: {} });
    expect(status).toBe(0);
    expect(out).toContain('nowhere: there is no home folder');
    const none = await run(['config', '--json'], { env: { HOME: join(home, 'none') } });
    expect(validDocument('config', none.out)['settingsFile']).toMatchObject({ state: 'absent' });
  });
});

describe('the settings file', () => {
  it.each([{ HOME: '/h' }, { HOME: '/h', XDG_CONFIG_HOME: '/c' }, { HOME: '/h', XDG_CONFIG_HOME: 'c' }, {}])(
    'is where the full-screen program keeps it: %j',
    (env) => {
      const folder = settingsFolder(env);
      expect(settingsPath(env)).toBe(folder === undefined ? undefined : join(folder, 'config.json'));
    },
  );

  it.each([
    '{}',
    '{ "glyphs": "braille", "color": "auto", "keys": {}, "last": {}, "recent": [] }',
    '{ "glyphs": "fancy" }',
    '{ "color": "red" }',
    '{ "zap": 1 }',
    '[]',
  ])('is faulty here exactly where it is faulty there: %s', async (text) => {
    store(text);
    const { out } = await run(['config', '--json'], { env: { HOME: home } });
    const { problems } = JSON.parse(out).settingsFile as { problems: readonly string[] };
    expect(problems.length).toBe(readSettings(JSON.parse(text)).problems.length);
  });
});
