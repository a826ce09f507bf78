import { describe, expect, it } from 'vitest';
import { parseRow } from '../../src/term/cells.ts';
import { PLAIN } from '../../src/term/sgr.ts';

const glyphs = (line: string, columns = 20): string[] => [...parseRow(line, columns).glyphs];
const styles = (line: string): string[] => parseRow(line, 20).styles.map((style) => style.code);

describe('the cells of a row', () => {
  it.each([
    ['plain text', 'n=1.5', ['n', '=', '1', '.', '5']],
    ['trailing blanks are not stored', 'ab   ', ['a', 'b']],
    ['a wide glyph takes two cells', 'a石b', ['a', '石', '', 'b']],
    ['a combining mark stays with its letter', 'man\u0303a', ['m', 'a', 'n\u0303', 'a']],
    ['a lone combining mark takes no cell', '\u0301ab', ['\u0301ab'[1], 'b']],
    ['the blank braille cell becomes a space', '⠁\u2800⠁', ['⠁', ' ', '⠁']],
    ['control characters are dropped', 'a\u0007b\tc\u009bd\re', ['a', 'b', 'c', 'd', 'e']],
    ['soft hyphens and directional marks are dropped', 'a\u00adb\u202ec\u200bd', ['a', 'b', 'c', 'd']],
    ['a foreign control sequence is dropped', 'a\x1b[2Jb\x1b[3;4Hc\x1b[?25hd', ['a', 'b', 'c', 'd']],
    ['a title is dropped', 'a\x1b]0;title\x07b\x1b]8;;x\x1b\\c', ['a', 'b', 'c']],
    ['a device control string is dropped', 'a\x1bPq#0\x1b\\b', ['a', 'b']],
    ['an unfinished sequence is dropped', 'ab\x1b[3', ['a', 'b']],
    ['a lone escape is dropped', 'ab\x1b', ['a', 'b']],
  ])('%s', (_, line, expected) => {
    expect(glyphs(line)).toEqual(expected);
  });

  it.each([
    ['cuts at the right edge', 'abcdef', 4, ['a', 'b', 'c', 'd']],
    ['leaves out a wide glyph cut in half', 'abc石', 4, ['a', 'b', 'c']],
    ['keeps a wide glyph that just fits', 'ab石x', 4, ['a', 'b', '石', '']],
    ['keeps a mark on the last cell', 'abce\u0301f', 4, ['a', 'b', 'c', 'e\u0301']],
    ['has no cell on a screen of no columns', 'abc', 0, []],
  ])('%s', (_, line, columns, expected) => {
    expect(glyphs(line, columns)).toEqual(expected);
  });

  it('carries styles to the cells', () => {
    expect(styles('a\x1b[1mb\x1b[31mc\x1b[22md\x1b[39me')).toEqual(['', '1', '1;31', '31', '']);
    expect(styles('\x1b[38;5;208ma\x1b[48;2;1;2;3mb\x1b[0mc')).toEqual([
      '38;5;208',
      '38;5;208;48;2;1;2;3',
      '',
    ]);
    expect(styles('\x1b[2;3;4;7;9ma\x1b[23;24mb\x1b[27;29mc\x1b[md')).toEqual([
      '2;3;4;7;9',
      '2;7;9',
      '2',
      '',
    ]);
    expect(styles('\x1b[95;104ma\x1b[49mb')).toEqual(['95;104', '95']);
  });

  it('ignores what it does not know in a style', () => {
    expect(styles('\x1b[5;8;1;21;53ma')).toEqual(['1']);
  });

  it('drops of the style of a blank what does not show', () => {
    expect(styles('\x1b[1;31ma b')).toEqual(['1;31', '', '1;31']);
    expect(styles('\x1b[7ma b')).toEqual(['7', '7', '7']);
    expect(styles('\x1b[31;44m \x1b[m')).toEqual(['31;44']);
    expect(glyphs('\x1b[1;31m   ')).toEqual([]);
  });

  it('starts every row in the default style', () => {
    expect(parseRow('\x1b[1mbold', 10).styles.at(-1)).not.toBe(PLAIN);
    expect(parseRow('plain', 10).styles[0]).toBe(PLAIN);
  });

  it('knows whether terminals agree on its widths', () => {
    expect(parseRow('SiO₂ λ 石 e\u0301', 20).agreed).toBe(true);
    expect(parseRow('a👍', 20).agreed).toBe(false);
  });
});
