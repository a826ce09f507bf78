/** How the built scripts get at Node's own modules: what takes long to load and is seldom used is loaded at its first call. */
import { builtinModules } from 'node:module';
import type { Loader, Plugin } from 'esbuild';

/** `node:tty` brings streams and sockets along, a tenth of a start; the others a few milliseconds each. */
const LATE = new Set(['os', 'tty', 'crypto', 'child_process']);

const KNOWN = new Set(builtinModules);
const bare = (name: string): string => name.replace(/^node:/, '');

/** For a script that answers one question: `require` is that of the starter. */
export const lateNodeModules: Plugin = {
  name: 'late-node-modules',
  setup(b) {
    b.onResolve({ filter: /^node:/ }, ({ path: name, namespace }) => {
      if (!LATE.has(bare(name))) return undefined;
      return namespace === 'late' ? { path: name, external: true } : { path: name, namespace: 'late' };
    });
    b.onLoad({ filter: /.*/, namespace: 'late' }, ({ path: name }) => exportsOf(name, 'require'));
  },
};

/** For a script of the screen, whose bundle keeps no imports: all of Node's modules come from `givenRequire`. */
export const givenNodeModules: Plugin = {
  name: 'given-node-modules',
  setup(b) {
    b.onResolve({ filter: /^[\w:/]+$/ }, ({ path: name, kind }) => {
      if (!KNOWN.has(bare(name))) return undefined;
      // Asked for as a whole, every export would be made at the start.
      return { path: name, namespace: kind === 'import-statement' ? 'given' : 'given-whole' };
    });
    b.onLoad({ filter: /.*/, namespace: 'given' }, ({ path: name }) => exportsOf(name, 'givenRequire'));
    b.onLoad({ filter: /.*/, namespace: 'given-whole' }, ({ path: name }) => ({
      contents: `module.exports = givenRequire(${JSON.stringify(name)});`,
    }));
  },
};

/** A module with the same exports, each left out of the bundle where nobody asks for it. */
async function exportsOf(name: string, require: string): Promise<{ contents: string; loader: Loader }> {
  const load = `${require}(${JSON.stringify(name)})`;
  const late = LATE.has(bare(name));
  const lines = Object.entries((await import(name)) as Record<string, unknown>).map(([key, value]) => {
    if (key === 'default') return `export default /* @__PURE__ */ (() => ${load})();`;
    const isLate = late && typeof value === 'function' && !/^class\b|^[A-Z]/.test(key);
    return isLate
      ? `export const ${key} = (...given) => ${load}.${key}(...given);`
      : `export const ${key} = /* @__PURE__ */ (() => ${load}.${key})();`;
  });
  return { contents: lines.join('\n'), loader: 'js' };
}
