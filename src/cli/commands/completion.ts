/** `halfspace completion SHELL`: the script a shell sources; `--names PREFIX`: the catalogue keys it offers, one a line. */
import { choiceParser, orList } from '../../units/parse-choice.ts';
import { isProblem, problem } from '../../units/problem.ts';
import type { Command } from '../context.ts';
import { usageErrorText } from '../usage-error.ts';

export const run: Command = async ({ operands, options }, context) => {
  if (options.names !== undefined) {
    const prefix = options.names.toLowerCase();
    const keys = context.catalogue().keys();
    const offered = keys.filter((key) => key.toLowerCase().startsWith(prefix));
    context.write(offered.map((key) => `${key}\n`).join(''));
    return 0;
  }
  // Only here: `--names` runs at each press of Tab, and needs none of it.
  const { completionScript, SHELLS } = await import('../completion.ts');
  const missing = problem('empty', 'SHELL missing', `write ${orList(SHELLS)}`);
  const [typed] = operands;
  const shell = typed === undefined ? missing : choiceParser('a shell known here', SHELLS)(typed);
  if (isProblem(shell)) {
    const { message, remedy } = shell;
    const error = { code: 'bad-value', message, remedy, candidates: SHELLS, command: 'completion' } as const;
    context.warn(usageErrorText(error, context.ascii));
    return 2;
  }
  context.write(completionScript(shell));
  return 0;
};
