/** A whole session of the built program in a pseudo-terminal: what it writes, where it leaves files, and after a kill. */
import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { PROGRAM } from '../helpers/built-program.ts';
import { PtySession } from '../helpers/pty.ts';

let home: string;
let session: PtySession;
const noted = (): string => join(home, '.noted', 'stderr');

/** Standard error goes to a file. */
async function start(): Promise<void> {
  const line = 'mkdir -p "$HOME/.noted"; exec "$0" "$1" 2>"$HOME/.noted/stderr"';
  session = new PtySession('sh', ['-c', line, process.execPath, PROGRAM], {
    env: { HOME: home, XDG_CONFIG_HOME: undefined, XDG_DATA_HOME: undefined, XDG_STATE_HOME: undefined },
  });
  await session.waitFor('? keys');
  await session.quiet(200);
}

beforeEach(() => {
  home = mkdtempSync(join(tmpdir(), 'halfspace-session-'));
});
afterEach(async () => {
  await session?.dispose();
  rmSync(home, { recursive: true, force: true });
});

describe.skipIf(!existsSync(PROGRAM))('a session in a terminal', { timeout: 60_000 }, () => {
  it('leaves mouse, scrollback and standard error alone, and files only in their folders', async () => {
    await start();
    // Each page is closed by its own key: an Escape just before another key is taken for Alt where the machine is busy.
    for (const key of ['?', '?', 's', 's', '!', '!', 'F', 'F', 'r', 'q']) {
      const before = session.screen();
      session.send(key);
      await session.waitFor((screen) => screen !== before);
    }
    session.send('ibk7\r');
    await session.waitFor(/into BK7/);
    session.send('l');
    await session.waitFor('logged as');
    session.send('y');
    await session.waitFor(/R = \d.*T = \d/);
    session.resize(60, 20);
    await session.quiet(200);
    session.resize(100, 30);
    await session.waitFor('? keys');
    session.send('q');
    expect(await session.exited).toBe(0);
    expect(session.output()).not.toMatch(/\x1b\[[23]J/);
    expect(session.output()).not.toMatch(/\x1b\[\?(?:9|100[0-6]|1015|1016)h/);
    expect(readFileSync(noted(), 'utf8')).toBe('');
    expect(readdirSync(home).sort()).toEqual(['.config', '.local', '.noted']);
    expect(readdirSync(join(home, '.config'))).toEqual(['halfspace']);
    expect(readdirSync(join(home, '.local', 'state'))).toEqual(['halfspace']);
  });

  it('starts again after a kill', async () => {
    await start();
    session.signal('SIGKILL');
    expect(await session.exited).toBe(137);
    await start();
    session.send('a30\r');
    await session.waitFor(/angle 30°/);
    session.send('q');
    expect(await session.exited).toBe(0);
  });
});
