/** A form that batches come and go in: chunks of bytes in, rows answered in order, bytes out. */
import type { AnswerColumn } from './answer-columns.ts';
import type { ByteWriter } from './byte-writer.ts';
import type { Asking, Trouble } from './question-column.ts';
import type { FixedParts } from './row-layout.ts';

export interface BatchSetup {
  readonly asking: Asking;
  readonly fixed: FixedParts;
  readonly columns: readonly AnswerColumn[];
  readonly writer: ByteWriter;
  /** Adds a column that names the media answered outside the range of their fits. */
  readonly marksOutside: boolean;
  /** Adds the whole answer to each row, where the form can hold it. */
  readonly whole: boolean;
  /** False answers row by row even what could go in bulk, for comparison. */
  readonly bulk?: boolean;
  /** The bytes a message may have. */
  readonly wording: (text: string) => string;
  /** Names of columns that are passed on unread, once they are known. */
  readonly passedOn: (names: readonly string[]) => void;
}

/** Names of what is added behind the answers. */
export const OUTSIDE_COLUMN = 'outside';
export const ERROR_COLUMN = 'error';
export const ANSWER_KEY = 'answer';

/** More rows may be at hand; or more bytes are needed. */
export type Step = 'more' | 'hungry';

export interface BatchFormat {
  /** Bytes of the input; they stay as they are until the next ones come. */
  readonly push: (chunk: Buffer) => void;
  /** The input has ended. Another may follow. */
  readonly end: () => void;
  /** Answers up to `limit` rows. A promise where a row has to be waited for. */
  readonly run: (limit: number) => Step | Promise<Step>;
  readonly rows: number;
  /** True while rows take long, each a question of its own. */
  readonly slow: boolean;
  /** Rows that were not answered. */
  readonly failed: number;
  /** Why the batch cannot go on. */
  readonly fatal: Trouble | undefined;
}

/** "line 3: ...; ..." */
export const rowMessage = (line: number, { message, remedy }: Trouble): string =>
  `line ${line}: ${message}; ${remedy}`;
