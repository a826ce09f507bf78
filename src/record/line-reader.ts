/**
 * The lines of a file, one at a time, from either end, in constant memory.
 *
 * A line is what stands between two newlines, empty ones left out. Bytes are cut at 0x0A before they are decoded, which UTF-8
 * allows. A line longer than `LONGEST_LINE_BYTES` is given by its first part alone and marked.
 */
export const LONGEST_LINE_BYTES = 16 * 2 ** 20;
const CHUNK_BYTES = 2 ** 16;
const SHOWN_OF_TOO_LONG_BYTES = 1024;
const NEWLINE = 0x0a;

export interface RawLine {
  readonly text: string;
  /** Byte at which the line starts. */
  readonly offset: number;
  /** False for a last line without a newline: being written at this moment, or cut off. */
  readonly ended: boolean;
  readonly tooLong: boolean;
}

/** Reads bytes at a place of the file into the buffer; returns how many, 0 at the end. */
export type ReadAt = (buffer: Uint8Array, position: number) => number;

/** Oldest line first, up to the byte `size`. */
export function* linesForward(read: ReadAt, size: number): Generator<RawLine, void> {
  const chunk = Buffer.allocUnsafe(CHUNK_BYTES);
  let line = new LineParts(0);
  for (let position = 0; position < size; ) {
    const got = read(chunk.subarray(0, Math.min(CHUNK_BYTES, size - position)), position);
    if (got === 0) break;
    let start = 0;
    for (;;) {
      const newline = chunk.subarray(0, got).indexOf(NEWLINE, start);
      if (newline < 0) break;
      line.append(chunk.subarray(start, newline));
      if (line.length > 0) yield line.whole(true);
      start = newline + 1;
      line = new LineParts(position + start);
    }
    line.append(chunk.subarray(start, got));
    position += got;
  }
  if (line.length > 0) yield line.whole(false);
}

/** Newest line first: those that start before the byte `size`. */
export function* linesBackward(read: ReadAt, size: number): Generator<RawLine, void> {
  const chunk = Buffer.allocUnsafe(CHUNK_BYTES);
  let line = new LineParts(0);
  let ended = false;
  for (let end = size; end > 0; ) {
    const start = Math.max(0, end - CHUNK_BYTES);
    const got = readWhole(read, chunk.subarray(0, end - start), start);
    let upTo = got;
    for (;;) {
      const newline = upTo > 0 ? chunk.lastIndexOf(NEWLINE, upTo - 1) : -1;
      if (newline < 0) break;
      line.prepend(chunk.subarray(newline + 1, upTo), start + newline + 1);
      if (line.length > 0) yield line.whole(ended);
      ended = true;
      line = new LineParts(start + newline);
      upTo = newline;
    }
    line.prepend(chunk.subarray(0, upTo), start);
    end = start;
  }
  if (line.length > 0) yield line.whole(ended);
}

function readWhole(read: ReadAt, buffer: Uint8Array, position: number): number {
  let got = 0;
  while (got < buffer.length) {
    const more = read(buffer.subarray(got), position + got);
    if (more === 0) break;
    got += more;
  }
  return got;
}

/** A line collected piece by piece; of one that grows too long only the first bytes are kept. */
class LineParts {
  length = 0;
  private parts: Buffer[] = [];
  private offset: number;

  constructor(offset: number) {
    this.offset = offset;
  }

  append(part: Buffer): void {
    if (part.length === 0) return;
    this.length += part.length;
    if (this.length <= LONGEST_LINE_BYTES) this.parts.push(Buffer.from(part));
    else this.parts = [this.firstBytes()];
  }

  prepend(part: Buffer, offset: number): void {
    this.offset = offset;
    if (part.length === 0) return;
    this.length += part.length;
    this.parts.unshift(Buffer.from(part));
    if (this.length > LONGEST_LINE_BYTES) this.parts = [this.firstBytes()];
  }

  whole(ended: boolean): RawLine {
    const tooLong = this.length > LONGEST_LINE_BYTES;
    const text = Buffer.concat(this.parts).toString('utf8');
    return { text, offset: this.offset, ended, tooLong };
  }

  private firstBytes(): Buffer {
    return Buffer.concat(this.parts).subarray(0, SHOWN_OF_TOO_LONG_BYTES);
  }
}
