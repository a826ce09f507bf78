/** The loops of bench/loops, each bundled as the product is and run in a process of its own. */
import { spawnSync } from 'node:child_process';
import path from 'node:path';
import { build } from 'esbuild';
import { type Line, percentile } from './figure.ts';
import type { Outcome } from './loops/race.ts';
import { DIST, ENVIRONMENT, HOME, ROOT } from './program.ts';

const BY_HAND = 'x loop by hand';

async function runLoop(name: string, ...args: readonly string[]): Promise<unknown> {
  const outfile = path.join(HOME, `${name}.mjs`);
  await build({
    entryPoints: [path.join(ROOT, 'bench', 'loops', `${name}.ts`)],
    outfile,
    bundle: true,
    format: 'esm',
    platform: 'node',
    target: 'node20',
    minify: true,
    logLevel: 'warning',
  });
  const run = spawnSync(process.execPath, [outfile, ...args], { env: ENVIRONMENT, encoding: 'utf8' });
  if (run.status !== 0) throw new Error(`${name}: ${run.stderr}`);
  return JSON.parse(run.stdout);
}

/** The compiler does not always decide the same: the median of several processes. */
const PROCESSES = 5;

async function contest(name: string): Promise<Record<string, Outcome | undefined>> {
  const runs: Record<string, Outcome>[] = [];
  for (let i = 0; i < PROCESSES; i++) runs.push((await runLoop(name)) as Record<string, Outcome>);
  return Object.fromEntries(
    Object.keys(runs[0] ?? {}).map((key) => {
      const sorted = runs.flatMap((run) => run[key] ?? []).sort((a, b) => a.speed - b.speed);
      return [key, sorted[sorted.length >> 1]];
    }),
  );
}

function line(name: string, outcome: Outcome | undefined, atLeast?: number): Line {
  if (!outcome) return { name, missing: 'not there yet' };
  return {
    name,
    value: outcome.speed,
    unit: BY_HAND,
    ...(atLeast === undefined ? {} : { target: { atLeast } }),
    note: `${outcome.millionsPerSecond.toPrecision(3)} million a second`,
  };
}

export async function coreLoops(): Promise<readonly Line[]> {
  const dispersion = await contest('dispersion-loops');
  const surface = await contest('fresnel-loops');
  return [
    line('index of a glass, many waves', dispersion['indices'], 0.9),
    line('index of a glass, wave by wave', dispersion['index']),
    line('group index of a glass', dispersion['groupIndex'], 0.9),
    line('complex Fresnel, s and p, as records', surface['records']),
    line('complex Fresnel, s and p, as numbers', surface['numbers'], 0.8),
  ];
}

export async function stackLoops(): Promise<readonly Line[]> {
  const { stack } = await contest('stack-loops');
  return [line('60 layers, 2,000 waves, s and p; layers', stack, 0.8)];
}

export async function searchLoops(): Promise<readonly Line[]> {
  const taken = (await runLoop('search-loops', DIST)) as Record<string, number[]>;
  return Object.entries(taken).flatMap(([count, ms]): Line[] => [
    { name: `search of ${count} entries, median key`, value: percentile(ms, 50), unit: 'ms' },
    {
      name: `search of ${count} entries, 99 of 100 keys`,
      value: percentile(ms, 99),
      unit: 'ms',
      target: { atMost: 16 },
    },
  ]);
}
