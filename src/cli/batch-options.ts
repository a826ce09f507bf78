/** Rows of the table of options for many questions at once: the batch stream, and sweeps of one question. */
import { DEFAULT_COLUMNS, SHORT_NAMES } from '../batch/answer-columns.ts';
import { parseSweep, type SweepRange } from '../batch/sweep-range.ts';
import { MOST_SIGNIFICANT } from '../batch/write-rounded.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem, type Problem, problem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { value } from './option-spec.ts';

/** What is done with one answer, and not with a table of them. */
const ONE_QUESTION = ['log', 'log-file', 'plot'];

export const BATCH_OPTION_ROWS = {
  fixedFrom: value({
    name: 'from',
    placeholder: 'MEDIUM',
    meaning: 'medium of incidence of every row, in place of a column',
    group: 'batch',
    parse: parseName,
    excludes: ['path'],
  }),
  fixedInto: value({
    name: 'into',
    placeholder: 'MEDIUM',
    meaning: 'medium beyond, of every row',
    group: 'batch',
    parse: parseName,
    excludes: ['path'],
  }),
  fixedPath: value({
    name: 'path',
    placeholder: 'PATH',
    meaning:
      'path of every row with its layers, in quotes: "air magnesium-fluoride-film@qw n-bk7", or with > between the media',
    group: 'batch',
    parse: parseName,
    excludes: ['from', 'into'],
  }),
  fixedWave: value({
    name: 'wave',
    placeholder: 'WAVE',
    meaning: 'wave of every row, such as 633nm',
    group: 'batch',
    parse: (text: string): string | Problem => {
      const wave = parseWave(text);
      return isProblem(wave) ? wave : text;
    },
  }),
  sweeps: value({
    name: 'sweep',
    placeholder: 'NAME=A..B:STEP',
    meaning:
      'the question at every point of a range: angle=0..89:1, wave=400nm..700nm:5nm (in place of WAVE), temperature=20C..80C:5C, thickness1=50nm..200nm:1nm; twice for a grid; as CSV unless --json, --markdown or --plain is given',
    group: 'batch',
    repeatable: true,
    excludes: ONE_QUESTION,
    parse(text: string): readonly SweepRange[] | Problem {
      const sweep = parseSweep(text);
      return isProblem(sweep) ? sweep : [sweep];
    },
  }),
  columns: value({
    name: 'columns',
    placeholder: 'NAME,...',
    meaning: `what to answer: ${SHORT_NAMES.map(([name]) => name).join(', ')}, or any key of --csv such as into.groupIndex; list shows all with their meaning`,
    fallback: DEFAULT_COLUMNS.join(','),
    group: 'batch',
    excludes: ONE_QUESTION,
    parse: parseName,
  }),
  digits: value({
    name: 'digits',
    placeholder: 'N',
    meaning: 'significant digits of the answers, 1 to 17',
    fallback: 'the shortest text that reads back as the same double',
    group: 'batch',
    excludes: ONE_QUESTION,
    parse: parseDigits,
  }),
};

function parseName(text: string): string | Problem {
  return text.trim() === '' ? problem('empty', 'nothing is given', 'write a value') : text.trim();
}

function parseDigits(text: string): number | Problem {
  const digits = /^\d{1,2}$/.test(text.trim()) ? Number(text) : 0;
  return digits >= 1 && digits <= MOST_SIGNIFICANT
    ? digits
    : problem(
        'out-of-range',
        `${quoteInput(text)} is no count of digits`,
        'write a whole number from 1 to 17',
      );
}
