import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  ABBE_RANGE,
  GVD_RANGE,
  INDEX_RANGE,
  parseRange,
  parseSpan,
} from '../../src/selection/parse-range.ts';
import { rangeWords, within } from '../../src/selection/value-range.ts';
import { isProblem } from '../../src/units/problem.ts';

describe('ranges', () => {
  it('reads both ends or one', () => {
    expect(parseRange('1.37..1.39', INDEX_RANGE)).toEqual({ from: 1.37, to: 1.39 });
    expect(parseRange(' 1.37 .. 1.39 ', INDEX_RANGE)).toEqual({ from: 1.37, to: 1.39 });
    expect(parseRange('1.7..', INDEX_RANGE)).toEqual({ from: 1.7 });
    expect(parseRange('..30', ABBE_RANGE)).toEqual({ to: 30 });
    expect(parseRange('-20..20', GVD_RANGE)).toEqual({ from: -20e-27, to: 20e-27 });
    expect(parseRange('0..36 fs²/mm', GVD_RANGE)).toEqual({ from: 0, to: 36e-27 });
    // 1 ps2/km is 1 fs2/mm.
    expect(parseRange('20ps2/km..', GVD_RANGE)).toEqual({ from: 20e-27 });
  });

  it('reads any two numbers in order', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -100, max: 100, noNaN: true }),
        fc.double({ min: 0, max: 50, noNaN: true }),
        (a, d) => {
          const range = parseRange(`${a}..${a + d}`, INDEX_RANGE);
          expect(isProblem(range)).toBe(false);
          if (!isProblem(range)) {
            expect([within(range, a), within(range, a + d)]).toEqual([true, true]);
            expect(within(range, a - 0.1)).toBe(false);
            expect(within(range, a + d + 0.1)).toBe(false);
          }
        },
      ),
    );
  });

  it.each([
    ['1.37-1.39', 'write 1.37..1.39'],
    ['1.37 - 1.39', 'write 1.37..1.39'],
    ['1.37 to 1.39', 'write 1.37..1.39'],
    ['1.4..1.3', '1.3..1.4'],
    ['1.38', '1.38..'],
    ['1.37...1.39', 'two dots'],
    ['1..2..3', 'two dots'],
    ['..', 'at least one end'],
    ['', '1.37..1.39'],
    ['1,3..1,4', '1.3'],
    ['a..b', 'decimal'],
  ])('says what would be right for %j', (text, hint) => {
    const problem = parseRange(text, INDEX_RANGE);
    expect(isProblem(problem) && `${problem.message}; ${problem.remedy}`).toContain(hint);
  });

  it('says a range in words', () => {
    expect(rangeWords({ from: 1.37, to: 1.39 })).toBe('1.37 to 1.39');
    expect(rangeWords({ from: 1.7 })).toBe('from 1.7 on');
    expect(rangeWords({ to: 30 })).toBe('up to 30');
  });
});

describe('spans of wavelengths', () => {
  it.each([
    ['3um..5um', 3e-6, 5e-6],
    ['3..5um', 3e-6, 5e-6],
    ['5um..3um', 3e-6, 5e-6],
    ['400..700 nm', 400e-9, 700e-9],
    ['10.6um', 10.6e-6, 10.6e-6],
    ['1000cm-1', 1e-5, 1e-5],
    // Frequencies run the other way; c is exact.
    ['20..30THz', 299_792_458 / 30e12, 299_792_458 / 20e12],
  ])('reads %s', (text, from_m, to_m) => {
    const span = parseSpan(text);
    expect(isProblem(span)).toBe(false);
    if (!isProblem(span)) {
      expect(span[0]).toBeCloseTo(from_m, 15);
      expect(span[1]).toBeCloseTo(to_m, 15);
    }
  });

  it('takes named lines as waves in air', () => {
    // F and C lines: 486.1327 nm and 656.2725 nm in air; n of standard air is 1.00028 and 1.00028 (Ciddor 1996).
    const span = parseSpan('F-line..C-line');
    expect(isProblem(span) ? 0 : span[0]).toBeCloseTo(486.2685e-9, 13);
    expect(isProblem(span) ? 0 : span[1]).toBeCloseTo(656.4538e-9, 13);
  });

  it.each([
    ['3-5um', 'write 3..5um'],
    ['3um-5um', 'write 3um..5um'],
    ['400nm to 700nm', 'write 400nm..700nm'],
    ['3um..', 'write both'],
    ['3um...5um', 'two dots'],
    ['3..5', 'unit'],
  ])('says what would be right for %j', (text, hint) => {
    const problem = parseSpan(text);
    expect(isProblem(problem) && `${problem.message}; ${problem.remedy}`).toContain(hint);
  });
});
