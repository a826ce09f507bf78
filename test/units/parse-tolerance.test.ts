import { describe, expect, it } from 'vitest';
import { parseTolerances, wavelengthTolerance_m } from '../../src/units/parse-tolerance.ts';
import { outcome } from './outcome.ts';

const examples = 'write for example wave=1nm,angle=0.5deg,n=1e-4,thickness=5nm,temperature=0.5C';

describe('tolerances', () => {
  it.each<[string, object]>([
    [
      'wave=1nm,angle=30mrad,n=1e-4',
      { wave: { kind: 'wavelength', value: 1e-9 }, angle_rad: 0.03, index: 1e-4 },
    ],
    ['n1=2e-5, N=1e-4', { indexFrom: 2e-5, index: 1e-4 }],
    ['thickness=5nm,temperature=0.5C', { thickness_m: 5e-9, temperature_K: 0.5 }],
    ['wave=2GHz', { wave: { kind: 'frequency', value: 2e9 } }],
    ['wave=1meV', { wave: { kind: 'photon-energy', value: 1e-3 } }],
    ['wave=0.5cm-1', { wave: { kind: 'wavenumber', value: 50 } }],
    ['n=0', { index: 0 }],
  ])('%j', (text, tolerances) => {
    expect(parseTolerances(text)).toEqual(tolerances);
  });

  it.each<[string, string]>([
    ['', `not-a-tolerance: "" is no tolerance; ${examples}`],
    ['wave', `not-a-tolerance: "wave" is no tolerance; ${examples}`],
    ['colour=1', `not-a-tolerance: "colour=1" is no tolerance; ${examples}`],
    ['constructor=1', `not-a-tolerance: "constructor=1" is no tolerance; ${examples}`],
    ['n=1e-4,n=2e-4', 'not-a-tolerance: the tolerance of n is given twice; give it once'],
    [
      'n=-1e-4',
      'out-of-range: "-1e-4" is out of range: a tolerance must be 0 or above; write for example n=1e-4',
    ],
    [
      'wave=1',
      'unit-missing: 1 what? a tolerance of the wave needs a unit; write for example 1nm, 2GHz or 0.5cm-1',
    ],
    ['temperature=1', 'not-a-tolerance: "1" is no temperature difference; write for example 0.5C or 0.5K'],
  ])('%j is refused', (text, line) => {
    expect(outcome(parseTolerances(text))).toBe(line);
  });
});

describe('a tolerance of the wave as one of the wavelength', () => {
  const at_m = 1550e-9;
  it.each<[string, number]>([
    ['wave=1nm', 1e-9],
    // 124.78 GHz is 1 nm at 1550 nm, to first order.
    ['wave=124.783541GHz', 1e-9],
    ['wave=4.162331cm-1', 1e-9],
    ['wave=0.516063meV', 1e-9],
  ])('%j', (text, width_m) => {
    const tolerances = parseTolerances(text);
    if (!('wave' in tolerances)) throw new Error('no wave');
    expect(wavelengthTolerance_m(tolerances.wave, at_m) / width_m).toBeCloseTo(1, 5);
  });
});
