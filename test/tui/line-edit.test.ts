import fc from 'fast-check';
import { expect, it } from 'vitest';
import {
  editLine,
  insertText,
  type Line,
  type LineCommand,
  lineOf,
  pasteText,
} from '../../src/tui/line-edit.ts';

/** A line written with `|` where the cursor is. */
function at(marked: string, killed = ''): Line {
  const cursor = marked.indexOf('|');
  return { text: marked.replace('|', ''), cursor, killed };
}
const show = (line: Line): string => `${line.text.slice(0, line.cursor)}|${line.text.slice(line.cursor)}`;

it.each<[string, LineCommand, string]>([
  ['abc|', 'left', 'ab|c'],
  ['|abc', 'left', '|abc'],
  ['ab|c', 'right', 'abc|'],
  ['n=1.5+0.1i|', 'word-left', 'n=1.5+0.|1i'],
  ['|fused silica', 'word-right', 'fused| silica'],
  ['fused| silica', 'word-right', 'fused silica|'],
  ['ab|c', 'start', '|abc'],
  ['ab|c', 'end', 'abc|'],
  ['ab|c', 'delete-back', 'a|c'],
  ['|abc', 'delete-back', '|abc'],
  ['ab|c', 'delete-forward', 'ab|'],
  ['fused sil|ica', 'kill-word-back', 'fused |ica'],
  ['fused |silica', 'kill-word-back', '|silica'],
  ['fused |silica x', 'kill-word-forward', 'fused | x'],
  ['fused |silica', 'kill-to-start', '|silica'],
  ['fused |silica', 'kill-to-end', 'fused |'],
])('edits %s by %s to %s', (before, command, after) => {
  expect(show(editLine(at(before), command))).toBe(after);
});

it('puts back what the last kill took', () => {
  const killed = editLine(at('633 nm|'), 'kill-to-start');
  expect(show(editLine(insertText(killed, 'x'), 'yank'))).toBe('x633 nm|');
});

it('steps over a whole accented letter', () => {
  const line = lineOf('a\u0301b');
  expect(editLine(editLine(line, 'left'), 'left').cursor).toBe(0);
  expect(editLine(editLine(line, 'left'), 'delete-back').text).toBe('b');
});

it('takes a paste as one line of printable text', () => {
  expect(pasteText(at('n|'), '=1.5\r\n').text).toBe('n=1.5');
  expect(pasteText(at('|'), 'fused\nsilica\x1b').text).toBe('fused silica');
});

it('keeps the cursor inside the text whatever is done', () => {
  const commands: LineCommand[] = [
    'left',
    'right',
    'word-left',
    'word-right',
    'delete-back',
    'delete-forward',
    'kill-word-back',
    'kill-word-forward',
    'kill-to-start',
    'kill-to-end',
    'yank',
  ];
  fc.assert(
    fc.property(fc.string({ unit: 'grapheme' }), fc.array(fc.constantFrom(...commands)), (text, applied) => {
      const end = applied.reduce(editLine, lineOf(text));
      return end.cursor >= 0 && end.cursor <= end.text.length;
    }),
  );
});
