/**
 * The terminal layer together with Ink in a real pseudo-terminal: bytes per key, resizes, keys over a slow link.
 */
import { rmSync } from 'node:fs';
import { dirname } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { bundleFixture } from '../helpers/bundle-fixture.ts';
import { type PtyOptions, PtySession } from '../helpers/pty.ts';

const started: PtySession[] = [];
let program = '';
beforeAll(async () => {
  program = await bundleFixture('test/fixtures/term/program.tsx');
});
afterAll(async () => {
  await Promise.all(started.map((session) => session.dispose()));
  rmSync(dirname(program), { recursive: true });
});

async function start(options: PtyOptions = {}): Promise<PtySession> {
  const session = new PtySession(process.execPath, [program], options);
  started.push(session);
  await session.waitFor('last none');
  await session.quiet();
  return session;
}

/** Process numbers differ, in length too: the blanks behind go with them. */
const picture = (session: PtySession): string =>
  session.screen().replace(/process \d+ */, (text) => '-'.repeat(text.length));

describe.concurrent('a program on the terminal layer', () => {
  it('sends few bytes for a first frame, a digit and a selection, and none while idle', async () => {
    const session = await start({ columns: 100, rows: 30 });
    expect(session.byteCount).toBeLessThanOrEqual(3000);
    const cost = async (keys: string, effect: string): Promise<number> => {
      const from = session.byteCount;
      session.send(keys);
      await session.waitFor(effect);
      await session.quiet();
      return session.byteCount - from;
    };
    expect(await cost('+', 'count 1')).toBeLessThanOrEqual(24);
    expect(await cost('+', 'count 2')).toBeLessThanOrEqual(24);
    await cost('\x1b[B', '> 石英 n₀ 1');
    // Two rows of 25 cells change from plain to inverse and back.
    expect(await cost('\x1b[B', '> 石英 n₀ 2')).toBeLessThanOrEqual(140);
    // Reports of the terminal cost nothing beside the digit.
    expect(await cost('\x1b[I\x1b[<0;3;3M\x1b]11;rgb:0/0/0\x07+', 'count 3')).toBeLessThanOrEqual(24);
    const from = session.byteCount;
    await sleep(1000);
    expect(session.byteCount).toBe(from);
    expect(session.output()).not.toMatch(/\x1b\[[23]J|\x1b\[2K/);
    expect(session.model.scrollback()).toEqual([]);
  });

  it('shows after every change of size what a fresh start shows', async () => {
    const session = await start({ columns: 80, rows: 24 });
    for (const [columns, rows] of [
      [60, 24],
      [60, 14],
      [110, 35],
    ] as const) {
      session.resize(columns, rows);
      await session.waitFor(`size ${columns}x${rows}`);
      await session.quiet();
      const fresh = await start({ columns, rows });
      expect(picture(session)).toBe(picture(fresh));
      fresh.send('q');
    }
  });

  it('redraws everything on Ctrl-L and on a window signal without a change of size', async () => {
    const session = await start();
    const before = session.screen();
    for (const ask of [() => session.send('\x0c'), () => session.signal('SIGWINCH')]) {
      await session.model.write('\x1b[5;5Hgarbage\x1b[20;1H\x1b[41m more garbage');
      expect(session.screen()).not.toBe(before);
      ask();
      await session.waitFor((screen) => screen === before);
    }
  });

  it('takes glued keys one by one, torn arrows as arrows and pastes as text', async () => {
    const session = await start();
    session.send('+++++');
    await session.waitFor('count 5');
    session.send('\x1b[B\x1b[B\x1b[By');
    await session.waitFor(/> 石英 n₀ 3/);
    await session.waitFor('last y');
    session.send('\x1b[');
    await sleep(20);
    session.send('A');
    await session.waitFor('last up');
    await session.waitFor('> 石英 n₀ 2');
    session.send('\x1b');
    await session.waitFor('last escape');
    session.send('\x1b[200~qr\r+\x1b[201~');
    await session.waitFor('last paste "qr\\n+"');
    expect(session.screen()).toContain('count 5');
    for (const byte of Buffer.from('µ')) {
      session.sendBytes(Buffer.of(byte));
      await sleep(20);
    }
    await session.waitFor('last µ');
  });

  it('draws as ever where CI is set', async () => {
    const session = await start({ env: { CI: 'true', CONTINUOUS_INTEGRATION: 'true' } });
    session.send('+');
    await session.waitFor('count 1');
    session.resize(70, 20);
    await session.waitFor('size 70x20');
  });

  it('survives windows of any size', async () => {
    const session = await start();
    for (const [columns, rows] of [
      [1, 1],
      [2, 40],
      [200, 2],
      [400, 120],
      [80, 24],
    ] as const) {
      session.resize(columns, rows);
      await session.quiet(120);
      expect(session.model.modes().alternateScreen).toBe(true);
    }
    await session.waitFor('size 80x24');
    session.send('q');
    expect(await session.exited).toBe(0);
  });
});
