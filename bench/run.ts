/**
 * `npm run bench`: how fast the built program is, as ratios measured in one run.
 *
 *   npm run bench                  everything, a few minutes
 *   npm run bench -- start core    parts: start, keys, core, stack, search, batch, memory
 *   npm run bench -- --quick       fewer rounds
 *   npm run bench -- --json        one JSON document
 *
 * Times of one machine mean nothing on another, so each figure stands against something measured beside it. Only delays that a
 * person feels (a key press) are in milliseconds. The load of the machine is said with the figures: on a busy one
 * the ratios of starts still hold, the delays do not.
 */
import { rmSync } from 'node:fs';
import os from 'node:os';
import { batch } from './batch.ts';
import { bigSearch } from './big-search.ts';
import { figureText, isMissing, type Line, verdict } from './figure.ts';
import { keyPresses } from './keys.ts';
import { coreLoops, searchLoops, stackLoops } from './loops.ts';
import { memory } from './memory.ts';
import { HOME, isBuilt } from './program.ts';
import { startUp } from './start-up.ts';

const asked = process.argv.slice(2);
const isJson = asked.includes('--json');
const isQuick = asked.includes('--quick');
const parts = asked.filter((a) => !a.startsWith('--'));

const PARTS: Readonly<Record<string, () => Promise<readonly Line[]>>> = {
  start: () => startUp(isQuick ? 9 : 31),
  keys: () => keyPresses(isQuick ? 1 : 3),
  core: coreLoops,
  stack: stackLoops,
  search: async () => [...(await searchLoops()), ...(await bigSearch())],
  batch: () => batch(isQuick ? 3 : 7),
  memory,
};

const unknown = parts.filter((part) => !(part in PARTS));
if (unknown.length > 0) {
  console.error(`bench: no part ${unknown.join(', ')}; there are ${Object.keys(PARTS).join(', ')}`);
  process.exit(2);
}
if (!isBuilt()) {
  console.error('bench: there is no built program; run npm run build first');
  process.exit(2);
}

const load = (): number => Math.round((os.loadavg()[0] ?? 0) * 100) / 100;
const before = load();
const all: Record<string, readonly Line[]> = {};
for (const part of parts.length > 0 ? parts : Object.keys(PARTS)) {
  const lines = (await PARTS[part]?.()) ?? [];
  all[part] = lines;
  if (!isJson) for (const line of lines) console.log(figureText(line));
}
const machine = {
  node: process.version,
  processors: os.availableParallelism(),
  loadBefore: before,
  loadAfter: load(),
};
const missed = Object.values(all)
  .flat()
  .filter((line) => !isMissing(line) && verdict(line) === 'missed').length;
if (isJson) console.log(JSON.stringify({ machine, parts: all, missed }, null, 2));
else {
  console.log(
    `\nNode ${machine.node}, ${machine.processors} processors, load ${before} before and ${machine.loadAfter} after; ${missed} missed`,
  );
}
rmSync(HOME, { recursive: true, force: true });
