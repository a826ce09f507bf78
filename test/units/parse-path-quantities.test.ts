import { describe, expect, it } from 'vitest';
import { linewidth_m, parseLinewidth } from '../../src/units/parse-linewidth.ts';
import { parseNonlinearIndex } from '../../src/units/parse-nonlinear-index.ts';
import { isProblem } from '../../src/units/problem.ts';
import { outcome } from './outcome.ts';

describe('parseLinewidth', () => {
  it('takes a width as wavelength, frequency, photon energy or wavenumber', () => {
    expect(parseLinewidth('0.1nm')).toEqual({ kind: 'wavelength', value: 1e-10 });
    expect(parseLinewidth('2 MHz')).toEqual({ kind: 'frequency', value: 2e6 });
    expect(parseLinewidth('0.5cm-1')).toEqual({ kind: 'wavenumber', value: 50 });
    expect(parseLinewidth('1meV')).toEqual({ kind: 'photon-energy', value: 1e-3 });
  });

  it('turns each into the same interval of wavelengths: lambda^2 dnu/c', () => {
    const at = 1e-6;
    for (const text of ['1GHz', '0.0333564095198152cm-1', '4.135667696923859ueV']) {
      const width = parseLinewidth(text);
      if (isProblem(width)) throw new Error(width.message);
      expect(linewidth_m(width, at) / ((at * at * 1e9) / 299_792_458)).toBeCloseTo(1, 12);
    }
  });

  it.each<[string, string]>([
    [
      '0nm',
      'out-of-range: "0nm" is out of range: a spectral width must be above 0; write for example 0.1nm, 2MHz or 0.5cm-1',
    ],
    ['2', 'unit-missing: 2 what? a spectral width needs a unit; write for example 0.1nm, 2MHz or 0.5cm-1'],
    [
      '2W',
      'unit-of-another-kind: "2W" is a power, not a spectral width; write for example 0.1nm, 2MHz or 0.5cm-1',
    ],
  ])('refuses %j', (text, line) => {
    expect(outcome(parseLinewidth(text))).toBe(line);
  });
});

describe('parseNonlinearIndex', () => {
  const examples = 'write for example 2.7e-20m2/W, 2.7e-16cm2/W or, for layer 2 alone, 2=2.7e-20m2/W';

  it.each<[string, object]>([
    ['2.7e-20m2/W', [{ value_m2_per_W: 2.7e-20 }]],
    ['2.7e-16 cm²/W', [{ value_m2_per_W: 2.7e-20 }]],
    ['-1e-17m^2/W', [{ value_m2_per_W: -1e-17 }]],
    [
      '2=2.7e-20m2/W,5=1e-19m2/W',
      [
        { layer: 2, value_m2_per_W: 2.7e-20 },
        { layer: 5, value_m2_per_W: 1e-19 },
      ],
    ],
  ])('%j', (text, value) => {
    expect(parseNonlinearIndex(text)).toEqual(value);
  });

  it.each<[string, string]>([
    ['2.7e-20', `unit-missing: 2.7e-20 what? a nonlinear index needs a unit; ${examples}`],
    ['1W/cm2', `unit-of-another-kind: "1W/cm2" is an irradiance, not a nonlinear index; ${examples}`],
    ['x=2.7e-20m2/W', `not-a-number: "x=2.7e-20m2/W" names no layer; ${examples}`],
    ['0=2.7e-20m2/W', `not-a-number: "0=2.7e-20m2/W" names no layer; ${examples}`],
    ['1=1m2/W,1=2m2/W', 'not-a-number: the nonlinear index of layer 1 is given twice; give it once'],
    ['1m2/W,2=2m2/W', `not-a-number: one nonlinear index names no layer; ${examples}`],
  ])('refuses %j', (text, line) => {
    expect(outcome(parseNonlinearIndex(text))).toBe(line);
  });
});
