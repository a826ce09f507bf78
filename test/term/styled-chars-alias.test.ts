import * as original from '@alcalzone/ansi-tokenize';
import fc from 'fast-check';
import { expect, it } from 'vitest';
import { parseRow } from '../../src/term/cells.ts';
import { styledCharsFromTokens, styledCharsToString, tokenize } from '../../src/term/styled-chars-alias.ts';

const through = (line: string): string => styledCharsToString(styledCharsFromTokens(tokenize(line)));
const throughOriginal = (line: string): string =>
  original.styledCharsToString(original.styledCharsFromTokens(original.tokenize(line)));

const text = fc.stringMatching(/^[a-zA-Z0-9 λµ°±²⣿┃漢é]{0,12}$/);
// Without what the original gets wrong: the short reset `ESC [ m`, and dim switched off beside bold.
const sgr = fc.constantFrom('0', '1', '4', '7', '22', '24', '27', '31', '36', '39', '1;4;36', '0;1');
const line = fc
  .array(fc.tuple(sgr, text), { maxLength: 8 })
  .map((pieces) => pieces.map(([code, piece]) => `\x1b[${code}m${piece}`).join(''));

it('shows the same cells as the module it stands in for', () => {
  fc.assert(
    fc.property(line, (styled) => {
      expect(parseRow(through(styled), 200)).toEqual(parseRow(throughOriginal(styled), 200));
    }),
  );
});

it('keeps the text of a line and ends in the default style', () => {
  expect(through('\x1b[1mn\x1b[0m 1.45')).toBe('\x1b[1mn\x1b[m 1.45');
  expect(through('plain')).toBe('plain');
  expect(through('\x1b[7mx')).toBe('\x1b[7mx\x1b[m');
});

it('takes the blank cells of the layout, which have an empty list of styles', () => {
  const blank = { type: 'char', value: ' ', fullWidth: false, styles: [] } as const;
  expect(styledCharsToString([...tokenize('\x1b[4mn\x1b[24m'), blank])).toBe('\x1b[4mn\x1b[m ');
});

it('marks wide characters and keeps clusters whole', () => {
  const [wide, accented] = tokenize('漢e\u0301');
  expect(wide).toMatchObject({ value: '漢', fullWidth: true });
  expect(accented).toMatchObject({ value: 'e\u0301', fullWidth: false });
});

it('gives the same characters for the same line, however many lines came between', () => {
  const before = tokenize('first');
  for (let i = 0; i < 3000; i++) tokenize(`line ${i}`);
  expect(tokenize('first')).toEqual(before);
});
