import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseWave, type TypedWave } from '../../src/units/parse-wave.ts';
import { isProblem } from '../../src/units/problem.ts';
import { findSpectralLine, lineSpelling, SPECTRAL_LINES } from '../../src/units/spectral-lines.ts';
import { outcome } from './outcome.ts';

const c = 299_792_458;
const wave = (text: string): TypedWave => {
  const typed = parseWave(text);
  if (isProblem(typed)) throw new Error(typed.message);
  return typed;
};

describe('a wavelength stays as given, to the last bit', () => {
  it.each<[string, number]>([
    ['633nm', 6.33e-7],
    ['633 nm', 6.33e-7],
    ['0.5876um', 5.876e-7],
    ['0.5876\u00b5m', 5.876e-7],
    ['0.5876\u03bcm', 5.876e-7],
    ['10.6µm', 1.06e-5],
    ['5876\u00c5', 5.876e-7],
    ['5876\u212b', 5.876e-7],
    ['5876 angstrom', 5.876e-7],
    ['1550.12nm', 1.55012e-6],
    ['3.2mm', 3.2e-3],
    ['3cm', 3e-2],
    ['1.5m', 1.5],
    ['300km', 3e5],
    ['633000pm', 6.33e-7],
    ['50nm', 5e-8],
    ['100000km', 1e8],
    ['633NM', 6.33e-7],
    ['0.633UM', 6.33e-7],
    ['6.33 × 10⁻⁷ m', 6.33e-7],
    ['6.33e-7m', 6.33e-7],
  ])('%j', (text, wavelength_m) => {
    expect(wave(text)).toMatchObject({ kind: 'wavelength', wavelength_m, inAir: false, text });
  });

  it('for every count of picometres in range', () => {
    fc.assert(
      fc.property(fc.integer({ min: 50_000, max: 1e15 }), (pm) => {
        expect(wave(`${pm}pm`).wavelength_m).toBe(Number(`${pm}e-12`));
      }),
    );
  });

  it('says how many digits were typed, trailing zeros included', () => {
    expect(wave('632.80nm').digits).toBe(5);
    expect(wave('0.6328um').digits).toBe(4);
  });

  it('is in air only where said so', () => {
    expect(parseWave('587.6nm', { airWavelength: true })).toMatchObject({
      inAir: true,
      wavelength_m: 5.876e-7,
    });
  });
});

describe('frequencies, photon energies and wavenumbers give the vacuum wavelength', () => {
  it.each<[string, string, number]>([
    ['474THz', 'frequency', c / 474e12],
    ['474 thz', 'frequency', c / 474e12],
    ['10GHz', 'frequency', c / 10e9],
    ['10ghz', 'frequency', c / 10e9],
    ['5kHz', 'frequency', c / 5e3],
    ['1PHz', 'frequency', c / 1e15],
    ['1MHz', 'frequency', c / 1e6],
    ['300Hz', 'frequency', c / 300],
    ['1.96eV', 'photon-energy', 1.2398419843320026e-6 / 1.96],
    ['1meV', 'photon-energy', 1.2398419843320026e-3],
    ['0.02keV', 'photon-energy', 1.2398419843320026e-6 / 20],
    ['15800cm-1', 'wavenumber', 1 / 1_580_000],
    ['15800 cm^-1', 'wavenumber', 1 / 1_580_000],
    ['15800 cm⁻¹', 'wavenumber', 1 / 1_580_000],
    ['15800 1/cm', 'wavenumber', 1 / 1_580_000],
    ['15800/cm', 'wavenumber', 1 / 1_580_000],
    ['1.58um-1', 'wavenumber', 1 / 1_580_000],
  ])('%j', (text, kind, wavelength_m) => {
    const typed = wave(text);
    expect(typed.kind).toBe(kind);
    expect(typed.inAir).toBe(false);
    expect(Math.abs(typed.wavelength_m / wavelength_m - 1)).toBeLessThan(1e-15);
  });

  it('cannot be wavelengths in air', () => {
    expect(outcome(parseWave('474THz', { airWavelength: true }))).toBe(
      'unit-of-another-kind: "474THz" is a frequency, which is the same in air and in vacuum; leave --air-wavelength out, or give the wavelength in air',
    );
  });
});

describe('one letter’s case never moves a wave by nine orders of magnitude', () => {
  it.each<[string, string]>([
    ['5mHz', '5 MHz (megahertz) or 5 mHz (millihertz); write 5MHz, or another unit'],
    ['5mhz', '5 MHz (megahertz) or 5 mHz (millihertz); write 5MHz, or another unit'],
    ['5MHZ', '5 MHz (megahertz) or 5 mHz (millihertz); write 5MHz, or another unit'],
    ['5MeV', '5 meV (millielectronvolt) or 5 MeV (megaelectronvolt); write 5meV, or another unit'],
    ['5mev', '5 meV (millielectronvolt) or 5 MeV (megaelectronvolt); write 5meV, or another unit'],
    ['5Mm', '5 mm (millimetre) or 5 Mm (megametre); write 5mm, or another unit'],
    ['5MM', '5 mm (millimetre) or 5 Mm (megametre); write 5mm, or another unit'],
  ])('%j is refused, both readings named', (text, readings) => {
    expect(outcome(parseWave(text))).toBe(`unit-ambiguous: "${text}" may be read as ${readings}`);
  });

  it('the exact spelling is taken', () => {
    expect(wave('5MHz').wavelength_m).toBe(c / 5e6);
    expect(wave('5mm').wavelength_m).toBe(5e-3);
    expect(wave('5meV').wavelength_m).toBeCloseTo(2.4797e-4, 8);
  });
});

describe('what is no wave is refused with what would be right', () => {
  const examples = 'write for example 633nm, 10.6um, 474THz, 1.96eV, 15800cm-1 or d-line';
  const units = 'units are nm, um, mm, m, angstrom, Hz to PHz, meV, eV, keV and cm-1';
  it.each<[string, string]>([
    [
      '633',
      'unit-missing: 633 what? a wave needs a unit; write 633nm, 633um, 633mm, 633GHz, 633THz or 633cm-1',
    ],
    ['2', 'unit-missing: 2 what? a wave needs a unit; write 2um, 2mm, 2GHz, 2THz, 2eV or 2cm-1'],
    ['', `empty: a wave is missing; ${examples}`],
    ['nm', `not-a-number: "nm" is not a wave: it does not begin with a number; ${examples}`],
    ['red', `not-a-number: "red" is not a wave: it does not begin with a number; ${examples}`],
    ['20C', `unit-of-another-kind: "20C" is a temperature, not a wave; ${examples}`],
    ['20 °C', `unit-of-another-kind: "20 °C" is a temperature, not a wave; ${examples}`],
    ['5W', `unit-of-another-kind: "5W" is a power, not a wave; ${examples}`],
    ['45deg', `unit-of-another-kind: "45deg" is an angle, not a wave; ${examples}`],
    ['10fs', `unit-of-another-kind: "10fs" is a time, not a wave; ${examples}`],
    ['5876A', `unit-unknown: "A" is no unit of a wave; ${units}`],
    ['633mn', `unit-unknown: "mn" is no unit of a wave; ${units}`],
    ['1,55um', 'not-a-number: "1,55um" is not a number; did you mean 1.55um?'],
    ['633nm air', 'unit-unknown: "633nm air" is not a wave; write 633nm and add --air-wavelength'],
    [
      'x-line',
      'unit-unknown: "x-line" is no reference line; lines are i h g F\' F e d D C\' C r s t, as in d-line',
    ],
  ])('%j', (text, line) => {
    expect(outcome(parseWave(text))).toBe(line);
  });

  it.each(['49.99nm', '100001km', '0nm', '-633nm', '7PHz', '2.99Hz', '30eV', '0eV', '1e300m', '-1eV'])(
    '%j is out of range',
    (text) => {
      expect(outcome(parseWave(text))).toBe(
        `out-of-range: "${text}" is out of range: waves from 50 nm to 100000 km are covered; ${examples}`,
      );
    },
  );
});

describe('reference lines', () => {
  it.each<[string, number]>([
    ['d-line', 587.5618e-9],
    ['D-line', 589.2938e-9],
    ['e-line', 546.074e-9],
    ['F-line', 486.1327e-9],
    ["F'-line", 479.9914e-9],
    ['F′-line', 479.9914e-9],
    ['F-prime-line', 479.9914e-9],
    ['C-line', 656.2725e-9],
    ["C'-line", 643.8469e-9],
    ['c-line', 656.2725e-9],
    ['d line', 587.5618e-9],
    ['t-line', 1013.98e-9],
  ])('%j is its wavelength in standard air', (text, wavelength_m) => {
    expect(wave(text)).toMatchObject({ kind: 'line', wavelength_m, inAir: true });
  });

  it('each is found by its own spelling', () => {
    for (const line of SPECTRAL_LINES) expect(findSpectralLine(lineSpelling(line))).toBe(line);
  });
});
