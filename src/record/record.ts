/**
 * The logbook record: all that is needed to say, a year later, what was asked, what came out, how many digits hold, where they
 * come from, and how to ask again. Plain JSON; keys are only ever added.
 */
import { createHash } from 'node:crypto';
import type { Caution, SourceLine } from '../answer/answer.ts';
import type { Question } from '../answer/question.ts';
import { CONVENTIONS } from './conventions.ts';
import { type JsonObject, toPlainJson, toPlainObject } from './plain-json.ts';
import { questionEcho } from './question-echo.ts';
import { questionRows } from './question-rows.ts';
import { shellCommand } from './shell-quote.ts';
import { sourcesIn } from './sources-in.ts';

/** A quantity as people read it: rounded, with its unit. */
export interface RecordRow {
  /** Heading under which it stands: a medium, "Interface"; empty for none. */
  readonly about: string;
  /** As printed in formulas; may be empty. */
  readonly symbol: string;
  readonly label: string;
  readonly text: string;
}

export interface LogRecord {
  readonly schema: 1;
  /** Twelve hexadecimal digits made from everything else in the record: tells whether a record was changed. */
  readonly id: string;
  /** RFC 3339 with the offset from UTC. */
  readonly time: string;
  readonly program: { readonly name: string; readonly version: string };
  readonly catalogue: { readonly hash: string; readonly date: string };
  /** For a POSIX shell; gives the same answer with the same versions. */
  readonly command: string;
  /** The same, word by word. */
  readonly commandWords: readonly string[];
  /** As understood, defaults filled in. */
  readonly question: JsonObject;
  /** The same in words. */
  readonly asked: readonly RecordRow[];
  /** Every number as computed, to the last bit. */
  readonly answer: JsonObject;
  /** What was shown. */
  readonly rows: readonly RecordRow[];
  readonly cautions: readonly Caution[];
  readonly sources: readonly SourceLine[];
  readonly conventions: readonly string[];
}

export interface RecordInput {
  /** From `timeStamp`. */
  readonly time: string;
  readonly version: string;
  readonly catalogue: { readonly hash: string; readonly date: string };
  /** The program's name and its arguments, long options only, nothing left to the configuration. */
  readonly commandWords: readonly string[];
  readonly question: JsonObject;
  readonly asked: readonly RecordRow[];
  /** An `Answer`, or the result of another command; its cautions are taken from the key `cautions`. */
  readonly answer: object;
  /** With the signs of the screen; forms in ASCII translate them. */
  readonly rows: readonly RecordRow[];
  readonly cautions: readonly Caution[];
  /** Beside those named inside the answer. */
  readonly moreSources?: readonly SourceLine[];
}

/** The parts of `RecordInput` that a question gives. */
export function describeQuestion(question: Question): Pick<RecordInput, 'question' | 'asked'> {
  return { question: questionEcho(question), asked: questionRows(question) };
}

export function makeRecord(input: RecordInput): LogRecord {
  const answer = toPlainObject(input.answer);
  const content = {
    time: input.time,
    program: { name: 'halfspace', version: input.version },
    catalogue: { hash: input.catalogue.hash, date: input.catalogue.date },
    command: shellCommand(input.commandWords),
    commandWords: [...input.commandWords],
    question: toPlainObject(input.question),
    asked: input.asked.map(plainRow),
    answer,
    rows: input.rows.map(plainRow),
    cautions: input.cautions.map(({ code, about, level, text }) => ({ code, about, level, text })),
    sources: sourcesIn([answer, toPlainJson(input.moreSources ?? [])]),
    conventions: CONVENTIONS,
  };
  return { schema: 1, id: contentId({ schema: 1, ...content }), ...content };
}

/** The id that belongs to the content; `record.id` differs from it where the record was changed later. */
export function idOfRecord(record: LogRecord): string {
  const { id: _, ...content } = record;
  return contentId(content);
}

function contentId(content: object): string {
  return createHash('sha256').update(JSON.stringify(content)).digest('hex').slice(0, 12);
}

function plainRow({ about, symbol, label, text }: RecordRow): RecordRow {
  return { about, symbol, label, text };
}
