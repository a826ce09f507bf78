/** What the table of options says about one option. Help, man page, completions and the parser read nothing else. */
import type { Problem } from '../units/problem.ts';

export type OptionGroup =
  | 'question'
  | 'path'
  | 'crystal'
  | 'coating'
  | 'beam'
  | 'selection'
  | 'fit'
  | 'batch'
  | 'form'
  | 'output'
  | 'general';

interface AnyOption {
  /** Long name without dashes. */
  readonly name: string;
  /** One letter, for the commonest only. `-h` is help and nothing else; `-v` is not used. */
  readonly short?: string;
  /** One phrase without a full stop, ASCII. */
  readonly meaning: string;
  readonly group: OptionGroup;
  /** Taken by every command; the others are listed by the commands that take them. */
  readonly everywhere?: true;
  /** Long names of options that contradict this one. */
  readonly excludes?: readonly string[];
  /** Long name of an option without which this one says nothing. */
  readonly needs?: string;
  /** Long names of options of which it needs one at least. */
  readonly needsOneOf?: readonly string[];
  /** For programs (completions), not for people: not shown in help. */
  readonly hidden?: true;
}

export interface FlagOption extends AnyOption {
  readonly kind: 'flag';
}

export interface ValueOption<Value> extends AnyOption {
  readonly kind: 'value';
  /** Stands for the value in help: `ANGLE`. */
  readonly placeholder: string;
  /** What holds where the option is not given, in words of the command line or as a phrase. */
  readonly fallback?: string;
  readonly parse: (text: string) => Value | Problem;
  /** The only words it takes. */
  readonly choices?: readonly string[];
  readonly completes?: 'file' | 'folder';
  /** May be given several times; `parse` gives a list then, and the lists are joined. */
  readonly repeatable?: true;
}

export type OptionSpec = FlagOption | ValueOption<unknown>;

/** What a given option is worth: true for a flag, else the parsed value. */
export type ValueOf<Spec> = Spec extends ValueOption<infer Value> ? Value : true;

export function flag(spec: Omit<FlagOption, 'kind'>): FlagOption {
  return { kind: 'flag', ...spec };
}

export function value<Value>(spec: Omit<ValueOption<Value>, 'kind'>): ValueOption<Value> {
  return { kind: 'value', ...spec };
}

/** An option that takes one of a few words. */
export function choice<Word extends string>(
  spec: Omit<ValueOption<Word>, 'kind' | 'choices' | 'placeholder'> & { readonly choices: readonly Word[] },
): ValueOption<Word> {
  return { kind: 'value', placeholder: spec.choices.join('|'), ...spec };
}
