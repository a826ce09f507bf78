/** Rows of the table of options (options.ts) that concern the logbook. */
import { type Problem, problem } from '../units/problem.ts';
import { flag, type OptionSpec, value } from './option-spec.ts';

/** Tables of many answers are not logged. */
const TABLES = ['sweep', 'columns', 'digits'];

export const LOG_OPTION_ROWS = {
  log: flag({
    name: 'log',
    meaning: 'add the answer to the logbook too; halfspace log shows what is there',
    group: 'output',
    excludes: TABLES,
  }),
  logFile: value({
    name: 'log-file',
    placeholder: 'FILE',
    meaning: 'the logbook is FILE; with a question: add the answer to it',
    fallback: 'logbook.jsonl in the folder of the state',
    group: 'output',
    completes: 'file',
    excludes: TABLES,
    parse(text: string): string | Problem {
      if (text === '-') {
        const remedy =
          'name a file; halfspace log last prints what is kept, write ./- for a file of that name';
        return problem('not-a-choice', 'a logbook is a file, and - is standard output', remedy);
      }
      return text === '' || text.includes('\0')
        ? problem('empty', 'the name is empty or holds a null character', 'write a path such as bench.jsonl')
        : text;
    },
  }),
  latex: flag({
    name: 'latex',
    meaning: 'a LaTeX table',
    group: 'form',
    excludes: ['json', 'csv', 'markdown', 'plain'],
  }),
} as const satisfies Readonly<Record<string, OptionSpec>>;
