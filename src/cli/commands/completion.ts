/** `halfspace completion SHELL`: the script a shell sources; `--names PREFIX`: the catalogue keys it offers, one a line. */
import { choiceParser, orList } from '../../units/parse-choice.ts';
import { isProblem, problem } from '../../units/problem.ts';
import type { Invocation } from '../arguments.ts';
import type { CommandIo } from '../command-io.ts';
import { completionScript, SHELLS } from '../completion.ts';
import { usageErrorText } from '../usage-error.ts';

const MISSING = problem('empty', 'SHELL missing', `write ${orList(SHELLS)}`);
const parseShell = choiceParser('a shell known here', SHELLS);

export function run({ operands, options }: Invocation, io: CommandIo): number {
  if (options.names !== undefined) {
    const prefix = options.names.toLowerCase();
    const keys = io.catalogueKeys().filter((key) => key.toLowerCase().startsWith(prefix));
    io.out(keys.map((key) => `${key}\n`).join(''));
    return 0;
  }
  const [typed] = operands;
  const shell = typed === undefined ? MISSING : parseShell(typed);
  if (isProblem(shell)) {
    const { message, remedy } = shell;
    io.err(usageErrorText({ code: 'bad-value', message, remedy, candidates: SHELLS, command: 'completion' }));
    return 2;
  }
  io.out(completionScript(shell));
  return 0;
}
