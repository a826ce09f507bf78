/**
 * `halfspace stream [FILE ...]`: a question a row, answered in order. What is wrong with the whole is told on standard error
 * and nothing is written; what is wrong with a row is told in its place, the others go on, and the status is 1.
 */
import { keysOf, SHORT_NAMES } from '../../batch/answer-columns.ts';
import type { BatchFormat, BatchSetup } from '../../batch/batch-format.ts';
import { ByteWriter } from '../../batch/byte-writer.ts';
import { CsvBatch } from '../../batch/csv-batch.ts';
import { JsonBatch } from '../../batch/json-batch.ts';
import type { Asking } from '../../batch/question-column.ts';
import type { ByteSource } from '../../batch/run-batch.ts';
import { isRefusal, type Refusal } from '../../medium/refusal.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { columnsAsked, fixedOptions, makeAsking, sampleAnswers } from '../asking.ts';
import { byteSource, openInput } from '../byte-streams.ts';
import type { Command, Context } from '../context.ts';
import { findMedium, suggestMedia } from '../find-medium.ts';
import type { OptionValues } from '../options.ts';
import { reportRefusal } from '../report-refusal.ts';
import { fileOf, note, type RowInputs, runRows } from '../run-rows.ts';

export const run: Command = async ({ operands, options }, context) => {
  const catalogue = context.catalogue();
  const tell = (text: string): void => note(context, options, text);
  const asking = makeAsking(catalogue, tell);
  if (options.columns === 'list') {
    context.write(columnList(asking));
    return 0;
  }
  const columns = columnsAsked(options.columns, asking);
  if (isRefusal(columns)) return reportRefusal(columns, context);
  const { fixedFrom, fixedInto, fixedPath, fixedWave } = options;
  for (const text of [fixedFrom, fixedInto]) {
    const medium = text === undefined ? undefined : findMedium(text, catalogue);
    if (text !== undefined && isRefusal(medium)) {
      return reportRefusal(await suggestMedia(medium, text, catalogue), context);
    }
  }
  const writer = new ByteWriter(options.digits);
  const setup: BatchSetup = {
    asking,
    fixed: {
      texts: { from: fixedFrom, into: fixedInto, path: fixedPath, wave: fixedWave },
      options: fixedOptions(options),
    },
    columns,
    writer,
    marksOutside: options.extrapolate === true,
    whole: options.full === true,
    wording: context.ascii ? toAscii : (text) => text,
    passedOn: (names) => tell(`columns passed on unread: ${names.join(', ')}`),
  };
  const format: BatchFormat = options.json ? new JsonBatch(setup) : new CsvBatch(setup);
  const paths = operands.length === 0 ? ['-'] : operands;
  const open: RowInputs['open'] = (failed) => inputs(paths, failed, context, options);
  return runRows(format, writer, { paths, open }, options, context);
};

/** The inputs one by one, each opened when its turn comes. */
async function* inputs(
  paths: readonly string[],
  failed: (refusal: Refusal) => void,
  context: Context,
  options: OptionValues,
): AsyncGenerator<ByteSource> {
  for (const path of paths) {
    const file = await fileOf(path, 'read', openInput);
    if (isRefusal(file)) return failed(file);
    if (path === '-' && context.stdinIsTTY)
      note(context, options, 'reading from the terminal; Ctrl-D ends it');
    yield byteSource(file.descriptor);
    await file.close();
  }
}

function columnList(asking: Asking): string {
  const width = Math.max(...SHORT_NAMES.map(([name]) => name.length)) + 2;
  const short = SHORT_NAMES.map(([name, key, meaning]) => `${name.padEnd(width)}${meaning} (${key})`);
  const keys = keysOf(sampleAnswers(asking));
  return `${['Short names:', ...short, '', 'Keys of the answer:', ...keys].join('\n')}\n`;
}
