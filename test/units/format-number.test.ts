import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatNumber, type Precision } from '../../src/units/format-number.ts';
import { ASCII, SCREEN, superscript } from '../../src/units/number-style.ts';

describe('formatNumber', () => {
  it.each<[number, Precision, string, string?]>([
    [1.005, { decimals: 2 }, '1.01'],
    [-1.005, { decimals: 2 }, '-1.01'],
    [0.5, { decimals: 0 }, '1'],
    [2.675, { decimals: 2 }, '2.68'],
    [9.996, { significant: 3 }, '10.0'],
    [1.458, { significant: 5 }, '1.4580'],
    [0.5, { significant: 3 }, '0.500'],
    [633, { significant: 3 }, '633'],
    [123456, { significant: 6 }, '123456'],
    [0.00012345, { significant: 3 }, '0.000123'],
    [0.000012345, { significant: 3 }, '1.23 × 10⁻⁵', '1.23e-5'],
    [-4.1e-6, { significant: 2 }, '-4.1 × 10⁻⁶', '-4.1e-6'],
    [299792458, { significant: 9 }, '2.99792458 × 10⁸', '2.99792458e8'],
    [1234567, { significant: 3 }, '1.23 × 10⁶', '1.23e6'],
    // No zero stands for a digit that is not known.
    [633, { significant: 2 }, '6.3 × 10²', '6.3e2'],
    [999.6, { significant: 3 }, '1.00 × 10³', '1.00e3'],
    [0, { decimals: 2 }, '0.00'],
    [0, { significant: 3 }, '0.00'],
    [-0, { decimals: 2 }, '0.00'],
    [-0.004, { decimals: 2 }, '0.00'],
    [-0.005, { decimals: 2 }, '-0.01'],
    [0.000001, { decimals: 6 }, '0.000001'],
    [1e6, { decimals: 1 }, '1000000.0'],
    [0.1, 'shortest', '0.1'],
    [0.1 + 0.2, 'shortest', '0.30000000000000004'],
    [1000, 'shortest', '1000'],
    [0, 'shortest', '0'],
    [-0, 'shortest', '0'],
    [1e21, 'shortest', '1 × 10²¹', '1e21'],
    [1e-7, 'shortest', '1 × 10⁻⁷', '1e-7'],
    [5e-324, { significant: 1 }, '5 × 10⁻³²⁴', '5e-324'],
    [Number.MAX_VALUE, { significant: 3 }, '1.80 × 10³⁰⁸', '1.80e308'],
  ])('%d to %j is %j', (value, precision, screen, ascii = screen) => {
    expect(formatNumber(value, precision, SCREEN)).toBe(screen);
    expect(formatNumber(value, precision, ASCII)).toBe(ascii);
  });

  it.each([null, Number.NaN, Infinity, -Infinity])('%s is no number to show', (value) => {
    for (const precision of ['shortest', { decimals: 2 }, { significant: 3 }] as const) {
      expect(formatNumber(value, precision)).toBe('-');
    }
  });

  it('never prints minus zero, NaN, grouping or a bare point, and ASCII only if asked', () => {
    const precision = fc.oneof(
      fc.integer({ min: 1, max: 17 }).map((significant) => ({ significant })),
      fc.integer({ min: 0, max: 20 }).map((decimals) => ({ decimals })),
      fc.constant('shortest' as const),
    );
    fc.assert(
      fc.property(fc.double(), precision, (value, p) => {
        expect(formatNumber(value, p, ASCII)).toMatch(/^(?:-?\d+(?:\.\d+)?(?:e-?\d+)?|-)$/);
        expect(formatNumber(value, p, ASCII)).not.toMatch(/^-0(?:\.0*)?$/);
        expect(formatNumber(value, p)).toMatch(/^(?:-?\d+(?:\.\d+)?(?: × 10⁻?[⁰¹²³⁴⁵⁶⁷⁸⁹]+)?|-)$/);
      }),
    );
  });

  it('shows exactly the digits asked for', () => {
    fc.assert(
      fc.property(
        fc.double({ noNaN: true, noDefaultInfinity: true }),
        fc.integer({ min: 1, max: 17 }),
        (x, n) => {
          fc.pre(x !== 0);
          const mantissa = formatNumber(x, { significant: n }, ASCII).replace(/e.*/, '');
          expect(mantissa.replace(/[-.]/g, '').replace(/^0+/, '')).toHaveLength(n);
        },
      ),
    );
  });
});

it('superscripts integers', () => {
  expect([superscript(-23), superscript(0), superscript(145)]).toEqual(['⁻²³', '⁰', '¹⁴⁵']);
});
