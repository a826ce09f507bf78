/**
 * Bundles a fixture program into one file, the way the product is bundled: starting it takes a third of the time that
 * loading the sources and Ink file by file takes, and a pseudo-terminal test starts many.
 */
import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

const root = fileURLToPath(new URL('../..', import.meta.url));

/**
 * @param source path of the program below the repository's root
 * @returns path of the bundle, in a folder of its own below the system's temporary folder
 */
export async function bundleFixture(source: string): Promise<string> {
  const outfile = join(mkdtempSync(join(tmpdir(), 'fixture-')), 'program.mjs');
  await build({
    entryPoints: [join(root, source)],
    outfile,
    bundle: true,
    format: 'esm',
    platform: 'node',
    target: 'node20',
    minifySyntax: true,
    define: { 'process.env.NODE_ENV': '"production"', 'process.env.DEV': '"false"', fetch: 'undefined' },
    alias: { 'string-width': join(root, 'src/term/string-width-alias.ts') },
    banner: {
      js: "import { createRequire } from 'node:module'; const require = createRequire(import.meta.url);",
    },
    logLevel: 'warning',
    plugins: [
      {
        // Only loaded by Ink in development; not installed.
        name: 'no-devtools',
        setup({ onResolve, onLoad }) {
          onResolve({ filter: /^react-devtools-core$/ }, ({ path }) => ({ path, namespace: 'no-devtools' }));
          onLoad({ filter: /.*/, namespace: 'no-devtools' }, () => ({ contents: 'export default {};' }));
        },
      },
    ],
  });
  return outfile;
}
