/** Completions for zsh, as a file `_halfspace` of the fpath or sourced; options are shown with their meanings. */
import { type CommandSpec, namedCommands } from './command-table.ts';
import {
  operandWords,
  optionsOfCommand,
  spellings,
  unnamedCommand,
  valueOptions,
} from './completion-words.ts';
import type { OptionSpec, ValueOption } from './option-spec.ts';

export function zshCompletion(): string {
  const commands = namedCommands();
  return `#compdef halfspace
# zsh completion for halfspace, made by: halfspace completion zsh
_halfspace() {
  local word skip='' command='' option='' cur=\${words[CURRENT]}
  local -a offered
  integer i operands=0
  for ((i = 2; i < CURRENT; i++)); do
    word=\${words[i]}
    if [[ -n $skip ]]; then
      skip=''
      continue
    fi
    case $word in
      (${valueOptions().flatMap(spellings).join('|')}) skip=$word ;;
      (-*) ;;
      (*)
        if ((operands == 0)); then
          case $word in
            (${commands.map((command) => command.name).join('|')}) command=$word ;;
          esac
        fi
        ((operands += 1))
        ;;
    esac
  done
  if [[ $cur == --*=* ]]; then
    option=\${cur%%=*}
    compset -P '*='
  elif [[ -n $skip ]]; then
    option=$skip
  fi
  if [[ -n $option ]]; then
    case $option in
${valueOptions().map(valueCase).join('\n')}
    esac
  elif [[ $cur == -* ]]; then
    case $command in
${commands.map((command) => optionCase(`(${command.name})`, command.name)).join('\n')}
${optionCase('(*)', unnamedCommand().name)}
    esac
    _describe -o option offered
  else
    case $command in
${commands.map(operandCase).join('\n')}
      (*)
        if ((operands == 0)); then
          offered=(${commands.map((command) => described(command.name, command.summary)).join(' ')})
          _describe command offered
        fi
        ${mediumWords}
        ;;
    esac
  fi
}
if [[ \${funcstack[1]} == _halfspace ]]; then
  _halfspace "$@"
else
  compdef _halfspace halfspace
fi
`;
}

const mediumWords =
  '[[ -n $cur ]] && compadd -- ${(f)"$(${(Q)words[1]} completion --names "$cur" 2>/dev/null)"}';

function valueCase(spec: ValueOption<unknown>): string {
  const pattern = `(${spellings(spec).join('|')})`;
  if (spec.choices) return `      ${pattern} compadd -- ${spec.choices.join(' ')} ;;`;
  if (spec.completes === undefined) return `      ${pattern} _message ${quote(spec.meaning)} ;;`;
  return `      ${pattern} _files${spec.completes === 'folder' ? ' -/' : ''} ;;`;
}

function optionCase(pattern: string, command: string): string {
  const rows = optionsOfCommand(command).flatMap((spec: OptionSpec) =>
    spellings(spec).map((spelling) => described(spelling, spec.meaning)),
  );
  return `      ${pattern} offered=(${rows.join(' ')}) ;;`;
}

function operandCase(command: CommandSpec): string {
  const words = operandWords(command);
  if (words === 'medium') return `      (${command.name}) ${mediumWords} ;;`;
  if (words === 'file') return `      (${command.name}) _files ;;`;
  return `      (${command.name}) ${words ? `compadd -- ${words.join(' ')}` : ':'} ;;`;
}

/** `word:meaning`, as _describe wants it. */
function described(word: string, meaning: string): string {
  return quote(`${word}:${meaning.replaceAll(':', '\\:')}`);
}

function quote(text: string): string {
  return `'${text.replaceAll("'", "'\\''")}'`;
}
