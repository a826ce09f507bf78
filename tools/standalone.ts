/**
 * `npm run standalone`: the program as one executable, for machines without Node, made and tested. It is the Node that builds it, with the built
 * program inside (single executable application), and lies in standalone/ beside the licences that must go with it.
 */
import { execFileSync, spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import {
  chmodSync,
  copyFileSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { gzipSync } from 'node:zlib';
import { NOTICE_FILE } from './licences.ts';

const root = path.dirname(path.dirname(fileURLToPath(import.meta.url)));
const dist = path.join(root, 'dist');

/** Where injected data begins, as the documentation of Node states it. */
const FUSE = 'NODE_SEA_FUSE_fce680ab2cc467b6e072b8b5df1996b2';
const NOT_INSIDE: readonly string[] = ['inputs.json', NOTICE_FILE];

/** The licence of Node itself, in the places where its distributions keep it. */
function nodeLicence(): string {
  const prefix = path.dirname(path.dirname(process.execPath));
  const places = ['LICENSE', 'share/doc/nodejs/LICENSE', 'share/doc/node/LICENSE'];
  const found = places.map((place) => path.join(prefix, place)).find((file) => existsSync(file));
  if (found === undefined) throw new Error(`the licence of Node is not in ${places.join(', ')} of ${prefix}`);
  return found;
}

/** Writes the executable and its licences into a folder; the path of the executable. The program must be built. */
export function makeStandalone(folder: string): string {
  if (process.platform !== 'linux' || process.arch !== 'x64')
    throw new Error(
      `the standalone executable is made for linux x64, and this is ${process.platform} ${process.arch}`,
    );
  const names = readdirSync(dist)
    .filter((name) => !NOT_INSIDE.includes(name))
    .sort();
  const contents = names.map((name) => readFileSync(path.join(dist, name)));
  const all = Buffer.concat(contents);
  const id = createHash('sha256').update(all).digest('hex').slice(0, 16);
  const work = mkdtempSync(path.join(os.tmpdir(), 'standalone-'));
  try {
    const at = (name: string): string => path.join(work, name);
    writeFileSync(
      at('list'),
      JSON.stringify({ id, files: names.map((name, i) => [name, contents[i]?.length]) }),
    );
    writeFileSync(at('files'), gzipSync(all));
    writeFileSync(
      at('config.json'),
      JSON.stringify({
        main: path.join(root, 'tools/standalone-main.cjs'),
        output: at('blob'),
        disableExperimentalSEAWarning: true,
        assets: { list: at('list'), files: at('files') },
      }),
    );
    // What both say on the way is for their authors; where one fails, the error holds it.
    execFileSync(process.execPath, ['--experimental-sea-config', at('config.json')], { stdio: 'pipe' });
    copyFileSync(process.execPath, at('halfspace'));
    chmodSync(at('halfspace'), 0o755);
    const injector = path.join(root, 'node_modules/postject/dist/cli.js');
    const words = [injector, at('halfspace'), 'NODE_SEA_BLOB', at('blob'), '--sentinel-fuse', FUSE];
    execFileSync(process.execPath, words, { stdio: 'pipe' });
    mkdirSync(folder, { recursive: true });
    copyFileSync(at('halfspace'), path.join(folder, 'halfspace'));
    copyFileSync(path.join(root, 'LICENSE'), path.join(folder, 'LICENSE'));
    copyFileSync(path.join(dist, NOTICE_FILE), path.join(folder, NOTICE_FILE));
    copyFileSync(nodeLicence(), path.join(folder, 'LICENSE-NODE.txt'));
    return path.join(folder, 'halfspace');
  } finally {
    rmSync(work, { recursive: true, force: true });
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const { buildAll } = await import('./build.ts');
  await buildAll();
  const folder = path.join(root, 'standalone');
  rmSync(folder, { recursive: true, force: true });
  const program = makeStandalone(folder);
  const tests = ['node_modules/vitest/vitest.mjs', 'run', '--config', 'vitest.standalone.config.ts'];
  const { status } = spawnSync(process.execPath, tests, {
    cwd: root,
    stdio: 'inherit',
    env: { ...process.env, HALFSPACE_STANDALONE: program },
  });
  process.exitCode = status ?? 1;
  if (status === 0)
    process.stdout.write(`${path.relative(process.cwd(), program)}: Node ${process.version} inside\n`);
}
