/** The key l of the full-screen program, in a pseudo-terminal: what it says is kept is kept, whatever happens to the connection. */
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { logEntries } from '../../src/record/logbook.ts';
import { isBuilt } from '../cli/program.ts';
import { PROGRAM, runBuilt } from '../helpers/built-program.ts';
import { PtySession } from '../helpers/pty.ts';

let home: string;
let session: PtySession | undefined;
beforeEach(() => {
  home = mkdtempSync(path.join(tmpdir(), 'halfspace-home-'));
});
afterEach(async () => {
  await session?.dispose();
  rmSync(home, { recursive: true, force: true });
});

const start = async (...args: string[]): Promise<PtySession> => {
  session = new PtySession(process.execPath, [PROGRAM, ...args], {
    columns: 120,
    rows: 30,
    env: { HOME: home, XDG_CONFIG_HOME: undefined, XDG_DATA_HOME: undefined, XDG_STATE_HOME: undefined },
  });
  await session.waitFor('? keys');
  await session.quiet(200);
  return session;
};

const idsIn = (file: string): string[] =>
  [...logEntries(file, 'oldest-first')].flatMap((e) =>
    e.kind === 'record' && !e.altered ? [e.record.id] : [],
  );

describe.skipIf(!isBuilt)('the key l in a terminal (left out without a build as new as the sources)', () => {
  it('keeps the answer, says where, and the record is there although the program is killed', async () => {
    const screen = await start();
    screen.send('a45\r');
    await screen.waitFor('angle 45');
    screen.send('l');
    await screen.waitFor(/logged as [0-9a-f]{12} in/);
    const id = /logged as ([0-9a-f]{12}) in/.exec(screen.screen())?.[1] ?? '';
    process.kill(screen.pid, 'SIGKILL');
    const file = path.join(home, '.local', 'state', 'halfspace', 'logbook.jsonl');
    expect(idsIn(file)).toEqual([id]);
    const { out, status } = await runBuilt(['log', 'rerun', 'all'], { env: { HOME: home } });
    expect([status, out]).toEqual([0, expect.stringContaining('the answer is the same, to the last bit')]);
  }, 60_000);

  it('writes into the logbook that was named, or shows the record where it cannot', async () => {
    const file = path.join(home, 'bench.jsonl');
    const named = await start('--log-file', file);
    named.send('l');
    await named.waitFor(/logged as [0-9a-f]{12} in .*bench\.jsonl/);
    expect(idsIn(file)).toHaveLength(1);
    await named.dispose();
    const nowhere = await start('--log-file', '/dev/full');
    nowhere.send('l');
    await nowhere.waitFor('not logged: no room is left');
    expect(nowhere.screen()).toContain('halfspace record ');
  }, 60_000);
});
