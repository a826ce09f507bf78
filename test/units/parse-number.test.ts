import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatNumber } from '../../src/units/format-number.ts';
import { ASCII } from '../../src/units/number-style.ts';
import { parseNumber } from '../../src/units/parse-number.ts';
import { isProblem } from '../../src/units/problem.ts';
import { outcome } from './outcome.ts';

const read = (text: string) => outcome(parseNumber(text));
const decimal = 'write it in decimal, for example 1.5 or 1.5e-3';
const single = 'write one number without grouping, for example 1550 or 1.55';

describe('numbers that are accepted', () => {
  it.each<[string, number]>([
    ['1', 1],
    ['1.5', 1.5],
    ['.5', 0.5],
    ['5.', 5],
    ['+2', 2],
    ['-2', -2],
    ['\u22122', -2],
    ['1.5e-3', 1.5e-3],
    ['1.5E+3', 1.5e3],
    ['1.5e\u22123', 1.5e-3],
    [' 7 ', 7],
    ['007', 7],
    ['4.1 × 10⁻⁶', 4.1e-6],
    ['4.1×10^-6', 4.1e-6],
    ['2 × 10⁸', 2e8],
    ['0.1', 0.1],
    ['1e308', 1e308],
    ['5e-324', 5e-324],
    ['0e999', 0],
    ['2 × 10⁺³', 2000],
    ['2 × 10^+3', 2000],
  ])('%j is %d', (text, value) => {
    expect(read(text)).toBe(value);
  });

  it('reads minus zero as zero', () => {
    expect(Object.is(parseNumber('-0'), 0)).toBe(true);
  });
});

describe('numbers that are refused, with what would be right', () => {
  it.each<[string, string]>([
    ['', `empty: a number is missing; ${decimal}`],
    ['   ', `empty: a number is missing; ${decimal}`],
    ['0x10', `not-a-number: "0x10" is not a number; ${decimal}`],
    ['1e', 'not-a-number: "1e" is not a number; complete its exponent, for example 1e-3'],
    ['1.5e-', 'not-a-number: "1.5e-" is not a number; complete its exponent, for example 1.5e-3'],
    ['--5', `not-a-number: "--5" is not a number; ${decimal}`],
    ['1_000', `not-a-number: "1_000" is not a number; ${single}`],
    ['1 000', `not-a-number: "1 000" is not a number; ${single}`],
    ['1.2.3', `not-a-number: "1.2.3" is not a number; ${single}`],
    ['1,55', 'not-a-number: "1,55" is not a number; did you mean 1.55?'],
    ['-0,5', 'not-a-number: "-0,5" is not a number; did you mean -0.5?'],
    ['0,500', 'not-a-number: "0,500" is not a number; did you mean 0.500?'],
    ['1,550', 'not-a-number: "1,550" is not a number; did you mean 1.550 or 1550?'],
    ['1,234.5', 'not-a-number: "1,234.5" is not a number; did you mean 1234.5?'],
    [',5', `not-a-number: ",5" is not a number; ${decimal}`],
    ['1,55 nm', 'not-a-number: "1,55 nm" is not a number; did you mean 1.55 nm?'],
    ['-12,3450', 'not-a-number: "-12,3450" is not a number; did you mean -12.3450?'],
    ['1,234.56', 'not-a-number: "1,234.56" is not a number; did you mean 1234.56?'],
    ['1,234,567', 'not-a-number: "1,234,567" is not a number; did you mean 1234567?'],
    ['NaN', `not-a-number: "NaN" is not a number; ${decimal}`],
    ['Infinity', `not-a-number: "Infinity" is not a number; ${decimal}`],
    ['.', `not-a-number: "." is not a number; ${decimal}`],
    ['e5', `not-a-number: "e5" is not a number; ${decimal}`],
    ['5²', `not-a-number: "5²" is not a number; ${decimal}`],
    ['1½', `not-a-number: "1½" is not a number; ${decimal}`],
    ['1e999', `number-too-large: "1e999" is beyond the numbers a computer holds; ${decimal}`],
    ['1e-999', `number-too-large: "1e-999" is beyond the numbers a computer holds; ${decimal}`],
    ['1;rm', `not-a-number: "1;rm" is not a number; ${decimal}`],
  ])('%j', (text, line) => {
    expect(read(text)).toBe(line);
  });

  it('shows no control character of what was typed, and not all of a long text', () => {
    const line = read('\u001b]0;x\u0007\n');
    expect(line).toBe(`not-a-number: "?]0;x??" is not a number; ${decimal}`);
    expect(String(read('9'.repeat(500))).length).toBeLessThan(160);
  });
});

describe('round trips', () => {
  const finite = fc.double({ noNaN: true, noDefaultInfinity: true });

  it('reads every double as JavaScript writes it', () => {
    fc.assert(fc.property(finite, (x) => parseNumber(String(x)) === x + 0));
  });

  it('reads every double as the program prints it, on a screen and in ASCII', () => {
    fc.assert(
      fc.property(finite, (x) => {
        expect(parseNumber(formatNumber(x, { significant: 17 }))).toBe(x + 0);
        expect(parseNumber(formatNumber(x, 'shortest', ASCII))).toBe(x + 0);
      }),
    );
  });

  it('gives a finite number or a problem for any text', () => {
    const numeric = fc.string({ unit: fc.constantFrom(...'0123456789.,eE+-−_ x×^⁻²') });
    fc.assert(
      fc.property(fc.oneof(numeric, fc.string({ unit: 'binary' })), (text) => {
        const value = parseNumber(text);
        return isProblem(value) || Number.isFinite(value);
      }),
      { numRuns: 2000 },
    );
  });
});
