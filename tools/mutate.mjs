/**
 * `npm run mutate -- [AREA|FILE ...]`: changes the physics core in thousands of small ways and lists the changes that no test
 * notices. An area is a folder of src; each is judged by its own tests. One area after the other; all where none is named.
 *
 *   npm run mutate                          everything
 *   npm run mutate -- units num             two areas
 *   npm run mutate -- src/units/decimal.ts  one file
 */
import { spawnSync } from 'node:child_process';
import { copyFileSync, mkdirSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

const root = path.dirname(path.dirname(fileURLToPath(import.meta.url)));
/** Area -> the tests that answer for it. */
const TESTS = {
  num: ['test/num'],
  units: ['test/units', 'test/published/units'],
  interface: ['test/interface', 'test/published/interface'],
  dispersion: ['test/dispersion'],
  medium: ['test/medium'],
  stack: ['test/stack'],
};

const areaOf = (name) => Object.keys(TESTS).find((area) => name === area || name.startsWith(`src/${area}/`));
const asked = process.argv.slice(2);
const unknown = asked.filter((name) => areaOf(name) === undefined);
if (unknown.length > 0) {
  process.stderr.write(
    `mutate: no area ${unknown.join(', ')}; there are ${Object.keys(TESTS).join(', ')}, and the files below src/ of each\n`,
  );
  process.exit(2);
}

let worst = 0;
for (const name of asked.length > 0 ? asked : Object.keys(TESTS)) {
  const area = areaOf(name);
  const files = name === area ? `src/${area}/**/*.ts` : name;
  const run = spawnSync(
    process.execPath,
    [path.join(root, 'node_modules/@stryker-mutator/core/bin/stryker.js'), 'run', '--mutate', files],
    {
      cwd: root,
      stdio: 'inherit',
      env: {
        ...process.env,
        HALFSPACE_MUTATE_TESTS: TESTS[area].join(' '),
      },
    },
  );
  worst = Math.max(worst, run.status ?? 1);
  if (run.status === 0) {
    mkdirSync(path.join(root, 'reports'), { recursive: true });
    copyFileSync(
      path.join(root, 'reports/mutation.json'),
      path.join(root, `reports/mutation-${path.basename(name, '.ts')}.json`),
    );
  }
}
process.exitCode = worst;
