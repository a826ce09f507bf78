/**
 * What the list of media offers for what is typed: a literal medium by its numbers, else catalogue entries, an exactly
 * named one (with its axis) first, or those that meet the conditions typed. While nothing is typed, the media used last come first.
 */
import type { MediumSpec, Question } from '../answer/question.ts';
import { bothReferences } from '../answer/wave.ts';
import { axesOf, defaultAxis } from '../catalog/choose-fit.ts';
import { type CatalogueEntry, entryOf } from '../catalog/entries.ts';
import type { Axis } from '../catalog/types.ts';
import { isRefusal } from '../medium/refusal.ts';
import type { Found } from '../selection/find-materials.ts';
import { isProblem, type Problem, problem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { type ConditionedHits, conditionedHits } from './conditioned-hits.ts';
import { readLiteral } from './fields/medium-fields.ts';
import type { World } from './world.ts';

export type Hit =
  | { readonly kind: 'literal'; readonly medium: MediumSpec }
  | { readonly kind: 'entry'; readonly entry: CatalogueEntry; readonly axis?: Axis | undefined };

/** A list of hits; one out of sight is not made. */
export type Hits = Pick<readonly Hit[], 'length' | 'at' | 'slice'>;

function lazily<T>(items: readonly T[], hit: (item: T) => Hit): Hits {
  return {
    length: items.length,
    at: (i) => {
      const item = items.at(i);
      return item === undefined ? undefined : hit(item);
    },
    slice: (from, to) => items.slice(from, to).map(hit),
  };
}

interface Made {
  readonly from: readonly unknown[];
  readonly hits: Hits;
}

/** The last list of a question: the views of one frame all ask for it. */
const made = new WeakMap<Question, Made>();

export function hitsFor(text: string, recent: readonly string[], question: Question, world: World): Hits {
  // All media too: a better search is loaded while the program runs.
  const from = [text, recent, world, world.search('')];
  let list = made.get(question);
  if (!list || from.some((part, i) => part !== list?.from[i])) {
    list = { from, hits: makeHits(text, recent, question, world) };
    made.set(question, list);
  }
  return list.hits;
}

function makeHits(text: string, recent: readonly string[], question: Question, world: World): Hits {
  const typed = text.trim();
  const literal = readLiteral(typed);
  if (literal !== undefined && !isProblem(literal)) return [{ kind: 'literal' as const, medium: literal }];
  if (typed === '') return lazily(recentFirst(world.search(typed), recent), entryHit);
  const named = world.lookup(typed);
  const conditioned = named.kind === 'one' ? undefined : conditionsIn(text, question, world);
  if (conditioned) return lazily(conditioned.found, foundHit);
  if (literal !== undefined) return [];
  const found = world.search(typed);
  if (named.kind !== 'one') return lazily(found, entryHit);
  const { material, axis } = named.found;
  const exact = entryOf(material);
  const others = found.filter((entry) => entry.key !== exact.key);
  return lazily([exact, ...others], (entry) => ({
    kind: 'entry',
    entry,
    axis: entry === exact ? axis : undefined,
  }));
}

const entryHit = (entry: CatalogueEntry): Hit => ({ kind: 'entry', entry });

function foundHit({ candidate: { material, axis } }: Found): Hit {
  const entry = entryOf(material);
  return { kind: 'entry', entry, axis: entry.axes.length > 1 ? axis : undefined };
}

/** The conditions in a text; undefined where it is a name or a medium by its numbers. */
export function conditionsIn(text: string, question: Question, world: World): ConditionedHits | undefined {
  const literal = readLiteral(text.trim());
  // "n=1.4..1.5" is a condition, "n=1.4+" an unfinished medium.
  if (literal !== undefined && !(isProblem(literal) && text.includes('..'))) return undefined;
  return conditionedHits(text, question, world);
}

const MOST_RECENT = 12;

/** The keys of media used, with one used now. */
export const latestFirst = (recent: readonly string[], key: string): readonly string[] =>
  [key, ...recent.filter((other) => other !== key)].slice(0, MOST_RECENT);

function recentFirst(
  entries: readonly CatalogueEntry[],
  recent: readonly string[],
): readonly CatalogueEntry[] {
  const used = new Set(recent);
  const first = entries
    .filter(({ key }) => used.has(key))
    .sort((a, b) => recent.indexOf(a.key) - recent.indexOf(b.key));
  return [...first, ...entries.filter(({ key }) => !used.has(key))];
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
