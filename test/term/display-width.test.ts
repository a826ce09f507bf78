import fc from 'fast-check';
import stringWidth from 'string-width';
import { describe, expect, it } from 'vitest';
import { clusters, displayWidth, isPlainNarrow, isWidthAgreed } from '../../src/term/display-width.ts';
import { isEastAsianWide } from '../../src/term/east-asian-wide.ts';
import aliasWidth from '../../src/term/string-width-alias.ts';

const assigned = (code: number): boolean => !/\p{Unassigned}|\p{Surrogate}/u.test(String.fromCodePoint(code));

/** Texts from the scripts that can turn up in names of media and of people, and from what terminals draw. */
const block = (first: number, last: number): fc.Arbitrary<string> =>
  fc.integer({ min: first, max: last }).filter(assigned).map(String.fromCodePoint);
const piece = fc.oneof(
  { weight: 6, arbitrary: block(0x20, 0x7e) },
  block(0xa0, 0x24f),
  block(0x370, 0x52f),
  block(0x2010, 0x2040),
  block(0x2070, 0x209c),
  block(0x2100, 0x22ff),
  block(0x2300, 0x2bff),
  block(0x2800, 0x28ff),
  block(0x300, 0x36f),
  block(0x3000, 0x30ff),
  block(0x4e00, 0x9fff),
  block(0xac00, 0xd7a3),
  block(0xff00, 0xffef),
  block(0x900, 0x97f),
  block(0xe00, 0xe5b),
  block(0x5d0, 0x5ea),
  block(0x1f300, 0x1faff),
  fc.constantFrom('\u200d', '\ufe0f', '\ufe0e', '\u20e3', '\u00ad', '\u200b', '\u202e'),
  fc.constantFrom('👨‍👩‍👧', '🇫🇷', '1️⃣', '⚠️', '☎️', '각', '\u1100\u1161\u11a8', '\u1100\u1161'),
);
const text = fc.array(piece, { maxLength: 12 }).map((pieces) => pieces.join(''));

describe('display width', () => {
  it('agrees with string-width on the assigned code points', () => {
    const wrong: string[] = [];
    // The ideographs, the syllables and most of what lies beyond U+10000 are long runs of one kind: a sample will do.
    const isLongRun = (code: number): boolean =>
      (code >= 0x3400 && code < 0xd800) || (code >= 0x10000 && code < 0x1f000) || code >= 0x20000;
    const step = (code: number): number => (isLongRun(code) ? 37 : 1);
    for (let code = 0; code <= 0x3ffff; code += step(code)) {
      if (!assigned(code)) continue;
      const character = String.fromCodePoint(code);
      if (displayWidth(character) !== stringWidth(character)) wrong.push(code.toString(16));
    }
    expect(wrong).toEqual([]);
  });

  it('agrees with string-width on random texts', () => {
    fc.assert(
      fc.property(text, (sample) => displayWidth(sample) === stringWidth(sample)),
      { numRuns: 2000 },
    );
  });

  it.each([
    ['', 0],
    ['n = 1.4585', 10],
    ['λ₀ = 632.8 nm', 13],
    ['⠉⠒⠤⣀┃▀▄█', 8],
    ['10⁻⁶ K⁻¹', 8],
    ['SiO₂ at 20 °C ± ½', 17],
    ['man\u0303ana', 6],
    ['石英ガラス', 10],
    ['\u001b[1;31mred\u001b[39;22m', 3],
    ['\u001b]8;;https://example.org\u0007link\u001b]8;;\u0007', 4],
    ['soft\u00adhyphen', 10],
    ['\u0301', 0],
    ['👨‍👩‍👧', 2],
    ['⚠️', 2],
    ['⚠', 1],
    ['tab\there', 7],
  ])('%j is %i columns wide', (sample, width) => {
    expect(displayWidth(sample)).toBe(width);
    expect(stringWidth(sample)).toBe(width);
  });

  it('stands in for the module it is an alias of', () => {
    fc.assert(fc.property(text, (sample) => aliasWidth(sample) === stringWidth(sample)));
    expect(aliasWidth(undefined as unknown as string)).toBe(stringWidth(undefined as unknown as string));
  });

  it('cuts a text into clusters that join to it and whose widths add up', () => {
    fc.assert(
      fc.property(text, (sample) => {
        const parts = clusters(sample);
        const joined = parts.map((part) => part.text).join('');
        const sum = parts.reduce((total, part) => total + part.width, 0);
        return joined === sample && sum === displayWidth(sample);
      }),
    );
  });

  it('takes its shortcut only for units that are one column and one cluster', () => {
    const segmenter = new Intl.Segmenter();
    const wrong: string[] = [];
    for (let unit = 0; unit < 0x10000; unit++) {
      if (!isPlainNarrow(unit)) continue;
      const character = String.fromCharCode(unit);
      const pieces = [...segmenter.segment(`a${character}${character}b`)];
      if (stringWidth(character) !== 1 || pieces.length !== 4) wrong.push(unit.toString(16));
    }
    expect(wrong).toEqual([]);
  });

  it.each(['a', 'λ', '⣿', '│', '₂', 'e\u0301', '石', 'か', '한', 'Ａ'])('%s is agreed on', (glyph) => {
    expect(isWidthAgreed(glyph)).toBe(true);
  });

  it.each(['⚠️', '👍', '☰', '\u1100\u1161', 'क्षि', '🇫🇷'])('%s is not agreed on', (glyph) => {
    expect(isWidthAgreed(glyph)).toBe(false);
  });

  it.each([
    [0x10ff, false],
    [0x1100, true],
    [0x115f, true],
    [0x1160, false],
    [0x20000, true],
    [0x3fffd, true],
    [0x3fffe, false],
    [0x41, false],
  ])('U+%s is wide: %s', (code, wide) => {
    expect(isEastAsianWide(code)).toBe(wide);
  });
});
