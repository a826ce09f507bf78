import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { derivedDigits, lastPlace, significantDigits } from '../../src/units/digits.ts';
import { formatUncertain } from '../../src/units/format-uncertain.ts';
import { ASCII, SCREEN } from '../../src/units/number-style.ts';

describe('the place to which an uncertainty is kept', () => {
  it.each<[number, number]>([
    [0.00003, -5],
    [0.0000124, -6],
    [0.0000296, -5],
    [0.0000294, -6],
    [0.000029, -6],
    [0.03, -2],
    [0.096, -2],
    [0.0999, -2],
    [0.1, -2],
    [1, -1],
    [2.94, -1],
    [2.96, 0],
    [15, 0],
    [30, 1],
  ])('%d keeps 10^%d', (uncertainty, place) => {
    expect(lastPlace(uncertainty)).toBe(place);
  });

  it.each([0, -1, Number.NaN, Infinity, null, undefined])('%s keeps none', (uncertainty) => {
    expect(lastPlace(uncertainty)).toBeUndefined();
  });

  it('leaves one or two digits of the uncertainty (GUM 7.2.6)', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-300, max: 1e300, noNaN: true }), (u) => {
        const place = lastPlace(u) as number;
        const units = u / 10 ** place;
        expect(units).toBeGreaterThan(2.9);
        expect(units).toBeLessThan(30);
      }),
    );
  });
});

describe('formatUncertain', () => {
  it.each<[number, number, string, string?]>([
    [0.034794, 0.000004, '0.034794(4)'],
    [3.47941, 0.0004, '3.4794(4)'],
    [1.45846, 0.00003, '1.45846(3)'],
    [1.458464, 0.000012, '1.458464(12)'],
    [1.45846, 0.0000296, '1.45846(3)'],
    [1.45846, 0.000096, '1.45846(10)'],
    [1.5, 0.0001, '1.50000(10)'],
    [12.345, 1.5, '12.3(15)'],
    [633, 0.5, '633.0(5)'],
    [1234, 34, '1.23(3) × 10³', '1.23(3)e3'],
    [4.123e-6, 3e-8, '4.12(3) × 10⁻⁶', '4.12(3)e-6'],
    [0.003, 0.5, '0.0(5)'],
    [0, 0.03, '0.00(3)'],
    [-0.001, 0.03, '0.00(3)'],
    [-1.45846, 0.00003, '-1.45846(3)'],
    [2.5e-10, 3e-8, '0(3) × 10⁻⁸', '0(3)e-8'],
    [9.9999, 0.0004, '9.9999(4)'],
    [9.99996, 0.0004, '10.0000(4)'],
    // CODATA 2022: vacuum permittivity in 1e-12 F/m, impedance of vacuum in ohm, as printed there.
    [8.8541878188e-12, 0.0000000014e-12, '8.8541878188(14) × 10⁻¹²', '8.8541878188(14)e-12'],
  ])('%d +- %d is %s', (value, uncertainty, screen, ascii = screen) => {
    expect(formatUncertain(value, uncertainty, 'shortest', SCREEN)).toBe(screen);
    expect(formatUncertain(value, uncertainty, 'shortest', ASCII)).toBe(ascii);
  });

  it('writes value and uncertainty side by side where asked', () => {
    expect(formatUncertain(1.45846, 3e-5, 'shortest', SCREEN, 'plus-minus')).toBe('1.45846 ± 0.00003');
    expect(formatUncertain(1.45846, 3e-5, 'shortest', ASCII, 'plus-minus')).toBe('1.45846 +/- 0.00003');
    expect(formatUncertain(4.123e-6, 3e-8, 'shortest', ASCII, 'plus-minus')).toBe('(4.12 +/- 0.03)e-6');
  });

  it('shows the stated digits where there is no uncertainty', () => {
    for (const none of [null, 0, Number.NaN]) {
      expect(formatUncertain(1.458464, none, { significant: 5 })).toBe('1.4585');
    }
    expect(formatUncertain(null, 1e-3, 'shortest')).toBe('-');
    expect(formatUncertain(Number.NaN, 1e-3, 'shortest')).toBe('-');
  });

  it('reads back as the value to within half a unit of the uncertainty’s place', () => {
    const value = fc.double({ min: -1e9, max: 1e9, noNaN: true });
    fc.assert(
      fc.property(value, fc.double({ min: 1e-9, max: 1e6, noNaN: true }), (x, u) => {
        const text = formatUncertain(x, u, 'shortest', ASCII);
        const [, digits, decimals = '', units, power = '0'] =
          /^(-?\d+(?:\.(\d+))?)\((\d+)\)(?:e(-?\d+))?$/.exec(text) ?? [];
        const unit = 10 ** (Number(power) - decimals.length);
        expect(Math.abs(Number(`${digits}e${power}`) - x)).toBeLessThanOrEqual(
          0.5001 * unit + Math.abs(x) * 1e-15,
        );
        expect(Math.abs(Number(units) * unit - u)).toBeLessThanOrEqual(0.5001 * unit);
      }),
    );
  });
});

describe('digits of a derived quantity', () => {
  it('follow the uncertainty', () => {
    expect(significantDigits(1.45846, 3e-5)).toBe(6);
    expect(significantDigits(206.8e6, 3e4)).toBe(5);
    expect(derivedDigits(473.755e12, 1e-6)).toBe(7);
    expect(derivedDigits(473.755e12, 0.5)).toBe(2);
    expect(significantDigits(1, 5)).toBe(1);
  });

  it('end where doubles end for exact values', () => {
    expect(derivedDigits(473.755e12, 0)).toBe(15);
    expect(significantDigits(1.5, 1e-30)).toBe(15);
    expect(significantDigits(0, 0.1)).toBe(15);
  });
});
