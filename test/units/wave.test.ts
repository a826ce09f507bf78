import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ELEMENTARY_CHARGE_C, PLANCK_J_s, SPEED_OF_LIGHT_m_per_s } from '../../src/units/constants.ts';
import {
  frequencyFromWavelength,
  frequencyWidthFromWavelengthWidth,
  PHOTON_ENERGY_TIMES_WAVELENGTH_eV_m,
  photonEnergyFromWavelength,
  wavelengthFromAngularFrequency,
  wavelengthFromFrequency,
  wavelengthFromPhotonEnergy,
  wavelengthFromWavenumber,
  wavelengthWidthFromFrequencyWidth,
  waveMeasures,
} from '../../src/units/wave.ts';

const wavelength_m = fc.double({ min: 5e-8, max: 1e8, noNaN: true });
const near = (a: number, b: number) => Math.abs(a / b - 1) < 1e-15;

describe('conversions of a wave', () => {
  it('come back to the wavelength within a rounding or two', () => {
    fc.assert(
      fc.property(wavelength_m, (L) => {
        const wave = waveMeasures(L);
        expect(near(wavelengthFromFrequency(wave.frequency_Hz), L)).toBe(true);
        expect(near(wavelengthFromPhotonEnergy(wave.photonEnergy_eV), L)).toBe(true);
        expect(near(wavelengthFromWavenumber(wave.wavenumber_per_m), L)).toBe(true);
        expect(near(wavelengthFromAngularFrequency(wave.angularFrequency_rad_per_s), L)).toBe(true);
      }),
    );
  });

  it('agree with each other', () => {
    fc.assert(
      fc.property(wavelength_m, (L) => {
        const energy_J = PLANCK_J_s * frequencyFromWavelength(L);
        expect(near(energy_J / ELEMENTARY_CHARGE_C, photonEnergyFromWavelength(L))).toBe(true);
      }),
    );
  });

  it('hc/e is the exact quotient of the defined constants to the last bit but one', () => {
    // h = 662607015e-42, c = 299792458, e = 1602176634e-28, all exact: the quotient by integer division to 30 digits.
    const exact = (662607015n * 299792458n * 10n ** 44n) / (1602176634n * 10n ** 14n);
    const value = Number(`${exact}e-44`);
    expect(Math.abs(PHOTON_ENERGY_TIMES_WAVELENGTH_eV_m / value - 1)).toBeLessThan(2.3e-16);
  });

  it('turn small widths into each other', () => {
    fc.assert(
      fc.property(wavelength_m, fc.double({ min: 1, max: 1e12, noNaN: true }), (L, width_Hz) => {
        const width_m = wavelengthWidthFromFrequencyWidth(L, width_Hz);
        expect(Math.abs(frequencyWidthFromWavelengthWidth(L, width_m) / width_Hz - 1)).toBeLessThan(1e-14);
      }),
    );
  });

  it('of one metre are the constants themselves', () => {
    expect(waveMeasures(1)).toEqual({
      vacuumWavelength_m: 1,
      frequency_Hz: SPEED_OF_LIGHT_m_per_s,
      photonEnergy_eV: PHOTON_ENERGY_TIMES_WAVELENGTH_eV_m,
      wavenumber_per_m: 1,
      angularFrequency_rad_per_s: 2 * Math.PI * SPEED_OF_LIGHT_m_per_s,
    });
  });
});
