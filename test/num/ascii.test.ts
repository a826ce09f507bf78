/** Against the regular expressions that say the same. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isAscii, isDigit, isLetter, skipDigits, skipSign } from '../../src/num/ascii.ts';
import { decimalOfText } from '../../src/units/decimal.ts';

const numberLike = fc.string({ unit: fc.constantFrom(...'+-.0123eE5 x') });

describe('characters', () => {
  it('are told apart as regular expressions do', () => {
    for (let code = 0; code < 0x250; code++) {
      const character = String.fromCharCode(code);
      expect(isLetter(code)).toBe(/^[A-Za-z]$/.test(character));
      expect(isDigit(code)).toBe(/^[0-9]$/.test(character));
      expect(isAscii(character)).toBe(/^[\x20-\x7e]$/.test(character));
    }
    expect(isAscii('')).toBe(true);
    expect(isAscii('plain text')).toBe(true);
    expect(isAscii('10 µm')).toBe(false);
  });

  it('are skipped to the first of another sort', () => {
    fc.assert(
      fc.property(numberLike, fc.nat(12), (text, at) => {
        const from = Math.min(at, text.length);
        expect(skipDigits(text, from) - from).toBe(/^\d*/.exec(text.slice(from))![0].length);
        expect(skipSign(text, from) - from).toBe(/^[+-]?/.exec(text.slice(from))![0].length);
      }),
    );
  });
});

describe('decimalOfText', () => {
  it('takes plain decimal numbers and nothing else', () => {
    const plain = /^([+-]?)(\d*)\.?(\d*)(?:[eE]([+-]?\d+))?$/;
    fc.assert(
      fc.property(numberLike, (text) => {
        const parts = plain.exec(text);
        const decimal = decimalOfText(text);
        expect(decimal !== undefined).toBe(parts !== null && parts[2]! + parts[3]! !== '');
        if (!decimal) return;
        expect(decimal.digits).toMatch(/^(0|[1-9]\d*)$/);
        const { negative, digits, exponent } = decimal;
        expect(Number(`${negative ? '-' : ''}${digits}e${exponent}`)).toBe(Number(text));
      }),
      { numRuns: 2000 },
    );
  });
});
