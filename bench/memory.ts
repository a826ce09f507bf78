/** Peak of the resident memory, as ratios to that of a Node that does nothing. */
import { spawnSync } from 'node:child_process';
import { openSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { STREAM, wavesFile } from './batch.ts';
import type { Line } from './figure.ts';
import { median } from './figure.ts';
import { ENVIRONMENT, HOME, PROGRAM, ROOT } from './program.ts';
import { Screen } from './screen.ts';

const REPEATS = 5;
const BARE = 'x node -e 0';

export async function memory(): Promise<readonly Line[]> {
  const bare_kB = peak(['-e', '0']);
  const ratio = (name: string, kB: number, most?: number): Line => ({
    name,
    value: kB / bare_kB,
    unit: BARE,
    ...(most === undefined ? {} : { target: { atMost: most } }),
    note: `${(kB / 1000).toFixed(0)} MB against ${(bare_kB / 1000).toFixed(0)} MB`,
  });
  const lines = [ratio('peak memory of a one-shot answer', peak([PROGRAM, 'air', 'fused-silica', '633nm']))];
  const screen = await screenPeak();
  lines.push(
    screen === undefined
      ? { name: 'peak memory of the screen', missing: 'this system has no /proc' }
      : ratio('peak memory of the screen, 300 keys', screen),
  );
  const batch_kB = peak([PROGRAM, ...STREAM], wavesFile());
  lines.push(ratio('peak memory of a batch', batch_kB), {
    name: 'peak memory of a batch, a million rows',
    value: batch_kB / 1000,
    unit: 'MB',
    target: { atMost: 80 },
  });
  return lines;
}

function peak(args: readonly string[], input?: string): number {
  const report = path.join(HOME, 'peak');
  const values = Array.from({ length: REPEATS }, () => {
    const { status, stderr } = spawnSync(
      process.execPath,
      ['--require', path.join(ROOT, 'bench', 'report-peak.cjs'), ...args],
      {
        env: { ...ENVIRONMENT, HALFSPACE_PEAK: report },
        stdio: [input === undefined ? 'ignore' : openSync(input, 'r'), 'ignore', 'pipe'],
      },
    );
    if (status !== 0) throw new Error(stderr.toString());
    return Number(readFileSync(report, 'utf8'));
  });
  return median(values);
}

async function screenPeak(): Promise<number | undefined> {
  const screen = new Screen([PROGRAM], { columns: 100, rows: 30, env: ENVIRONMENT });
  await screen.sight('keys');
  await screen.settle(400);
  for (let i = 0; i < 100; i++) {
    screen.type('a');
    screen.type(String(i % 90));
    screen.type('\r');
    await screen.settle(20);
  }
  let status = '';
  try {
    status = readFileSync(`/proc/${screen.pid}/status`, 'utf8');
  } catch {}
  screen.end();
  await screen.exited;
  const found = /^VmHWM:\s+(\d+) kB/m.exec(status);
  return found ? Number(found[1]) : undefined;
}
