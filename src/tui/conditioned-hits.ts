/**
 * Conditions typed beside the name of a medium, in the language of `halfspace find`: `glass n 1.5..1.53 not toxic`. What a
 * condition lacks is said while the others hold. The wave is that of the question where none is typed, the temperature always. Words that match nothing
 * as they stand are taken with slips.
 */
import type { Question, WaveSpec } from '../answer/question.ts';
import type { Material } from '../catalog/types.ts';
import { isRefusal } from '../medium/refusal.ts';
import type { FindResult, Found } from '../selection/find-materials.ts';
import { wordTest } from '../selection/material-words.ts';
import { type ConditionReading, parseConditions } from '../selection/parse-conditions.ts';
import { defaultOrder, sortFound } from '../selection/sort-found.ts';
import { UNDECIDED_WORDS, type UndecidedReason } from '../selection/undecided.ts';
import { METRE } from '../units/display-unit.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { ASCII } from '../units/number-style.ts';
import type { World } from './world.ts';

export interface ConditionedHits {
  readonly reading: ConditionReading;
  readonly found: readonly Found[];
  /** "12 of 464; 3 left out: no data at 633 nm" */
  readonly count: string;
}

const made = new WeakMap<World, WeakMap<Question, Map<string, ConditionedHits | undefined>>>();
/** Texts kept, for the views of one frame and a letter taken back; lists of thousands are heavy to keep. */
const MOST_TEXTS = 4;

/** Undefined where the text holds nothing but words: then it is a name. */
export function conditionedHits(text: string, question: Question, world: World): ConditionedHits | undefined {
  const questions = made.get(world) ?? new WeakMap<Question, Map<string, ConditionedHits | undefined>>();
  made.set(world, questions);
  const known = questions.get(question) ?? new Map<string, ConditionedHits | undefined>();
  questions.set(question, known);
  if (known.has(text)) return known.get(text);
  const hits = findConditioned(text, question, world);
  if (known.size >= MOST_TEXTS) known.clear();
  known.set(text, hits);
  return hits;
}

function findConditioned(text: string, question: Question, world: World): ConditionedHits | undefined {
  const { wave, conditions } = question;
  const { materials, classes } = world.survey();
  const reading = parseConditions(text, { classes, wave });
  if (reading.parts.every((part) => part.kind === 'word')) return undefined;
  const { words } = reading.criteria;
  const criteria = { ...reading.criteria, temperature_K: conditions.temperature_K, words: [] };
  const result = world.find(criteria, words.length === 0 ? undefined : meant(words, world));
  if (isRefusal(result)) return { reading, found: [], count: result.message };
  const order = defaultOrder(criteria);
  // By key is the order found in, but for the entries of one's own, which stand last.
  const found = order.key === 'key' ? result.found : sortFound(result.found, order, criteria);
  return { reading, found, count: countText(result, materials.length, criteria.wave) };
}

interface Meant {
  readonly text: string;
  readonly materials: readonly Material[];
}

/** The last words of a world: they stay while a condition behind them is typed. */
const lastMeant = new WeakMap<World, Meant>();

/** Those that hold the words; where none does, those that come close. */
function meant(words: readonly string[], world: World): readonly Material[] {
  const text = words.join(' ');
  const last = lastMeant.get(world);
  if (last?.text === text) return last.materials;
  const { materials, material } = world.survey();
  const strict = materials.filter(wordTest(words));
  const close = strict.length > 0 ? strict : world.search(text).flatMap(({ key }) => material(key) ?? []);
  lastMeant.set(world, { text, materials: close });
  return close;
}

function countText({ found, undecided }: FindResult, total: number, wave: WaveSpec | undefined): string {
  const left = [...undecided].sort((a, b) => b[1] - a[1]);
  const open = left.reduce((sum, [, count]) => sum + count, 0);
  const count = `${found.length} of ${total}`;
  if (open === 0) return count;
  const reasons = left.map(([reason]) => reasonText(reason, wave)).join(', ');
  return `${count}; ${open} left out: ${reasons}`;
}

function reasonText(reason: UndecidedReason, wave: WaveSpec | undefined): string {
  if (reason !== 'no-data-at-wave' || !wave) return UNDECIDED_WORDS[reason];
  const length = formatQuantity(Number(wave.wavelength_m.toPrecision(6)), METRE, 'shortest', {
    style: ASCII,
  });
  return `no data at ${length}`;
}

/** What was understood so far: "n 1.5 to 1.53, not toxic, at 633 nm; words: glass". */
export function understoodText({ reading: { criteria, parts } }: ConditionedHits): string {
  const said = parts.filter((part) => part.kind === 'condition').map((part) => part.text);
  const words = criteria.words.length > 0 ? [`words: ${criteria.words.join(' ')}`] : [];
  return [...(said.length > 0 ? [said.join(', ')] : []), ...words].join('; ');
}

export interface ReadingFault {
  /** Not wrong yet: the last part is still being typed. */
  readonly isOpen: boolean;
  /** What is wrong and what would be right. */
  readonly text: string;
}

/** The first mistake, or how what is being typed may go on. */
export function faultOf({ reading: { parts } }: ConditionedHits): ReadingFault | undefined {
  const part = parts.find((p) => p.kind === 'problem') ?? parts.findLast((p) => p.remedy !== undefined);
  if (!part) return undefined;
  const text = part.kind === 'word' ? (part.remedy ?? '') : `${part.text}; ${part.remedy ?? ''}`;
  return { isOpen: part.kind !== 'problem', text };
}
