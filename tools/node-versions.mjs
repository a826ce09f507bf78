/**
 * `npm run node-versions -- [MAJOR ...]`: builds with the Node at hand, then runs the tests of the built program with Node 20, 22
 * and 24. The other versions come from the npm registry, once, into node_modules/.cache; no install script runs.
 */
import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import path from 'node:path';
import { build, root, runTests } from './run-tests.mjs';

const MAJORS = ['20', '22', '24'];
/** The tests that start the built program. */
const END_TO_END = [
  'test/cli/program.test.ts',
  'test/cli-batch',
  'test/cli-log/built.test.ts',
  'test/cli-log/screen.test.ts',
  'test/term/guard.test.ts',
  'test/term/ink-program.test.ts',
  'test/tui/program.test.ts',
  'test/packaging/built.test.ts',
];

const majorOf = (node) => {
  const { status, stdout } = spawnSync(node, ['--version'], { encoding: 'utf8' });
  return status === 0 ? /^v(\d+)\./.exec(stdout)?.[1] : undefined;
};

/** The package that holds nothing but the binary for this machine; `node` itself would fetch it by an install script. */
function install(major) {
  const platform = process.platform === 'win32' ? 'win' : process.platform;
  const name = `node-${platform}-${process.arch}`;
  const folder = path.join(root, 'node_modules/.cache/node-versions', major);
  const node = path.join(folder, 'node_modules', name, 'bin/node');
  if (existsSync(node)) return node;
  const flags = ['--no-save', '--ignore-scripts', '--no-audit', '--no-fund', '--silent'];
  const { status } = spawnSync('npm', ['install', ...flags, '--prefix', folder, `${name}@${major}`], {
    stdio: 'inherit',
  });
  if (status !== 0) throw new Error(`npm could not install ${name}@${major}`);
  return node;
}

const asked = process.argv.slice(2);
const wrong = asked.filter((word) => !/^\d+$/.test(word));
if (wrong.length > 0) {
  process.stderr.write(`node-versions: ${wrong.join(', ')} is no version such as 22\n`);
  process.exit(2);
}
if (!build()) process.exit(1);
const lines = [];
for (const major of asked.length > 0 ? asked : MAJORS) {
  const node = majorOf(process.execPath) === major ? process.execPath : install(major);
  if (majorOf(node) !== major) throw new Error(`${node} is no Node ${major}`);
  const { status, sum } = runTests(node, END_TO_END);
  if (status !== 0) process.exitCode = 1;
  lines.push(`Node ${major}: ${sum}`);
}
process.stdout.write(`${lines.join('\n')}\n`);
