/**
 * `--log`: the answer becomes a record in the logbook. It is called logged only when it is on the disk; where it is not, the
 * record is shown, so that nothing is lost.
 */
import type { Answer } from '../../answer/answer.ts';
import type { Question } from '../../answer/question.ts';
import { isRefusal, type Refusal } from '../../medium/refusal.ts';
import { answerRecord } from '../../record/answer-record.ts';
import { keepRecord } from '../../record/logbook.ts';
import { placeOfLogbook } from '../../record/logbook-place.ts';
import { usesOwnEntries } from '../../record/question-echo.ts';
import type { LogRecord } from '../../record/record.ts';
import { recordMarkdown } from '../../record/record-markdown.ts';
import { harmless } from '../../record/record-parts.ts';
import { recordText } from '../../record/record-text.ts';
import { timeStamp } from '../../record/time-stamp.ts';
import type { Invocation } from '../arguments.ts';
import type { Context, ExitStatus } from '../context.ts';
import { reportRefusal } from '../report-refusal.ts';
import { recordedCommand } from './recorded-command.ts';

/** 0 where the record is kept, else the status of the trouble. The answer itself is written already. */
export function keepAnswer(
  question: Question,
  answer: Answer,
  invocation: Invocation,
  context: Context,
): ExitStatus {
  const record = recordOf(question, answer, invocation, context);
  const place = placeOfLogbook(context.env, invocation.options.logFile);
  const kept = isRefusal(place) ? place : keepRecord(place, record);
  if (isRefusal(kept)) return showInstead(record, kept, invocation, context);
  if (invocation.options.quiet) return 0;
  const file = harmless(kept.path, { ascii: context.ascii });
  context.warn(`logged as ${record.id} in ${file}\n`);
  if (kept.afterUnfinishedLine)
    context.warn(`halfspace: the line before it was cut off by an earlier failure and stays as it is\n`);
  return 0;
}

export function recordOf(
  question: Question,
  answer: Answer,
  invocation: Invocation,
  context: Context,
): LogRecord {
  const catalogue = context.catalogue();
  const { now_ms, offset_min } = context.clock();
  return answerRecord(question, answer, {
    time: timeStamp({ sinceEpoch_ms: now_ms, utcOffset_min: offset_min }),
    version: context.version,
    catalogue: { hash: catalogue.hash, date: catalogue.date },
    commandWords: recordedCommand(invocation, context, catalogue, usesOwnEntries(question)),
  });
}

/**
 * On standard output, behind the answer. Where that holds one document for a program, the document stays alone (it has
 * every number) and the record goes to standard error.
 */
function showInstead(
  record: LogRecord,
  trouble: Refusal,
  { options }: Invocation,
  context: Context,
): ExitStatus {
  const style = { ascii: context.ascii };
  const forProgram = options.json === true || options.csv === true || options.plain === true;
  if (options.markdown) context.print(`\n${recordMarkdown(record, style)}`);
  else (forProgram ? context.warn : context.print)(`\n${recordText(record, style)}`);
  return reportRefusal(trouble, context);
}
