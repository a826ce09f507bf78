/** What the completion scripts of all shells are made of, taken from the tables. */
import {
  type CommandName,
  type CommandSpec,
  commandSpec,
  namedCommands,
  optionsOf,
  UNNAMED_COMMAND,
} from './command-table.ts';
import type { OptionSpec, ValueOption } from './option-spec.ts';
import { OPTION_KEYS, optionSpec } from './options.ts';

const shown = (spec: OptionSpec): boolean => !spec.hidden;

/** Every option that people may type. */
export function allOptions(): readonly OptionSpec[] {
  return OPTION_KEYS.map(optionSpec).filter(shown);
}

export function optionsOfCommand(name: string): readonly OptionSpec[] {
  return optionsOf(name as CommandName)
    .map(optionSpec)
    .filter(shown);
}

export function valueOptions(): readonly ValueOption<unknown>[] {
  return allOptions().filter((spec): spec is ValueOption<unknown> => spec.kind === 'value');
}

/** `--angle`, and `-o` where there is a letter. */
export function spellings(spec: OptionSpec): readonly string[] {
  return spec.short === undefined ? [`--${spec.name}`] : [`--${spec.name}`, `-${spec.short}`];
}

/** The words an operand of the command may be; catalogue keys where `medium`; nothing to offer where undefined. */
export function operandWords(spec: CommandSpec): readonly string[] | 'medium' | 'file' | undefined {
  const kinds = spec.operands.map((operand) => operand.completes);
  if (kinds.includes('medium')) return 'medium';
  if (kinds.includes('file')) return 'file';
  if (kinds.includes('command')) return namedCommands().map((command) => command.name);
  return kinds.find((kind): kind is readonly string[] => typeof kind === 'object');
}

export function unnamedCommand(): CommandSpec {
  return commandSpec(UNNAMED_COMMAND);
}
