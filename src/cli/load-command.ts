/** Where each command's code is; loaded only when it runs, so that one command never pays for another's imports. */
import type { Invocation } from './arguments.ts';
import type { Command } from './context.ts';

export interface CommandModule {
  readonly run: Command;
}

const LOADERS: Readonly<Record<Invocation['command'], () => Promise<CommandModule>>> = {
  answer: () => import('./commands/answer.ts'),
  completion: () => import('./commands/completion.ts'),
  man: () => import('./commands/man.ts'),
  cite: () => import('./commands/cite.ts'),
  material: () => import('./commands/material.ts'),
  find: () => import('./commands/find.ts'),
  match: () => import('./commands/match.ts'),
  compare: () => import('./commands/compare.ts'),
  'order-check': () => import('./commands/order-check.ts'),
  fit: () => import('./commands/fit.ts'),
  coat: () => import('./commands/coat.ts'),
  crystal: () => import('./commands/crystal.ts'),
  stream: () => import('./commands/stream.ts'),
  equivalent: () => import('./commands/equivalent.ts'),
  config: () => import('./commands/config.ts'),
  log: () => import('./commands/log.ts'),
  verify: () => import('./commands/verify.ts'),
};

/** Whether a first word is the name of a command: one that has code, or `help`. */
export const isCommandWord = (word: string): boolean => word === 'help' || Object.hasOwn(LOADERS, word);

export function loadCommand(name: Invocation['command']): Promise<CommandModule> {
  return LOADERS[name]();
}
