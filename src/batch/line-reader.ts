/** Lines out of a stream of byte chunks, in constant memory; blank lines are passed over, a byte order mark is dropped. */
import { LONGEST_ROW } from './row-reader.ts';

const LF = 10;

export class LineReader {
  /** The line last read, without outer blanks; undefined where it is longer than `LONGEST_ROW`. */
  text: string | undefined = '';
  /** Its number, from 1. */
  line = 0;

  private bytes: Buffer = Buffer.alloc(0);
  private at = 0;
  private lines = 0;
  private ended = false;
  private skipping = false;

  push(chunk: Buffer): void {
    const rest = this.bytes.length - this.at;
    this.bytes = rest === 0 ? chunk : Buffer.concat([this.bytes.subarray(this.at), chunk]);
    this.at = 0;
  }

  end(): void {
    this.ended = true;
  }

  /** The next line that is not blank; false where more bytes are needed, or none are left. */
  next(): boolean {
    for (;;) {
      const { bytes, at } = this;
      if (at >= bytes.length) return false;
      const found = bytes.indexOf(LF, at);
      if (found < 0 && !this.ended) {
        if (bytes.length - at <= LONGEST_ROW) return false;
        this.at = bytes.length;
        if (this.skipping) return false;
        this.skipping = true;
        return this.give(undefined, this.lines + 1);
      }
      const end = found < 0 ? bytes.length : found;
      this.at = end + 1;
      this.lines++;
      const skipped = this.skipping;
      this.skipping = false;
      const text = skipped
        ? ''
        : bytes
            .toString('utf8', at, end)
            .replace(/^\uFEFF/, '')
            .trim();
      if (text !== '') return this.give(text, this.lines);
    }
  }

  private give(text: string | undefined, line: number): true {
    this.text = text;
    this.line = line;
    return true;
  }
}
