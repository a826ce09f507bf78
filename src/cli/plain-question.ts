/** The commonest command line, a question without options, understood without the tables of options and commands. */
import type { Invocation } from './arguments.ts';
import { isCommandWord } from './load-command.ts';

/** What `parseArguments` makes of these arguments where they are FROM [LAYER ...] INTO WAVE; undefined for all others. */
export function plainQuestion(argv: readonly string[]): Invocation | undefined {
  const [first = ''] = argv;
  if (argv.length < 3 || isCommandWord(first) || argv.some((argument) => argument.startsWith('-')))
    return undefined;
  return { command: 'answer', operands: argv, options: {}, given: [] };
}
