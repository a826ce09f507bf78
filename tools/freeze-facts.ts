/**
 * The frozen facts of the catalogue: a hash per fit of everything that fixes its index (parameters, thermal form, reference,
 * temperature, range), so that no digit changes unnoticed. After a change that is meant:
 *   npx tsx tools/freeze-facts.ts            writes test/catalog/frozen-facts.json anew and says what changed
 *   npx tsx tools/freeze-facts.ts --check    writes nothing; exit status 1 where a fact changed, came or went
 */
import { createHash } from 'node:crypto';
import { readFileSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { readCatalogueSources } from '../src/catalog/from-sources.ts';
import type { Fit, Material } from '../src/catalog/types.ts';
import { layOut } from './json-layout.ts';

export type FrozenFacts = Readonly<Record<string, string>>;

export const FROZEN_FACTS_FILE = join(import.meta.dirname, '..', 'test', 'catalog', 'frozen-facts.json');

/** "material/axis/fit" -> hash, in the order of the names. */
export function freeze(materials: readonly Material[]): FrozenFacts {
  const facts = materials.flatMap((m) => m.fits.map((f) => [`${m.key}/${f.axis}/${f.id}`, hash(f)] as const));
  return Object.fromEntries(facts.sort(([a], [b]) => (a < b ? -1 : 1)));
}

function hash(fit: Fit): string {
  const { parameters, thermal, reference, temperature_C, range_um } = fit;
  const text = JSON.stringify(sorted({ parameters, thermal, reference, temperature_C, range_um }));
  return createHash('sha256').update(text).digest('hex').slice(0, 16);
}

/** Keys in a fixed order: the order in a file is no fact. */
function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (value === null || typeof value !== 'object') return value;
  const entries = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1));
  return Object.fromEntries(entries.map(([k, v]) => [k, sorted(v)]));
}

/** One line per difference. */
export function differences(before: FrozenFacts, now: FrozenFacts): readonly string[] {
  return [...new Set([...Object.keys(before), ...Object.keys(now)])].sort().flatMap((path) => {
    if (before[path] === now[path]) return [];
    if (before[path] === undefined) return [`${path}: new`];
    return now[path] === undefined ? [`${path}: gone`] : [`${path}: changed`];
  });
}

export function readFrozenFacts(): FrozenFacts {
  return JSON.parse(readFileSync(FROZEN_FACTS_FILE, 'utf8')) as FrozenFacts;
}

if (process.argv[1] !== undefined && resolve(process.argv[1]) === fileURLToPath(import.meta.url)) {
  const now = freeze(readCatalogueSources().materials);
  const check = process.argv.includes('--check');
  let before: FrozenFacts = {};
  try {
    before = readFrozenFacts();
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ENOENT') throw error;
  }
  const list = differences(before, now);
  for (const text of list) console.log(text);
  console.log(`${Object.keys(now).length} fits, ${list.length} differences`);
  if (check && list.length > 0) process.exitCode = 1;
  if (!check) writeFileSync(FROZEN_FACTS_FILE, layOut(now));
}
