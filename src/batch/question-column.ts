/**
 * What a batch may hold for each row: the parts of a question, as columns. The list itself comes from the command line's
 * table of options, so that a column means what the option of its name means.
 */
import type { Answer } from '../answer/answer.ts';
import type { MediumSpec } from '../answer/question.ts';
import type { Refusal } from '../medium/refusal.ts';
import type { Problem } from '../units/problem.ts';

export interface QuestionColumn {
  /** `from`, `into`, `path`, `wave`, or the key of the option's value: `angle_rad`. */
  readonly key: string;
  /** As a person writes it in a header, words joined by `-`. */
  readonly name: string;
  readonly aliases: readonly string[];
  /** The unit as the cells take it, where the column may have that unit; undefined where not. */
  readonly unit: (text: string) => string | undefined;
  /** Units to name where another is written. Empty for a column that takes none. */
  readonly unitNames: string;
  /** The value of a cell that states something. */
  readonly parse: (text: string) => unknown;
}

/** Option values of one row, by key, as the command line would have parsed them. */
export type RowOptions = Readonly<Record<string, unknown>>;

/** How the rows are answered; the command line lends its own ways. */
export interface Asking {
  readonly columns: readonly QuestionColumn[];
  /** The whole answer, as the one-shot command gives it: operands are the path of media and the wave. */
  readonly answer: (
    operands: readonly string[],
    options: RowOptions,
  ) => Answer | Refusal | Promise<Answer | Refusal>;
  /** The medium of a name or of numbers; undefined where `answer` has something to say about it. */
  readonly medium: (text: string) => MediumSpec | undefined;
  /** Names close to one that is not known. */
  readonly nearest: (word: string, names: readonly string[]) => readonly string[];
}

/** Why a row or the whole batch is not answered, in words for one line. */
export interface Trouble {
  readonly code: string;
  readonly message: string;
  readonly remedy: string;
}

export const trouble = (code: string, message: string, remedy: string): Trouble => ({
  code,
  message,
  remedy,
});

export const troubleOf = ({ code, message, remedy }: Problem | Refusal | Trouble): Trouble => ({
  code,
  message,
  remedy,
});
