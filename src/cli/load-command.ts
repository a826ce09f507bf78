/** Where each command's code is; loaded only when it runs, so that one command never pays for another's imports. */
import type { Invocation } from './arguments.ts';
import type { CommandIo } from './command-io.ts';
import type { CommandName } from './command-table.ts';

export interface CommandModule {
  /** Resolves to the exit status. */
  readonly run: (invocation: Invocation, io: CommandIo) => number | Promise<number>;
}

const LOADERS: Readonly<Partial<Record<CommandName, () => Promise<CommandModule>>>> = {
  completion: () => import('./commands/completion.ts'),
  man: () => import('./commands/man.ts'),
};

/** Undefined for the commands that the caller answers itself (help). */
export function loadCommand(name: CommandName): Promise<CommandModule> | undefined {
  return LOADERS[name]?.();
}
