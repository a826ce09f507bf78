/**
 * What the list of media offers for what is typed: a literal medium by its numbers, else catalogue entries, an exactly
 * named one (with its axis) first, or those that meet the conditions typed. While nothing is typed, the media used last come first.
 */
import type { MediumSpec, Question } from '../answer/question.ts';
import { bothReferences } from '../answer/wave.ts';
import { axesOf, defaultAxis } from '../catalog/choose-fit.ts';
import type { CatalogueEntry } from '../catalog/entries.ts';
import type { Axis } from '../catalog/types.ts';
import { isRefusal } from '../medium/refusal.ts';
import type { Candidate } from '../selection/candidate.ts';
import { isProblem, type Problem, problem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { type ConditionedHits, conditionedHits } from './conditioned-hits.ts';
import { readLiteral } from './fields/medium-fields.ts';
import type { World } from './world.ts';

export type Hit =
  | { readonly kind: 'literal'; readonly medium: MediumSpec }
  | { readonly kind: 'entry'; readonly entry: CatalogueEntry; readonly axis?: Axis | undefined };

export function hitsFor(
  text: string,
  recent: readonly string[],
  question: Question,
  world: World,
): readonly Hit[] {
  const typed = text.trim();
  const literal = readLiteral(typed);
  if (literal !== undefined && !isProblem(literal)) return [{ kind: 'literal', medium: literal }];
  if (typed === '') return recentFirst(world.search(typed), recent);
  const named = world.lookup(typed);
  const conditioned = named.kind === 'one' ? undefined : conditionsIn(text, question, world);
  if (conditioned) return conditioned.found.flatMap(({ candidate }) => hitOf(candidate, world));
  if (literal !== undefined) return [];
  const found = world.search(typed);
  const entries = found.map((entry): Hit => ({ kind: 'entry', entry }));
  if (named.kind !== 'one') return entries;
  const { material, axis } = named.found;
  const exact = found.find((e) => e.key === material.key) ?? entryOfMaterial(world, material.key);
  if (!exact) return entries;
  return [
    { kind: 'entry', entry: exact, axis },
    ...entries.filter((h) => h.kind === 'entry' && h.entry.key !== material.key),
  ];
}

/** The conditions in a text; undefined where it is a name or a medium by its numbers. */
export function conditionsIn(text: string, question: Question, world: World): ConditionedHits | undefined {
  const literal = readLiteral(text.trim());
  // "n=1.4..1.5" is a condition, "n=1.4+" an unfinished medium.
  if (literal !== undefined && !(isProblem(literal) && text.includes('..'))) return undefined;
  return conditionedHits(text, question.wave, world);
}

function hitOf({ material, axis }: Candidate, world: World): readonly Hit[] {
  const entry = entryByKey(world).get(material.key);
  if (!entry) return [];
  return [{ kind: 'entry', entry, axis: axesOf(material).length > 1 ? axis : undefined }];
}

const byKey = new WeakMap<readonly CatalogueEntry[], ReadonlyMap<string, CatalogueEntry>>();

function entryByKey(world: World): ReadonlyMap<string, CatalogueEntry> {
  const all = world.search('');
  const known = byKey.get(all) ?? new Map(all.map((e) => [e.key, e]));
  byKey.set(all, known);
  return known;
}

function entryOfMaterial(world: World, key: string): CatalogueEntry | undefined {
  return world.search(key).find((e) => e.key === key);
}

function recentFirst(entries: readonly CatalogueEntry[], recent: readonly string[]): readonly Hit[] {
  const known = new Map(entries.map((e) => [e.key, e]));
  const first = recent.flatMap((key) => known.get(key) ?? []);
  const rest = entries.filter((e) => !recent.includes(e.key));
  return [...first, ...rest].map((entry) => ({ kind: 'entry', entry }));
}

/** Why nothing is offered for a text. */
export function whyNoHit(text: string, question: Question, world: World): Problem {
  if (conditionsIn(text, question, world)) {
    return problem('not-a-medium', 'no medium meets these conditions', 'widen one or take one out');
  }
  const literal = readLiteral(text.trim());
  if (literal !== undefined && isProblem(literal)) return literal;
  return problem(
    'not-a-medium',
    `no medium matches ${quoteInput(text.trim())}`,
    'type another name or formula, or its numbers as in n=1.5+0.1i',
  );
}

/** The medium of a hit, ready for a question; crystals get the first axis that reaches the wave. */
export function mediumOfHit(hit: Hit, question: Question, world: World): MediumSpec | undefined {
  if (hit.kind === 'literal') return hit.medium;
  const material = world.material(hit.entry.key);
  if (!material) return undefined;
  const several = axesOf(material).length > 1;
  if (!several) return { kind: 'catalogue', material };
  const wave = bothReferences(question.wave);
  const axis = hit.axis ?? (isRefusal(wave) ? axesOf(material)[0] : defaultAxis(material, wave));
  return { kind: 'catalogue', material, axis };
}
