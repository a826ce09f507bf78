/** The built program in a pseudo-terminal under random bytes: it must end when told to, and leave the terminal as it was. */
import { mkdtempSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { lineSettingsOf, PtySession } from '../helpers/pty.ts';
import { Random } from './random.ts';

const BYTES = 1500;
/** On a busy machine the keys before it may take their time; hangs of single keys are found without a terminal. */
const LONGEST_END_ms = 60_000;
/** Says the settings of the line once the program has ended. */
const LINE = '"$0" "$1"; status=$?; stty -a; exit $status';
/** Ctrl-C ends and Ctrl-Z suspends: both would end the session early. */
const harmless = (bytes: Buffer): Buffer => Buffer.from(bytes.filter((b) => b !== 3 && b !== 26));

/** What was wrong, a text each. */
export async function terminalSessions(
  program: string,
  seed: number,
  count: number,
): Promise<readonly string[]> {
  const broken: string[] = [];
  for (let i = 0; i < count; i++) {
    const r = new Random(seed + i);
    const home = mkdtempSync(path.join(os.tmpdir(), 'halfspace-fuzz-'));
    const session = new PtySession('sh', ['-c', LINE, process.execPath, program], {
      columns: 30 + r.below(100),
      rows: 10 + r.below(40),
      env: { HOME: home },
    });
    await session.quiet(600);
    for (let sent = 0; sent < BYTES; ) {
      const bytes = harmless(
        r.chance(0.5)
          ? r.bytes(1 + r.below(8))
          : Buffer.from(r.pick(['\x1b[A', '\x1b[B', '\t', '\r', '\x1b', 'a45\r', 'igold\r', '?'])),
      );
      session.sendBytes(bytes);
      sent += bytes.length;
      if (r.chance(0.05)) await sleep(30);
    }
    await session.quiet(300);
    session.send('\x1b');
    await sleep(120);
    session.send('\x03');
    const status = await Promise.race([session.exited, sleep(LONGEST_END_ms, -1)]);
    await session.quiet(50);
    const modes = session.model.modes();
    const output = session.output();
    const where = `terminal session, seed ${seed + i}`;
    if (status < 0) broken.push(`${where}: does not end on Ctrl-C; the screen is\n${session.screen()}`);
    else if (status !== 130 && status !== 0)
      broken.push(`${where}: ended with ${status}\n${session.screen()}`);
    if (
      status >= 0 &&
      (modes.alternateScreen || !modes.cursorShown || modes.bracketedPaste || !modes.autowrap)
    ) {
      broken.push(`${where}: left ${JSON.stringify(modes)}`);
    }
    const line = lineSettingsOf(output.slice(output.lastIndexOf('speed ')));
    if (status >= 0 && !(line.echo && line.canonical)) broken.push(`${where}: left ${JSON.stringify(line)}`);
    if (/^\s+at .+:\d+:\d+\)?$/m.test(output)) broken.push(`${where}: a stack trace\n${session.screen()}`);
    await session.dispose();
  }
  return broken;
}
