import { chmodSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { makeQuestion } from '../../src/answer/question.ts';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { KeptSettings } from '../../src/tui/settings/kept-settings.ts';
import { plainQuestion, readQuestion } from '../../src/tui/settings/plain-question.ts';
import { NO_SETTINGS, readSettings } from '../../src/tui/settings/settings.ts';
import { readSettingsFile, SettingsFile, settingsFolder } from '../../src/tui/settings/settings-file.ts';
import { initialState } from '../../src/tui/state.ts';
import { update } from '../../src/tui/update/update.ts';
import { named } from '../helpers/ask.ts';
import { airToSilica, keysOf, testWorld } from './helpers/stage.tsx';

const materialOf = (key: string) => catalogueFromSources().material(key);
const throughJson = (value: unknown): unknown => JSON.parse(JSON.stringify(value));

describe('a question as plain JSON', () => {
  it('comes back as it was', () => {
    const question = makeQuestion(
      { kind: 'literal', literal: { n: { re: 1.5, im: 0.1 } }, text: 'n=1.5+0.1i' },
      named('calcite', 'extraordinary'),
      { wavelength_m: 589.3e-9, inAir: true, text: '589.3 nm' },
      {
        incidenceAngle_rad: 0.7,
        polarization: 'p',
        conditions: { temperature_K: 300, humidity: 0.5 },
        tolerances: { wavelength_m: 1e-9 },
        beam: { kind: 'power', power_W: 1e-3, diameter_m: 2e-3, profile: 'flat' },
      },
    );
    const read = readQuestion(throughJson(plainQuestion(question)), airToSilica(), materialOf);
    expect(read.problems).toEqual([]);
    expect(read.question).toEqual(question);
  });

  it('forgets the wish to extrapolate', () => {
    const plain = throughJson(plainQuestion({ ...airToSilica(), extrapolate: true }));
    expect(readQuestion(plain, airToSilica(), materialOf).question.extrapolate).toBe(false);
  });

  it.each<[string, unknown, RegExp]>([
    ['from', { key: 'no-such-material' }, /last\.from/],
    ['into', 'glass', /last\.into/],
    ['wave', { text: '633xx' }, /last\.wave/],
    ['incidenceAngle_rad', 3, /last\.incidenceAngle_rad/],
    ['polarization', 'x', /last\.polarization/],
    ['conditions', { temperature_K: 'warm' }, /last\.conditions/],
    ['tolerances', { unheard: 1 }, /last\.tolerances/],
    ['beam', { kind: 'power', power_W: -1, profile: 'flat' }, /last\.beam/],
  ])('names %s where it does not hold, and does without it', (name, value, message) => {
    const plain = { ...(throughJson(plainQuestion(airToSilica())) as object), [name]: value };
    const { question, problems } = readQuestion(plain, airToSilica(), materialOf);
    expect(problems.join('\n')).toMatch(message);
    expect(question.wave.wavelength_m).toBe(632.8e-9);
    expect(question.incidenceAngle_rad).toBe(0);
  });
});

describe('the settings', () => {
  it('are empty where there are none', () => {
    expect(readSettings({})).toEqual({ settings: NO_SETTINGS, problems: [] });
  });

  it('are read', () => {
    const { settings, problems } = readSettings({
      glyphs: 'blocks',
      color: 'never',
      keys: { swap: 'X', quit: ['q', 'Q'] },
      recent: ['air'],
    });
    expect(problems).toEqual([]);
    expect(settings).toMatchObject({
      glyphs: 'blocks',
      color: 'never',
      keys: { swap: ['X'], quit: ['q', 'Q'] },
      recent: ['air'],
    });
  });

  it.each<[unknown, RegExp]>([
    [[], /holds no object/],
    [{ glyphs: 'dots' }, /glyphs is "dots"; write "auto", "braille", "blocks", "ascii"/],
    [{ color: 1 }, /color is 1/],
    [{ keys: { fly: ['x'] } }, /keys\.fly is no action/],
    [{ keys: { swap: [1] } }, /keys\.swap is no list of keys/],
    [{ theme: 'dark' }, /theme is no setting/],
    [{ recent: 'air' }, /recent is no list/],
  ])('%j is named by its key', (value, message) => {
    expect(readSettings(value).problems.join('\n')).toMatch(message);
  });
});

describe('the settings file', () => {
  let home: string;
  beforeEach(() => {
    home = mkdtempSync(join(tmpdir(), 'settings-'));
  });
  afterEach(() => {
    chmodSync(home, 0o755);
    rmSync(home, { recursive: true });
  });
  const put = (text: string): string => {
    const folder = join(home, 'halfspace');
    mkdirSync(folder, { recursive: true });
    writeFileSync(join(folder, 'config.json'), text);
    return folder;
  };

  it('is looked for where the environment says; relative places are ignored', () => {
    expect(settingsFolder({ XDG_CONFIG_HOME: '/x', HOME: '/home/a' })).toBe('/x/halfspace');
    expect(settingsFolder({ XDG_CONFIG_HOME: 'x', HOME: '/home/a' })).toBe('/home/a/.config/halfspace');
    expect(settingsFolder({})).toBeUndefined();
  });

  it('is named with its line where it is broken, and not written over', async () => {
    const folder = put('{\n  "glyphs": "ascii",\n  oops\n}');
    const { value, problem } = readSettingsFile(folder);
    expect(value).toEqual({});
    expect(problem).toMatch(/config\.json, line 3: no valid JSON/);
    const file = new SettingsFile(folder, false);
    expect(await file.open()).toBeUndefined();
    expect(file.write({ recent: [] })).toBeUndefined();
    expect(readFileSync(join(folder, 'config.json'), 'utf8')).toContain('oops');
  });

  it('keeps what else a person has written in it', async () => {
    const folder = put('{ "keys": { "swap": ["X"] } }');
    const file = new SettingsFile(folder, true);
    expect(await file.open()).toBeUndefined();
    expect(file.write({ recent: ['air'] })).toBeUndefined();
    expect(readSettingsFile(folder).value).toMatchObject({ keys: { swap: ['X'] }, recent: ['air'] });
  });

  it('says once that it cannot be written, without trying for long', async () => {
    writeFileSync(join(home, 'file'), '');
    const file = new SettingsFile(join(home, 'file', 'halfspace'), true);
    const begin_ms = performance.now();
    const said = await file.open();
    expect(said).toMatch(/settings are not kept/);
    expect(await file.open()).toBeUndefined();
    expect(performance.now() - begin_ms).toBeLessThan(900);
  });

  it('is written after a change and not without one', async () => {
    const folder = join(home, 'halfspace');
    const world = testWorld();
    const first = initialState(
      airToSilica(),
      { columns: 80, rows: 24 },
      { glyphs: 'braille', colour: false },
      world,
    );
    const said: string[] = [];
    const kept = new KeptSettings(new SettingsFile(folder, true), first, (text) => said.push(text));
    await kept.save();
    expect(existsSync(folder)).toBe(false);
    const after = keysOf('a45<enter>').reduce(
      (state, key) => update(state, { kind: 'key', key }, world).state,
      first,
    );
    kept.follow(after);
    await kept.save();
    const { settings } = readSettings(readSettingsFile(folder).value);
    const read = readQuestion(settings.last, airToSilica(), materialOf);
    expect(read.question.incidenceAngle_rad).toBeCloseTo(Math.PI / 4, 12);
    expect(settings.glyphs).toBeUndefined();
    expect(said).toEqual([]);
  });
});
