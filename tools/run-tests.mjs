/** Builds the program, and runs tests of it with a Node of one's choice. */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = path.dirname(path.dirname(fileURLToPath(import.meta.url)));

/** True where the build went well; it says itself why not. */
export const build = () =>
  spawnSync(process.execPath, ['--import', 'tsx', 'tools/build.ts'], { cwd: root, stdio: 'inherit' })
    .status === 0;

/** Runs the tests that the arguments name, all where they name none. The exit status, and a line that sums up. */
export function runTests(node, args) {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'halfspace-test-'));
  const report = path.join(folder, 'report.json');
  const tests = spawnSync(
    node,
    [
      'node_modules/vitest/vitest.mjs',
      'run',
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${report}`,
      ...args,
    ],
    { cwd: root, stdio: 'inherit' },
  );
  let sum = 'no test report: the run broke off';
  try {
    const { numPassedTests, numFailedTests } = JSON.parse(readFileSync(report, 'utf8'));
    sum = `${numPassedTests} passed, ${numFailedTests} failed`;
  } catch {}
  rmSync(folder, { recursive: true, force: true });
  return { status: tests.status ?? 1, sum };
}
