import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { brokenJsonLine } from '../../src/units/broken-json-line.ts';

describe('the line where a text stops being JSON', () => {
  it.each<[string, number]>([
    ['{ "glyphs": }', 1],
    ['{ "glyphs": }\n', 1],
    ['{\n  "a": 1,\n  "glyphs": }\n}\n', 3],
    ['{\n  "color": "never"\n  "glyphs": 1\n}', 3],
    ['{\n  "glyphs": "ascii",\n  oops\n}', 3],
    ['{\n  "a": "not closed,\n  "b": 1\n}', 2],
    ['{\n  "a": 1,\n}\n', 3],
    ['{\n  "a": [1, 2\n}\n', 3],
    ['{\r\n  "a": tru\r\n}\r\n', 2],
    ['{\n  "a": 1\n', 2],
    ['{\n  "a": 1\n}\n}\n', 4],
    ['{ "a": 1 }\n\n', 0],
  ])('%j: %i', (text, line) => {
    expect(brokenJsonLine(text)).toBe(line);
  });

  it('is the line of a stray word put into any document, and none without it', () => {
    fc.assert(
      fc.property(fc.jsonValue(), fc.nat(), (value, n) => {
        const lines = JSON.stringify({ value, end: [0] }, null, 1).split('\n');
        expect(brokenJsonLine(lines.join('\n'))).toBe(0);
        const at = n % lines.length;
        const broken = [...lines.slice(0, at), 'oops', ...lines.slice(at)];
        expect(brokenJsonLine(broken.join('\n'))).toBe(at + 1);
      }),
    );
  });
});
