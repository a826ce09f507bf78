/** The built program and its logbook: kills, several at once, pipes, the recorded line in a real shell. */
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { logEntries } from '../../src/record/logbook.ts';
import { recordLine } from '../../src/record/record-line.ts';
import { runBuilt, runInShell } from '../helpers/built-program.ts';
import { sampleRecord } from '../record/sample-record.ts';

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'halfspace-built-'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const idsIn = (file: string): string[] =>
  [...logEntries(file, 'oldest-first')].flatMap((e) =>
    e.kind === 'record' && !e.altered ? [e.record.id] : [],
  );

const LOGGED = /^logged as ([0-9a-f]{12}) in \S+\n$/;

describe('the built program', () => {
  it('confirms a record, and finds it again in another run', async () => {
    const file = path.join(folder, 'one.jsonl');
    const words = ['air', 'fused-silica', '632.8nm', '--angle', '45', '--log-file', file];
    const { status, out, err } = await runBuilt(words);
    const id = LOGGED.exec(err)?.[1];
    expect([status, id]).toEqual([0, expect.any(String)]);
    const listed = await runBuilt(['log', '--log-file', file]);
    expect(listed.out).toContain(id);
    const shown = await runBuilt(['log', 'last', '--log-file', file]);
    // Local time with its offset.
    expect(shown.out).toMatch(
      /^halfspace record [0-9a-f]{12}, \d{4}-\d\d-\d\dT\d\d:\d\d:\d\d[+-]\d\d:\d\d\n/,
    );
    expect(Date.now() - Date.parse(/, (\S+)\n/.exec(shown.out)?.[1] ?? '')).toBeLessThan(600_000);
    for (const { out: text } of [listed, shown]) expect(text).not.toContain('\u001b');
    expect(out).not.toContain('\u001b');
    const again = await runBuilt(['log', 'rerun', 'all', '--log-file', file]);
    expect([again.status, again.err]).toEqual([0, '']);
    expect(again.out).toContain('the answer is the same, to the last bit');
  }, 60_000);

  it('prints the same bytes where the recorded line is given to a shell', async () => {
    const own = path.join(folder, "it's my own");
    mkdirSync(own);
    const entry = {
      key: 'my-glass',
      name: 'My glass',
      fits: [
        {
          parameters: { model: 'constant', n: 1.5 },
          range_um: [0.4, 0.8],
          reference: 'air',
          source: 'my-notes',
        },
      ],
      sources: [{ id: 'my-notes', type: 'manuscript', title: 'Notebook 3' }],
    };
    writeFileSync(path.join(own, 'my-glass.json'), JSON.stringify(entry));
    const file = path.join(folder, 'shell.jsonl');
    const lines = [
      ['air', 'My Glass', '633 nm', '--angle', '45 deg', '--catalog', "it's my own"],
      ['air', 'n=1.5+0.02i', '15800 1/cm', '--tolerance', 'wave=1nm, n=1e-4', '--json'],
      ['air', '3x:', 'n=2.3@qw', 'n=1.46@qw', ':', 'n-bk7', '633nm', '--plot', 'angle', '--ascii'],
    ];
    for (const words of lines) {
      const asked = await runBuilt([...words, '--log-file', file], { cwd: folder });
      expect(asked.status, asked.err).toBe(0);
      const { out: text } = await runBuilt(['log', 'last', '--json', '--log-file', file]);
      const { command } = JSON.parse(text) as { command: string };
      // From another folder: nothing of the record depends on where it was made.
      const again = await runInShell(command, { cwd: tmpdir() });
      expect(again.out, command).toBe(asked.out);
    }
    const rerun = await runBuilt(['log', 'rerun', 'all', '--log-file', file]);
    expect([rerun.status, rerun.out]).toEqual([0, expect.stringContaining('3 records: 3 the same')]);
    // An entry of one's own that has changed is named as the cause.
    const changed = { ...entry, fits: [{ ...entry.fits[0], parameters: { model: 'constant', n: 1.51 } }] };
    writeFileSync(path.join(own, 'my-glass.json'), JSON.stringify(changed));
    const differs = await runBuilt(['log', 'rerun', 'all', '--log-file', file]);
    expect(differs.status).toBe(1);
    expect(differs.out).toContain('cause: your own entry my-glass has other content now than then');
    expect(differs.out).toContain('3 records: 2 the same, 1 differs');
  }, 120_000);

  it('keeps what it confirmed when killed at any moment, and can go on afterwards', async () => {
    const file = path.join(folder, 'killed.jsonl');
    const confirmed: string[] = [];
    let killed = 0;
    let started = 0;
    const keepKilling = async (): Promise<void> => {
      while (started < 30) {
        const words = ['air', `n=1.${100 + started++}`, '633nm', '--log-file', file];
        const { signal, err } = await runBuilt(words, {
          onStart: async (child) => {
            await wait(20 + Math.random() * 400);
            child.kill('SIGKILL');
          },
        });
        if (signal === 'SIGKILL') killed += 1;
        const id = LOGGED.exec(err)?.[1];
        if (id) confirmed.push(id);
      }
    };
    await Promise.all([keepKilling(), keepKilling()]);
    expect(killed).toBeGreaterThan(0);
    const last = await runBuilt(['air', 'n=2', '633nm', '--log-file', file]);
    const id = LOGGED.exec(last.err.split('\n')[0] + '\n')?.[1] ?? '';
    const kept = idsIn(file);
    expect(kept.at(-1)).toBe(id);
    expect(confirmed.filter((one) => !kept.includes(one))).toEqual([]);
  }, 120_000);

  it('keeps the records of many that log at once, each once', async () => {
    const file = path.join(folder, 'many.jsonl');
    const all = Array.from({ length: 8 }, (_, i) =>
      runBuilt(['air', `n=1.${200 + i}`, '633nm', '--log-file', file]),
    );
    const ids = (await Promise.all(all)).map(({ err }) => LOGGED.exec(err)?.[1] ?? err);
    expect(idsIn(file).sort()).toEqual([...ids].sort());
  }, 120_000);

  it('shows the record and ends with 4 where it cannot be kept', async () => {
    const { status, out, err } = await runBuilt(['air', 'n=1.5', '633nm', '--log-file', '/dev/full']);
    expect(status).toBe(4);
    expect(out).toContain('halfspace record ');
    expect(err).toContain('no room is left for /dev/full');
    const nowhere = await runBuilt(['air', 'n=1.5', '633nm', '--log'], {
      env: { XDG_STATE_HOME: '/proc/nothing' },
    });
    expect([nowhere.status, nowhere.out]).toEqual([4, expect.stringContaining('halfspace record ')]);
  }, 60_000);

  it('streams: head ends it without a word, a full pipe loses nothing', async () => {
    const file = path.join(folder, 'large.jsonl');
    const count = 4000;
    const lines = Array.from({ length: count }, (_, i) => `${recordLine(sampleRecord(`question ${i}`))}\n`);
    writeFileSync(file, lines.join(''));
    const env = { FILE: file };
    const head = await runInShell('halfspace log --log-file "$FILE" | head -n 1', { env });
    expect([head.status, head.err]).toEqual([0, '']);
    expect(head.out.split('\n').length).toBe(2);
    const slow = 'halfspace log export --log-file "$FILE" | (sleep 1; grep -c "^halfspace record")';
    const all = await runInShell(slow, { env });
    expect([all.out, all.err]).toEqual([`${count}\n`, '']);
  }, 120_000);
});
