/** How an option, a command line and an operand list are written in help and man page. */
import type { CommandSpec } from './command-table.ts';
import type { OptionSpec } from './option-spec.ts';
import { NO_BREAK } from './wrap-text.ts';

/** `-o, --output FILE`. */
export function optionTerm(spec: OptionSpec): string {
  const long = spec.kind === 'flag' ? `--${spec.name}` : `--${spec.name} ${spec.placeholder}`;
  return spec.short === undefined ? long : `-${spec.short}, ${long}`;
}

/** The meaning with what holds by default; may hold `NO_BREAK`. */
export function optionMeaning(spec: OptionSpec): string {
  if (spec.kind === 'flag' || spec.fallback === undefined) return spec.meaning;
  return `${spec.meaning} (default:${NO_BREAK}${spec.fallback})`;
}

/** `halfspace FROM [LAYER ...] INTO WAVE [options]`. */
export function usageLine(command: CommandSpec): string {
  const operands = command.operands.map(({ name, optional, many }) => {
    const repeated = many ? `${name} ...` : name;
    return optional ? `[${repeated}]` : repeated;
  });
  const name = command.unnamed ? [] : [command.name];
  return ['halfspace', ...name, ...operands, '[options]'].join(' ');
}
