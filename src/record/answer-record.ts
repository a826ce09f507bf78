/** An answer as a record: what was asked, what was shown, every number behind it, and the command that asks again. */
import type { Answer } from '../answer/answer.ts';
import type { Question } from '../answer/question.ts';
import { answerSections } from '../present/answer-sections.ts';
import { SCREEN } from '../units/number-style.ts';
import { describeQuestion, type LogRecord, makeRecord, type RecordInput, type RecordRow } from './record.ts';

/** What is not in question and answer: when, with which program and data, and how it was asked. */
export type Circumstances = Pick<RecordInput, 'time' | 'version' | 'catalogue' | 'commandWords'>;

/** The rows are those of the screen, digit for digit. */
export function answerRecord(question: Question, answer: Answer, circumstances: Circumstances): LogRecord {
  return makeRecord({
    ...circumstances,
    ...describeQuestion(question),
    answer,
    rows: answerRows(answer),
    cautions: answer.cautions,
  });
}

function answerRows(answer: Answer): readonly RecordRow[] {
  return answerSections(answer, SCREEN).flatMap(({ title, rows }) =>
    rows.map(({ symbol, label, text }) => ({ about: title, symbol, label, text })),
  );
}
