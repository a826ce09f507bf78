/** Rows of the table of commands (command-table.ts) that concern the logbook. */
import type { CommandSpec } from './command-table.ts';
import { LOG_ACTION_NAMES } from './logbook/log-action.ts';

export const LOG_COMMANDS = [
  {
    name: 'log',
    summary: 'the logbook: answers kept with --log',
    operands: [
      {
        name: 'ACTION',
        meaning:
          'list (the default), show ID, last, search WORDS, export [ID ...] (all without one), rerun ID ... (or rerun all)',
        optional: true,
        completes: LOG_ACTION_NAMES,
      },
      {
        name: 'ID',
        meaning: 'the id of a record, its first digits, or last; the words searched for',
        optional: true,
        many: true,
      },
    ],
    options: ['logFile', 'full', 'json', 'csv', 'markdown', 'latex', 'plain', 'catalog'],
    examples: [
      { line: 'log', meaning: 'every answer kept with --log on a line, the newest first' },
      { line: 'log show 3f09', meaning: 'one record, by the first digits of its id' },
      { line: 'log search sapphire 1064nm', meaning: 'records that hold all of these words' },
      { line: 'log last --markdown', meaning: 'the newest, for a notebook; --latex too' },
      { line: 'log export --csv -o records.csv', meaning: 'all, the oldest first, a row each' },
      { line: 'log rerun all', meaning: 'asks again, says what differs and why; status 1 if it does' },
    ],
  },
] as const satisfies readonly CommandSpec[];
