/**
 * The test runner of mutation testing (Stryker's interface), thousands of runs in one process. Starting a general runner afresh
 * for every mutant costs seconds; here the tests and the changed sources are bundled once, and the bundle is evaluated anew for each
 * mutant (a few milliseconds), so that no table built under one mutant is left to the next. The tests that took least time go first;
 * the first failure ends the run. It knows `describe`, `it`, their `each`, and `expect`, which is all these tests use.
 */
import { readdirSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import vm from 'node:vm';
import { declareClassPlugin, PluginKind } from '@stryker-mutator/api/plugin';
import { determineHitLimitReached, toMutantRunResult } from '@stryker-mutator/api/test-runner';
import { chai, customMatchers, JestAsymmetricMatchers, JestChaiExpect, JestExtend } from '@vitest/expect';
import { build } from 'esbuild';

const require = createRequire(import.meta.url);
for (const plugin of [JestExtend, JestChaiExpect, JestAsymmetricMatchers]) chai.use(plugin);
chai.expect.extend(chai.expect, customMatchers);
const expect = Object.assign((value, message) => chai.expect(value, message), {
  unreachable: (message) => chai.assert.fail(message ?? 'expected never to get here'),
});
/** Random examples: the same in every run, at most 100 a property, and no search for the smallest that fails. */
const fc = require('fast-check');
const assert = (property, { numRuns = 100, ...rest } = {}) =>
  fc.assert(property, { ...rest, seed: 1, endOnFailure: true, numRuns: Math.min(numRuns, 100) });

/** What Stryker puts into the sources talks through this object. */
globalThis.__stryker__ ??= {};
const shared = globalThis.__stryker__;

/** Where the tests of one evaluation of the bundle gather. */
let tests = [];
let titles = [];
const register = (name, body) => tests.push({ id: `${tests.length} ${[...titles, name].join(' > ')}`, body });
const group = (name, body) => {
  titles.push(name);
  body();
  titles.pop();
};
const eachOf = (one) => (rows) => (name, body) => {
  for (const row of rows) one(name, () => (Array.isArray(row) ? body(...row) : body(row)));
};
const vitest = {
  describe: Object.assign(group, { each: eachOf(group) }),
  it: Object.assign(register, { each: eachOf(register) }),
  expect,
};

const ours = {
  vitest,
  'fast-check': { ...fc, __esModule: true, assert, default: { ...fc.default, assert } },
};

class SameProcessRunner {
  #script;
  #time_ms = new Map();

  capabilities() {
    return { reloadEnvironment: true };
  }

  async init() {
    const files = (process.env.HALFSPACE_MUTATE_TESTS ?? '').split(' ').flatMap((folder) =>
      readdirSync(folder)
        .filter((name) => name.endsWith('.test.ts'))
        .map((name) => `${folder}/${name}`),
    );
    const bundle = await build({
      stdin: { contents: files.map((file) => `import './${file}';`).join('\n'), resolveDir: process.cwd() },
      bundle: true,
      write: false,
      format: 'cjs',
      platform: 'node',
      packages: 'external',
      logLevel: 'error',
      plugins: [ownUrls],
    });
    this.#script = new vm.Script(`(function (require) {${bundle.outputFiles[0].text}\n})`, {
      filename: 'mutate-tests.cjs',
    });
  }

  async dryRun() {
    shared.mutantCoverage = undefined;
    shared.activeMutant = undefined;
    shared.hitLimit = undefined;
    this.#load();
    const results = [];
    for (const test of tests) {
      shared.currentTestId = test.id;
      results.push(await result(test));
      shared.currentTestId = undefined;
    }
    for (const { id, timeSpentMs } of results) this.#time_ms.set(id, timeSpentMs);
    return { status: 'complete', tests: results, mutantCoverage: shared.mutantCoverage };
  }

  async mutantRun({ activeMutant, testFilter, hitLimit, mutantActivation }) {
    shared.hitCount = 0;
    shared.hitLimit = hitLimit;
    shared.activeMutant = mutantActivation === 'static' ? activeMutant.id : undefined;
    try {
      this.#load();
    } catch (error) {
      return toMutantRunResult({ status: 'complete', tests: [failed('loading', error, 0)] });
    }
    shared.activeMutant = activeMutant.id;
    const wanted = testFilter === undefined ? tests : tests.filter(({ id }) => testFilter.includes(id));
    const time = ({ id }) => this.#time_ms.get(id) ?? 0;
    const results = [];
    for (const test of wanted.toSorted((a, b) => time(a) - time(b))) {
      results.push(await result(test, 5000 + 20 * time(test)));
      if (results.at(-1).status === ENDLESS) return { status: 'timeout' };
      if (results.at(-1).status === FAILED) break;
    }
    return toMutantRunResult(
      determineHitLimitReached(shared.hitCount, hitLimit) ?? { status: 'complete', tests: results },
    );
  }

  #load() {
    tests = [];
    titles = [];
    this.#script.runInThisContext()((name) => ours[name] ?? require(name));
  }
}

const [PASSED, FAILED, ENDLESS] = [0, 1, 'endless'];
const inCall = new vm.Script('__call()');

/** Runs one test; a mutant that makes it loop without end is cut off after `limit_ms`. */
async function result({ id, body }, limit_ms = 600_000) {
  const start_ms = performance.now();
  globalThis.__call = body;
  try {
    await inCall.runInThisContext({ timeout: Math.ceil(limit_ms) });
    return { id, name: id, timeSpentMs: performance.now() - start_ms, status: PASSED };
  } catch (error) {
    if (error?.code === 'ERR_SCRIPT_EXECUTION_TIMEOUT') return { id, status: ENDLESS };
    return failed(id, error, performance.now() - start_ms);
  }
}

const failed = (id, error, timeSpentMs) => ({
  id,
  name: id,
  timeSpentMs,
  status: FAILED,
  failureMessage: String(error),
});

/** Some files read tables from beside themselves. */
const ownUrls = {
  name: 'own-urls',
  setup(hooks) {
    hooks.onLoad({ filter: /\.ts$/ }, async (file) => ({
      contents: (await readFile(file.path, 'utf8')).replaceAll(
        'import.meta.url',
        JSON.stringify(pathToFileURL(path.resolve(file.path)).href),
      ),
      loader: 'ts',
    }));
  },
};

export const strykerPlugins = [declareClassPlugin(PluginKind.TestRunner, 'same-process', SameProcessRunner)];
