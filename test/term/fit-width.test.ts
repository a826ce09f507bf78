import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { displayWidth } from '../../src/term/display-width.ts';
import {
  centreInWidth,
  cutToWidth,
  fitToWidth,
  padEndToWidth,
  padStartToWidth,
} from '../../src/term/fit-width.ts';

const text = fc
  .array(fc.constantFrom('a', ' ', 'λ', '₂', '石', 'e\u0301', '⠿', '👍'), { maxLength: 20 })
  .map((p) => p.join(''));
const columns = fc.integer({ min: 0, max: 25 });

describe('fitting text into columns', () => {
  it.each([
    ['fused silica', 12, '…', 'fused silica'],
    ['fused silica', 11, '…', 'fused sili…'],
    ['fused silica', 11, '...', 'fused si...'],
    ['fused silica', 1, '…', '…'],
    ['fused silica', 0, '…', ''],
    ['fused silica', 2, '...', 'fu'],
    ['石英ガラス', 6, '…', '石英…'],
    ['石英ガラス', 7, '…', '石英ガ…'],
    ['e\u0301e\u0301e\u0301', 2, '…', 'e\u0301…'],
  ])('cuts %j to %i', (sample, width, mark, expected) => {
    expect(cutToWidth(sample, width, mark)).toBe(expected);
  });

  it.each([
    [padEndToWidth('石', 4), '石  '],
    [padStartToWidth('石', 4), '  石'],
    [padStartToWidth('wider', 3), 'wider'],
    [centreInWidth('ab', 5), ' ab  '],
    [fitToWidth('石英', 3), '石…'],
    [fitToWidth('石英', 2), '… '],
  ])('pads to %j', (actual, expected) => {
    expect(actual).toBe(expected);
  });

  it('never exceeds the width when cutting, and fills it exactly when fitting', () => {
    fc.assert(
      fc.property(text, columns, (sample, width) => {
        expect(displayWidth(cutToWidth(sample, width))).toBeLessThanOrEqual(width);
        expect(displayWidth(fitToWidth(sample, width))).toBe(width);
      }),
    );
  });

  it('leaves a text that fits as it is', () => {
    fc.assert(fc.property(text, (sample) => cutToWidth(sample, displayWidth(sample)) === sample));
  });
});
