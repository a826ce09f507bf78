/** Runs a batch or a sweep to its end: output opened, signals held, progress shown, what is wrong told, the status given. */
import type { BatchFormat } from '../batch/batch-format.ts';
import type { ByteWriter } from '../batch/byte-writer.ts';
import { type BatchControl, type ByteSource, runBatch } from '../batch/run-batch.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { toAscii } from '../units/to-ascii.ts';
import { byteSink, emptyFile, isSameFile, openOutput } from './byte-streams.ts';
import type { Context, ExitStatus } from './context.ts';
import { holdInterrupts } from './interrupt.ts';
import type { OptionValues } from './options.ts';
import { reportRefusal } from './report-refusal.ts';

const ROWS_FAILED = 1;

/** Where the rows come from. */
export interface RowInputs {
  /** The files that are read; `-` is standard input. */
  readonly paths: readonly string[];
  /** Opened one by one; `failed` ends the batch with what is wrong. */
  readonly open: (failed: (refusal: Refusal) => void) => AsyncIterable<ByteSource>;
}

export async function runRows(
  format: BatchFormat,
  writer: ByteWriter,
  inputs: RowInputs,
  options: OptionValues,
  context: Context,
): Promise<ExitStatus> {
  const output = await fileOf(options.output ?? '-', 'written', openOutput);
  if (isRefusal(output)) return reportRefusal(output, context);
  const same =
    options.output !== undefined && inputs.paths.find((path) => isSameFile(path, output.descriptor));
  if (same) {
    await output.close();
    const message = `${same === '-' ? 'standard input' : same} is both read and written`;
    return reportRefusal(refuse('same-file', 4, message, 'write to another file, then rename it'), context);
  }
  if (options.output !== undefined) emptyFile(output.descriptor);
  const interrupt = holdInterrupts();
  const progress = progressOn(inputs.paths, context, options);
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
  const end = await runBatch(format, writer, inputs.open(failed), byteSink(output.descriptor), control).catch(
    (error) => {
      failed(streamTrouble(error));
      return 'fatal' as const;
    },
  );
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

export async function fileOf<File>(
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
  const message = `the ${syscall} failed (${code})`;
  return refuse('file-trouble', 4, message, 'see that the disk has room and the file is there');
}

/** A line on standard error, unless --quiet. */
export function note(context: Context, options: OptionValues, text: string): void {
  if (options.quiet) return;
  const line = `halfspace: ${text}`;
  context.warn(`${context.ascii ? toAscii(line) : line}\n`);
}

const PROGRESS_EVERY_ms = 250;

/** Rows done, on a terminal on which neither answers appear nor questions are typed. */
function progressOn(
  paths: readonly string[],
  context: Context,
  options: OptionValues,
): { show: (rows: number) => void; clear: () => void } {
  const showsAnswers = context.stdoutIsTTY && (options.output ?? '-') === '-';
  const isTyped = context.stdinIsTTY && paths.includes('-');
  const on = context.stderrIsTTY && !showsAnswers && !isTyped && !options.quiet;
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
