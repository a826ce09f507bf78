import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseArguments } from '../../src/cli/arguments.ts';
import { COMMAND_NAMES } from '../../src/cli/command-table.ts';
import { plainQuestion } from '../../src/cli/plain-question.ts';

const word = fc.oneof(
  fc.constantFrom(
    ...COMMAND_NAMES,
    'air',
    'n-bk7@3mm',
    '8x:',
    ':',
    '633nm',
    '',
    '-',
    '--',
    '-1',
    '.5',
    '--json',
    '-q',
    '--help',
  ),
  fc.string({ maxLength: 6 }),
);

describe('plainQuestion', () => {
  it('understands what it takes on as the tables do', () => {
    fc.assert(
      fc.property(fc.array(word, { maxLength: 6 }), (argv) => {
        const invocation = plainQuestion(argv);
        if (invocation) expect(parseArguments(argv)).toEqual({ kind: 'run', invocation });
      }),
      { numRuns: 3000 },
    );
  });

  it('takes on questions without options, and no command', () => {
    expect(plainQuestion(['air', 'n-bk7', '633nm'])?.operands).toEqual(['air', 'n-bk7', '633nm']);
    expect(plainQuestion(['air', 'n-bk7'])).toBeUndefined();
    for (const command of COMMAND_NAMES) expect(plainQuestion([command, 'n-bk7', '633nm'])).toBeUndefined();
    expect(plainQuestion(['air', 'n-bk7', '633nm', '--json'])).toBeUndefined();
  });
});
