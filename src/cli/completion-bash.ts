/**
 * Completions for bash 3.2 and later, without help from other packages. The line is split by spaces, not by bash's word
 * breaks, so that `--pol=s` is one word; what is offered after a `=` is the value alone, as bash expects.
 */

import { type CommandSpec, namedCommands } from './command-table.ts';
import {
  operandWords,
  optionsOfCommand,
  spellings,
  unnamedCommand,
  valueOptions,
} from './completion-words.ts';
import type { ValueOption } from './option-spec.ts';

export function bashCompletion(): string {
  const names = namedCommands().map((command) => command.name);
  const optionCases = namedCommands().map(
    (command) => `      ${command.name}) words='${optionWords(command.name)}' ;;`,
  );
  return `# bash completion for halfspace, made by: halfspace completion bash
_halfspace() {
  local line=\${COMP_LINE:0:COMP_POINT} word skip='' command='' option='' words=''
  local -i i operands=0
  local -a typed
  read -r -a typed <<<"$line"
  [[ $line == *[[:space:]] ]] && typed+=('')
  local cur=\${typed[\${#typed[@]} - 1]}
  local value=$cur
  COMPREPLY=()
  for ((i = 1; i < \${#typed[@]} - 1; i++)); do
    word=\${typed[i]}
    if [[ -n $skip ]]; then
      skip=''
      continue
    fi
    case $word in
      ${valueOptions().flatMap(spellings).join(' | ')}) skip=$word ;;
      -*) ;;
      *)
        ((operands == 0)) && case $word in ${names.join(' | ')}) command=$word ;; esac
        operands+=1
        ;;
    esac
  done
  if [[ $cur == --*=* ]]; then
    option=\${cur%%=*}
    value=\${cur#*=}
  elif [[ -n $skip ]]; then
    option=$skip
  fi
  local IFS=$' \\t\\n'
  if [[ -n $option ]]; then
    case $option in
${valueOptions().map(valueCase).join('\n')}
    esac
    COMPREPLY=($(compgen -W "$words" -- "$value"))
    [[ $cur == --*=* && $COMP_WORDBREAKS != *=* ]] && COMPREPLY=("\${COMPREPLY[@]/#/$option=}")
  elif [[ $cur == -* ]]; then
    case $command in
${optionCases.join('\n')}
      *) words='${optionWords(unnamedCommand().name)}' ;;
    esac
    COMPREPLY=($(compgen -W "$words" -- "$cur"))
  else
    case $command in
${namedCommands().map(operandCase).join('\n')}
      *)
        ((operands == 0)) && words='${names.join(' ')}'
        [[ -n $cur ]] && words+=" $("\${typed[0]}" completion --names "$cur" 2>/dev/null)"
        ;;
    esac
    COMPREPLY=($(compgen -W "$words" -- "$cur"))
  fi
}
complete -F _halfspace halfspace
`;
}

function optionWords(command: string): string {
  return optionsOfCommand(command).flatMap(spellings).join(' ');
}

function valueCase(spec: ValueOption<unknown>): string {
  const pattern = spellings(spec).join(' | ');
  if (spec.choices) return `      ${pattern}) words='${spec.choices.join(' ')}' ;;`;
  if (spec.completes === undefined) return `      ${pattern}) return ;;`;
  return `      ${pattern})
        compopt -o filenames 2>/dev/null
        IFS=$'\\n'
        COMPREPLY=($(compgen ${spec.completes === 'file' ? '-f' : '-d'} -- "$value"))
        return
        ;;`;
}

function operandCase(command: CommandSpec): string {
  const words = operandWords(command);
  if (words === 'medium')
    return `      ${command.name}) words=$("\${typed[0]}" completion --names "$cur" 2>/dev/null) ;;`;
  if (words === 'file') return `      ${command.name}) words=$(compgen -f -- "$cur") ;;`;
  return `      ${command.name}) words='${(words ?? []).join(' ')}' ;;`;
}
