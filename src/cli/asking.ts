/**
 * How batches and sweeps ask: the columns that a question has, from the table of options, and the answer to a row by the very
 * steps of the one-shot command.
 */
import type { Answer } from '../answer/answer.ts';
import { answerQuestion } from '../answer/answer-question.ts';
import type { MediumSpec } from '../answer/question.ts';
import { type AnswerColumn, answerColumns, DEFAULT_COLUMNS, keysOf } from '../batch/answer-columns.ts';
import type { Asking, QuestionColumn, RowOptions } from '../batch/question-column.ts';
import { axesOf } from '../catalog/choose-fit.ts';
import type { IndexedCatalogue } from '../catalog/entries.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { choiceParser } from '../units/parse-choice.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem, type Problem } from '../units/problem.ts';
import { findClash, SWEPT_WAVE } from './arguments.ts';
import { BEAM_OPTIONS, PATH_OPTIONS, QUESTION_OPTIONS, UNNAMED_COMMAND } from './command-table.ts';
import { findMedium } from './find-medium.ts';
import { nearest } from './nearest.ts';
import type { OptionSpec } from './option-spec.ts';
import { type OptionKey, type OptionValues, optionSpec } from './options.ts';
import { readQuestion } from './read-question.ts';

/** Options of a question that mean nothing row by row. */
const NOT_BY_ROW: readonly OptionKey[] = ['catalog', 'fieldProfile'];

const ALIASES: Readonly<Record<string, readonly string[]>> = {
  wave: SWEPT_WAVE.slice(1),
  polarization: ['polarization', 'polarisation'],
  angle_rad: ['angle-of-incidence', 'incidence'],
};

/** Options of a question, and so columns. */
export const ROW_OPTION_KEYS: readonly OptionKey[] = [
  ...QUESTION_OPTIONS,
  ...PATH_OPTIONS,
  ...BEAM_OPTIONS,
].filter((key) => !NOT_BY_ROW.some((other) => other === key));

export function questionColumns(): readonly QuestionColumn[] {
  const text = (key: string): QuestionColumn => ({
    key,
    name: key,
    aliases: ALIASES[key] ?? [],
    unit: () => undefined,
    unitNames: '',
    parse: (cell) => cell,
  });
  const wave: QuestionColumn = { ...text('wave'), ...units(readWave), parse: readWave };
  return [text('from'), text('into'), text('path'), wave, ...ROW_OPTION_KEYS.map(optionColumn)];
}

function optionColumn(key: OptionKey): QuestionColumn {
  const spec: OptionSpec = optionSpec(key);
  const parse = spec.kind === 'flag' ? parseTruth : spec.parse;
  return { key, name: spec.name, aliases: ALIASES[key] ?? [], ...units(parse), parse };
}

const readWave = (cell: string): unknown => parseWave(cell);

/** A unit is one that the parser takes behind a number. */
function units(parse: (cell: string) => unknown): Pick<QuestionColumn, 'unit' | 'unitNames'> {
  const unknown = parse('1 no-such-unit');
  const takesUnits = isProblem(unknown) && unknown.code === 'unit-unknown';
  return {
    unitNames: takesUnits ? unknown.remedy.replace(/^units are /, '') : '',
    unit(typed) {
      if (!takesUnits || typed === '') return undefined;
      const one = parse(`1${typed}`);
      return !isProblem(one) || one.code === 'out-of-range' ? typed : undefined;
    },
  };
}

const TRUTHS = ['true', 'yes', '1', 'false', 'no', '0'] as const;
const readTruth = choiceParser('a truth value', TRUTHS);

/** A flag that is not set is as good as not given. */
function parseTruth(cell: string): true | undefined | Problem {
  const word = readTruth(cell);
  if (isProblem(word)) return word;
  return word === 'true' || word === 'yes' || word === '1' ? true : undefined;
}

/** `assumed` is told once of each medium whose axis the rows leave open. */
export function makeAsking(
  catalogue: IndexedCatalogue,
  assumed: (sentence: string) => void = () => undefined,
): Asking {
  const told = new Set<string>();
  const tellAxis = (medium: MediumSpec): void => {
    if (medium.kind !== 'catalogue' || medium.axis !== undefined) return;
    const { key } = medium.material;
    const [first = '', ...others] = axesOf(medium.material);
    if (others.length === 0 || told.has(key)) return;
    told.add(key);
    assumed(`${key} names no axis: ${first} is taken (also: ${others.join(', ')}); write ${key}:${first}`);
  };
  // The search for names close to an unknown one takes longer than an answer, and such a name comes again.
  const unknown = new Map<string, Refusal>();
  return {
    columns: questionColumns(),
    nearest,
    medium(text) {
      const medium = findMedium(text, catalogue);
      if (isRefusal(medium)) return undefined;
      tellAxis(medium);
      return medium;
    },
    answer(operands, options) {
      const path = operands.slice(0, -1).join('\n');
      const known = unknown.get(path);
      if (known) return known;
      const clash = clashOf(options);
      if (clash) return clash;
      // Each value came out of the parser of its option, which is what OptionValues states.
      const question = readQuestion(operands, options as OptionValues, catalogue);
      if (question instanceof Promise) {
        return question.then((refusal) => {
          if (unknown.size > 1000) unknown.clear();
          if (refusal.code === 'unknown-medium') unknown.set(path, refusal);
          return refusal;
        });
      }
      if (isRefusal(question)) return question;
      for (const medium of [question.from, ...question.layers.map((l) => l.medium), question.into])
        tellAxis(medium);
      return answerQuestion(question, (id) => catalogue.source(id));
    },
  };
}

function clashOf(options: RowOptions): Refusal | undefined {
  const keys = Object.keys(options).filter((key) => options[key] !== undefined) as OptionKey[];
  const clash = findClash(
    keys.map((key) => ({ key })),
    UNNAMED_COMMAND,
  );
  return clash && refuse(clash.code, 2, clash.message, clash.remedy);
}

/** Answers that between them have every part an answer can have. */
export function sampleAnswers(asking: Asking): readonly Answer[] {
  const beam = { power_W: 1, beamDiameter_m: 1e-3, pulseDuration_s: 1e-13 };
  const samples: readonly (readonly [readonly string[], RowOptions])[] = [
    [['air', 'magnesium-fluoride-film@qw', 'n-bk7', '550nm'], { ...beam }],
    [['air', 'fused-silica@5mm', 'air', '1um'], { ...beam }],
    [['n-bk7', 'air', '600nm'], { angle_rad: 1, ...beam }],
    [['air', 'sapphire:o', '600nm'], {}],
  ];
  return samples.flatMap(([operands, options]) => {
    const answer = asking.answer(operands, options);
    return answer instanceof Promise || isRefusal(answer) ? [] : [answer];
  });
}

/** The answer columns that `--columns` names. */
export function columnsAsked(typed: string | undefined, asking: Asking): readonly AnswerColumn[] | Refusal {
  const columns = answerColumns(
    typed ?? DEFAULT_COLUMNS.join(','),
    () => keysOf(sampleAnswers(asking)),
    asking.nearest,
  );
  return 'code' in columns ? refuse(columns.code, 2, columns.message, columns.remedy) : columns;
}

/** Options of the command line that hold for every row. */
export function fixedOptions(options: OptionValues): RowOptions {
  return Object.fromEntries(
    ROW_OPTION_KEYS.flatMap((key) => (options[key] === undefined ? [] : [[key, options[key]]])),
  );
}
