/** The logbook of the running program: makes records of answers as they would be kept now, and keeps them. */
import path from 'node:path';
import type { Answer } from '../answer/answer.ts';
import type { Question } from '../answer/question.ts';
import { ownFolderPath } from '../catalog/own-folder.ts';
import { isRefusal, type Refusal } from '../medium/refusal.ts';
import { answerRecord } from '../record/answer-record.ts';
import { keepRecord } from '../record/logbook.ts';
import type { Confirmed } from '../record/logbook-file.ts';
import { placeOfLogbook } from '../record/logbook-place.ts';
import { usesOwnEntries } from '../record/question-echo.ts';
import { questionWords } from '../record/question-words.ts';
import type { LogRecord } from '../record/record.ts';
import { timeStamp } from '../record/time-stamp.ts';
import type { Start } from './main.tsx';

export class Logbook {
  readonly #start: Start;

  constructor(start: Start) {
    this.#start = start;
  }

  record(question: Question, answer: Answer): LogRecord {
    const { host, catalogFolder } = this.#start;
    const { now_ms, offset_min } = host.clock();
    const { hash, date } = host.catalogue();
    const folder = path.resolve(catalogFolder ?? ownFolderPath(host.env));
    return answerRecord(question, answer, {
      time: timeStamp({ sinceEpoch_ms: now_ms, utcOffset_min: offset_min }),
      version: host.version,
      catalogue: { hash, date },
      commandWords: [...questionWords(question), ...(usesOwnEntries(question) ? ['--catalog', folder] : [])],
    });
  }

  keep(record: LogRecord): Confirmed | Refusal {
    const place = placeOfLogbook(this.#start.host.env, this.#start.logFile);
    return isRefusal(place) ? place : keepRecord(place, record);
  }
}

/** What is said of a record that was kept, or was not. */
export function keptText(record: LogRecord, outcome: Confirmed | Refusal): string {
  return isRefusal(outcome)
    ? `not logged: ${outcome.message}; ${outcome.remedy}`
    : `logged as ${record.id} in ${outcome.path}`;
}
