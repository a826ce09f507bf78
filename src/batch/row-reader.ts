/**
 * Rows of separated values (RFC 4180) out of a stream of byte chunks, in constant memory: the bytes of a row stay where they
 * are, and the reader says where its fields begin and end. Line ends are LF or CR LF, the last may be missing; blank lines
 * are passed over; a byte order mark is dropped. A field that begins with a quote ends with one, may hold separators and
 * line ends, and doubles quotes inside; a quote elsewhere is a character like any other.
 *
 * What is no row does not stop the rest: a quote that is never closed, or a row beyond `LONGEST_ROW`, makes the line it
 * stands in a row of its own with `trouble`.
 */
const LF = 10;
const CR = 13;
const QUOTE = 34;

export const LONGEST_ROW = 1 << 20;

export type RowTrouble = 'open-quote' | 'text-after-quote' | 'too-long';

export class RowReader {
  /** Of the row last read, until the next call. */
  bytes: Buffer = Buffer.alloc(0);
  from = 0;
  to = 0;
  fields = 0;
  starts: Int32Array = new Int32Array(64);
  ends: Int32Array = new Int32Array(64);
  /** True where any field is quoted. */
  quoted = false;
  trouble: RowTrouble | undefined;
  /** Number of the line it begins in, from 1. */
  line = 0;

  private readonly separator: number;
  private at = 0;
  private ended = false;
  private fresh = true;
  private lines = 0;
  private skipping = false;

  constructor(separator: number) {
    this.separator = separator;
  }

  /** More bytes; the reader keeps them, so they must not change until it has asked for more. */
  push(chunk: Buffer): void {
    const rest = this.bytes.length - this.at;
    this.bytes = rest === 0 ? chunk : Buffer.concat([this.bytes.subarray(this.at), chunk]);
    this.at = 0;
    if (this.fresh && this.bytes.length >= 3) {
      this.fresh = false;
      if (this.bytes[0] === 0xef && this.bytes[1] === 0xbb && this.bytes[2] === 0xbf) this.at = 3;
    }
  }

  /** Where the next row, or a blank line before it, begins in `bytes`; beyond their end where nothing is left. */
  get position(): number {
    return this.skipping ? this.bytes.length : this.at;
  }

  /** Passes over rows that somebody else has read: up to `position`, so many lines. */
  advance(position: number, lines: number): void {
    this.at = position;
    this.lines += lines;
    this.fresh = false;
  }

  /** No more bytes will come. */
  end(): void {
    this.ended = true;
  }

  /** The next row; false where more bytes are needed, or none are left. */
  next(): boolean {
    for (;;) {
      if (this.skipping && !this.skip()) return false;
      const { bytes, at } = this;
      if (at >= bytes.length) return false;
      if (bytes[at] === LF || (bytes[at] === CR && bytes[at + 1] === LF)) {
        this.at = at + (bytes[at] === LF ? 1 : 2);
        this.lines++;
        continue;
      }
      return this.read(at);
    }
  }

  private read(start: number): boolean {
    const { bytes, separator } = this;
    const size = bytes.length;
    this.quoted = false;
    this.trouble = undefined;
    let { starts, ends } = this;
    let field = 0;
    let newlines = 0;
    let fieldStart = start;
    let i = start;
    for (; i < size; i++) {
      const byte = bytes[i]!;
      if (byte === separator) {
        if (field + 2 >= starts.length) ({ starts, ends } = this.widen());
        starts[field] = fieldStart;
        ends[field++] = i;
        fieldStart = i + 1;
      } else if (byte === LF) break;
      else if (byte === QUOTE && i === fieldStart) {
        this.quoted = true;
        const close = this.closing(i + 1);
        if (close < 0) {
          if (!this.ended && size - start <= LONGEST_ROW) return false;
          return this.broken(start, 'open-quote');
        }
        for (let j = i + 1; j < close; j++) if (bytes[j] === LF) newlines++;
        i = close;
        const after = bytes[i + 1];
        const closed = after === undefined || after === separator || after === LF || after === CR;
        if (!closed) this.trouble = 'text-after-quote';
      }
    }
    if (i >= size && !this.ended) {
      if (size - start <= LONGEST_ROW) return false;
      this.skipping = true;
      return this.broken(start, 'too-long');
    }
    const end = i > start && bytes[i - 1] === CR ? i - 1 : i;
    this.fresh = false;
    starts[field] = fieldStart;
    ends[field++] = Math.max(fieldStart, end);
    this.from = start;
    this.to = end;
    this.fields = field;
    this.line = this.lines + 1;
    this.lines += newlines + 1;
    this.at = i + 1;
    return true;
  }

  /** Where the quote opened before `from` closes; negative where it does not in these bytes. */
  private closing(from: number): number {
    const { bytes } = this;
    let i = from;
    for (;;) {
      i = bytes.indexOf(QUOTE, i);
      if (i < 0) return -1;
      // A quote at the very end may be the first of two.
      if (i + 1 >= bytes.length) return this.ended ? i : -1;
      if (bytes[i + 1] !== QUOTE) return i;
      i += 2;
    }
  }

  /** The line from `start` as a row by itself that cannot be read. */
  private broken(start: number, trouble: RowTrouble): true {
    const { bytes } = this;
    const found = bytes.indexOf(LF, start);
    const end = found < 0 ? bytes.length : found;
    this.trouble = trouble;
    this.from = start;
    this.to = trouble === 'too-long' ? start : end > start && bytes[end - 1] === CR ? end - 1 : end;
    this.fields = 0;
    this.line = this.lines + 1;
    if (trouble === 'too-long') this.at = bytes.length;
    else {
      this.at = end + 1;
      this.lines++;
    }
    return true;
  }

  /** Passes over the rest of a line that is too long; false where its end has not come yet. */
  private skip(): boolean {
    const end = this.bytes.indexOf(LF, this.at);
    if (end < 0) {
      this.at = this.bytes.length;
      return false;
    }
    this.skipping = false;
    this.lines++;
    this.at = end + 1;
    return true;
  }

  private widen(): { starts: Int32Array; ends: Int32Array } {
    const twice = (old: Int32Array): Int32Array => {
      const wider = new Int32Array(2 * old.length);
      wider.set(old);
      return wider;
    };
    this.starts = twice(this.starts);
    this.ends = twice(this.ends);
    return this;
  }

  /** Field number `i` as text, quotes taken off. */
  text(i: number): string {
    const start = this.starts[i]!;
    const end = this.ends[i]!;
    if (this.bytes[start] !== QUOTE || end - start < 2) return this.bytes.toString('utf8', start, end);
    const close = this.bytes[end - 1] === QUOTE ? end - 1 : end;
    return this.bytes.toString('utf8', start + 1, close).replaceAll('""', '"');
  }
}

/** A field as it is written: quoted where it holds the separator, a quote or a line end. */
export function quotedField(text: string, separator: string): string {
  return text.includes(separator) || /["\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
