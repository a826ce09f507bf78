/** What `halfspace log` is asked to do, from its operands. */
import { type Refusal, refuse } from '../../medium/refusal.ts';
import { orList } from '../../units/parse-choice.ts';
import { quoteInput } from '../../units/quote-input.ts';
import { nearest } from '../nearest.ts';

export const LOG_ACTION_NAMES = ['list', 'show', 'last', 'search', 'export', 'rerun'] as const;
export type LogActionName = (typeof LOG_ACTION_NAMES)[number];

export type LogAction =
  | { readonly name: 'list' | 'last' }
  | { readonly name: 'show'; readonly id: string }
  | { readonly name: 'search'; readonly words: string }
  /** No ids: all records. */
  | { readonly name: 'export' | 'rerun'; readonly ids: readonly string[] };

const ALL = 'all';

export function readLogAction([name = 'list', ...rest]: readonly string[]): LogAction | Refusal {
  if (!isActionName(name)) return unknown(name);
  const [first, second] = rest;
  switch (name) {
    case 'list':
    case 'last':
      if (first === undefined) return { name };
      return refuse(
        'extra-operand',
        2,
        `${quoteInput(first)} is one operand too many for log ${name}`,
        name === 'list' ? 'write log search WORDS to list some records' : 'write log show ID',
      );
    case 'show':
      if (first !== undefined && second === undefined) return { name, id: first };
      return first === undefined
        ? refuse('missing-operand', 2, 'log show needs an id', 'write log show ID, or log last')
        : refuse('extra-operand', 2, 'log show takes one id', 'write log export ID ID for several');
    case 'search':
      return first === undefined
        ? refuse('missing-operand', 2, 'log search needs a word', 'write log search WORDS')
        : { name, words: rest.join(' ') };
    case 'export':
      return { name, ids: isAll(rest) ? [] : rest };
    case 'rerun':
      return first === undefined
        ? refuse('missing-operand', 2, 'log rerun needs an id', 'write log rerun ID ..., or log rerun all')
        : { name, ids: isAll(rest) ? [] : rest };
  }
}

const isAll = (ids: readonly string[]): boolean => ids.length === 1 && ids[0] === ALL;

function isActionName(text: string): text is LogActionName {
  return LOG_ACTION_NAMES.some((name) => name === text);
}

function unknown(typed: string): Refusal {
  const candidates = nearest(typed, LOG_ACTION_NAMES);
  const remedy =
    candidates.length > 0
      ? `did you mean log ${orList(candidates)}?`
      : /^[0-9a-f]{3,12}$/i.test(typed)
        ? `write log show ${typed} for the record with that id`
        : `write log ${orList(LOG_ACTION_NAMES)}`;
  return refuse('unknown-action', 2, `there is no log ${quoteInput(typed)}`, remedy, candidates);
}
