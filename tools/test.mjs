/** `npm test`: builds, then runs every test once; ends with a plain line "N passed, N failed". Further arguments go to vitest. */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

const root = path.dirname(path.dirname(fileURLToPath(import.meta.url)));
const run = (args, stdio) => spawnSync(process.execPath, args, { cwd: root, stdio });

if (run(['--import', 'tsx', 'tools/build.ts'], 'inherit').status !== 0) process.exit(1);

const folder = mkdtempSync(path.join(os.tmpdir(), 'halfspace-test-'));
const report = path.join(folder, 'report.json');
const tests = run(
  [
    'node_modules/vitest/vitest.mjs',
    'run',
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
    ...process.argv.slice(2),
  ],
  'inherit',
);
try {
  const { numPassedTests, numFailedTests } = JSON.parse(readFileSync(report, 'utf8'));
  process.stdout.write(`${numPassedTests} passed, ${numFailedTests} failed\n`);
} catch {
  process.stdout.write('no test report: the run broke off\n');
}
rmSync(folder, { recursive: true, force: true });
process.exitCode = tests.status ?? 1;
