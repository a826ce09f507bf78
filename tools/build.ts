/**
 * Builds dist/: the packed catalogue and the program.
 *
 * halfspace.js   a few lines that start core.js from its code cache (code-cache.ts).
 * core.js        CommonJS, minified: the one-shot path and nothing else, as one function of `require` and its own path.
 * *.mjs          ES modules with shared chunks: the full-screen program and every command, loaded by `import()` only when
 *                asked for. Which modules these are is read off the dynamic imports of src/, so there is no list to keep.
 *
 * The build fails if the one-shot bundle contains a package that must stay out of it.
 */
import { execFileSync } from 'node:child_process';
import { chmodSync, copyFileSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { type BuildOptions, build, type Metafile, type Plugin } from 'esbuild';
import { asyncScript, closeAsyncScript } from './async-script.ts';
import { makeCache, makeScreenCaches } from './code-cache.ts';
import { buildLateParts, callLate, type LateModules } from './late-parts.ts';
import { writeNotices } from './licences.ts';
import { lateNodeModules } from './node-modules.ts';
import { writePackedCatalogue } from './pack-catalog.ts';

const root = path.dirname(path.dirname(fileURLToPath(import.meta.url)));
const src = path.join(root, 'src');
const dist = path.join(root, 'dist');
const { version } = JSON.parse(readFileSync(path.join(root, 'package.json'), 'utf8')) as { version: string };

const common: BuildOptions = {
  bundle: true,
  platform: 'node',
  target: 'node20',
  minify: true,
  lineLimit: 160,
  legalComments: 'none',
  metafile: true,
  logLevel: 'warning',
  logOverride: { 'import-is-undefined': 'error' },
  absWorkingDir: root,
};
const define = {
  'process.env.NODE_ENV': '"production"',
  HALFSPACE_VERSION: JSON.stringify(version),
};

/** Name of the built file for a lazily loaded module: src/cli/commands/verify.ts -> cli-commands-verify. */
const partName = (file: string): string =>
  path
    .relative(path.join(root, 'src'), file)
    .replace(/\.tsx?$/, '')
    .replaceAll(path.sep, '-');

/** Turns `import('./x.ts')` of a script into a load of the built part and remembers the part. */
function lazyParts(parts: Map<string, string>): Plugin {
  return {
    name: 'lazy-parts',
    setup(b) {
      b.onResolve({ filter: /^[.a-z]/ }, (args) => {
        if (args.kind !== 'dynamic-import' || !args.importer.startsWith(src)) return undefined;
        const isPackage = !args.path.startsWith('.');
        const file = isPackage ? args.path : path.resolve(args.resolveDir, args.path);
        const name = isPackage ? args.path : partName(file);
        parts.set(name, file);
        return { path: `./${name}.mjs`, external: true };
      });
    },
  };
}

/**
 * Parts that scripts start often: a script each with a code cache of its own, since dozens of modules take longer to load
 * than to run. With the command line that fills the cache.
 */
const ALONE: ReadonlyMap<string, readonly string[]> = new Map([
  ['cli-commands-sweep', ['air', 'n-bk7', '--sweep', 'wave=400nm..700nm:1nm', '-o', '/dev/null']],
  ['cli-commands-stream', ['stream', '--from', 'air', '--into', 'n-bk7', '-o', '/dev/null', '{rows}']],
]);

/** The full-screen program: what takes the terminal over, and, behind it, what draws the picture. */
const SCREEN: readonly string[] = ['tui-main', 'tui-show-picture'];
/** A step of the angle either way, then out. */
const SCREEN_KEYS: readonly string[] = ['\x1b[A', '\x1b[B', 'q'];

/** What most starts are: a few questions about one surface. */
const PLAIN_QUESTIONS = [
  ['air', 'n-bk7', '633nm', '--angle', '45', '--pol', 'p'],
  ['air', 'fused-silica', '632.8nm'],
  ['--json', 'vacuum', 'gold', '633nm'],
];

/** Ink asks for the developer tools only in development; they, and the network connection they open, stay out. */
const withoutDevtools: Plugin = {
  name: 'without-devtools',
  setup(b) {
    b.onResolve({ filter: /^\.\/devtools\.js$/ }, ({ importer }) =>
      /node_modules\/ink\//.test(importer) ? { path: 'devtools', namespace: 'empty' } : undefined,
    );
    b.onLoad({ filter: /.*/, namespace: 'empty' }, () => ({ contents: 'export default {};' }));
  },
};

const KEPT_OUT = /node_modules\/(ink|react|fuse\.js|conf|yoga-layout|d3-scale|ml-levenberg-marquardt)\//;

function refuseHeavyEntry(meta: Metafile): void {
  const heavy = Object.keys(meta.inputs).filter((f) => KEPT_OUT.test(f));
  if (heavy.length > 0) throw new Error(`the one-shot bundle must not contain ${heavy.join(', ')}`);
}

/** Code compiled from a cache has no loader for `import()`: the entry's own is handed to it. */
function importThroughEntry(script: string): void {
  const text = readFileSync(script, 'utf8');
  const imports = text.match(/\bimport\("\.\//g)?.length ?? 0;
  if (imports !== (text.match(/\bimport\(/g)?.length ?? 0)) {
    throw new Error(`${script} loads parts in a way the build does not know`);
  }
  // Pure ASCII, so that it can be read without decoding; the bundler leaves other characters in regular expressions.
  const ascii = text.replace(/[^\x00-\x7f]/g, (c) => `\\u${c.charCodeAt(0).toString(16).padStart(4, '0')}`);
  writeFileSync(script, ascii.replace(/\bimport\("\.\//g, 'importPart("./'));
}

/** Those of the parts that are named, for the bundler. */
const named = (parts: ReadonlyMap<string, string>, names: readonly string[]): Record<string, string> =>
  Object.fromEntries(names.map((name) => [name, parts.get(name) ?? '']));

/** The code of the layout engine, which its package holds as text. */
function writeLayoutEngine(): void {
  const holder = path.join(root, 'node_modules/yoga-layout/dist/binaries/yoga-wasm-base64-esm.js');
  const text = /"data:application\/octet-stream;base64,([A-Za-z0-9+/=]+)"/.exec(
    readFileSync(holder, 'utf8'),
  )?.[1];
  if (text === undefined) throw new Error(`${holder} holds no WebAssembly where it used to`);
  writeFileSync(path.join(dist, 'layout-engine.wasm'), Buffer.from(text, 'base64'));
}

export async function buildAll(): Promise<void> {
  rmSync(dist, { recursive: true, force: true });
  mkdirSync(dist, { recursive: true });
  writePackedCatalogue(root, dist);
  writeLayoutEngine();
  // The root package is an ES module package; the entry is CommonJS.
  writeFileSync(path.join(dist, 'package.json'), '{"type":"commonjs"}\n');

  const parts = new Map<string, string>();
  const met: LateModules = new Map();
  const drawing: BuildOptions = {
    // Reading `fetch` loads the whole HTTP client of Node (50 ms); the layout engine asks for it without needing it.
    define: {
      ...define,
      fetch: 'undefined',
      'import.meta.dirname': '__dirname',
      'Intl.Segmenter': 'LateSegmenter',
    },
    inject: [path.join(root, 'src/term/late-segmenter.ts')],
    alias: {
      'string-width': path.join(root, 'src/term/string-width-alias.ts'),
      'yoga-layout': path.join(root, 'tools/layout-engine.mjs'),
      '@alcalzone/ansi-tokenize': path.join(root, 'src/term/styled-chars-alias.ts'),
    },
    plugins: [withoutDevtools],
  };
  const script: BuildOptions = {
    ...common,
    outdir: dist,
    format: 'cjs',
    define: { ...define, 'import.meta.dirname': '__dirname' },
    banner: { js: '(function(require,__dirname,importPart,loadNow,module){' },
    footer: { js: '})' },
    plugins: [lazyParts(parts)],
  };
  const entry = await build({
    ...script,
    entryPoints: { core: path.join(root, 'src/main.ts') },
    plugins: [lazyParts(parts), callLate(src, met), lateNodeModules],
  });
  const late = await buildLateParts(script, src, met);
  refuseHeavyEntry(entry.metafile!);
  importThroughEntry(path.join(dist, 'core.js'));
  copyFileSync(path.join(root, 'tools/entry.cjs'), path.join(dist, 'halfspace.js'));
  chmodSync(path.join(dist, 'halfspace.js'), 0o755);

  const alone = await build({ ...script, entryPoints: named(parts, [...ALONE.keys()]) });
  const screen: Metafile[] = [];
  // One after the other: the second is met in the first.
  for (const name of SCREEN) {
    const { metafile } = await build(
      asyncScript({
        ...script,
        ...drawing,
        entryPoints: named(parts, [name]),
        plugins: [withoutDevtools, lazyParts(parts)],
      }),
    );
    if (metafile) screen.push(metafile);
  }
  const scripts = [...ALONE.keys(), ...SCREEN];
  const rest = await build({
    ...common,
    ...drawing,
    entryPoints: named(
      parts,
      [...parts.keys()].filter((name) => !scripts.includes(name)),
    ),
    outdir: dist,
    outExtension: { '.js': '.mjs' },
    chunkNames: 'part-[hash]',
    format: 'esm',
    splitting: true,
    banner: {
      js: 'import{createRequire}from"node:module";const require=createRequire(import.meta.url),__dirname=require("node:path").dirname(require("node:url").fileURLToPath(import.meta.url));',
    },
  });
  for (const name of SCREEN) closeAsyncScript(path.join(dist, `${name}.js`));
  for (const name of [...scripts, ...[...met.keys()].map((part) => part.name)]) {
    importThroughEntry(path.join(dist, `${name}.js`));
  }
  makeCache(dist, 'core', PLAIN_QUESTIONS);
  for (const [name, line] of ALONE) makeCache(dist, name, [line]);
  for (const { name, lines } of met.keys()) makeCache(dist, name, lines);
  await makeScreenCaches(dist, SCREEN, SCREEN_KEYS);
  // Made by the program from its own table of options, and installed with it.
  writeFileSync(
    path.join(dist, 'halfspace.1'),
    execFileSync(process.execPath, [path.join(dist, 'halfspace.js'), 'man']),
  );
  const inputsOf = (...metas: (Metafile | undefined)[]): string[] => [
    ...new Set(metas.flatMap((meta) => Object.keys(meta?.inputs ?? {}))),
  ];
  const inputs = {
    entry: inputsOf(entry.metafile),
    parts: inputsOf(...late, alone.metafile, ...screen, rest.metafile),
  };
  writeNotices(root, dist, [...inputs.entry, ...inputs.parts]);
  writeFileSync(path.join(dist, 'inputs.json'), JSON.stringify(inputs));
}

if (process.argv[1] === fileURLToPath(import.meta.url)) await buildAll();
