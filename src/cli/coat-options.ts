/** Rows of the table of options (options.ts) that say what a coating is designed with and for. */
import { countParser } from '../units/parse-count.ts';
import { parseFraction } from '../units/parse-fraction.ts';
import { isProblem, type Problem, problem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { type OptionSpec, value } from './option-spec.ts';

export const MOST_PAIRS = 200;

export const COAT_OPTION_ROWS = {
  limit: value({
    name: 'limit',
    placeholder: 'R',
    meaning: 'reflectance below which a band is wanted',
    fallback: '0.5%',
    group: 'coating',
    parse: parseFraction,
  }),
  films: value({
    name: 'films',
    placeholder: 'KEY,...',
    meaning: 'what to design with: materials, films or not, or numbers (n=1.38)',
    fallback: 'every film of the catalogue',
    group: 'coating',
    parse: (text: string) => nameList(text),
  }),
  highFilm: value({
    name: 'high',
    placeholder: 'KEY',
    meaning: 'material of the high-index layers of a reflector',
    fallback: 'the film of greatest index',
    group: 'coating',
    parse: oneName,
  }),
  lowFilm: value({
    name: 'low',
    placeholder: 'KEY',
    meaning: 'material of its low-index layers',
    fallback: 'the film of least index',
    group: 'coating',
    parse: oneName,
  }),
  pairs: value({
    name: 'pairs',
    placeholder: 'N',
    meaning: 'list the reflector up to so many pairs',
    fallback: 'as many as --reflect needs',
    group: 'coating',
    parse: countParser('a number of pairs', MOST_PAIRS),
  }),
  wantedReflectance: value({
    name: 'reflect',
    placeholder: 'R',
    meaning: 'reflectance wanted of the reflector',
    fallback: '99.5%',
    group: 'coating',
    parse: parseWanted,
  }),
} as const satisfies Readonly<Record<string, OptionSpec>>;

function nameList(text: string): readonly string[] | Problem {
  const names = text.split(',').map((name) => name.trim());
  return names.every((name) => name !== '')
    ? names
    : problem('empty', `${quoteInput(text)} has an empty name`, 'write KEY,KEY');
}

function oneName(text: string): string | Problem {
  return text.trim() === '' ? problem('empty', 'a name is missing', 'write the key of a film') : text.trim();
}

function parseWanted(text: string): number | Problem {
  const wanted = parseFraction(text);
  if (isProblem(wanted) || (wanted > 0 && wanted < 1)) return wanted;
  return problem(
    'out-of-range',
    `${quoteInput(text)} is no reflectance to aim at: no number of pairs reaches 1`,
    'write for example 99.5%',
  );
}
