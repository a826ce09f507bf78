/** What is confirmed is there, whatever ends the program: kills at random instants, several writers at once. */
import { rmSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { logEntries } from '../../src/record/logbook.ts';
import { bundleWriter, runUntilEnd, testFolder } from './writer.ts';

let folder: string;
let writer: string;
beforeAll(async () => {
  folder = testFolder();
  writer = await bundleWriter(folder);
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** Ids of the whole records and how often each stands there; counts of everything else. */
function takeStock(file: string) {
  const ids = new Map<string, number>();
  const others = { altered: 0, unfinished: 0, foreign: 0, unreadable: 0 };
  for (const entry of logEntries(file, 'oldest-first')) {
    if (entry.kind !== 'record') others[entry.kind] += 1;
    else if (entry.altered) others.altered += 1;
    else ids.set(entry.record.id, (ids.get(entry.record.id) ?? 0) + 1);
  }
  return { ids, others };
}

describe('the logbook', () => {
  const MOST_KILLS = 300;
  const LEAST_KILLS = 200;
  const TIME_ms = 20_000;
  const AT_ONCE = 3;
  it(`loses no confirmed record in up to ${MOST_KILLS} kills of ${AT_ONCE} writers at once`, async () => {
    const file = path.join(folder, 'killed', 'logbook.jsonl');
    const confirmed: string[] = [];
    let killed = 0;
    let started = 0;
    const end_ms = Date.now() + TIME_ms;
    const keepKilling = async (): Promise<void> => {
      while (started < MOST_KILLS && (Date.now() < end_ms || started < LEAST_KILLS)) {
        const name = `writer ${started++}`;
        const run = await runUntilEnd(process.execPath, [writer, file, name, '1000000', '12'], {
          onFirstOutput: async (child) => {
            await wait(Math.random() * 40);
            child.kill('SIGKILL');
          },
        });
        expect(run.errors).toBe('');
        if (run.signal === 'SIGKILL') killed += 1;
        confirmed.push(...run.lines);
      }
    };
    await Promise.all(Array.from({ length: AT_ONCE }, keepKilling));

    expect(killed).toBe(started);
    expect(confirmed.length).toBeGreaterThan(started);
    expect(confirmed.every((line) => /^[0-9a-f]{12}$/.test(line))).toBe(true);
    const { ids, others } = takeStock(file);
    expect(confirmed.filter((id) => !ids.has(id))).toEqual([]);
    expect(others).toMatchObject({ altered: 0, foreign: 0, unreadable: 0 });
    // Each kill can leave one whole record that was not confirmed any more, and one line cut off.
    expect(ids.size - confirmed.length).toBeLessThanOrEqual(started);
    expect(others.unfinished).toBeLessThanOrEqual(2 * started);
  }, 120_000);

  it('keeps every record of two programs that write thousands at once, each once', async () => {
    const file = path.join(folder, 'shared.jsonl');
    const each = 1000;
    const runs = await Promise.all(
      ['one', 'two'].map((name) => runUntilEnd(process.execPath, [writer, file, name, String(each), '100'])),
    );
    const confirmed = runs.flatMap((run) => run.lines);
    expect(confirmed.length).toBe(2 * each);
    const { ids, others } = takeStock(file);
    expect([...ids.keys()].sort()).toEqual([...confirmed].sort());
    expect([...ids.values()].every((times) => times === 1)).toBe(true);
    expect(others).toEqual({ altered: 0, unfinished: 0, foreign: 0, unreadable: 0 });
  }, 120_000);
});
