/**
 * Batches as separated values: the columns of the input as they stand, byte for byte, then the answer columns, then `error`,
 * which is empty where the row was answered. The separator is that of the header: comma, tab or semicolon.
 */
import type { BatchFormat, BatchSetup, Step } from './batch-format.ts';
import { ERROR_COLUMN, OUTSIDE_COLUMN, rowMessage } from './batch-format.ts';
import { scanDecimal } from './decimal-bytes.ts';
import { type Header, readHeader } from './header.ts';
import { PlainRows } from './plain-rows.ts';
import { type Trouble, trouble } from './question-column.ts';
import { RowAnswers } from './row-answers.ts';
import type { Cells } from './row-layout.ts';
import { LONGEST_ROW, quotedField, RowReader, type RowTrouble } from './row-reader.ts';

const LF = 10;
const QUOTE = 34;

export class CsvBatch implements BatchFormat {
  rows = 0;
  failed = 0;
  fatal: Trouble | undefined;

  private readonly setup: BatchSetup;
  private reader: RowReader | undefined;
  private waiting: Buffer = Buffer.alloc(0);
  private header: Header | undefined;
  private headerDue = true;
  private answers: RowAnswers | undefined;
  private separator = 44;
  private cells: Cells | undefined;
  private plain: PlainRows | undefined;
  private plainTried = false;
  private ended = false;

  constructor(setup: BatchSetup) {
    this.setup = setup;
  }

  get slow(): boolean {
    return this.answers?.whole !== undefined;
  }

  push(chunk: Buffer): void {
    if (this.reader) this.reader.push(chunk);
    else {
      // The header tells the separator; until it is whole nothing can be read.
      this.waiting = Buffer.concat([this.waiting, chunk]);
      if (this.waiting.includes(LF) || this.waiting.length > LONGEST_ROW) this.open();
    }
  }

  end(): void {
    this.ended = true;
    if (!this.reader) this.open();
    this.reader?.end();
  }

  run(limit: number): Step | Promise<Step> {
    for (let left = limit; left > 0; left--) {
      const { reader } = this;
      if (!reader || this.fatal) return 'hungry';
      if (this.plain && !this.headerDue) {
        const rows = this.plain.run(reader, this.setup.writer);
        if (rows > 0) {
          this.rows += rows;
          // A block for a row: the same stride for blocks would keep signals waiting.
          left -= rows - 1;
          continue;
        }
      }
      if (!reader.next()) {
        if (this.ended) this.close();
        return 'hungry';
      }
      if (this.headerDue) {
        this.readHeader(reader);
        continue;
      }
      const waited = this.row(reader);
      if (waited) return waited.then(() => 'more' as const);
    }
    return 'more';
  }

  private open(): void {
    const [first, second] = this.waiting;
    if ((first === 0xff && second === 0xfe) || (first === 0xfe && second === 0xff)) {
      this.fatal = trouble('not-utf8', 'the input is UTF-16', 'save it as UTF-8');
      return;
    }
    const end = this.waiting.indexOf(LF);
    const line = this.waiting.subarray(0, end < 0 ? this.waiting.length : end);
    const separator = [44, 9, 59].find((byte) => line.includes(byte)) ?? 44;
    if (this.header && separator !== this.separator) {
      this.fatal = otherHeader();
      return;
    }
    this.separator = separator;
    this.reader = new RowReader(separator);
    this.reader.push(this.waiting);
    this.waiting = Buffer.alloc(0);
    this.headerDue = true;
    this.cells ??= new CsvCells(() => this.reader);
  }

  /** Ready for another input. */
  private close(): void {
    if (this.headerDue) {
      this.fatal = trouble('no-header', 'the input is empty', 'begin it with a line that names the columns');
    }
    this.reader = undefined;
    this.ended = false;
  }

  private readHeader(reader: RowReader): void {
    this.headerDue = false;
    if (reader.trouble) {
      this.fatal = rowTrouble(reader.trouble);
      return;
    }
    const names = Array.from({ length: reader.fields }, (_, i) => reader.text(i).trim());
    if (this.header) {
      if (names.join('\n') !== this.header.names.join('\n')) this.fatal = otherHeader();
      return;
    }
    if (names[0]?.startsWith('{')) {
      this.fatal = trouble('json-input', 'the input is JSON', 'add --json');
      return;
    }
    const { setup } = this;
    const header = readHeader(names, setup.asking);
    if ('code' in header) {
      this.fatal = header;
      return;
    }
    const added = [...setup.columns.map(({ name }) => name), ...this.marks(), ERROR_COLUMN];
    const clash = added.find((name) => names.includes(name));
    if (clash !== undefined) {
      this.fatal = trouble(
        'column-twice',
        `the input already has a column ${clash}`,
        clash === ERROR_COLUMN || clash === OUTSIDE_COLUMN
          ? 'rename it, or leave it out'
          : 'rename it, or choose other answers with --columns',
      );
      return;
    }
    const answers = new RowAnswers(setup.asking, header.columns, setup.fixed, setup.columns);
    this.fatal = answers.fault();
    if (this.fatal) return;
    if (header.passedOn.length > 0) setup.passedOn(header.passedOn);
    this.header = header;
    this.answers = answers;
    const { writer } = setup;
    writer.copy(reader.bytes, reader.from, reader.to);
    for (const name of added) {
      writer.byte(this.separator);
      writer.text(this.field(name));
    }
    writer.byte(LF);
  }

  private marks(): readonly string[] {
    return this.setup.marksOutside ? [OUTSIDE_COLUMN] : [];
  }

  /** One row; a promise where its answer has to be waited for. */
  private row(reader: RowReader): Promise<void> | undefined {
    const { answers, cells, header } = this;
    if (!answers || !cells || !header) return undefined;
    this.rows++;
    const bad = reader.trouble
      ? rowTrouble(reader.trouble)
      : reader.fields !== header.names.length
        ? fieldCount(reader.fields, header.names.length)
        : answers.evaluate(cells);
    if (bad instanceof Promise) return bad.then((result) => this.write(reader, result));
    this.write(reader, bad);
    // From the first row answered on it is known which media are meant.
    if (!bad && !this.plainTried) this.plain = this.makePlain(answers, header);
    return undefined;
  }

  private makePlain({ lean }: RowAnswers, header: Header): PlainRows | undefined {
    this.plainTried = true;
    const columns = this.setup.marksOutside || this.setup.bulk === false ? undefined : lean?.reader.plain();
    if (!lean || !columns || (!lean.reader.surface.into && !lean.reader.surface.from)) return undefined;
    const { answers, reader } = lean;
    return new PlainRows(answers, reader, columns, header.names.length, this.setup.columns, this.separator);
  }

  private write(reader: RowReader, bad: Trouble | undefined): void {
    const { setup, separator } = this;
    const { writer, columns } = setup;
    this.copyRow(reader);
    if (bad) {
      this.failed++;
      for (let i = columns.length + this.marks().length; i > 0; i--) writer.byte(separator);
      writer.byte(separator);
      writer.text(this.field(setup.wording(rowMessage(reader.line, bad))));
    } else {
      const answers = this.answers!;
      for (let i = 0; i < columns.length; i++) {
        writer.byte(separator);
        const value = answers.value(i);
        if (typeof value === 'number') writer.number(value);
        else if (value !== null) writer.text(this.field(String(value)));
      }
      if (setup.marksOutside) {
        writer.byte(separator);
        writer.text(answers.outside);
      }
      writer.byte(separator);
    }
    writer.byte(LF);
  }

  /** The fields of the input, as many as the header has; a row that cannot be read becomes one quoted field. */
  private copyRow(reader: RowReader): void {
    const { writer } = this.setup;
    const count = this.header?.names.length ?? 1;
    let fields = reader.fields;
    if (reader.trouble) {
      writer.text(this.field(reader.bytes.toString('utf8', reader.from, reader.to)));
      fields = 1;
    } else if (fields <= count) writer.copy(reader.bytes, reader.from, reader.to);
    else writer.copy(reader.bytes, reader.from, reader.ends[count - 1]!);
    for (; fields < count; fields++) writer.byte(this.separator);
  }

  private field(text: string): string {
    return quotedField(text, String.fromCharCode(this.separator));
  }
}

/** The row a reader stands at. */
class CsvCells implements Cells {
  private readonly reader: () => RowReader | undefined;
  private readonly memos: Memo[] = [];

  constructor(reader: () => RowReader | undefined) {
    this.reader = reader;
  }

  text(field: number): string {
    const reader = this.reader()!;
    const start = reader.starts[field]!;
    const length = reader.ends[field]! - start;
    let memo = this.memos[field];
    if (!memo) {
      memo = { bytes: new Uint8Array(LONGEST_MEMO), length: -1, text: '' };
      this.memos[field] = memo;
    }
    if (length === memo.length && same(reader.bytes, start, memo.bytes, length)) return memo.text;
    const text = reader.text(field).trim();
    memo.text = text;
    memo.length = length <= LONGEST_MEMO ? length : -1;
    if (length <= LONGEST_MEMO) memo.bytes.set(reader.bytes.subarray(start, start + length));
    return text;
  }

  decimal(field: number, out: Float64Array): boolean {
    const reader = this.reader()!;
    const start = reader.starts[field]!;
    return reader.bytes[start] !== QUOTE && scanDecimal(reader.bytes, start, reader.ends[field]!, out);
  }
}

/** The bytes of the last cell of a column, so that a column that stays the same becomes no new text. */
interface Memo {
  readonly bytes: Uint8Array;
  length: number;
  text: string;
}

const LONGEST_MEMO = 64;

function same(bytes: Uint8Array, start: number, memo: Uint8Array, length: number): boolean {
  for (let i = 0; i < length; i++) if (bytes[start + i] !== memo[i]) return false;
  return true;
}

const fieldCount = (fields: number, expected: number): Trouble =>
  trouble(
    'field-count',
    `${fields} ${fields === 1 ? 'field' : 'fields'}, where the header has ${expected}`,
    'quote a field that holds the separator',
  );

const otherHeader = (): Trouble =>
  trouble('other-header', 'the inputs have different headers', 'answer them one by one');

const ROW_TROUBLES: Readonly<Record<RowTrouble, Trouble>> = {
  'open-quote': trouble(
    'open-quote',
    'a quote is opened and never closed',
    'close it, or double it inside quotes',
  ),
  'text-after-quote': trouble(
    'text-after-quote',
    'text stands behind a closing quote',
    'double quotes inside quotes',
  ),
  'too-long': trouble('too-long', 'the row is longer than 1 MiB', 'break it into lines'),
};

const rowTrouble = (kind: RowTrouble): Trouble => ROW_TROUBLES[kind];
