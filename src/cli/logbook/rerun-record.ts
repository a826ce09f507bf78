/** A record's question asked again, with the program and the catalogue of today, and held against the record. */
import type { Answer } from '../../answer/answer.ts';
import { answerQuestion } from '../../answer/answer-question.ts';
import type { Question } from '../../answer/question.ts';
import { isRefusal, type Refusal, refuse } from '../../medium/refusal.ts';
import { answerRecord } from '../../record/answer-record.ts';
import { type Comparison, compareRecords } from '../../record/compare-records.ts';
import type { RecordEntry } from '../../record/logbook.ts';
import type { LogRecord } from '../../record/record.ts';
import { type Invocation, parseArguments } from '../arguments.ts';
import type { Context } from '../context.ts';
import { readQuestion } from '../read-question.ts';

export type Rerun =
  | { readonly outcome: 'same' | 'differs'; readonly comparison: Comparison }
  /** It has no answer any more. */
  | { readonly outcome: 'refused'; readonly refusal: Refusal };

/** @param ownFolder where own entries are now, in place of the folder that the record names */
export async function rerunRecord(
  { record }: RecordEntry,
  context: Context,
  ownFolder: string | undefined,
): Promise<Rerun> {
  const again = await askAgain(record, context, ownFolder);
  if (isRefusal(again)) return { outcome: 'refused', refusal: again };
  const comparison = compareRecords(record, again);
  return { outcome: comparison.same ? 'same' : 'differs', comparison };
}

async function askAgain(
  record: LogRecord,
  context: Context,
  ownFolder: string | undefined,
): Promise<LogRecord | Refusal> {
  const invocation = invocationOf(record);
  if (isRefusal(invocation)) return invocation;
  const { operands, options } = invocation;
  const catalogue = context.catalogue(ownFolder ?? options.catalog);
  const question: Question | Refusal = await readQuestion(operands, options, catalogue);
  if (isRefusal(question)) return question;
  const answer: Answer | Refusal = answerQuestion(question, (id) => catalogue.source(id));
  if (isRefusal(answer)) return answer;
  return answerRecord(question, answer, {
    time: record.time,
    version: context.version,
    catalogue: { hash: catalogue.hash, date: catalogue.date },
    commandWords: record.commandWords,
  });
}

function invocationOf({ id, commandWords }: LogRecord): Invocation | Refusal {
  const parsed = parseArguments(commandWords.slice(1));
  if (parsed.kind === 'run' && parsed.invocation.command === 'answer') return parsed.invocation;
  const why =
    parsed.kind === 'error'
      ? `its command is not understood by this version: ${parsed.error.message}`
      : 'its command asks no question';
  return refuse('record-not-askable', 2, `record ${id} cannot be asked again: ${why}`, 'ask it by hand');
}
