import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addDecimals,
  type Decimal,
  decimalOf,
  decimalOfText,
  decimalToNumber,
  leadingPlace,
  plainDecimal,
  roundDecimal,
  roundToDigits,
  trimZeros,
} from '../../src/units/decimal.ts';

const finite = fc.double({ noNaN: true, noDefaultInfinity: true });
const text = (s: string): Decimal => decimalOfText(s) as Decimal;

describe('decimal', () => {
  it('reads back the double it was made of, whatever the double', () => {
    fc.assert(fc.property(finite, (x) => decimalToNumber(decimalOf(x)) === x));
    for (const x of [5e-324, Number.MAX_VALUE, Number.MIN_SAFE_INTEGER, 1e21, 1e-7, 0]) {
      expect(decimalToNumber(decimalOf(x))).toBe(x);
    }
  });

  it('has none for NaN and infinities', () => {
    for (const x of [Number.NaN, Infinity, -Infinity]) expect(() => decimalOf(x)).toThrow(RangeError);
  });

  it.each(['', '.', '-', '1e', '1.2.3', '0x1', ' 1', '1 ', '1,5', 'e5', '--1'])('does not read %j', (s) => {
    expect(decimalOfText(s)).toBeUndefined();
  });

  it('rounds ties away from zero on the decimal text, not on the double below it', () => {
    const cases: [string, number, string][] = [
      ['1.005', -2, '1.01'],
      ['-1.005', -2, '-1.01'],
      ['2.5', 0, '3'],
      ['0.5', 0, '1'],
      ['0.4999', 0, '0'],
      ['-0.4', 0, '0'],
      ['9.995', -2, '10.00'],
      ['0.05', 0, '0'],
      ['5', 1, '10'],
      ['4', 1, '0'],
      ['5', 2, '0'],
      ['149', 2, '100'],
      ['1.4580', -6, '1.458000'],
      ['0', -2, '0.00'],
    ];
    for (const [from, place, to] of cases) expect(plainDecimal(roundDecimal(text(from), place))).toBe(to);
    expect((1.005).toFixed(2)).toBe('1.00');
  });

  it('rounds to a count of digits also where rounding carries', () => {
    const cases: [string, number, string][] = [
      ['9.996', 3, '10.0'],
      ['0.09996', 3, '0.100'],
      ['99.5', 2, '100'],
      ['1.4580', 3, '1.46'],
      ['0', 3, '0.00'],
    ];
    for (const [from, digits, to] of cases) expect(plainDecimal(roundToDigits(text(from), digits))).toBe(to);
  });

  it('never rounds by more than half a unit of the last place', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.integer({ min: -12, max: 3 }),
        (x, place) => {
          const error = Math.abs(decimalToNumber(roundDecimal(decimalOf(x), place)) - x);
          expect(error).toBeLessThanOrEqual(0.5 * 10 ** place * (1 + 1e-9) + Math.abs(x) * 2 ** -52);
        },
      ),
    );
  });

  it('keeps the wanted count of digits, however small or large the number', () => {
    fc.assert(
      fc.property(finite, fc.integer({ min: 1, max: 17 }), (x, digits) => {
        const rounded = roundToDigits(decimalOf(x), digits);
        expect(rounded.digits).toHaveLength(x === 0 ? 1 : digits);
        if (x !== 0) expect(leadingPlace(rounded) - leadingPlace(decimalOf(x))).toBeOneOf([0, 1]);
      }),
    );
  });

  it('adds exactly', () => {
    expect(plainDecimal(addDecimals(text('0.1'), text('0.2')))).toBe('0.3');
    expect(plainDecimal(addDecimals(text('-40'), text('273.15')))).toBe('233.15');
    expect(plainDecimal(addDecimals(text('-273.15'), text('273.15')))).toBe('0.00');
    expect(decimalToNumber(addDecimals(text('0e-99999999'), text('273.15')))).toBe(273.15);
    fc.assert(
      fc.property(fc.integer(), fc.integer(), (a, b) => {
        expect(decimalToNumber(addDecimals(decimalOf(a), decimalOf(b)))).toBe(a + b);
      }),
    );
  });

  it('reads powers with either letter, and nothing that runs on', () => {
    expect(decimalOfText('1.5e3')).toEqual({ negative: false, digits: '15', exponent: 2 });
    expect(decimalOfText('1.5E-3')).toEqual({ negative: false, digits: '15', exponent: -4 });
    expect(decimalOfText('-007.50')).toEqual({ negative: true, digits: '750', exponent: -2 });
    for (const junk of ['1x3', '1e3x', '1e3 ', '1f3']) expect(decimalOfText(junk)).toBeUndefined();
  });

  it('writes the zeros of integers as digits, up to 1e21 as the language does', () => {
    expect(decimalOf(6300)).toEqual({ negative: false, digits: '6300', exponent: 0 });
    expect(decimalOf(-5)).toEqual({ negative: true, digits: '5', exponent: 0 });
    expect(decimalOf(1e20)).toEqual({ negative: false, digits: `1${'0'.repeat(20)}`, exponent: 0 });
    expect(decimalOf(1e21)).toEqual({ negative: false, digits: '1', exponent: 21 });
    expect(decimalOf(-1e21)).toEqual({ negative: true, digits: '1', exponent: 21 });
    expect(() => decimalOf(Number.NaN)).toThrow('only a finite number has a decimal');
  });

  it('gives zero no sign and one exponent', () => {
    expect(roundDecimal(text('-0'), -2)).toEqual({ negative: false, digits: '0', exponent: -2 });
    expect(roundDecimal(text('-0.4'), 0)).toEqual({ negative: false, digits: '0', exponent: 0 });
    expect(roundDecimal(text('-0.04'), 1)).toEqual({ negative: false, digits: '0', exponent: 1 });
    expect(trimZeros(text('0e7'))).toEqual({ negative: false, digits: '0', exponent: 0 });
    expect(trimZeros(text('1200'))).toEqual({ negative: false, digits: '12', exponent: 2 });
    expect(addDecimals(text('5'), text('-5'))).toEqual({ negative: false, digits: '0', exponent: 0 });
    expect(plainDecimal(text('0e3'))).toBe('0');
  });

  it('carries through more digits than a double holds', () => {
    expect(plainDecimal(roundDecimal(text('12345678901234567890.5'), 0))).toBe('12345678901234567891');
    expect(plainDecimal(roundDecimal(text('99999999999999999999.5'), 0))).toBe('100000000000000000000');
    expect(plainDecimal(roundDecimal(text('999999999999999.5'), 0))).toBe('1000000000000000');
  });
});
