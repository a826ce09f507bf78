import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import * as unit from '../../src/units/display-unit.ts';
import type { Precision } from '../../src/units/format-number.ts';
import {
  columnPrefix,
  formatQuantity,
  formatRange,
  formatUncertainQuantity,
  withUnit,
} from '../../src/units/format-quantity.ts';
import { ASCII } from '../../src/units/number-style.ts';
import { parseLength } from '../../src/units/parse-length.ts';
import { toAscii } from '../../src/units/to-ascii.ts';

const { METRE } = unit;

describe('formatQuantity', () => {
  it.each<[number, unit.DisplayUnit, Precision, string, string?]>([
    [589.3e-9, METRE, { significant: 4 }, '589.3 nm'],
    [10.6e-6, METRE, { significant: 3 }, '10.6 µm', '10.6 um'],
    [999.96e-9, METRE, { significant: 4 }, '1.000 µm', '1.000 um'],
    [999.96e-9, METRE, { decimals: 1 }, '1.0 µm', '1.0 um'],
    [999.94e-9, METRE, { decimals: 1 }, '999.9 nm'],
    [633e-9, METRE, { significant: 2 }, '0.63 µm', '0.63 um'],
    [2e-5, METRE, 'shortest', '20 µm', '20 um'],
    [0.0299792458, METRE, { significant: 4 }, '29.98 mm'],
    [1e6, METRE, 'shortest', '1000 km'],
    [-12e-9, METRE, { significant: 3 }, '-12.0 nm'],
    [0, METRE, { significant: 3 }, '0.00 m'],
    [1e-30, METRE, { significant: 3 }, '1.00 × 10⁻³⁰ m', '1.00e-30 m'],
    [3e17, METRE, { significant: 3 }, '3.00 × 10¹⁷ m', '3.00e17 m'],
    [473.755e12, unit.HERTZ, { significant: 6 }, '473.755 THz'],
    [1.9593, unit.ELECTRONVOLT, { significant: 5 }, '1.9593 eV'],
    [4.1e-5, unit.ELECTRONVOLT, { significant: 2 }, '41 µeV', '41 ueV'],
    [2546, unit.WATT_PER_SQUARE_METRE, { significant: 3 }, '2.55 kW/m²', '2.55 kW/m2'],
    [8.5e-6, unit.JOULE_PER_CUBIC_METRE, { significant: 2 }, '8.5 µJ/m³', '8.5 uJ/m3'],
    [376.7303, unit.OHM, { significant: 5 }, '376.73 Ω', '376.73 ohm'],
    [2.0576e8, unit.METRE_PER_SECOND, { significant: 4 }, '2.058 × 10⁸ m/s', '2.058e8 m/s'],
    [0.034794, unit.PER_CENT, { significant: 5 }, '3.4794 %'],
    [56.309, unit.DEGREE, { decimals: 2 }, '56.31°', '56.31 deg'],
    [20, unit.CELSIUS, { decimals: 0 }, '20 °C', '20 degC'],
    [-0.155, unit.DECIBEL, { decimals: 3 }, '-0.155 dB'],
    [1.58e6, unit.PER_CENTIMETRE, { significant: 5 }, '15800 cm⁻¹', '15800 cm-1'],
    [36.163e-27, unit.FS2_PER_MM, { significant: 3 }, '36.2 fs²/mm', '36.2 fs2/mm'],
    [1.4585, unit.NUMBER, { significant: 5 }, '1.4585'],
  ])('%d %o to %j is %s', (value, u, precision, screen, ascii = screen) => {
    expect(formatQuantity(value, u, precision)).toBe(screen);
    expect(formatQuantity(value, u, precision, { style: ASCII })).toBe(ascii);
    expect(toAscii(screen)).toBe(ascii);
  });

  it.each([null, Number.NaN, Infinity, -Infinity])('%s has no unit either', (value) => {
    expect(formatQuantity(value, METRE, { significant: 3 })).toBe('-');
    expect(formatUncertainQuantity(value, 1e-9, METRE, 'shortest')).toBe('-');
  });

  it('keeps one prefix for a column', () => {
    const column = [0.21e-6, 6.7e-6, 12e-6];
    const prefix = columnPrefix(column, METRE);
    const shown = column.map((x) => formatQuantity(x, METRE, { decimals: 2 }, { prefix }));
    expect(shown).toEqual(['0.21 µm', '6.70 µm', '12.00 µm']);
    expect(columnPrefix([], METRE).power).toBe(0);
  });

  it('writes 1 to 999 before the prefix, digits as asked, and reads back', () => {
    const length = fc.double({ min: 1e-14, max: 9e5, noNaN: true });
    fc.assert(
      fc.property(length, fc.integer({ min: 3, max: 12 }), (x, significant) => {
        const text = formatQuantity(x, METRE, { significant });
        const number = Number(text.replace(/ .*/, ''));
        expect(number).toBeGreaterThanOrEqual(1);
        expect(number).toBeLessThan(1000);
        expect(Math.abs((parseLength(text) as number) / x - 1)).toBeLessThanOrEqual(
          0.5 * 10 ** (1 - significant) * 1.001,
        );
      }),
    );
  });
});

describe('quantities with an uncertainty', () => {
  it.each<[number, number, unit.DisplayUnit, string]>([
    [0.034794, 0.000004, unit.PER_CENT, '3.4794(4) %'],
    [632.8e-9, 0.3e-9, METRE, '632.8(3) nm'],
    [1234e-9, 30e-9, METRE, '1.23(3) µm'],
    [123e-9, 30e-9, METRE, '0.12(3) µm'],
    [2.0576e8, 1e4, unit.METRE_PER_SECOND, '2.05760(10) × 10⁸ m/s'],
    [55.54, 0.03, unit.DEGREE, '55.54(3)°'],
    [0, 3e-9, METRE, '0(3) nm'],
    [2546, 25, unit.WATT_PER_SQUARE_METRE, '2.546(25) kW/m²'],
  ])('%d +- %d %o is %s', (value, uncertainty, u, text) => {
    expect(formatUncertainQuantity(value, uncertainty, u, 'shortest')).toBe(text);
  });

  it('puts the pair in brackets before a unit', () => {
    const form = { form: 'plus-minus' } as const;
    expect(formatUncertainQuantity(632.8e-9, 0.3e-9, METRE, 'shortest', form)).toBe('(632.8 ± 0.3) nm');
    expect(formatUncertainQuantity(632.8e-9, 0.3e-9, METRE, 'shortest', { ...form, style: ASCII })).toBe(
      '(632.8 +/- 0.3) nm',
    );
    expect(formatUncertainQuantity(1.5, 0.03, unit.NUMBER, 'shortest', form)).toBe('1.50 ± 0.03');
  });

  it('falls back on the stated digits', () => {
    expect(formatUncertainQuantity(632.8e-9, null, METRE, { significant: 4 })).toBe('632.8 nm');
  });
});

describe('ranges say "to"', () => {
  it.each<[[number, number], string]>([
    [[0.21e-6, 6.7e-6], '0.21 µm to 6.7 µm'],
    [[2e-6, 20e-6], '2 µm to 20 µm'],
    [[50e-9, 1e6], '50 nm to 1000 km'],
    [[0, 2e-3], '0 mm to 2 mm'],
  ])('%j', (range, text) => {
    expect(formatRange(range, METRE)).toBe(text);
  });
});

describe('ASCII', () => {
  it.each<[string, string]>([
    ['λ = 0.633 µm, θ = 45°', 'lambda = 0.633 um, theta = 45 deg'],
    ['-10.6 × 10⁻⁶ K⁻¹', '-10.6e-6 K-1'],
    ['5 °C ± 1 °C', '5 degC +/- 1 degC'],
    ['Schröder, Å. Ångström', 'Schroder, A. Angstrom'],
    ['n₁ → n₂…', 'n1 -> n2...'],
    ['56°18′36″', '56 deg18\'36"'],
    ['plain', 'plain'],
    ['snow ☃', 'snow ?'],
    ['W·m⁻²', 'W m-2'],
  ])('%j is %j', (text, ascii) => {
    expect(toAscii(text)).toBe(ascii);
  });

  it('holds the bytes 0x20 to 0x7E and line ends only, for any text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary' }), (text) => {
        expect(toAscii(text)).toMatch(/^[\x20-\x7e\n]*$/);
      }),
    );
  });
});

it('withUnit leaves no space before the degree sign alone', () => {
  expect([withUnit('1', '°'), withUnit('1', '°C'), withUnit('1', ''), withUnit('-', 'm')]).toEqual([
    '1°',
    '1 °C',
    '1',
    '-',
  ]);
});
