/** From operands and options to the criteria of a search, or to the refusal that says what is not understood. */
import type { IndexedCatalogue } from '../catalog/entries.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { type Criteria, NO_CRITERIA } from '../selection/criteria.ts';
import { parseConditions } from '../selection/parse-conditions.ts';
import { parseClass, parseExclusion } from '../selection/parse-exclusion.ts';
import { isProblem, type Problem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import type { OptionValues } from './options.ts';
import { readWave } from './read-question.ts';

/** `operands`: words and conditions in the language of the search box. */
export function readCriteria(
  operands: readonly string[],
  options: OptionValues,
  catalogue: IndexedCatalogue,
): Criteria | Refusal {
  const classes = classesOf(catalogue);
  const read = readOperands(operands.join(' '), classes);
  if (isRefusal(read)) return read;
  // A wavelength among the conditions is one in air too where the option says so.
  const wave = read.wave && readWave(read.wave.text, options);
  if (isRefusal(wave)) return wave;
  const typed: Criteria = wave ? { ...read, wave } : read;
  const stated = readOptions(options, classes);
  if (isRefusal(stated)) return stated;
  const twice = givenTwice(typed, stated);
  if (twice) {
    return refuse(
      'given-twice',
      2,
      `${twice} is given as an option and among the conditions`,
      'give it once',
    );
  }
  return {
    ...typed,
    ...stated,
    ranges: { ...typed.ranges, ...stated.ranges },
    words: typed.words,
    classes: [...typed.classes, ...stated.classes],
    not: [...typed.not, ...stated.not],
  };
}

/** In the order of the catalogue, each once. */
export const classesOf = (catalogue: IndexedCatalogue): readonly string[] => [
  ...new Set(catalogue.entries().map((entry) => entry.class)),
];

function readOperands(text: string, classes: readonly string[]): Criteria | Refusal {
  const { criteria, parts } = parseConditions(text, { classes });
  const open = parts.find((part) => part.kind !== 'condition' && (part.kind !== 'word' || part.remedy));
  if (!open) return criteria;
  const lone = /\d/.test(open.text) ? 'stands without a keyword' : 'needs a value';
  const message = open.kind === 'word' ? `${quoteInput(open.text)} ${lone}` : open.text;
  return refuse('bad-condition', 2, message, open.remedy ?? 'see halfspace find --help');
}

/** `class`, `not` and the ranges that options state; classes and exclusions checked against the catalogue. */
export function readOptions(options: OptionValues, classes: readonly string[]): Criteria | Refusal {
  const refused = (problem: Problem): Refusal => refuse('bad-condition', 2, problem.message, problem.remedy);
  const wave = options.at && readWave(options.at.text, options);
  if (isRefusal(wave)) return wave;
  for (const text of options.classNames ?? []) {
    const name = parseClass(text, classes);
    if (isProblem(name)) return refused(name);
  }
  for (const exclusion of options.not ?? []) {
    const known = exclusion.kind === 'class' ? parseExclusion(exclusion.text, classes) : exclusion;
    if (isProblem(known)) return refused(known);
  }
  const { indexRange, groupIndexRange, gvdRange, birefringenceRange, abbeRange } = options;
  return {
    ...NO_CRITERIA,
    ...(wave && { wave }),
    ...(options.clear_m && { clear_m: options.clear_m }),
    ...(options.maxLoss !== undefined && { maxLoss: options.maxLoss }),
    ...(options.thickness_m !== undefined && { thickness_m: options.thickness_m }),
    ...(options.temperature_K !== undefined && { temperature_K: options.temperature_K }),
    ranges: {
      ...(indexRange && { n: indexRange }),
      ...(groupIndexRange && { groupIndex: groupIndexRange }),
      ...(gvdRange && { gvd_s2_per_m: gvdRange }),
      ...(birefringenceRange && { birefringence: birefringenceRange }),
      ...(abbeRange && { abbe: abbeRange }),
    },
    classes: options.classNames ?? [],
    not: options.not ?? [],
  };
}

function givenTwice(typed: Criteria, stated: Criteria): string | undefined {
  const range = Object.keys(typed.ranges).find((measure) => measure in stated.ranges);
  if (range !== undefined) return range === 'gvd_s2_per_m' ? 'gvd' : range;
  if (typed.wave && stated.wave) return 'the wave';
  if (typed.clear_m && stated.clear_m) return 'clear';
  if (typed.maxLoss !== undefined && stated.maxLoss !== undefined) return 'the loss';
  return typed.thickness_m !== undefined && stated.thickness_m !== undefined ? 'the thickness' : undefined;
}
