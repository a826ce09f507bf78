/** What is to be left out: a property ("hygroscopic", "toxic", "hazardous") or a class ("metal", "films"). */
import { type Problem, problem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { EXCLUDABLE, type Exclusion } from './criteria.ts';
import { matchesClass } from './material-class.ts';

/** `classes`: those of the catalogue; where absent any other word passes as a class. */
export function parseExclusion(text: string, classes?: readonly string[]): Exclusion | Problem {
  const typed = text.trim().toLowerCase();
  const property = EXCLUDABLE.find((word) => word === typed);
  if (property) return { kind: 'property', property };
  if (typed !== '' && (!classes || classes.some((c) => matchesClass(typed, c)))) {
    return { kind: 'class', text: typed };
  }
  const what = typed === '' ? 'nothing to leave out is named' : `${quoteInput(text)} is nothing to leave out`;
  return problem('not-a-choice', what, `write ${EXCLUDABLE.join(', ')} or a class, such as metal`);
}

/** A class by any word of it; `classes` are those of the catalogue. */
export function parseClass(text: string, classes: readonly string[]): string | Problem {
  const typed = text.trim().toLowerCase();
  if (typed !== '' && classes.some((c) => matchesClass(typed, c))) return typed;
  return problem(
    'not-a-choice',
    typed === '' ? 'a class is missing' : `there is no class ${quoteInput(text)}`,
    `name one by a word of it: ${commonWords(classes).join(', ')}; words of names stand by themselves`,
  );
}

/** The nouns of the classes: glass, crystal, liquid ... */
const commonWords = (classes: readonly string[]): readonly string[] => [
  ...new Set(classes.map((c) => c.split(' ').at(-1) ?? c)),
];
