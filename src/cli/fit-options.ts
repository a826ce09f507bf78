/** Options of the fit to measured points, for the table of options. */
import { KEY_PATTERN } from '../catalog/key-pattern.ts';
import { choiceParser } from '../units/parse-choice.ts';
import { type Problem, problem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { choice, flag, value } from './option-spec.ts';

const MODELS = ['sellmeier', 'cauchy'] as const;
const REFERENCES = ['air', 'vacuum'] as const;

export const FIT_OPTION_ROWS = {
  model: choice({
    name: 'model',
    choices: MODELS,
    meaning: 'formula to fit',
    fallback: 'sellmeier',
    group: 'fit',
    parse: choiceParser('a formula that is fitted here', MODELS),
  }),
  terms: value({
    name: 'terms',
    placeholder: 'N',
    meaning: 'terms of the formula: 1 to 4 for sellmeier, 2 to 5 for cauchy',
    fallback: '2',
    group: 'fit',
    parse: parseTerms,
  }),
  reference: choice({
    name: 'reference',
    choices: REFERENCES,
    meaning: 'what index and wavelength of the points are relative to',
    fallback: 'what the file states, else air',
    group: 'fit',
    parse: choiceParser('a reference', REFERENCES),
  }),
  key: value({
    name: 'key',
    placeholder: 'KEY',
    meaning: 'key of the entry to write',
    fallback: 'the name of the file',
    group: 'fit',
    parse: parseKey,
  }),
  entryName: value({
    name: 'name',
    placeholder: 'TEXT',
    meaning: 'name of the entry to write',
    fallback: 'what the file states, else the key',
    group: 'fit',
    parse: parseText,
  }),
  entrySource: value({
    name: 'source',
    placeholder: 'TEXT',
    meaning: 'who measured the points, where and when',
    fallback: 'what the file states',
    group: 'fit',
    parse: parseText,
  }),
  force: flag({ name: 'force', meaning: 'write over a file that is there', group: 'output' }),
};

function parseTerms(text: string): number | Problem {
  return /^[1-9]$/.test(text.trim())
    ? Number(text)
    : problem('not-a-number', `${quoteInput(text)} is no number of terms`, 'write a whole number such as 3');
}

function parseKey(text: string): string | Problem {
  return new RegExp(KEY_PATTERN).test(text)
    ? text
    : problem(
        'not-a-choice',
        `${quoteInput(text)} is no key`,
        'write lower-case letters, digits and single hyphens, such as my-oil',
      );
}

function parseText(text: string): string | Problem {
  return text.trim() === '' || /\p{Cc}/u.test(text)
    ? problem('empty', 'the text is empty or holds a control character', 'write a text in quotation marks')
    : text.trim();
}
