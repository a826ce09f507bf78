/**
 * `halfspace FROM [LAYER ...] INTO [WAVE] --sweep NAME=FROM..TO:STEP`: the question at every point of a range, or of a grid of
 * several. Loaded by the command of the one question when a sweep or answer columns are asked.
 */
import { ByteWriter } from '../../batch/byte-writer.ts';
import type { Asking, QuestionColumn } from '../../batch/question-column.ts';
import {
  csvForm,
  type FormSetup,
  jsonForm,
  markdownForm,
  plainForm,
  type RowForm,
} from '../../batch/row-form.ts';
import type { ByteSource } from '../../batch/run-batch.ts';
import { SweepBatch, type SweepVariable, sweepVariable, variableName } from '../../batch/sweep-batch.ts';
import { pointText } from '../../batch/sweep-range.ts';
import { isRefusal, type Refusal, refuse } from '../../medium/refusal.ts';
import { parseThickness } from '../../units/parse-thickness.ts';
import { parseWave } from '../../units/parse-wave.ts';
import { isProblem } from '../../units/problem.ts';
import { quoteInput } from '../../units/quote-input.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { SWEPT_WAVE } from '../arguments.ts';
import { columnsAsked, fixedOptions, makeAsking } from '../asking.ts';
import type { Command } from '../context.ts';
import type { OptionValues } from '../options.ts';
import { isGroupMark } from '../read-path.ts';
import { readQuestion } from '../read-question.ts';
import { reportRefusal } from '../report-refusal.ts';
import { note, runRows } from '../run-rows.ts';

/** Digits of tables for the eye, where none are asked. */
const TABLE_DIGITS = 6;

export const run: Command = async ({ operands, options }, context) => {
  const other = ONE_ANSWER.find(({ key }) => options[key] !== undefined);
  if (other) {
    const message = `--${other.name} is for one answer, and a table is asked`;
    return reportRefusal(refuse('not-with-a-table', 2, message, `leave --${other.name} out`), context);
  }
  const catalogue = context.catalogue();
  const swept = (options.sweeps ?? []).map(({ name }) => name.toLowerCase());
  const sweepsWave = swept.some((name) => SWEPT_WAVE.includes(name));
  const media = sweepsWave ? operands : operands.slice(0, -1);
  const layers = media.slice(1, -1).filter((word) => !isGroupMark(word));
  const asking = withThickness(
    makeAsking(catalogue, (text) => note(context, options, text)),
    media,
    layers.length,
  );
  const clash = sweepsWave ? waveClash(operands) : undefined;
  if (clash) return reportRefusal(clash, context);
  const variables = readVariables(options, asking);
  if (isRefusal(variables)) return reportRefusal(variables, context);
  const columns = columnsAsked(options.columns, asking);
  if (isRefusal(columns)) return reportRefusal(columns, context);

  // What is wrong with the fixed parts is wrong with every point: it is told once, as of one question.
  const wave = sweepsWave ? firstWave(variables) : (operands.at(-1) ?? '');
  const question = await readQuestion([...media, wave], withoutSwept(options, variables), catalogue);
  if (isRefusal(question)) return reportRefusal(question, context);

  const table = options.markdown === true || options.plain === true;
  const writer = new ByteWriter(options.digits ?? (table ? TABLE_DIGITS : 0));
  const setup: FormSetup = {
    writer,
    names: variables.map(variableName),
    columns,
    marksOutside: options.extrapolate === true,
    whole: options.full === true,
    wording: context.ascii ? toAscii : (text) => text,
  };
  const [from = '', into = ''] = media;
  const waveText = sweepsWave ? undefined : wave;
  const texts =
    media.length === 2 ? { from, into, wave: waveText } : { path: media.join(' > '), wave: waveText };
  const batch = new SweepBatch({
    asking,
    variables,
    fixed: { texts, options: fixedOptions(options) },
    columns,
    form: formOf(options, setup, variables),
    whole: setup.whole,
  });
  return runRows(batch, writer, { paths: [], open: () => oneSource() }, options, context);
};

/** Options that say what becomes of one answer. */
const ONE_ANSWER = [
  { key: 'plot', name: 'plot' },
  { key: 'log', name: 'log' },
  { key: 'logFile', name: 'log-file' },
] as const;

/** A sweep reads nothing: its rows come when the input ends. */
async function* oneSource(): AsyncGenerator<ByteSource> {
  yield { read: () => Promise.resolve(undefined), plenty: () => false };
}

function readVariables(options: OptionValues, asking: Asking): readonly SweepVariable[] | Refusal {
  const variables: SweepVariable[] = [];
  for (const [field, range] of (options.sweeps ?? []).entries()) {
    const variable = sweepVariable(range, field, asking);
    if ('code' in variable) return refuse(variable.code, 2, variable.message, variable.remedy);
    const { column } = variable;
    if (variables.some((other) => other.column.key === column.key)) {
      return refuse('swept-twice', 2, `the ${column.name} is swept twice`, 'sweep it once');
    }
    if ((options as Readonly<Record<string, unknown>>)[column.key] !== undefined) {
      return refuse(
        'swept-and-given',
        2,
        `the ${column.name} is both swept and given`,
        `leave --${column.name} out`,
      );
    }
    variables.push(variable);
  }
  return variables;
}

function waveClash(operands: readonly string[]): Refusal | undefined {
  const last = operands.at(-1) ?? '';
  if (isProblem(parseWave(last))) return undefined;
  return refuse(
    'swept-and-given',
    2,
    `the wave is swept, and ${quoteInput(last)} is given too`,
    'leave it out',
  );
}

const firstWave = (variables: readonly SweepVariable[]): string => {
  const wave = variables.find(({ column }) => column.key === 'wave');
  return wave ? pointText(wave.range, 0) + wave.unit : '';
};

/** The options with the first point of what is swept in place, so that the question can be read as a whole. */
function withoutSwept(options: OptionValues, variables: readonly SweepVariable[]): OptionValues {
  const first = variables
    .filter(({ column }) => column.key !== 'wave' && !column.key.startsWith(THICKNESS))
    .map(({ column, range, unit }) => [column.key, column.parse(pointText(range, 0) + unit)]);
  return { ...options, ...Object.fromEntries(first) };
}

const THICKNESS = 'thickness';

/** `thickness` or `thickness1`, `thickness2` ...: the layers of the path, as typed, with another thickness. */
function withThickness(asking: Asking, media: readonly string[], layers: number): Asking {
  const places = media.flatMap((word, i) => (i > 0 && i < media.length - 1 && !isGroupMark(word) ? [i] : []));
  const columns = places.map((_, i): QuestionColumn => {
    const name = `${THICKNESS}${i + 1}`;
    return {
      key: name,
      name,
      aliases: layers === 1 ? [THICKNESS] : [],
      unitNames: 'nm, um, mm, cm, m, qw and hw',
      unit: (text) => (isProblem(parseThickness(`1${text}`)) ? undefined : text),
      parse(cell) {
        const thickness = parseThickness(cell);
        return isProblem(thickness) ? thickness : cell;
      },
    };
  });
  return {
    ...asking,
    columns: [...asking.columns, ...columns],
    answer(operands, options) {
      const rest: Record<string, unknown> = { ...options };
      const words = [...operands];
      for (const [i, place] of places.entries()) {
        const text = rest[`${THICKNESS}${i + 1}`];
        delete rest[`${THICKNESS}${i + 1}`];
        if (typeof text === 'string') words[place] = `${words[place]?.split('@')[0] ?? ''}@${text}`;
      }
      return asking.answer(words, rest);
    },
  };
}

function formOf(options: OptionValues, setup: FormSetup, variables: readonly SweepVariable[]): RowForm {
  if (options.json) return jsonForm(setup);
  if (options.markdown) return markdownForm(setup);
  if (!options.plain) return csvForm(setup);
  const widest = variables.map(({ range }) =>
    Math.max(pointText(range, 0).length, pointText(range, range.points - 1).length),
  );
  return plainForm(setup, widest);
}
