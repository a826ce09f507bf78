/** Completion scripts for the shells, printed from the tables of commands and options. */
import { bashCompletion } from './completion-bash.ts';
import { fishCompletion } from './completion-fish.ts';
import { zshCompletion } from './completion-zsh.ts';

export const SHELLS = ['bash', 'zsh', 'fish'] as const;
export type Shell = (typeof SHELLS)[number];

const SCRIPTS: Readonly<Record<Shell, () => string>> = {
  bash: bashCompletion,
  zsh: zshCompletion,
  fish: fishCompletion,
};

export function completionScript(shell: Shell): string {
  return SCRIPTS[shell]();
}
