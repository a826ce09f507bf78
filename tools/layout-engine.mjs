/**
 * Stands in for `yoga-layout` in the built screen, with the same exports. The package decodes its WebAssembly from text and
 * compiles it in the background, which takes longer than all the layout of a first frame; here it is read from a file that
 * the build makes of that text, and is ready at once.
 */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import loadEngine from '../node_modules/yoga-layout/dist/binaries/yoga-wasm-base64-esm.js';
import wrapAssembly from '../node_modules/yoga-layout/dist/src/wrapAssembly.js';

export * from '../node_modules/yoga-layout/dist/src/generated/YGEnums.js';

const engine = {
  instantiateWasm(imports, done) {
    const code = new WebAssembly.Module(readFileSync(join(import.meta.dirname, 'layout-engine.wasm')));
    done(new WebAssembly.Instance(code, imports));
    return {};
  },
};
loadEngine(engine);

// biome-ignore lint/style/noDefaultExport: the module it stands in for has one
export default wrapAssembly(engine);
