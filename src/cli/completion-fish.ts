/** Completions for fish: one `complete` line an option, with a condition where only some commands take it. */
import { type CommandSpec, namedCommands } from './command-table.ts';
import {
  allOptions,
  operandWords,
  optionsOfCommand,
  spellings,
  unnamedCommand,
  valueOptions,
} from './completion-words.ts';
import type { OptionSpec } from './option-spec.ts';

export function fishCompletion(): string {
  const commands = namedCommands();
  const names = commands.map((command) => command.name).join(' ');
  return `# fish completion for halfspace, made by: halfspace completion fish
function __halfspace_command
    set -l skip 0
    set -l words (commandline -opc)
    for word in $words[2..-1]
        if test $skip = 1
            set skip 0
            continue
        end
        switch $word
            case ${valueOptions().flatMap(spellings).join(' ')}
                set skip 1
            case '-*'
            case ${names}
                echo $word
                return
            case '*'
                echo ${unnamedCommand().name}
                return
        end
    end
    echo none
end
function __halfspace_in
    contains -- (__halfspace_command) $argv
end
complete -c halfspace -f
${allOptions().map(optionLine).join('\n')}
${commands.map((command) => `complete -c halfspace -n '__halfspace_in none' -a ${command.name} -d ${quote(command.summary)}`).join('\n')}
${[unnamedCommand(), ...commands].flatMap(operandLines).join('\n')}
`;
}

function optionLine(spec: OptionSpec): string {
  const takers = [unnamedCommand(), ...namedCommands()]
    .map((command) => command.name)
    .filter((name) => optionsOfCommand(name).includes(spec));
  const unnamed = unnamedCommand().name;
  const condition = spec.everywhere
    ? ''
    : ` -n '__halfspace_in ${[...takers, ...(takers.includes(unnamed) ? ['none'] : [])].join(' ')}'`;
  const letter = spec.short === undefined ? '' : ` -s ${spec.short}`;
  return `complete -c halfspace${condition} -l ${spec.name}${letter}${argument(spec)} -d ${quote(spec.meaning)}`;
}

function argument(spec: OptionSpec): string {
  if (spec.kind === 'flag') return '';
  if (spec.choices) return ` -x -a ${quote(spec.choices.join(' '))}`;
  if (spec.completes === 'file') return ' -r -F';
  return spec.completes === 'folder' ? " -x -a '(__fish_complete_directories)'" : ' -x';
}

function operandLines(command: CommandSpec): string[] {
  const words = operandWords(command);
  if (words === undefined) return [];
  const where = command.unnamed ? `${command.name} none` : command.name;
  const line = `complete -c halfspace -n '__halfspace_in ${where}'`;
  if (words === 'file') return [`${line} -F`];
  if (words === 'medium') return [`${line} -a '(halfspace completion --names (commandline -ct))'`];
  return [`${line} -a ${quote(words.join(' '))}`];
}

function quote(text: string): string {
  return `'${text.replaceAll('\\', '\\\\').replaceAll("'", "\\'")}'`;
}
