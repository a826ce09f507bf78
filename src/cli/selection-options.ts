/** Rows of the table of options for the commands that choose among media: find, match, compare, order-check. */

import type { Exclusion } from '../selection/criteria.ts';
import { parseExclusion } from '../selection/parse-exclusion.ts';
import {
  ABBE_RANGE,
  BIREFRINGENCE_RANGE,
  GROUP_INDEX_RANGE,
  GVD_RANGE,
  INDEX_RANGE,
  parseRange,
  parseSpan,
} from '../selection/parse-range.ts';
import { parseSortOrder } from '../selection/sort-order.ts';
import { parseFraction } from '../units/parse-fraction.ts';
import { parseLength } from '../units/parse-length.ts';
import { parseNumber } from '../units/parse-number.ts';
import { ABOVE_ZERO } from '../units/parse-quantity.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem, type Problem, problem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { flag, value } from './option-spec.ts';

export const SELECTION_OPTION_ROWS = {
  at: value({
    name: 'at',
    placeholder: 'WAVE',
    meaning: 'the wave that indices and losses are meant for, such as 633nm or d-line',
    group: 'selection',
    parse: (text) => parseWave(text),
  }),
  indexRange: value({
    name: 'n',
    placeholder: 'A..B',
    meaning: 'index relative to vacuum, such as 1.37..1.39, 1.7.. or ..1.4',
    group: 'selection',
    parse: (text) => parseRange(text, INDEX_RANGE),
  }),
  clear_m: value({
    name: 'clear',
    placeholder: 'WAVE..WAVE',
    meaning: 'inside the transparency range on file: 3um..5um, or one wave',
    group: 'selection',
    parse: parseSpan,
  }),
  classNames: value({
    name: 'class',
    placeholder: 'CLASS,...',
    meaning: 'one of these classes, each by a word of it: liquid, glass, film, crystal, metal',
    group: 'selection',
    parse: (text) => words(text, 'a class'),
  }),
  not: value({
    name: 'not',
    placeholder: 'WHAT,...',
    meaning: 'leave out: hygroscopic, toxic, hazardous or a class',
    group: 'selection',
    repeatable: true,
    parse(text): readonly Exclusion[] | Problem {
      const read = words(text, 'what to leave out');
      if (isProblem(read)) return read;
      const exclusions: Exclusion[] = [];
      for (const word of read) {
        const exclusion = parseExclusion(word);
        if (isProblem(exclusion)) return exclusion;
        exclusions.push(exclusion);
      }
      return exclusions;
    },
  }),
  maxLoss: value({
    name: 'max-loss',
    placeholder: 'FRACTION',
    meaning:
      'greatest loss at normal incidence in air, uncoated: of one surface, or with --thickness of a whole plate, absorption included',
    group: 'selection',
    parse: parseFraction,
  }),
  thickness_m: value({
    name: 'thickness',
    placeholder: 'LENGTH',
    meaning: 'thickness of the plate that a loss is meant for',
    group: 'selection',
    parse: parseLength,
  }),
  groupIndexRange: value({
    name: 'group-index',
    placeholder: 'A..B',
    meaning: 'group index',
    group: 'selection',
    parse: (text) => parseRange(text, GROUP_INDEX_RANGE),
  }),
  gvdRange: value({
    name: 'gvd',
    placeholder: 'A..B',
    meaning: 'group-velocity dispersion in fs2/mm, such as -20..20',
    group: 'selection',
    parse: (text) => parseRange(text, GVD_RANGE),
  }),
  birefringenceRange: value({
    name: 'birefringence',
    placeholder: 'A..B',
    meaning: 'size of n_e - n_o (or n_z - n_x): 0.1.. is 0.1 and more',
    group: 'selection',
    parse: (text) => parseRange(text, BIREFRINGENCE_RANGE),
  }),
  abbeRange: value({
    name: 'abbe',
    placeholder: 'A..B',
    meaning: 'Abbe number V_d, such as 60..70',
    group: 'selection',
    parse: (text) => parseRange(text, ABBE_RANGE),
  }),
  sort: value({
    name: 'sort',
    placeholder: 'KEY',
    meaning:
      'key, name, class, n, loss, group-index, gvd, birefringence, abbe, hardness or density; -KEY for the greatest first',
    fallback: 'the first quantity asked for',
    group: 'selection',
    parse: parseSortOrder,
  }),
  within: value({
    name: 'within',
    placeholder: 'NUMBER',
    meaning: 'list every medium whose index is no further off than this',
    fallback: 'the twelve nearest',
    group: 'selection',
    parse: parsePositive,
  }),
  mix: flag({
    name: 'mix',
    meaning: 'mixtures of two liquids too, by the Lorentz-Lorenz rule: an estimate',
    group: 'selection',
  }),
};

function words(text: string, what: string): readonly string[] | Problem {
  const list = text.split(',').map((word) => word.trim());
  return list.some((word) => word === '')
    ? problem(
        'empty',
        `${quoteInput(text)} leaves out ${what}`,
        'write one or more, with commas between them',
      )
    : list;
}

function parsePositive(text: string): number | Problem {
  const number = parseNumber(text);
  if (isProblem(number) || ABOVE_ZERO.allows(number)) return number;
  return problem('out-of-range', `${quoteInput(text)} is not above 0`, 'write for example 0.002');
}
