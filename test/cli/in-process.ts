/** Runs a command line inside the test: the same parsing and the same commands as the program, its streams caught. */
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { parseArguments } from '../../src/cli/arguments.ts';
import type { Context } from '../../src/cli/context.ts';
import { helpText } from '../../src/cli/help.ts';
import { loadCommand } from '../../src/cli/load-command.ts';
import { usageErrorText } from '../../src/cli/usage-error.ts';

export interface Outcome {
  readonly status: number;
  readonly out: string;
  readonly err: string;
}

export interface Surroundings {
  readonly env?: Readonly<Record<string, string | undefined>>;
  readonly catalogue?: Context['catalogue'];
}

export async function run(args: readonly string[], surroundings: Surroundings = {}): Promise<Outcome> {
  const parsed = parseArguments(args);
  if (parsed.kind === 'error') {
    const err = usageErrorText(parsed.error);
    return { status: 2, out: '', err };
  }
  if (parsed.kind === 'help') return { status: 0, out: helpText(parsed.topic), err: '' };
  if (parsed.kind !== 'run') throw new Error(`no command to run in: ${args.join(' ')}`);
  let out = '';
  let err = '';
  const context: Context = {
    write: (text) => (out += text),
    print: (text) => {
      out += text;
      return true;
    },
    warn: (text) => (err += text),
    version: '0.1.0',
    env: surroundings.env ?? {},
    stdinIsTTY: false,
    stdoutIsTTY: false,
    stderrIsTTY: false,
    ascii: parsed.invocation.options.ascii === true,
    catalogue: surroundings.catalogue ?? catalogueFromSources,
    clock: () => ({ now_ms: 0, offset_min: 0 }),
  };
  const { run: command } = await loadCommand(parsed.invocation.command);
  const status = await command(parsed.invocation, context);
  return { status, out, err };
}
