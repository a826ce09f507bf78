/**
 * Turns a bundle of modules into a script with a code cache: an asynchronous function of what the starter gives, since some
 * packages wait at the top of a module, which no other script format allows. The bundler leaves one list of exports at the
 * end, which becomes what the function gives back; Node's own modules come from the starter's `require`.
 */
import { readFileSync, writeFileSync } from 'node:fs';
import type { BuildOptions } from 'esbuild';
import { givenNodeModules } from './node-modules.ts';

/** The options of the build, changed so that `closeAsyncScript` can finish what it makes. */
export const asyncScript = (given: BuildOptions): BuildOptions => ({
  ...given,
  define: { ...given.define, 'import.meta.url': 'scriptUrl' },
  format: 'esm',
  splitting: false,
  outExtension: { '.js': '.js' },
  banner: {
    js: '(async function(require,__dirname,importPart,loadNow,module){const givenRequire=require,scriptUrl="file://"+__dirname+"/";',
  },
  footer: {},
  plugins: [givenNodeModules, ...(given.plugins ?? [])],
});

/** Makes the built module a function; throws where it is not of the shape stated above. */
export function closeAsyncScript(file: string): void {
  const text = readFileSync(file, 'utf8');
  const list = /export\s*\{([^{}]*)\};?\s*$/.exec(text);
  if (!list) throw new Error(`${file} does not end in its exports`);
  const names = (list[1] ?? '').split(',').map((item) => item.trim().split(/\s+as\s+/));
  const object = names.map(([inside, outside = inside]) => `${outside}:${inside}`).join(',');
  writeFileSync(file, `${text.slice(0, list.index)}module.exports={${object}}})`);
}
