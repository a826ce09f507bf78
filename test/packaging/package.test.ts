/** What `npm pack` would publish: every file the program loads, the documents that go with it, and nothing else. */
import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { beforeAll, describe, expect, it } from 'vitest';

const root = fileURLToPath(new URL('../..', import.meta.url));
const dist = path.join(root, 'dist');
const about = JSON.parse(readFileSync(path.join(root, 'package.json'), 'utf8')) as Record<string, unknown>;

/** With what each is for. */
const DOCUMENTS = [
  'LICENSE',
  'README.md',
  'package.json',
  'dist/THIRD-PARTY.txt', // licences of what is bundled
  'dist/halfspace.1', // the manual page
  'dist/package.json', // makes the folder CommonJS
  'catalog/README.md', // how to write an entry of one's own, which README.md refers to
  'catalog/schema/own-material.schema.json',
];

/** A built file and everything it names in turn: modules, scripts with their code caches, data. */
function loadedFrom(name: string, found = new Set<string>()): Set<string> {
  if (found.has(name)) return found;
  found.add(name);
  if (!/\.m?js$/.test(name)) return found;
  const text = readFileSync(path.join(dist, name), 'utf8');
  const cache = name.replace(/\.js$/, '.cache');
  if (cache !== name && existsSync(path.join(dist, cache))) found.add(cache);
  for (const [, part = ''] of text.matchAll(/"\.\/([\w-]+\.mjs)"/g)) {
    const script = part.replace(/\.mjs$/, '.js');
    loadedFrom(existsSync(path.join(dist, part)) ? part : script, found);
  }
  for (const [, script = ''] of text.matchAll(/\bloadNow\("([\w-]+)"\)/g)) loadedFrom(`${script}.js`, found);
  for (const [, data = ''] of text.matchAll(/["'`]([\w-]+\.(?:dat|wasm))["'`]/g)) found.add(data);
  return found;
}

/** Modules that open connections. The bundler calls functions with short names for `require`; `https` is a scheme of addresses too. */
const NETWORK =
  /["'`](?:node:(?:https?|inspector|cluster)|(?:node:)?(?:http2|net|tls|dns|dgram))["'`]|[\w$]\(["'`]https?["'`]\)/g;

let packed: readonly string[] = [];
beforeAll(() => {
  const json = execFileSync('npm', ['pack', '--dry-run', '--json', '--ignore-scripts'], {
    cwd: root,
    encoding: 'utf8',
  });
  const [tarball] = JSON.parse(json) as { files: { path: string }[] }[];
  packed = (tarball?.files ?? []).map((file) => file.path).sort();
});

describe('the package', () => {
  it('holds exactly what the program loads, and its documents', () => {
    const needed = [...loadedFrom('halfspace.js'), ...loadedFrom('core.js')].map((name) => `dist/${name}`);
    expect(needed).toContain('dist/catalog.dat');
    expect(needed.some((name) => name.startsWith('dist/tui-'))).toBe(true);
    expect(packed).toEqual([...new Set([...needed, ...DOCUMENTS])].sort());
  });

  it('holds no source maps and no traces of where it was built', () => {
    expect(packed.filter((file) => /\.map$|\.tsx?$|inputs\.json$/.test(file))).toEqual([]);
    for (const file of packed.filter((f) => /\.m?js$/.test(f))) {
      const text = readFileSync(path.join(root, file), 'utf8');
      expect(text.includes('sourceMappingURL'), file).toBe(false);
      expect(text.includes(root), file).toBe(false);
    }
  });

  it('runs nothing when installed and asks for no other package', () => {
    const scripts = Object.keys(about['scripts'] as object);
    const onInstall = /^(pre|post)?(install|prepare|pack|publish|uninstall|version)$/;
    expect(scripts.filter((name) => onInstall.test(name))).toEqual([]);
    for (const kind of ['dependencies', 'optionalDependencies', 'peerDependencies', 'bundleDependencies'])
      expect(about[kind], kind).toBeUndefined();
  });

  it('can reach no network: it loads none of the modules that could, and nothing calls fetch', () => {
    for (const file of packed.filter((f) => /\.m?js$/.test(f))) {
      const text = readFileSync(path.join(root, file), 'utf8');
      expect(text.match(NETWORK), file).toBeNull();
      expect(text.match(/(?<![\w.$])(?:fetch|XMLHttpRequest|EventSource)\(/), file).toBeNull();
      expect(text.match(/\bnew WebSocket\b|127\.0\.0\.1|localhost/), file).toBeNull();
    }
  });

  it('loads the modules of Node and its own parts, and no others', () => {
    const loaded = new Set<string>();
    for (const file of packed.filter((f) => /\.m?js$/.test(f))) {
      const text = readFileSync(path.join(root, file), 'utf8');
      const names = text.matchAll(
        /(?:\b(?:require|import)\(|\b(?:from|import) ?)["']([\w@.][\w:./@-]*)["']/g,
      );
      for (const [, name = ''] of names) loaded.add(name);
    }
    expect([...loaded]).toContain('node:fs');
    // The schema checker names its modules in code that it writes only where schemas are made into files.
    const foreign = [...loaded].filter((name) => !/^(?:node:|\.\/|ajv(?:-formats)?\/dist\/)/.test(name));
    expect(foreign).toEqual([]);
  });
});
