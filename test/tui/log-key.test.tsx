/** The key that keeps the answer in the logbook, in the picture and in the linear layout; what is said where it cannot. */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, describe, expect, it } from 'vitest';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { isRefusal } from '../../src/medium/refusal.ts';
import { logEntries } from '../../src/record/logbook.ts';
import { beginSession, reply } from '../../src/tui/linear/session.ts';
import { keptText, Logbook } from '../../src/tui/logbook.ts';
import type { Start } from '../../src/tui/main.tsx';
import { NO_SETTINGS } from '../../src/tui/settings/settings.ts';
import { Stage } from './helpers/stage.tsx';

let stage: Stage | undefined;
const folders: string[] = [];
afterEach(() => {
  stage?.end();
  for (const folder of folders.splice(0)) rmSync(folder, { recursive: true, force: true });
});

const open = (options = {}): Stage => {
  stage = new Stage(options);
  return stage;
};

const keptBy = (from: Stage) => {
  const effect = from.effects.find(({ kind }) => kind === 'keep');
  if (effect?.kind !== 'keep') throw new Error('nothing is to be kept');
  return effect.record;
};

function logbookIn(file: string): Logbook {
  const start: Start = {
    settings: NO_SETTINGS,
    settingsFolder: undefined,
    canWriteSettings: false,
    problems: [],
    preferences: { glyphs: 'braille', colour: false },
    catalogFolder: undefined,
    host: {
      env: {},
      catalogue: catalogueFromSources,
      readLayers: () => [],
      version: '0.1.0',
      clock: () => ({ now_ms: Date.UTC(2026, 2, 14, 8, 26, 53), offset_min: 60 }),
      warn: () => {},
    },
    logFile: file,
  };
  return new Logbook(start);
}

describe('the key l', () => {
  it('has the record of the present answer kept, with the command that asks it again', () => {
    const record = keptBy(open().type('a45<enter>').type('p').type('l'));
    expect(record.command).toMatch(/^halfspace air fused-silica 632\.8nm --angle 45deg/);
    expect(record.rows.some(({ symbol }) => /^R/.test(symbol))).toBe(true);
    expect(record.sources.length).toBeGreaterThan(0);
  });

  it('says where and under which id it is, once it is on disk', async () => {
    const folder = mkdtempSync(path.join(tmpdir(), 'halfspace-screen-'));
    folders.push(folder);
    const file = path.join(folder, 'bench.jsonl');
    const record = keptBy(open().type('l'));
    const outcome = logbookIn(file).keep(record);
    expect(isRefusal(outcome)).toBe(false);
    expect([...logEntries(file, 'oldest-first')]).toMatchObject([{ kind: 'record', altered: false, record }]);
    const text = keptText(record, outcome);
    expect(text).toBe(`logged as ${record.id} in ${file}`);
    stage?.store.dispatch({ kind: 'message', message: { tone: 'said', text } });
    expect(await stage?.text()).toContain(`logged as ${record.id}`);
  });

  it('shows the record where it could not be kept, to be copied from there', async () => {
    const record = keptBy(open().type('l'));
    const outcome = logbookIn('/dev/full').keep(record);
    const text = keptText(record, outcome);
    expect(text).toMatch(/^not logged: no room is left for \/dev\/full/);
    stage?.store.dispatch({ kind: 'unkept', record, text });
    const screen = await stage?.text();
    expect(screen).toContain(`halfspace record ${record.id}`);
    expect(screen).toContain('not logged: no room is left');
    stage?.type('y');
    const copied = stage?.effects.at(-1);
    expect(copied?.kind === 'copy' ? copied.text : '').toContain(`halfspace record ${record.id}`);
    stage?.type('<escape>');
    expect(await stage?.text()).not.toContain('halfspace record');
  });

  it('keeps nothing while there is no answer', async () => {
    open().type('w20um<enter>').type('l');
    expect(stage?.effects.filter(({ kind }) => kind === 'keep')).toEqual([]);
    expect(await stage?.text()).toContain('there is no answer to keep yet');
  });

  it('is text where text is typed', () => {
    open().type('il');
    expect(stage?.state.search?.line.text).toBe('l');
    expect(stage?.effects).toEqual([]);
  });

  it('is among the keys of the footer', async () => {
    expect((await open().lines()).at(-1)).toContain('l log');
  });
});

describe('the word log of the linear layout', () => {
  it('has the record kept', () => {
    const { world, state } = open();
    const { session } = beginSession(state);
    const said = reply(session, 'log', world);
    expect(said.keep?.command).toBe('halfspace air fused-silica 632.8nm');
    expect(said.lines).toEqual([]);
    expect(reply(session, 'help', world).lines.join('\n')).toContain('log: keep the answer in the logbook');
  });
});
