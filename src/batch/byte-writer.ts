/**
 * Output collected as bytes: numbers and copied cells go in without becoming strings first. Two buffers take turns, so that
 * one can be written out while the other fills.
 */
import { writeShortest } from './write-number.ts';
import { LONGEST_ROUNDED, writeRounded } from './write-rounded.ts';

const FIRST_SIZE = 1 << 17;

export class ByteWriter {
  private bytes = Buffer.allocUnsafe(FIRST_SIZE);
  private other = Buffer.allocUnsafe(FIRST_SIZE);
  private used = 0;
  private readonly digits: number | undefined;

  /** Numbers in the shortest text that reads back as the same double, or to `digits` significant ones. */
  constructor(digits?: number) {
    this.digits = digits;
  }

  get length(): number {
    return this.used;
  }

  /** What was collected, good until the next `take`; the writer begins anew in its other buffer. */
  take(): Uint8Array {
    const taken = this.bytes;
    const length = this.used;
    this.bytes = this.other;
    this.other = taken;
    this.used = 0;
    return taken.subarray(0, length);
  }

  byte(value: number): void {
    this.reserve(1);
    this.bytes[this.used++] = value;
  }

  /** A copy of bytes of another buffer. */
  copy(source: Uint8Array, from: number, to: number): void {
    this.reserve(to - from);
    const { bytes } = this;
    let at = this.used;
    if (to - from > LONG) bytes.set(source.subarray(from, to), at);
    else for (let i = from; i < to; i++) bytes[at++] = source[i]!;
    this.used += to - from;
  }

  text(text: string): void {
    this.reserve(3 * text.length);
    this.used += this.bytes.write(text, this.used, 'utf8');
  }

  /** A finite number. */
  number(value: number): void {
    this.reserve(LONGEST_ROUNDED);
    this.used =
      this.digits === undefined
        ? writeShortest(value, this.bytes, this.used)
        : writeRounded(value, this.digits, this.bytes, this.used);
  }

  private reserve(room: number): void {
    if (this.used + room <= this.bytes.length) return;
    const larger = Buffer.allocUnsafe(2 * this.bytes.length + room);
    this.bytes.copy(larger, 0, 0, this.used);
    this.bytes = larger;
  }
}

/** From here on one call of the engine is faster than a loop. */
const LONG = 40;
