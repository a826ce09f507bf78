/**
 * Output collected as bytes: numbers and copied cells go in without becoming strings first. Two buffers take turns, so that
 * one can be written out while the other fills.
 */
import { writeShortest } from './write-number.ts';
import { LONGEST_ROUNDED, writeRounded } from './write-rounded.ts';

const FIRST_SIZE = 1 << 17;

export class ByteWriter {
  /** For writers of whole rows: `room` first, then bytes from `length` on, then `extend`. */
  bytes = Buffer.allocUnsafe(FIRST_SIZE);
  private other = Buffer.allocUnsafe(FIRST_SIZE);
  private used = 0;
  /** 0 for the shortest text. */
  readonly digits: number;

  /** Numbers in the shortest text that reads back as the same double, or to `digits` significant ones. */
  constructor(digits = 0) {
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

  /** Makes sure that so many bytes more fit into `bytes`. */
  room(count: number): void {
    if (this.used + count <= this.bytes.length) return;
    const larger = Buffer.allocUnsafe(2 * this.bytes.length + count);
    this.bytes.copy(larger, 0, 0, this.used);
    this.bytes = larger;
  }

  /** Bytes written by the caller up to here count. */
  extend(length: number): void {
    this.used = length;
  }

  byte(value: number): void {
    this.room(1);
    this.bytes[this.used++] = value;
  }

  /** A copy of bytes of another buffer. */
  copy(source: Uint8Array, from: number, to: number): void {
    this.room(to - from);
    const { bytes } = this;
    let at = this.used;
    if (to - from > LONG) bytes.set(source.subarray(from, to), at);
    else for (let i = from; i < to; i++) bytes[at++] = source[i]!;
    this.used += to - from;
  }

  text(text: string): void {
    this.room(3 * text.length);
    this.used += this.bytes.write(text, this.used, 'utf8');
  }

  /** A finite number. */
  number(value: number): void {
    this.room(LONGEST_ROUNDED);
    this.used =
      this.digits === 0
        ? writeShortest(value, this.bytes, this.used)
        : writeRounded(value, this.digits, this.bytes, this.used);
  }
}

/** From here on one call of the engine is faster than a loop. */
const LONG = 40;
