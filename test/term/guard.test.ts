/**
 * Every way a full-screen program can end, in a real pseudo-terminal: afterwards the terminal is as it was.
 */
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { bundleFixture } from '../helpers/bundle-fixture.ts';
import { isAlive, lineSettingsOf, type PtyOptions, PtySession } from '../helpers/pty.ts';

/** All that were started: a failed test may leave one running. */
const started: PtySession[] = [];
let program = '';
let folder = '';
beforeAll(async () => {
  program = await bundleFixture('test/fixtures/term/program.tsx');
  folder = mkdtempSync(join(tmpdir(), 'guard-'));
});
afterAll(async () => {
  await Promise.all(started.map((session) => session.dispose()));
  rmSync(dirname(program), { recursive: true });
  rmSync(folder, { recursive: true });
});

const FULL_SCREEN = { alternateScreen: true, cursorShown: false, bracketedPaste: true, autowrap: false };
const AS_BEFORE = { alternateScreen: false, cursorShown: true, bracketedPaste: false, autowrap: true };

/** Runs the program under a shell that reports how it ended and in which state the line was left. */
const REPORT = '"$@"; printf "\\nstatus=%s\\n" "$?"; stty -a; printf "settled\\n"; read -r _';

let sessions = 0;
async function start(
  options: PtyOptions = {},
): Promise<{ session: PtySession; pid: number; stateFile: string }> {
  const stateFile = join(folder, `state-${sessions++}`);
  const env = { ...options.env, STATE_FILE: stateFile };
  const session = new PtySession('sh', ['-c', `echo before; ${REPORT}`, 'sh', process.execPath, program], {
    ...options,
    env,
  });
  started.push(session);
  await session.waitFor('last none');
  expect(session.model.modes()).toEqual(FULL_SCREEN);
  const pid = Number(/process (\d+)/.exec(session.screen())?.[1]);
  return { session, pid, stateFile };
}

/** Waits for the end and checks everything that was taken over. Returns what stands on the normal screen. */
async function expectRestored(session: PtySession, status: number, stateFile: string): Promise<string> {
  await session.waitFor('settled');
  const screen = session.screen();
  expect(screen).toContain(`status=${status}\n`);
  expect(screen).toMatch(/^before\n/);
  expect(session.model.modes()).toEqual(AS_BEFORE);
  expect(session.model.cell(0, 0).style).toBe('');
  expect(lineSettingsOf(screen)).toEqual({ echo: true, canonical: true });
  expect(screen).not.toMatch(/[╭│]/);
  expect(session.output()).not.toMatch(/\x1b\[[23]J/);
  if (stateFile !== '') expect(readFileSync(stateFile, 'utf8')).toBe(String(status));
  return screen;
}

describe.concurrent('the terminal is as before after', () => {
  it.each([
    ['q', 0],
    ['\x03', 130],
  ])('key %j, status %i', async (key, status) => {
    const { session, stateFile } = await start();
    session.send(key);
    const screen = await expectRestored(session, status, stateFile);
    expect(screen).not.toContain('error');
  });

  it.each([
    ['SIGTERM', 143],
    ['SIGHUP', 129],
    ['SIGINT', 130],
    ['SIGQUIT', 131],
  ] as const)('%s, status %i', async (signal, status) => {
    const { session, pid, stateFile } = await start();
    session.signal(signal, pid);
    await expectRestored(session, status, stateFile);
  });

  it.each([
    ['a throw while drawing', 'r', 'fixture: unexpected error: broken while drawing'],
    ['a rejection nobody handles', 'p', 'fixture: unexpected error: rejected and not handled'],
    ['a throw of something that is no error', 'n', 'fixture: unexpected error: only a text'],
  ])('%s, with the text of the error', async (_, key, text) => {
    const { session, stateFile } = await start();
    session.send(key);
    const screen = await expectRestored(session, 1, stateFile);
    expect(screen).toContain(text);
    expect(screen).toContain('Set FIXTURE_DEBUG=1');
    expect(screen).not.toContain('    at ');
  });

  it('a throw in a timer, whose long text is cut and cannot disturb the terminal', async () => {
    const { session, stateFile } = await start({ rows: 40 });
    session.send('t');
    const screen = await expectRestored(session, 1, stateFile);
    expect(screen).toContain('fixture: unexpected error: broken in a timer [31m with much to say');
    expect(screen.replaceAll('\n', '')).toMatch(/to say with.{0,20}\.\.\.Set/);
    expect(screen).not.toContain('    at ');
  });

  it('a throw in a timer, with the stack where it is asked for', async () => {
    const { session, stateFile } = await start({ rows: 60, env: { FIXTURE_DEBUG: '1' } });
    session.send('t');
    const screen = await expectRestored(session, 1, stateFile);
    expect(screen).toMatch(/ at failInTimer/);
  });

  it('a plain process.exit somewhere in the program', async () => {
    const { session } = await start();
    session.send('x');
    await expectRestored(session, 7, '');
  });

  it('two signals at once', async () => {
    const { session, pid, stateFile } = await start();
    session.signal('SIGTERM', pid);
    session.signal('SIGINT', pid);
    await session.waitFor('settled');
    const status = Number(readFileSync(stateFile, 'utf8'));
    expect([130, 143]).toContain(status);
    await expectRestored(session, status, stateFile);
  });
});

// Not beside others: a program started meanwhile would inherit the terminal's own side and keep it open.
describe('a dropped connection', () => {
  const expectEnd = async (session: PtySession, stateFile: string): Promise<void> => {
    started.push(session);
    await session.waitFor('last none');
    const pid = Number(/process (\d+)/.exec(session.screen())?.[1]);
    session.drop();
    const end_ms = performance.now() + 5000;
    while (isAlive(pid) && performance.now() < end_ms) await sleep(10);
    expect(isAlive(pid)).toBe(false);
    expect(readFileSync(stateFile, 'utf8')).toBe('129');
  };

  it('ends the program with status 129 by the hang-up signal, and what is to be saved is saved', async () => {
    const stateFile = join(folder, 'hang-up');
    await expectEnd(
      new PtySession(process.execPath, [program], { env: { STATE_FILE: stateFile } }),
      stateFile,
    );
  });

  it('does so too where the signal goes to a shell that ignores it, and only the terminal fails', async () => {
    const stateFile = join(folder, 'lost');
    const args = ['-c', `trap '' HUP; "$@"; sleep 1`, 'sh', process.execPath, program];
    await expectEnd(new PtySession('sh', args, { env: { STATE_FILE: stateFile } }), stateFile);
  });
});

describe.concurrent('Ctrl-Z', () => {
  const shell = async (): Promise<PtySession> => {
    const session = new PtySession('bash', ['--norc', '--noprofile', '-i'], {
      env: { PS1: 'ready> ', HISTFILE: undefined },
    });
    started.push(session);
    await session.waitFor('ready>');
    session.send(`'${process.execPath}' '${program}'\r`);
    await session.waitFor('last none');
    return session;
  };

  it('stops the program with a usable shell, and fg brings the whole picture back', async () => {
    const session = await shell();
    session.send('+\x1b[B');
    await session.waitFor('last down');
    await session.quiet();
    const picture = session.screen();
    session.send('\x1a');
    await session.waitFor(/Stopped[\s\S]*ready> $|Stopped[\s\S]*ready>$/);
    expect(session.model.modes()).toEqual(
      expect.objectContaining({ alternateScreen: false, cursorShown: true, autowrap: true }),
    );
    session.send('echo sum $((40 + 2))\r');
    await session.waitFor('sum 42');
    expect(session.screen()).toContain('echo sum');
    session.send('fg\r');
    await session.waitFor('last down');
    await session.quiet();
    expect(session.screen()).toBe(picture);
    expect(session.model.modes()).toEqual(FULL_SCREEN);
    expect(session.lineSettings()).toEqual({ echo: false, canonical: false });
    session.send('+');
    await session.waitFor('count 2');
    session.send('\x1a');
    await session.waitFor(/Stopped[\s\S]*Stopped/);
    session.send('fg\r');
    await session.waitFor('count 2');
    session.send('q');
    await session.waitFor(/ready>$/);
    expect(session.model.modes().alternateScreen).toBe(false);
    expect(session.output()).not.toMatch(/\x1b\[[23]J/);
  });

  it('and bg leave it stopped until fg', async () => {
    const session = await shell();
    session.send('\x1a');
    await session.waitFor('Stopped');
    session.send('bg\r');
    await session.waitFor(/bg[\s\S]*ready>/);
    await session.quiet(300);
    expect(session.model.modes().alternateScreen).toBe(false);
    session.send('fg\r');
    await session.waitFor('last none');
    expect(session.lineSettings()).toEqual({ echo: false, canonical: false });
    session.send('q');
    await session.waitFor(/ready>$/);
  });

  it('from outside does the same, and so does a stop that cannot be caught', async () => {
    const session = await shell();
    const pid = Number(/process (\d+)/.exec(session.screen())?.[1]);
    for (const signal of ['SIGTSTP', 'SIGSTOP'] as const) {
      session.signal(signal, pid);
      await session.waitFor('ready>');
      session.send('fg\r');
      await session.waitFor('last none');
      await session.quiet();
      expect(session.screen().split('\n')).toHaveLength(24);
      expect(session.lineSettings()).toEqual({ echo: false, canonical: false });
    }
    session.send('+');
    await session.waitFor('count 1');
  });

  it('where nothing can stop the program, comes back by itself', async () => {
    const session = new PtySession(process.execPath, [program]);
    started.push(session);
    await session.waitFor('last none');
    session.send('w\x1a');
    await session.waitFor((screen) => !screen.includes('last none'));
    await session.waitFor('last none');
    expect(session.model.modes()).toEqual(FULL_SCREEN);
    await session.waitFor('count 1');
    // Nothing was drawn between the leaving and the coming back, although the count changed meanwhile.
    expect(session.output()).toMatch(/\x1b\[\?1049l\x1b\[\?25h\x1b\[\?1049h/);
    session.send('+');
    await session.waitFor('count 2');
    session.send('q');
    expect(await session.exited).toBe(0);
  });
});
