/**
 * The one table of options. A key is what the option's value is called in the program, unit included; `name` is what
 * people type. To add an option: add its row, and its key to the rows of the commands that take it (command-table.ts). Rows
 * of paths and beams stand in beam-options.ts, those of choosing among media in selection-options.ts.
 */
import { parseIncidence } from '../units/parse-angle.ts';
import { choiceParser } from '../units/parse-choice.ts';
import { parseCo2 } from '../units/parse-co2.ts';
import { parseFraction } from '../units/parse-fraction.ts';
import { parsePressure } from '../units/parse-pressure.ts';
import { parseSalinity } from '../units/parse-salinity.ts';
import { parseTemperature } from '../units/parse-temperature.ts';
import { parseTolerances } from '../units/parse-tolerance.ts';
import { type Problem, problem } from '../units/problem.ts';
import { BATCH_OPTION_ROWS } from './batch-options.ts';
import { BEAM_OPTION_ROWS, PATH_OPTION_ROWS } from './beam-options.ts';
import { COAT_OPTION_ROWS } from './coat-options.ts';
import { CRYSTAL_OPTION_ROWS } from './crystal-options.ts';
import { FIT_OPTION_ROWS } from './fit-options.ts';
import { GLASS_OPTION_ROWS } from './glass-options.ts';
import { LOG_OPTION_ROWS } from './log-options.ts';
import { choice, flag, type OptionSpec, type ValueOf, value } from './option-spec.ts';
import { PLOT_OPTION_ROWS } from './plot-options.ts';
import { SELECTION_OPTION_ROWS } from './selection-options.ts';

const POLARIZATIONS = ['s', 'p', 'unpolarized'] as const;
const COLOURS = ['auto', 'always', 'never'] as const;

export const OPTIONS = {
  angle_rad: value({
    name: 'angle',
    placeholder: 'ANGLE',
    meaning: 'angle of incidence, from the surface normal; degrees, or with a unit: 0.78rad, 30mrad',
    fallback: '0',
    group: 'question',
    parse: parseIncidence,
  }),
  polarization: choice({
    name: 'pol',
    choices: POLARIZATIONS,
    meaning: 'polarization; unpolarized is the mean of s and p',
    fallback: 'unpolarized',
    group: 'question',
    parse: choiceParser('a polarization', POLARIZATIONS),
  }),
  airWavelength: flag({
    name: 'air-wavelength',
    meaning: 'the WAVE given is a wavelength in standard air, not in vacuum',
    group: 'question',
  }),
  temperature_K: value({
    name: 'temperature',
    placeholder: 'TEMPERATURE',
    meaning: 'temperature of the media, such as 25C or 298.15K',
    fallback: 'that of the recommended fit',
    group: 'question',
    parse: parseTemperature,
  }),
  pressure_Pa: value({
    name: 'pressure',
    placeholder: 'PRESSURE',
    meaning: 'pressure of a gas, such as 101.325kPa, 1atm or 980hPa',
    fallback: '101325Pa',
    group: 'question',
    parse: parsePressure,
  }),
  humidity: value({
    name: 'humidity',
    placeholder: 'FRACTION',
    meaning: 'relative humidity of air, such as 50% or 0.5',
    fallback: '0',
    group: 'question',
    parse: parseFraction,
  }),
  co2_ppm: value({
    name: 'co2',
    placeholder: 'CONTENT',
    meaning: 'CO2 content of air in umol/mol (1e-6)',
    fallback: '450',
    group: 'question',
    parse: parseCo2,
  }),
  salinity_g_per_kg: value({
    name: 'salinity',
    placeholder: 'SALINITY',
    meaning: 'salt in sea water, in g/kg',
    fallback: 'that of the recommended fit',
    group: 'question',
    parse: parseSalinity,
  }),
  composition: value({
    name: 'composition',
    placeholder: 'FRACTION',
    meaning: 'share of the second constituent of a mixture, as its fit says, such as 30% or 0.3',
    fallback: 'that of the recommended fit',
    group: 'question',
    parse: parseFraction,
  }),
  tolerances: value({
    name: 'tolerance',
    placeholder: 'NAME=VALUE,...',
    meaning:
      'standard uncertainties of what is given: wave=1nm, angle=0.5deg, n=1e-4 (beyond), n1=1e-4 (before), nlayer=0.01 (each layer between), thickness=5nm or 1% (each layer on its own), temperature=0.5C',
    group: 'question',
    parse: parseTolerances,
  }),
  extrapolate: flag({
    name: 'extrapolate',
    meaning: "answer outside a fit's range too, with the caution",
    group: 'question',
  }),

  ...PATH_OPTION_ROWS,
  ...CRYSTAL_OPTION_ROWS,
  ...COAT_OPTION_ROWS,
  ...BEAM_OPTION_ROWS,
  ...SELECTION_OPTION_ROWS,
  ...FIT_OPTION_ROWS,
  ...GLASS_OPTION_ROWS,
  ...BATCH_OPTION_ROWS,
  ...GLASS_OPTION_ROWS,

  json: flag({
    name: 'json',
    meaning: 'one JSON document, SI units, full precision',
    group: 'form',
    excludes: ['csv', 'markdown', 'latex', 'plain', 'text', 'bibtex', 'csl'],
  }),
  csv: flag({
    name: 'csv',
    meaning: 'comma-separated values with a header line',
    group: 'form',
    excludes: ['json', 'markdown', 'latex', 'plain'],
  }),
  markdown: flag({
    name: 'markdown',
    meaning: 'a Markdown table',
    group: 'form',
    excludes: ['json', 'csv', 'latex', 'plain'],
  }),
  plain: flag({
    name: 'plain',
    meaning: 'one quantity a line, never wrapped or cut',
    group: 'form',
    excludes: ['json', 'csv', 'markdown', 'latex', 'text', 'bibtex', 'csl'],
  }),

  text: flag({
    name: 'text',
    meaning: 'text for people, which is what comes without it',
    group: 'form',
    excludes: ['json', 'plain', 'bibtex', 'csl'],
  }),
  bibtex: flag({
    name: 'bibtex',
    meaning: 'BibTeX entries',
    group: 'form',
    excludes: ['json', 'plain', 'text', 'csl'],
  }),
  csl: flag({
    name: 'csl',
    meaning: 'a CSL-JSON list of works, as reference managers read it',
    group: 'form',
    excludes: ['json', 'plain', 'text', 'bibtex'],
  }),
  full: flag({
    name: 'full',
    meaning:
      'everything: every check value, every coefficient, every row of absorption, every number of a record',
    group: 'form',
  }),

  output: value({
    name: 'output',
    short: 'o',
    placeholder: 'FILE',
    meaning: 'write to FILE instead of standard output; - is standard output',
    group: 'output',
    everywhere: true,
    completes: 'file',
    parse: parsePath,
  }),
  ...LOG_OPTION_ROWS,
  ...PLOT_OPTION_ROWS,
  quiet: flag({
    name: 'quiet',
    short: 'q',
    meaning: 'no cautions or notes on standard error',
    group: 'output',
    everywhere: true,
  }),
  strict: flag({ name: 'strict', meaning: 'a caution makes the exit status 1', group: 'output' }),
  color: choice({
    name: 'color',
    choices: COLOURS,
    meaning: 'when the full-screen program uses colour; all else has none',
    fallback: 'auto',
    group: 'output',
    everywhere: true,
    parse: choiceParser('a time for colour', COLOURS),
    excludes: ['no-color'],
  }),
  noColor: flag({
    name: 'no-color',
    meaning: 'the same as --color=never',
    group: 'output',
    everywhere: true,
    excludes: ['color'],
  }),
  ascii: flag({
    name: 'ascii',
    meaning: 'only printable ASCII: um, deg, +/-, lambda',
    group: 'output',
    everywhere: true,
  }),
  linear: flag({
    name: 'linear',
    meaning: 'plain lines in place of the picture, for screen readers',
    group: 'output',
    everywhere: true,
  }),

  catalog: value({
    name: 'catalog',
    placeholder: 'FOLDER',
    meaning: 'folder with entries of your own, used beside the catalogue',
    group: 'general',
    completes: 'folder',
    parse: parsePath,
  }),
  noInput: flag({
    name: 'no-input',
    meaning: 'ask nothing; fail where a question would be needed',
    group: 'general',
    everywhere: true,
  }),
  help: flag({ name: 'help', short: 'h', meaning: 'show this help', group: 'general', everywhere: true }),
  version: flag({
    name: 'version',
    short: 'V',
    meaning: 'show the versions of program and catalogue',
    group: 'general',
    everywhere: true,
  }),

  names: value({
    name: 'names',
    placeholder: 'PREFIX',
    meaning: 'list the catalogue keys that begin so, one a line',
    group: 'general',
    hidden: true,
    parse: (text: string) => text,
  }),
} as const satisfies Readonly<Record<string, OptionSpec>>;

export type OptionKey = keyof typeof OPTIONS;

/** Parsed values of the options given, by key; absent where not given. */
export type OptionValues = { readonly [Key in OptionKey]?: ValueOf<(typeof OPTIONS)[Key]> };

export const OPTION_KEYS = Object.keys(OPTIONS) as readonly OptionKey[];

export function optionSpec(key: OptionKey): OptionSpec {
  return OPTIONS[key];
}

export function optionKeyByName(name: string): OptionKey | undefined {
  return OPTION_KEYS.find((key) => OPTIONS[key].name === name);
}

export function optionKeyByLetter(letter: string): OptionKey | undefined {
  return OPTION_KEYS.find((key) => optionSpec(key).short === letter);
}

function parsePath(text: string): string | Problem {
  return text === '' || text.includes('\0')
    ? problem('empty', 'the name is empty or holds a null character', 'write a path such as answer.json')
    : text;
}
