import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimalValue, EXPONENT, MANTISSA, scanDecimal } from '../../src/batch/decimal-bytes.ts';
import { parseSweep, pointText } from '../../src/batch/sweep-range.ts';
import { writeShortest } from '../../src/batch/write-number.ts';
import { LONGEST_ROUNDED, roundedText, writeRounded } from '../../src/batch/write-rounded.ts';
import { isProblem } from '../../src/units/problem.ts';

const out = Buffer.alloc(2 * LONGEST_ROUNDED);
const shortest = (x: number): string => out.toString('latin1', 0, writeShortest(x, out, 0));
const finite = fc.oneof(
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.double({ min: 1e-5, max: 2e6, noNaN: true }),
  // Short dyadic fractions, where two candidates can be equally near.
  fc.tuple(fc.integer({ min: 1, max: 2 ** 30 }), fc.integer({ min: 0, max: 40 })).map(([n, k]) => n / 2 ** k),
  fc
    .tuple(fc.integer({ min: -999999, max: 999999 }), fc.integer({ min: 0, max: 9 }))
    .map(([n, k]) => n / 10 ** k),
);

describe('numbers as bytes', () => {
  it('are written as String writes them', () => {
    fc.assert(
      fc.property(finite, (x) => {
        expect(shortest(x)).toBe(String(x));
      }),
      { numRuns: 20_000 },
    );
  });
  it('are rounded in bytes as in decimal', () => {
    fc.assert(
      fc.property(finite, fc.integer({ min: 1, max: 17 }), (x, digits) => {
        expect(out.toString('latin1', 0, writeRounded(x, digits, out, 0))).toBe(roundedText(x, digits));
      }),
      { numRuns: 10_000 },
    );
  });
  it('are read as Number reads them', () => {
    const digits = new Float64Array(2);
    const plain = fc
      .tuple(fc.constantFrom('', '-'), fc.stringMatching(/^\d{1,7}(\.\d{0,8})?$/))
      .map(([s, t]) => s + t);
    fc.assert(
      fc.property(plain, (text) => {
        const bytes = Buffer.from(` ${text} `);
        expect(scanDecimal(bytes, 0, bytes.length, digits)).toBe(true);
        expect(decimalValue(digits[MANTISSA]!, digits[EXPONENT]!)).toBe(Number(text) + 0);
      }),
      { numRuns: 5000 },
    );
    for (const text of ['', '.', '1e3', '1.2.3', '0x1', '1 2', '1234567890123456'])
      expect(scanDecimal(Buffer.from(text), 0, text.length, digits), text).toBe(false);
  });
});

describe('a sweep', () => {
  it.each([
    ['wave=700nm..400nm:5nm', 'write the lower end first: wave=400nm..700nm:5nm'],
    ['temperature=700.0000000000000000..400.0000000:5.000000', 'write the lower end first'],
    ['wa\nve=2..1:1', 'write the lower end first'],
    ['wa\x1b[2Jve=1..2', 'write it behind a colon: wa?[2Jve=1..2:STEP'],
  ])('says of %j in one line what would be right', (text, remedy) => {
    expect(parseSweep(text)).toMatchObject({ remedy });
  });

  it('counts and writes its points in decimal', () => {
    const sweep = parseSweep('wave=0.4um..0.7um:0.1um');
    if (isProblem(sweep)) throw new Error(sweep.message);
    expect(Array.from({ length: sweep.points }, (_, i) => pointText(sweep, i))).toEqual([
      '0.4',
      '0.5',
      '0.6',
      '0.7',
    ]);
  });
  it('refuses with the remedy', () => {
    for (const [text, said] of [
      ['angle=80..0:5', 'angle=0..80:5'],
      ['angle=0..80', 'STEP'],
      ['angle=0..80:0', 'above 0'],
      ['angle=', 'two ends'],
      ['angle=0..80:0.000001', 'larger step'],
      ['wave=1nm..2um:1nm', 'one unit'],
    ] as const) {
      const sweep = parseSweep(text);
      expect(isProblem(sweep) && `${sweep.message} ${sweep.remedy}`, text).toContain(said);
    }
  });
});
