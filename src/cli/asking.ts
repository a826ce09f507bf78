/**
 * How batches and sweeps ask: the columns that a question has, from the table of options, and the answer to a row by the very
 * steps of the one-shot command.
 */
import type { Answer } from '../answer/answer.ts';
import { answerQuestion } from '../answer/answer-question.ts';
import type { Asking, QuestionColumn, RowOptions } from '../batch/question-column.ts';
import type { IndexedCatalogue } from '../catalog/entries.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { choiceParser } from '../units/parse-choice.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem, type Problem } from '../units/problem.ts';
import { findClash } from './arguments.ts';
import { optionsOf, UNNAMED_COMMAND } from './command-table.ts';
import { findMedium } from './find-medium.ts';
import { nearest } from './nearest.ts';
import type { OptionGroup, OptionSpec } from './option-spec.ts';
import { type OptionKey, type OptionValues, optionSpec } from './options.ts';
import { readQuestion } from './read-question.ts';

/** Options of a question that mean nothing row by row. */
const NOT_BY_ROW: readonly OptionKey[] = ['catalog', 'fieldProfile'];

const OTHER_GROUPS: readonly OptionGroup[] = ['form', 'output', 'batch', 'general'];

const ALIASES: Readonly<Record<string, readonly string[]>> = {
  wave: ['wavelength', 'frequency', 'wavenumber', 'photon-energy'],
  polarization: ['polarization', 'polarisation'],
  angle_rad: ['angle-of-incidence', 'incidence'],
};

/** Options of a question, and so columns: all that do not say in which form the answer comes. */
export function rowOptionKeys(): readonly OptionKey[] {
  return optionsOf(UNNAMED_COMMAND).filter((key) => {
    const { group, everywhere } = optionSpec(key);
    return !everywhere && !OTHER_GROUPS.includes(group) && !NOT_BY_ROW.includes(key);
  });
}

export function questionColumns(): readonly QuestionColumn[] {
  const text = (key: string): QuestionColumn => ({
    key,
    name: key,
    aliases: ALIASES[key] ?? [],
    unit: () => undefined,
    unitNames: '',
    parse: (cell) => cell,
  });
  const wave: QuestionColumn = { ...text('wave'), ...units((cell) => parseWave(cell)) };
  return [text('from'), text('into'), text('path'), wave, ...rowOptionKeys().map(optionColumn)];
}

function optionColumn(key: OptionKey): QuestionColumn {
  const spec: OptionSpec = optionSpec(key);
  const parse = spec.kind === 'flag' ? parseTruth : spec.parse;
  return { key, name: spec.name, aliases: ALIASES[key] ?? [], ...units(parse), parse };
}

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

export function makeAsking(catalogue: IndexedCatalogue): Asking {
  // The search for names close to an unknown one takes longer than an answer, and such a name comes again.
  const unknown = new Map<string, Refusal>();
  return {
    columns: questionColumns(),
    nearest,
    medium(text) {
      const medium = findMedium(text, catalogue);
      return isRefusal(medium) ? undefined : medium;
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
      return isRefusal(question) ? question : answerQuestion(question, (id) => catalogue.source(id));
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
