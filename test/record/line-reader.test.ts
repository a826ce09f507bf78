/** The lines of a file from either end, compared with splitting the whole text; memory while a long file is read. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  LONGEST_LINE_BYTES,
  linesBackward,
  linesForward,
  type RawLine,
  type ReadAt,
} from '../../src/record/line-reader.ts';

/** Reads from bytes in memory, at most `most` at a time, as a slow disk may. */
const readerOf =
  (bytes: Buffer, most = Number.POSITIVE_INFINITY): ReadAt =>
  (buffer, position) =>
    bytes.copy(buffer, 0, position, Math.min(bytes.length, position + Math.min(most, buffer.length)));

function split(text: string): RawLine[] {
  const lines: RawLine[] = [];
  let offset = 0;
  const parts = text.split('\n');
  parts.forEach((part, i) => {
    if (part !== '') lines.push({ text: part, offset, ended: i < parts.length - 1, tooLong: false });
    offset += Buffer.byteLength(part) + 1;
  });
  return lines;
}

const lineText = fc.oneof(
  fc.constant(''),
  fc.string({ unit: 'binary', maxLength: 30 }).map((text) => text.replaceAll('\n', ' ')),
  fc.integer({ min: 60_000, max: 140_000 }).map((n) => 'µ'.repeat(n / 2)),
);

describe('line reader', () => {
  it('gives the lines that splitting gives, from both ends, whatever the read sizes', () => {
    fc.assert(
      fc.property(
        fc.array(lineText, { maxLength: 12 }),
        fc.boolean(),
        fc.constantFrom(Number.POSITIVE_INFINITY, 65_537, 4096, 1000),
        (lines, ended, most) => {
          const text = lines.join('\n') + (ended ? '\n' : '');
          const bytes = Buffer.from(text);
          const expected = split(bytes.toString('utf8'));
          expect([...linesForward(readerOf(bytes, most), bytes.length)]).toEqual(expected);
          expect([...linesBackward(readerOf(bytes, most), bytes.length)]).toEqual(expected.reverse());
        },
      ),
      { numRuns: 150 },
    );
  });

  it('shortens a line beyond the longest and goes on behind it', () => {
    const bytes = Buffer.concat([
      Buffer.from('first\n'),
      Buffer.alloc(LONGEST_LINE_BYTES + 1, 'a'),
      Buffer.from('\nlast\n'),
    ]);
    for (const lines of [linesForward, linesBackward]) {
      const found = [...lines(readerOf(bytes), bytes.length)].sort((a, b) => a.offset - b.offset);
      expect(found.map((line) => [line.text.slice(0, 5), line.offset, line.tooLong])).toEqual([
        ['first', 0, false],
        ['aaaaa', 6, true],
        ['last', LONGEST_LINE_BYTES + 8, false],
      ]);
      expect(found[1]?.text.length).toBeLessThan(2000);
    }
  });

  it('reads a quarter of a gigabyte in little memory', () => {
    const line = Buffer.from(`${'x'.repeat(4095)}\n`);
    const endless: ReadAt = (buffer, position) => {
      for (let i = 0; i < buffer.length; i += line.length) line.copy(buffer, i, (position + i) % line.length);
      return buffer.length;
    };
    const size = 2 ** 28;
    const before = process.memoryUsage.rss();
    let count = 0;
    let most = 0;
    for (const { text } of linesForward(endless, size)) {
      count += text.length > 0 ? 1 : 0;
      if (count % 20_000 === 0) most = Math.max(most, process.memoryUsage.rss() - before);
    }
    expect(count).toBe(size / line.length);
    for (const { text } of linesBackward(endless, size)) {
      expect(text.length).toBe(4095);
      break;
    }
    expect(most).toBeLessThan(150e6);
  });

  it('stops quietly where the file has become shorter meanwhile', () => {
    const bytes = Buffer.from('one\ntwo\n');
    expect([...linesForward(readerOf(bytes), 100_000)].map((line) => line.text)).toEqual(['one', 'two']);
    expect([...linesBackward(readerOf(bytes), 100)].map((line) => line.text)).toEqual(['two', 'one']);
  });
});
