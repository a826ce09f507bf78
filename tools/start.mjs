/** `npm start`: builds when a source is newer than the build, then hands over to the built program. */
import { spawnSync } from 'node:child_process';
import { readdirSync, statSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

const root = path.dirname(path.dirname(fileURLToPath(import.meta.url)));
const program = path.join(root, 'dist', 'halfspace.js');

function newest(place) {
  const stat = statSync(place, { throwIfNoEntry: false });
  if (!stat) return 0;
  if (!stat.isDirectory()) return stat.mtimeMs;
  return readdirSync(place).reduce(
    (latest, name) => Math.max(latest, newest(path.join(place, name))),
    stat.mtimeMs,
  );
}

const sources = ['src', 'catalog', 'tools', 'package.json', 'package-lock.json'].map((p) =>
  newest(path.join(root, p)),
);
if (newest(program) < Math.max(...sources)) {
  const built = spawnSync(process.execPath, ['--import', 'tsx', path.join(root, 'tools', 'build.ts')], {
    cwd: root,
    stdio: ['ignore', 2, 2],
  });
  if (built.status !== 0) process.exit(1);
}
const run = spawnSync(process.execPath, [program, ...process.argv.slice(2)], { stdio: 'inherit' });
if (run.signal) process.kill(process.pid, run.signal);
process.exitCode = run.status ?? 1;
