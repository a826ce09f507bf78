/**
 * Splits a command line into operands and options as typed, by the table of options alone: options and operands in any
 * order, `--name=value` and `--name value`, `-o value` and `-ovalue`, single letters joined (`-qo file`), `--` before
 * operands that begin with a dash. What follows an option that takes a value is its value, even if it begins with a dash
 * (`--temperature -40C`), unless it is itself an option. `-5` and `-` are operands. No abbreviations.
 */
import { isDigit } from '../num/ascii.ts';
import { orList } from '../units/parse-choice.ts';
import { quoteInput } from '../units/quote-input.ts';
import { MOST_CANDIDATES, nearest } from './nearest.ts';
import type { OptionSpec } from './option-spec.ts';
import { OPTION_KEYS, type OptionKey, optionKeyByLetter, optionKeyByName, optionSpec } from './options.ts';
import type { UsageError } from './usage-error.ts';

export interface GivenOption {
  readonly key: OptionKey;
  /** Absent for a flag. */
  readonly text?: string;
}

export interface ReadOptions {
  readonly operands: readonly string[];
  /** How many of the operands stood before `--`. */
  readonly beforeDashes: number;
  readonly given: readonly GivenOption[];
  /** The first thing not understood. What follows it is read all the same. */
  readonly error?: UsageError;
}

export function readOptions(argv: readonly string[]): ReadOptions {
  const end = endOfOptions(argv);
  const operands: string[] = [];
  const given: GivenOption[] = [];
  const errors: UsageError[] = [];
  for (let i = 0; i < end; i++) {
    const argument = argv[i] ?? '';
    if (!looksLikeOption(argument)) {
      operands.push(argument);
      continue;
    }
    const next = i + 1 < end ? argv[i + 1] : undefined;
    const read = argument.startsWith('--') ? readLong(argument, next) : readLetters(argument, next);
    given.push(...read.given);
    if (read.error) errors.push(read.error);
    if (read.tookNext) i++;
  }
  const beforeDashes = operands.length;
  operands.push(...argv.slice(end + 1));
  const [error] = errors;
  return { operands, beforeDashes, given, ...(error && { error }) };
}

/** Where the `--` stands that ends the options; it may be an option's missing value, so it always ends them. */
function endOfOptions(argv: readonly string[]): number {
  const index = argv.indexOf('--');
  return index < 0 ? argv.length : index;
}

interface OneRead {
  readonly given: readonly GivenOption[];
  readonly tookNext?: boolean;
  readonly error?: UsageError;
}

function readLong(argument: string, next: string | undefined): OneRead {
  const equals = argument.indexOf('=');
  const name = equals < 0 ? argument.slice(2) : argument.slice(2, equals);
  const inline = equals < 0 ? undefined : argument.slice(equals + 1);
  const key = optionKeyByName(name);
  if (key === undefined) return { given: [], error: unknownOption(`--${name}`) };
  if (optionSpec(key).kind === 'flag') {
    return inline === undefined ? { given: [{ key }] } : { given: [], error: unexpectedValue(key, inline) };
  }
  return withValue(key, inline, next);
}

/** `-q`, `-qh`, `-o file`, `-ofile`: letters up to the first that takes a value, which takes the rest. */
function readLetters(argument: string, next: string | undefined): OneRead {
  const given: GivenOption[] = [];
  for (let j = 1; j < argument.length; j++) {
    const key = optionKeyByLetter(argument[j] ?? '');
    if (key === undefined) return { given, error: unknownOption(argument) };
    if (optionSpec(key).kind === 'value') {
      const rest = argument.slice(j + 1);
      const last = withValue(key, rest === '' ? undefined : rest, next);
      return { ...last, given: [...given, ...last.given] };
    }
    given.push({ key });
  }
  return { given };
}

function withValue(key: OptionKey, inline: string | undefined, next: string | undefined): OneRead {
  if (inline !== undefined) return { given: [{ key, text: inline }] };
  if (next === undefined || isKnownOption(next)) return { given: [], error: missingValue(key) };
  return { given: [{ key, text: next }], tookNext: true };
}

function looksLikeOption(argument: string): boolean {
  const second = argument[1];
  return argument[0] === '-' && second !== undefined && second !== '.' && !isDigit(argument.charCodeAt(1));
}

function isKnownOption(argument: string): boolean {
  if (argument.startsWith('--')) return optionKeyByName(argument.slice(2).replace(/=.*/s, '')) !== undefined;
  return /^-.$/.test(argument) && optionKeyByLetter(argument.slice(1)) !== undefined;
}

function unknownOption(typed: string): UsageError {
  const specs = OPTION_KEYS.map(optionSpec).filter((spec) => !spec.hidden);
  const candidates =
    typed.length === 2
      ? meantByLetter(typed.slice(1).toLowerCase(), specs)
      : nearest(
          typed,
          specs.map((spec) => `--${spec.name}`),
        );
  const remedy =
    candidates.length > 0
      ? `did you mean ${orList(candidates)}?`
      : 'an operand that begins with - goes after --';
  return { code: 'unknown-option', message: `there is no option ${plain(typed)}`, remedy, candidates };
}

/** Of a letter that is none: the same one in the other case, else the options whose names begin with it. */
function meantByLetter(letter: string, specs: readonly OptionSpec[]): readonly string[] {
  const other = specs.find(({ short }) => short?.toLowerCase() === letter);
  if (other) return [`-${other.short}`];
  const begin = specs.filter(({ name }) => name.startsWith(letter));
  return begin.slice(0, MOST_CANDIDATES).map(({ name }) => `--${name}`);
}

function missingValue(key: OptionKey): UsageError {
  const spec = optionSpec(key);
  const placeholder = spec.kind === 'value' ? spec.placeholder : '';
  const remedy = `write --${spec.name} ${placeholder} (${spec.meaning})`;
  return { code: 'missing-value', message: `--${spec.name} needs a value`, remedy, candidates: [] };
}

function unexpectedValue(key: OptionKey, text: string): UsageError {
  const { name } = optionSpec(key);
  const message = `--${name} takes no value, but ${quoteInput(text)} is given`;
  return { code: 'unexpected-value', message, remedy: `write --${name} alone`, candidates: [] };
}

function plain(typed: string): string {
  return quoteInput(typed).slice(1, -1);
}
