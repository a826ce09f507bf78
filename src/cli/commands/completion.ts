/** `halfspace completion SHELL`: the script a shell sources; `--names PREFIX`: the catalogue keys it offers, one a line. */
import { choiceParser, orList } from '../../units/parse-choice.ts';
import { isProblem, problem } from '../../units/problem.ts';
import { completionScript, SHELLS } from '../completion.ts';
import type { Command } from '../context.ts';
import { usageErrorText } from '../usage-error.ts';

const MISSING = problem('empty', 'SHELL missing', `write ${orList(SHELLS)}`);
const parseShell = choiceParser('a shell known here', SHELLS);

export const run: Command = ({ operands, options }, context) => {
  if (options.names !== undefined) {
    const prefix = options.names.toLowerCase();
    const keys = context.catalogue().keys();
    const offered = keys.filter((key) => key.toLowerCase().startsWith(prefix));
    context.write(offered.map((key) => `${key}\n`).join(''));
    return 0;
  }
  const [typed] = operands;
  const shell = typed === undefined ? MISSING : parseShell(typed);
  if (isProblem(shell)) {
    const { message, remedy } = shell;
    const error = { code: 'bad-value', message, remedy, candidates: SHELLS, command: 'completion' } as const;
    context.warn(usageErrorText(error, context.ascii));
    return 2;
  }
  context.write(completionScript(shell));
  return 0;
};
