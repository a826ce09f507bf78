/**
 * The bulk of a large batch: rows of plain numbers, without quotes, about media that stay the same. They are read, answered
 * and written block by block in three tight passes over typed arrays. The numbers and the order of the operations are those
 * of the row-by-row way (`row-answers.ts`); the first row that is anything else ends the block and is left to that way.
 */
import type { AnswerColumn } from './answer-columns.ts';
import type { ByteWriter } from './byte-writer.ts';
import { MOST_DIGITS } from './decimal-bytes.ts';
import { type LeanAnswers, type LeanRows, makeRows } from './lean-answer.ts';
import { type LeanReader, type PlainColumns, putWaves } from './lean-reader.ts';
import { numberValue } from './number-cell.ts';
import type { RowReader } from './row-reader.ts';
import { writeShortest } from './write-number.ts';
import { LONGEST_ROUNDED, writeRounded } from './write-rounded.ts';

const LF = 10;
const CR = 13;
const QUOTE = 34;

const MOST_ROWS = 512;
/** After a row for the other way, in case more of them come. */
const FEW_ROWS = 8;

export class PlainRows {
  private readonly answers: LeanAnswers;
  private readonly reader: LeanReader;
  private readonly columns: PlainColumns;
  private readonly fields: number;
  /** By column. */
  private readonly values: readonly Float64Array[];
  private readonly factors: Float64Array;
  private readonly separator: number;

  private readonly rows: LeanRows = makeRows(MOST_ROWS);
  private readonly from = new Int32Array(MOST_ROWS);
  private readonly to = new Int32Array(MOST_ROWS);
  /** Place behind each row, and the lines that are over by then. */
  private readonly behind = new Int32Array(MOST_ROWS);
  private readonly lines = new Int32Array(MOST_ROWS);
  private block = MOST_ROWS;

  constructor(
    answers: LeanAnswers,
    reader: LeanReader,
    columns: PlainColumns,
    fields: number,
    asked: readonly AnswerColumn[],
    separator: number,
  ) {
    this.answers = answers;
    this.reader = reader;
    this.columns = columns;
    this.fields = fields;
    this.values = asked.map((_, column) => answers.valuesOf(this.rows, column));
    this.factors = Float64Array.from(asked, ({ factor }) => factor);
    this.separator = separator;
  }

  /** Answers the plain rows that come next, at most one block of them; how many. */
  run(reader: RowReader, writer: ByteWriter): number {
    const scanned = this.scan(reader.bytes, reader.position);
    putWaves(this.rows, scanned, this.columns.inAir);
    const answered = this.answers.evaluateBlock(this.reader.surface, this.rows, scanned);
    this.block = answered < this.block ? FEW_ROWS : Math.min(2 * this.block, MOST_ROWS);
    if (answered === 0) return 0;
    for (let row = 0; row < answered; row++) this.write(reader.bytes, row, writer);
    reader.advance(this.behind[answered - 1]!, this.lines[answered - 1]!);
    return answered;
  }

  /** Finds rows and reads their numbers, up to the first that is not plain or not whole; how many. */
  private scan(bytes: Uint8Array, position: number): number {
    const { separator, fields, block, from, to, behind, lines } = this;
    const { waveField, angleField, wave, angle } = this.columns;
    const { angle_rad, given_m } = this.rows;
    const size = bytes.length;
    let i = position;
    let line = 0;
    let row = 0;
    while (row < block) {
      const start = i;
      let field = 0;
      let byte = 0;
      for (;;) {
        if (field === waveField || field === angleField) {
          // As `scanDecimal` reads it, blanks apart.
          let mantissa = 0;
          let digits = 0;
          let point = -1;
          for (; i < size; i++) {
            byte = bytes[i]!;
            if (byte >= 48 && byte <= 57) {
              mantissa = mantissa * 10 + (byte - 48);
              digits++;
            } else if (byte === 46 && point < 0) point = digits;
            else break;
          }
          if (i >= size) return row;
          if (byte === CR && bytes[i + 1] === LF) byte = bytes[++i]!;
          // A blank line begins like an empty cell.
          if (digits === 0 && field === 0 && byte === LF) break;
          if (digits === 0 || digits > MOST_DIGITS || (byte !== separator && byte !== LF)) return row;
          const exponent = point < 0 ? 0 : point - digits;
          if (field === waveField) given_m[row] = numberValue(wave, mantissa, exponent);
          else if (angle) angle_rad[row] = numberValue(angle, mantissa, exponent);
        } else {
          for (; i < size; i++) {
            byte = bytes[i]!;
            if (byte === separator || byte === LF || byte === QUOTE) break;
          }
          if (i >= size || byte === QUOTE) return row;
        }
        if (byte === LF) break;
        i++;
        field++;
      }
      const end = i > start && bytes[i - 1] === CR ? i - 1 : i;
      i++;
      line++;
      if (end === start) continue;
      if (field + 1 !== fields || !(given_m[row]! > 0)) return row;
      if (angleField < 0) angle_rad[row] = this.columns.fixedAngle_rad;
      else if (!(angle_rad[row]! >= 0)) return row;
      from[row] = start;
      to[row] = end;
      behind[row] = i;
      lines[row] = line;
      row++;
    }
    return row;
  }

  private write(bytes: Uint8Array, row: number, writer: ByteWriter): void {
    const { separator, values, factors } = this;
    const from = this.from[row]!;
    const to = this.to[row]!;
    writer.room(to - from + 2 + values.length * (LONGEST_ROUNDED + 1));
    const out = writer.bytes;
    const { digits } = writer;
    let o = writer.length;
    for (let i = from; i < to; i++) out[o++] = bytes[i]!;
    for (let column = 0; column < values.length; column++) {
      out[o++] = separator;
      const value = values[column]![row]! * factors[column]!;
      if (!Number.isFinite(value)) continue;
      o = digits === 0 ? writeShortest(value, out, o) : writeRounded(value, digits, out, o);
    }
    out[o++] = separator;
    out[o++] = LF;
    writer.extend(o);
  }
}
