/** By what a list of media is put in order, as a person says it. */
import { orList } from '../units/parse-choice.ts';
import { type Problem, problem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';

export const SORT_KEYS = [
  'key',
  'name',
  'class',
  'n',
  'loss',
  'group-index',
  'gvd',
  'birefringence',
  'abbe',
  'hardness',
  'density',
] as const;
export type SortKey = (typeof SORT_KEYS)[number];

export interface SortOrder {
  readonly key: SortKey;
  readonly descending: boolean;
}

/** `n`, or `-n` from the greatest down. */
export function parseSortOrder(text: string): SortOrder | Problem {
  const trimmed = text.trim().toLowerCase();
  const descending = trimmed.startsWith('-');
  const key = SORT_KEYS.find((k) => k === (descending ? trimmed.slice(1) : trimmed));
  if (key) return { key, descending };
  return problem(
    'not-a-choice',
    `${quoteInput(text)} is nothing to sort by`,
    `write ${orList(SORT_KEYS)}, with a dash before it for the greatest first`,
  );
}
