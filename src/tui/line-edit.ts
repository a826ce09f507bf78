/**
 * The text of one line being typed, edited as in readline: characters, words, ends, kill and yank.
 * Pure: a line in, a line out. The cursor always stands between grapheme clusters, so an accented letter is one step.
 * Special case: control characters and line breaks of a paste become single spaces; outer ones are dropped.
 */
import { clusters } from '../term/display-width.ts';

export interface Line {
  readonly text: string;
  /** Offset in UTF-16 units, on a cluster boundary. */
  readonly cursor: number;
  /** What the last kill took away; `yank` puts it back. */
  readonly killed: string;
}

export type LineCommand =
  | 'left'
  | 'right'
  | 'word-left'
  | 'word-right'
  | 'start'
  | 'end'
  | 'delete-back'
  | 'delete-forward'
  | 'kill-word-back'
  | 'kill-word-forward'
  | 'kill-to-start'
  | 'kill-to-end'
  | 'yank';

export const EMPTY_LINE: Line = { text: '', cursor: 0, killed: '' };

/** A line with the cursor at its end. */
export function lineOf(text: string): Line {
  return { text, cursor: text.length, killed: '' };
}

export function insertText(line: Line, typed: string): Line {
  const text = line.text.slice(0, line.cursor) + typed + line.text.slice(line.cursor);
  return { ...line, text, cursor: line.cursor + typed.length };
}

/** Inserts what was pasted: one line, printable characters only. */
export function pasteText(line: Line, pasted: string): Line {
  return insertText(line, pasted.replace(/[\p{Cc}\u2028\u2029]+/gu, ' ').trim());
}

export function editLine(line: Line, command: LineCommand): Line {
  const { text, cursor } = line;
  switch (command) {
    case 'left':
      return { ...line, cursor: clusterBefore(text, cursor) };
    case 'right':
      return { ...line, cursor: clusterAfter(text, cursor) };
    case 'word-left':
      return { ...line, cursor: wordBefore(text, cursor) };
    case 'word-right':
      return { ...line, cursor: wordAfter(text, cursor) };
    case 'start':
      return { ...line, cursor: 0 };
    case 'end':
      return { ...line, cursor: text.length };
    case 'delete-back':
      return without(line, clusterBefore(text, cursor), cursor);
    case 'delete-forward':
      return without(line, cursor, clusterAfter(text, cursor));
    case 'kill-word-back':
      return kill(line, blankBefore(text, cursor), cursor);
    case 'kill-word-forward':
      return kill(line, cursor, wordAfter(text, cursor));
    case 'kill-to-start':
      return kill(line, 0, cursor);
    case 'kill-to-end':
      return kill(line, cursor, text.length);
    case 'yank':
      return insertText(line, line.killed);
  }
}

function without(line: Line, from: number, to: number): Line {
  return { ...line, text: line.text.slice(0, from) + line.text.slice(to), cursor: from };
}

function kill(line: Line, from: number, to: number): Line {
  return from === to ? line : { ...without(line, from, to), killed: line.text.slice(from, to) };
}

function clusterBefore(text: string, cursor: number): number {
  let at = 0;
  let previous = 0;
  for (const { text: cluster } of clusters(text)) {
    if (at >= cursor) break;
    previous = at;
    at += cluster.length;
  }
  return previous;
}

function clusterAfter(text: string, cursor: number): number {
  let at = 0;
  for (const { text: cluster } of clusters(text)) {
    at += cluster.length;
    if (at > cursor) return at;
  }
  return text.length;
}

const WORD = /[\p{L}\p{M}\p{N}]/u;

function wordBefore(text: string, cursor: number): number {
  let at = cursor;
  while (at > 0 && !WORD.test(text.charAt(at - 1))) at--;
  while (at > 0 && WORD.test(text.charAt(at - 1))) at--;
  return at;
}

function wordAfter(text: string, cursor: number): number {
  let at = cursor;
  while (at < text.length && !WORD.test(text.charAt(at))) at++;
  while (at < text.length && WORD.test(text.charAt(at))) at++;
  return at;
}

/** Ctrl-W takes back to the previous blank. */
function blankBefore(text: string, cursor: number): number {
  let at = cursor;
  while (at > 0 && text.charAt(at - 1) === ' ') at--;
  while (at > 0 && text.charAt(at - 1) !== ' ') at--;
  return at;
}
