/**
 * `halfspace stream [FILE ...]`: a question a row, answered in order. What is wrong with the whole is told on standard error
 * and nothing is written; what is wrong with a row is told in its place, the others go on, and the status is 1.
 */
import {
  type AnswerColumn,
  answerColumns,
  DEFAULT_COLUMNS,
  keysOf,
  SHORT_NAMES,
} from '../../batch/answer-columns.ts';
import type { BatchFormat, BatchSetup } from '../../batch/batch-format.ts';
import { ByteWriter } from '../../batch/byte-writer.ts';
import { CsvBatch } from '../../batch/csv-batch.ts';
import { JsonBatch } from '../../batch/json-batch.ts';
import type { Asking } from '../../batch/question-column.ts';
import type { FixedParts } from '../../batch/row-layout.ts';
import { type BatchControl, type ByteSource, runBatch } from '../../batch/run-batch.ts';
import { isRefusal, type Refusal, refuse } from '../../medium/refusal.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { makeAsking, rowOptionKeys, sampleAnswers } from '../asking.ts';
import { byteSink, byteSource, fileIdentity, openInput, openOutput } from '../byte-streams.ts';
import type { Command, Context, ExitStatus } from '../context.ts';
import { findMedium, suggestMedia } from '../find-medium.ts';
import { holdInterrupts } from '../interrupt.ts';
import type { OptionValues } from '../options.ts';
import { reportRefusal } from '../report-refusal.ts';

const ROWS_FAILED = 1;

export const run: Command = async ({ operands, options }, context) => {
  const catalogue = context.catalogue();
  const asking = makeAsking(catalogue);
  if (options.columns === 'list') {
    context.write(columnList(asking));
    return 0;
  }
  const columns = answerColumns(
    options.columns ?? DEFAULT_COLUMNS.join(','),
    () => keysOf(sampleAnswers(asking)),
    asking.nearest,
  );
  if ('code' in columns)
    return reportRefusal(refuse(columns.code, 2, columns.message, columns.remedy), context);
  for (const text of [options.fixedFrom, options.fixedInto]) {
    const medium = text === undefined ? undefined : findMedium(text, catalogue);
    if (text !== undefined && isRefusal(medium)) {
      return reportRefusal(await suggestMedia(medium, text, catalogue), context);
    }
  }
  return answerFiles(operands.length === 0 ? ['-'] : operands, columns, asking, options, context);
};

async function answerFiles(
  paths: readonly string[],
  columns: readonly AnswerColumn[],
  asking: Asking,
  options: OptionValues,
  context: Context,
): Promise<ExitStatus> {
  const output = await fileOf(options.output ?? '-', 'written', openOutput);
  if (isRefusal(output)) return reportRefusal(output, context);
  const writer = new ByteWriter(options.digits);
  const setup: BatchSetup = {
    asking,
    fixed: fixedParts(options),
    columns,
    writer,
    marksOutside: options.extrapolate === true,
    whole: options.full === true,
    wording: context.ascii ? toAscii : (text) => text,
    passedOn: (names) => note(context, options, `columns passed on unread: ${names.join(', ')}`),
  };
  const format: BatchFormat = options.json === true ? new JsonBatch(setup) : new CsvBatch(setup);
  const interrupt = holdInterrupts();
  const progress = progressOn(context, options);
  const control: BatchControl = {
    interrupted: interrupt.interrupted,
    onInterrupt: interrupt.onInterrupt,
    turn: () => new Promise((resolve) => setImmediate(resolve)),
    progress: progress.show,
  };
  let trouble: Refusal | undefined;
  const failed = (refusal: Refusal): void => {
    trouble = refusal;
  };
  const sources = inputs(paths, fileIdentity(output.descriptor), failed, context, options);
  const end = await runBatch(format, writer, sources, byteSink(output.descriptor), control).catch((error) => {
    failed(streamTrouble(error));
    return 'fatal' as const;
  });
  progress.clear();
  await output.close();
  if (end === 'interrupted') return interrupt.passOn();
  interrupt.release();
  if (end === 'reader-gone') return 0;
  if (format.fatal) {
    const { code, message, remedy } = format.fatal;
    return reportRefusal(refuse(code, 2, message, remedy), context);
  }
  if (trouble) return reportRefusal(trouble, context);
  if (format.failed === 0) return 0;
  note(context, options, `${format.failed} of ${format.rows} rows not answered; the column error says why`);
  return ROWS_FAILED;
}

/** The inputs one by one, each opened when its turn comes. */
async function* inputs(
  paths: readonly string[],
  written: string | undefined,
  failed: (refusal: Refusal) => void,
  context: Context,
  options: OptionValues,
): AsyncGenerator<ByteSource> {
  for (const path of paths) {
    const file = await fileOf(path, 'read', openInput);
    if (isRefusal(file)) return failed(file);
    if (written !== undefined && written === fileIdentity(file.descriptor)) {
      const message = `${path} is both read and written`;
      return failed(refuse('same-file', 4, message, 'write to another file, then rename it'));
    }
    if (path === '-' && context.stdinIsTTY)
      note(context, options, 'reading from the terminal; Ctrl-D ends it');
    yield byteSource(file.descriptor);
    await file.close();
  }
}

async function fileOf<File>(
  path: string,
  done: 'read' | 'written',
  open: (path: string) => Promise<File>,
): Promise<File | Refusal> {
  try {
    return await open(path);
  } catch (error) {
    const why = (error as NodeJS.ErrnoException).code ?? 'unknown error';
    return refuse('file-trouble', 4, `${path} cannot be ${done} (${why})`, 'name a file you have access to');
  }
}

/** What the system says in the middle of a stream. Anything else is no trouble of files and is thrown. */
function streamTrouble(error: unknown): Refusal {
  const { code, syscall } = error as NodeJS.ErrnoException;
  if (code === undefined || syscall === undefined) throw error;
  if (code === 'EISDIR')
    return refuse('file-trouble', 4, 'a folder is named as input', 'name the files in it');
  return refuse(
    'file-trouble',
    4,
    `the ${syscall} failed (${code})`,
    'see that the disk has room and the file is there',
  );
}

function fixedParts(options: OptionValues): FixedParts {
  const values: Record<string, unknown> = {};
  for (const key of rowOptionKeys()) if (options[key] !== undefined) values[key] = options[key];
  const { fixedFrom, fixedInto, fixedPath, fixedWave } = options;
  return { texts: { from: fixedFrom, into: fixedInto, path: fixedPath, wave: fixedWave }, options: values };
}

function note(context: Context, options: OptionValues, text: string): void {
  const line = `halfspace: ${text}\n`;
  if (!options.quiet) context.warn(context.ascii ? toAscii(line.trimEnd()) + '\n' : line);
}

const PROGRESS_EVERY_ms = 250;

/** Rows done, on a terminal that shows nothing else. */
function progressOn(
  context: Context,
  options: OptionValues,
): { show: (rows: number) => void; clear: () => void } {
  const on = context.stderrIsTTY && !context.stdoutIsTTY && !context.stdinIsTTY && !options.quiet;
  if (!on) return { show: () => undefined, clear: () => undefined };
  const start_ms = context.clock().now_ms;
  let last_ms = start_ms;
  let width = 0;
  return {
    show(rows) {
      const now_ms = context.clock().now_ms;
      if (now_ms - last_ms < PROGRESS_EVERY_ms) return;
      last_ms = now_ms;
      const text = `${rows} rows, ${Math.round((rows / (now_ms - start_ms)) * 1000)} per second`;
      context.warn(`\r${text.padEnd(width)}`);
      width = text.length;
    },
    clear: () => context.warn(width > 0 ? `\r${' '.repeat(width)}\r` : ''),
  };
}

function columnList(asking: Asking): string {
  const width = Math.max(...SHORT_NAMES.map(([name]) => name.length)) + 2;
  const short = SHORT_NAMES.map(([name, key, meaning]) => `${name.padEnd(width)}${meaning} (${key})`);
  const keys = keysOf(sampleAnswers(asking));
  return `${['Short names:', ...short, '', 'Keys of the answer:', ...keys].join('\n')}\n`;
}
