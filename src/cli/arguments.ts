/**
 * From the arguments of the process to what is asked of the program, by the tables alone. Nothing is guessed: an unknown
 * option, command or value, a contradiction or a missing operand is a `UsageError` with the nearest spellings.
 * `--help`, `-h`, `--version`, `-V` anywhere before `--` win over everything else, errors included.
 */
import { orList } from '../units/parse-choice.ts';
import { isProblem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import {
  COMMAND_NAMES,
  type CommandName,
  commandSpec,
  commandsWith,
  isCommandName,
  optionsOf,
  SCREEN_OPTIONS,
  UNNAMED_COMMAND,
} from './command-table.ts';
import { nearest } from './nearest.ts';
import { type OptionKey, type OptionValues, optionKeyByName, optionSpec } from './options.ts';
import { type GivenOption, readOptions } from './read-options.ts';
import type { UsageCode, UsageError } from './usage-error.ts';

/** A command to run; `help` is answered by its own kind of result. */
export interface Invocation {
  readonly command: Exclude<CommandName, 'help'>;
  readonly operands: readonly string[];
  readonly options: OptionValues;
  /** The options as typed, in order, for the line that reproduces the answer. */
  readonly given: readonly GivenOption[];
}

export type ParsedArguments =
  | { readonly kind: 'run'; readonly invocation: Invocation }
  /** No operands: the full-screen program. */
  | { readonly kind: 'screen'; readonly options: OptionValues }
  | { readonly kind: 'help'; readonly topic?: CommandName }
  | { readonly kind: 'version' }
  | { readonly kind: 'error'; readonly error: UsageError };

export function parseArguments(argv: readonly string[]): ParsedArguments {
  const read = readOptions(argv);
  const first = read.beforeDashes > 0 ? read.operands[0] : undefined;
  const named = first !== undefined && isCommandName(first) ? first : undefined;
  const has = (key: OptionKey): boolean => read.given.some((option) => option.key === key);
  if (has('help')) return { kind: 'help', ...(named && named !== 'help' && { topic: named }) };
  if (has('version')) return { kind: 'version' };

  const failed = (error: UsageError): ParsedArguments => ({ kind: 'error', error });
  const command = named ?? UNNAMED_COMMAND;
  if (read.error) return failed({ ...read.error, ...(named && { command: named }) });
  const screen = read.operands.length === 0 && read.given.every(({ key }) => isScreenOption(key));

  const taken = screen ? SCREEN_OPTIONS : optionsOf(command);
  const misplaced = read.given.find(({ key }) => !taken.some((k) => k === key));
  if (misplaced) return failed(notHere(misplaced.key, command));
  const options = parseValues(read.given, command);
  if ('code' in options) return failed(options);
  const clash = findClash(read.given, command);
  if (clash) return failed(clash);
  if (screen) return { kind: 'screen', options: options.values };

  const operands = named === undefined ? read.operands : read.operands.slice(1);
  if (command === 'help') return helpTopic(operands, failed);
  const swept = options.values.sweeps?.some(({ name }) => SWEPT_WAVE.includes(name.toLowerCase())) === true;
  const arity = checkOperands(operands, command, named, swept);
  if (arity) return failed(arity);
  return { kind: 'run', invocation: { command, operands, options: options.values, given: read.given } };
}

/** What a sweep of the wave may be called. */
export const SWEPT_WAVE: readonly string[] = [
  'wave',
  'wavelength',
  'frequency',
  'wavenumber',
  'photon-energy',
];

function isScreenOption(key: OptionKey): boolean {
  return SCREEN_OPTIONS.some((k) => k === key);
}

function helpTopic(
  operands: readonly string[],
  failed: (error: UsageError) => ParsedArguments,
): ParsedArguments {
  const [topic] = operands;
  if (topic === undefined) return { kind: 'help' };
  if (isCommandName(topic)) return { kind: 'help', topic };
  const candidates = nearest(topic, COMMAND_NAMES);
  const remedy =
    candidates.length > 0
      ? `did you mean ${orList(candidates)}?`
      : `commands are ${COMMAND_NAMES.join(', ')}`;
  return failed(
    usageError('unknown-command', `there is no command ${quoteInput(topic)}`, remedy, 'help', candidates),
  );
}

function parseValues(
  given: readonly GivenOption[],
  command: CommandName,
): { readonly values: OptionValues } | UsageError {
  const values: Record<string, unknown> = {};
  const texts = new Map<OptionKey, string | undefined>();
  for (const { key, text } of given) {
    const spec = optionSpec(key);
    const again = texts.has(key);
    const repeatable = spec.kind === 'value' && spec.repeatable === true;
    if (again && !repeatable && texts.get(key) !== text) {
      const both = `--${spec.name} is given as ${quoteInput(texts.get(key) ?? '')} and as ${quoteInput(text ?? '')}`;
      return usageError('given-twice', both, 'give it once', command);
    }
    texts.set(key, text);
    const value = spec.kind === 'flag' ? true : spec.parse(text ?? '');
    if (isProblem(value)) {
      const candidates = spec.kind === 'value' && spec.choices ? nearest(text ?? '', spec.choices) : [];
      return usageError('bad-value', `--${spec.name}: ${value.message}`, value.remedy, command, candidates);
    }
    values[key] = again && repeatable ? [...(values[key] as unknown[]), ...(value as unknown[])] : value;
  }
  // Each value came out of the parser of its own row, which is what OptionValues states.
  return { values: values as OptionValues };
}

export function findClash(given: readonly GivenOption[], command: CommandName): UsageError | undefined {
  const isGiven = (name: string): boolean => given.some(({ key }) => key === optionKeyByName(name));
  for (const { key } of given) {
    const { name, excludes = [], needs, needsOneOf } = optionSpec(key);
    const other = excludes.find(isGiven);
    if (other !== undefined) {
      return usageError(
        'options-conflict',
        `--${name} and --${other} contradict each other`,
        'give one of them',
        command,
      );
    }
    if (needs !== undefined && !isGiven(needs)) {
      return usageError(
        'option-needs',
        `--${name} says nothing without --${needs}`,
        `give --${needs} too`,
        command,
      );
    }
    if (needsOneOf && !needsOneOf.some(isGiven)) {
      const others = orList(needsOneOf.map((other) => `--${other}`));
      return usageError(
        'option-needs',
        `--${name} says nothing without ${others}`,
        `give ${others} too`,
        command,
      );
    }
  }
  return undefined;
}

function checkOperands(
  operands: readonly string[],
  command: CommandName,
  named: CommandName | undefined,
  waveIsSwept: boolean,
): UsageError | undefined {
  const specs = commandSpec(command).operands.filter((spec) => !(spec.unlessSwept && waveIsSwept));
  const required = specs.filter((spec) => !spec.optional);
  const most = specs.some((spec) => spec.many) ? Infinity : specs.length;
  if (operands.length >= required.length && operands.length <= most) return undefined;
  const [typed] = operands;
  const commands = named === undefined && typed !== undefined ? nearest(typed, COMMAND_NAMES) : [];
  if (operands.length > most) {
    const extra = quoteInput(operands[most] ?? '');
    const takes = most === 0 ? 'takes no operands' : `takes ${orList(specs.map((spec) => spec.name))} only`;
    return usageError(
      'extra-operand',
      `${extra} is one operand too many`,
      `halfspace ${command} ${takes}`,
      named,
    );
  }
  const usage = `${named === undefined ? '' : `${named} `}${required.map((spec) => spec.name).join(' ')}`;
  const missing = required.slice(operands.length).map((spec) => spec.name);
  const remedy =
    commands.length > 0 ? `did you mean the command ${orList(commands)}?` : `write halfspace ${usage}`;
  return usageError('missing-operand', `${missing.join(', ')} missing`, remedy, named, commands);
}

function notHere(key: OptionKey, command: CommandName): UsageError {
  const { name } = optionSpec(key);
  const where = commandsWith(key).map((other) =>
    other === UNNAMED_COMMAND ? 'a question (FROM INTO WAVE)' : other,
  );
  return usageError(
    'option-not-here',
    `halfspace ${command} takes no --${name}`,
    `it belongs to ${orList(where)}`,
    command,
  );
}

function usageError(
  code: UsageCode,
  message: string,
  remedy: string,
  command: CommandName | undefined,
  candidates: readonly string[] = [],
): UsageError {
  return { code, message, remedy, candidates, command: command === UNNAMED_COMMAND ? undefined : command };
}
