/**
 * Batches as JSON lines: one object a row, its keys named as the columns of a header are. Each comes back as it was, with the
 * answers behind its own keys and `error`, which is null where the row was answered. Objects need not have the same keys.
 */
import {
  ANSWER_KEY,
  type BatchFormat,
  type BatchSetup,
  ERROR_COLUMN,
  OUTSIDE_COLUMN,
  rowMessage,
  type Step,
} from './batch-format.ts';
import { readHeader } from './header.ts';
import { LineReader } from './line-reader.ts';
import { type Trouble, trouble } from './question-column.ts';
import { RowAnswers } from './row-answers.ts';
import { finite } from './row-form.ts';
import type { Cells } from './row-layout.ts';

const LF = 10;
/** Sets of keys whose meaning is kept. */
const MOST_SHAPES = 64;

type Row = Readonly<Record<string, unknown>>;

export class JsonBatch implements BatchFormat {
  rows = 0;
  failed = 0;
  slow = false;
  readonly fatal: Trouble | undefined;

  private readonly setup: BatchSetup;
  private reader = new LineReader();
  private readonly shapes = new Map<string, RowAnswers | Trouble>();
  private readonly added: readonly string[];
  private ended = false;
  private readonly told = new Set<string>();

  constructor(setup: BatchSetup) {
    this.setup = setup;
    const { columns, marksOutside, whole } = setup;
    this.added = [
      ...columns.map(({ name }) => name),
      ...(marksOutside ? [OUTSIDE_COLUMN] : []),
      ...(whole ? [ANSWER_KEY] : []),
      ERROR_COLUMN,
    ];
  }

  push(chunk: Buffer): void {
    this.reader.push(chunk);
  }

  end(): void {
    this.ended = true;
    this.reader.end();
  }

  run(limit: number): Step | Promise<Step> {
    for (let left = limit; left > 0; left--) {
      if (!this.reader.next()) {
        if (this.ended) {
          this.ended = false;
          this.reader = new LineReader();
        }
        return 'hungry';
      }
      const waited = this.row(this.reader.text, this.reader.line);
      if (waited) return waited.then(() => 'more' as const);
    }
    return 'more';
  }

  private row(text: string | undefined, line: number): Promise<void> | undefined {
    this.rows++;
    const row = text === undefined ? TOO_LONG : parseRow(text);
    if ('trouble' in row) {
      this.write(undefined, undefined, row.trouble, line);
      return undefined;
    }
    const names = Object.keys(row.object);
    const answers = this.answersTo(names);
    if (!(answers instanceof RowAnswers)) {
      this.write(text, undefined, answers, line);
      return undefined;
    }
    const cells = jsonCells(row.object, names);
    const nested = names.find((name, i) => isNested(row.object[name]) && answers.layout.reads(i));
    const bad = nested !== undefined ? notScalar(nested) : answers.evaluate(cells);
    if (bad instanceof Promise) return bad.then((result) => this.write(text, answers, result, line));
    this.write(text, answers, bad, line);
    return undefined;
  }

  private answersTo(names: readonly string[]): RowAnswers | Trouble {
    const key = JSON.stringify(names);
    const known = this.shapes.get(key);
    if (known) return known;
    const made = this.makeAnswers(names);
    if (this.shapes.size >= MOST_SHAPES) this.shapes.clear();
    this.shapes.set(key, made);
    return made;
  }

  private makeAnswers(names: readonly string[]): RowAnswers | Trouble {
    const { asking, fixed, columns, passedOn } = this.setup;
    const clash = this.added.find((name) => names.includes(name));
    if (clash !== undefined) {
      return trouble('column-twice', `the row already has a key ${clash}`, 'rename it, or leave it out');
    }
    const header = readHeader(names, asking);
    if ('code' in header) return header;
    const news = header.passedOn.filter((name) => !this.told.has(name));
    for (const name of news) this.told.add(name);
    if (news.length > 0) passedOn(news);
    const answers = new RowAnswers(asking, header.columns, fixed, columns, this.setup.whole);
    return answers.fault() ?? answers;
  }

  private write(
    text: string | undefined,
    answers: RowAnswers | undefined,
    bad: Trouble | undefined,
    line: number,
  ): void {
    const { writer, columns, marksOutside, whole, wording } = this.setup;
    this.slow = answers?.whole !== undefined;
    // The object itself, up to its closing brace.
    const own = text?.slice(0, -1).trimEnd() ?? '{';
    writer.text(own);
    let first = own === '{';
    const key = (name: string): void => {
      if (!first) writer.byte(44);
      first = false;
      writer.text(`${JSON.stringify(name)}:`);
    };
    for (const [i, { name }] of columns.entries()) {
      key(name);
      const value = bad || !answers ? null : answers.value(i);
      if (typeof value === 'number') writer.number(value);
      else writer.text(JSON.stringify(value));
    }
    if (marksOutside) {
      key(OUTSIDE_COLUMN);
      writer.text(JSON.stringify(bad || !answers ? null : answers.outside));
    }
    if (whole) {
      key(ANSWER_KEY);
      writer.text(JSON.stringify(bad ? null : (answers?.whole ?? null), finite));
    }
    key(ERROR_COLUMN);
    if (bad) {
      this.failed++;
      const { code, message, remedy } = bad;
      writer.text(wording(JSON.stringify({ line, code, message, remedy, text: rowMessage(line, bad) })));
    } else writer.text('null');
    writer.byte(125);
    writer.byte(LF);
  }
}

function parseRow(text: string): { readonly object: Row } | { readonly trouble: Trouble } {
  try {
    const value: unknown = JSON.parse(text);
    if (typeof value === 'object' && value !== null && !Array.isArray(value)) return { object: value as Row };
  } catch {
    // Said below in our own words.
  }
  return {
    trouble: trouble('not-json', 'the line is no JSON object', 'write one object a line: {"wave":"633nm"}'),
  };
}

const TOO_LONG = {
  trouble: trouble('too-long', 'the line is longer than 1 MiB', 'write one object a line'),
} as const;

const isNested = (value: unknown): boolean => typeof value === 'object' && value !== null;

const notScalar = (name: string): Trouble =>
  trouble('not-a-value', `${name} is no text, number or truth value`, 'write one value');

function jsonCells(row: Row, names: readonly string[]): Cells {
  return {
    text(field) {
      const value = row[names[field] ?? ''];
      return value === null || value === undefined ? '' : String(value).trim();
    },
    decimal: () => false,
  };
}
