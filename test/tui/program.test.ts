/** The built program in a pseudo-terminal. `npm test` builds it first; HALFSPACE_PROGRAM names another build. */
import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { isAlive, PtySession } from '../helpers/pty.ts';

const PROGRAM =
  process.env['HALFSPACE_PROGRAM'] ?? fileURLToPath(new URL('../../dist/halfspace.js', import.meta.url));

let home: string;
let session: PtySession;

interface StartOptions {
  readonly columns?: number;
  readonly rows?: number;
  readonly env?: Readonly<Record<string, string | undefined>>;
  readonly args?: readonly string[];
}

async function start({
  columns = 80,
  rows = 24,
  env = {},
  args = [],
}: StartOptions = {}): Promise<PtySession> {
  session = new PtySession(process.execPath, [PROGRAM, ...args], {
    columns,
    rows,
    env: { HOME: home, XDG_CONFIG_HOME: undefined, XDG_DATA_HOME: undefined, ...env },
  });
  if (columns >= 40 && rows >= 12) await session.waitFor('? keys');
  await session.quiet(200);
  return session;
}

type Condition = Parameters<PtySession['waitFor']>[0];

/** Types, waits for what should come of it, then until nothing more is written. */
async function type(keys: string, until: Condition = () => true): Promise<string> {
  session.send(keys);
  await session.waitFor(until);
  await session.quiet(150);
  return session.screen();
}

const configFile = (): string => join(home, '.config', 'halfspace', 'config.json');

beforeEach(() => {
  home = mkdtempSync(join(tmpdir(), 'home-'));
});
afterEach(async () => {
  await session?.dispose();
  rmSync(home, { recursive: true, force: true });
});

describe.skipIf(!existsSync(PROGRAM))('the program in a terminal', () => {
  it('answers the first question, quits with q and leaves the terminal as it was', async () => {
    await start();
    await type('45\rpp', /R_p +0\.6702\d\(\d+\) %/);
    session.send('q');
    expect(await session.exited).toBe(0);
    expect(session.model.modes()).toEqual({
      alternateScreen: false,
      cursorShown: true,
      bracketedPaste: false,
      autowrap: true,
    });
    expect(session.screen()).toBe('');
    expect(session.output()).not.toMatch(/\x1b\[[23]J/);
  });

  it('finds the last question again', async () => {
    await start();
    await type('ibk7\ra30\r', /angle 30°/);
    session.send('q');
    await session.exited;
    expect(JSON.parse(readFileSync(configFile(), 'utf8')).last.into.key).toBe('bk7');
    await start();
    expect(session.screen()).toMatch(/into BK7/);
    expect(session.screen()).toMatch(/angle 30°/);
  });

  it.each([
    ['', 'angle 0°'],
    ['w512', 'reads: wave 512 nm'],
    ['isil', 'into sil'],
    ['?', 'in the picture'],
  ])('quits at once with Ctrl-C after "%s", status 130', async (before, seen) => {
    await start();
    await type(before, seen);
    session.send('\x03');
    expect(await session.exited).toBe(130);
    expect(session.model.modes()).toMatchObject({ alternateScreen: false, cursorShown: true });
  });

  it('gives the terminal back on SIGTERM', async () => {
    await start();
    session.signal('SIGTERM');
    expect(await session.exited).toBe(143);
    expect(session.model.modes()).toMatchObject({ alternateScreen: false, cursorShown: true });
  });

  it('ends with the connection, and the last question is found again', async () => {
    await start();
    await type('a30\r', /angle 30°/);
    const { pid } = session;
    session.drop();
    const end_ms = performance.now() + 5000;
    while (isAlive(pid) && performance.now() < end_ms) await new Promise((r) => setTimeout(r, 10));
    expect(isAlive(pid)).toBe(false);
    expect(JSON.parse(readFileSync(configFile(), 'utf8')).last.incidenceAngle_rad).toBeCloseTo(
      Math.PI / 6,
      12,
    );
  });

  it('shows after a resize what a fresh start at that size shows', async () => {
    await start({ columns: 120, rows: 40 });
    await type('a30\r', /angle 30°/);
    const pictures: string[] = [];
    const sizes = [
      [80, 24],
      [40, 12],
      [30, 8],
      [100, 30],
    ] as const;
    for (const [columns, rows] of sizes) {
      session.resize(columns, rows);
      await session.waitFor(columns < 40 ? /needs 40 x 12/ : /\? keys$/);
      await session.quiet(400);
      pictures.push(session.screen());
    }
    await session.dispose();
    for (const [i, [columns, rows]] of sizes.entries()) {
      await start({ columns, rows });
      await type('a30\r', (screen) => screen === pictures[i]);
      await session.dispose();
    }
  }, 60_000);

  it('writes little: a start, a key, and nothing at all while idle', async () => {
    await start();
    expect(session.byteCount).toBeLessThan(3200);
    const bytesOf = async (keys: string, until: Condition): Promise<number> => {
      const before = session.byteCount;
      await type(keys, until);
      return session.byteCount - before;
    };
    // One digit changes, and the cursor moves on; the line that says how it is read follows.
    await type('a1', 'reads: angle 1°');
    expect(await bytesOf('2', 'reads: angle 12°')).toBeLessThan(64);
    await type('\x1b', (screen) => !screen.includes('Esc keep the old'));
    expect(await bytesOf('\t', '>unpolarized')).toBeLessThan(300);
    expect(await bytesOf('x', /from Fused/)).toBeLessThan(2500);
    const before = session.byteCount;
    await new Promise((resolve) => setTimeout(resolve, 2500));
    expect(session.byteCount).toBe(before);
  });

  it('takes a torn arrow for an arrow and a paste for text', async () => {
    await start();
    session.send('\x1b');
    await new Promise((resolve) => setTimeout(resolve, 20));
    await type('[B', (screen) => !screen.includes('>angle') && /\n.*>\S+ auto/.test(screen));
    await type('a\x1b[200~60\r\nq\x1b[201~', /angle 60 q/);
    await type('\x1b', />angle 0°/);
    await type('jjj', /\n>\S|┃>\S/);
  });

  it('names a broken settings file, leaves it alone and starts all the same', async () => {
    mkdirSync(join(home, '.config', 'halfspace'), { recursive: true });
    writeFileSync(configFile(), '{ "glyphs": }');
    await start();
    expect(session.screen()).toMatch(/x settings: .*config\.json, line 1/s);
    await type('a20\r', /angle 20°/);
    session.send('q');
    await session.exited;
    expect(readFileSync(configFile(), 'utf8')).toBe('{ "glyphs": }');
  });

  it('reports keys that clash and keeps its own', async () => {
    mkdirSync(join(home, '.config', 'halfspace'), { recursive: true });
    writeFileSync(configFile(), '{ "keys": { "swap": "q" } }');
    await start();
    expect(session.screen()).toMatch(/"q" already means quit/);
  });

  it('draws with ASCII where the locale has no more', async () => {
    await start({ env: { LANG: 'C' } });
    await type('xa60\r', 'total reflection');
    expect(session.screen()).toMatch(/^[\x20-\x7e\n]*$/);
  });

  it('writes no colour where none is wanted, and keeps bold and inverse', async () => {
    await start({ env: { NO_COLOR: '1' } });
    expect(session.output()).not.toMatch(/\x1b\[(?:\d*;)*3[0-7](?:;\d+)*m/);
    expect(session.output()).toMatch(/\x1b\[(?:\d*;)*7m/);
  });

  it('speaks in lines where asked to', async () => {
    session = new PtySession(process.execPath, [PROGRAM, '--linear'], { env: { HOME: home } });
    await session.waitFor('change or command:');
    session.send('angle 45\n');
    await session.waitFor(/reflectance = 4\.428/);
    session.send('quit\n');
    expect(await session.exited).toBe(0);
    expect(session.output()).not.toContain('\x1b');
  });
});
