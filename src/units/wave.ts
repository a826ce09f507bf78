/**
 * One wave, five ways to say it. Always from the vacuum wavelength: frequency c/L, photon energy hc/L, wavenumber 1/L
 * (not 2 pi/L), angular frequency 2 pi c/L. c, h and e are exact (SI Brochure, 9th ed.), so these conversions are exact
 * up to the rounding of doubles.
 */
import { ELEMENTARY_CHARGE_C, PLANCK_J_s, SPEED_OF_LIGHT_m_per_s } from './constants.ts';

/** hc/e: a photon of 1 eV has this vacuum wavelength in metres. */
export const PHOTON_ENERGY_TIMES_WAVELENGTH_eV_m =
  (PLANCK_J_s * SPEED_OF_LIGHT_m_per_s) / ELEMENTARY_CHARGE_C;

export interface WaveMeasures {
  readonly vacuumWavelength_m: number;
  readonly frequency_Hz: number;
  readonly photonEnergy_eV: number;
  readonly wavenumber_per_m: number;
  readonly angularFrequency_rad_per_s: number;
}

/** All measures of the wave with this vacuum wavelength. */
export function waveMeasures(vacuumWavelength_m: number): WaveMeasures {
  const frequency_Hz = frequencyFromWavelength(vacuumWavelength_m);
  return {
    vacuumWavelength_m,
    frequency_Hz,
    photonEnergy_eV: photonEnergyFromWavelength(vacuumWavelength_m),
    wavenumber_per_m: 1 / vacuumWavelength_m,
    angularFrequency_rad_per_s: 2 * Math.PI * frequency_Hz,
  };
}

/** Hz. */
export function frequencyFromWavelength(vacuumWavelength_m: number): number {
  return SPEED_OF_LIGHT_m_per_s / vacuumWavelength_m;
}

/** Vacuum wavelength in metres. */
export function wavelengthFromFrequency(frequency_Hz: number): number {
  return SPEED_OF_LIGHT_m_per_s / frequency_Hz;
}

/** eV. */
export function photonEnergyFromWavelength(vacuumWavelength_m: number): number {
  return PHOTON_ENERGY_TIMES_WAVELENGTH_eV_m / vacuumWavelength_m;
}

/** Vacuum wavelength in metres. */
export function wavelengthFromPhotonEnergy(photonEnergy_eV: number): number {
  return PHOTON_ENERGY_TIMES_WAVELENGTH_eV_m / photonEnergy_eV;
}

/** Vacuum wavelength in metres from 1/L. */
export function wavelengthFromWavenumber(wavenumber_per_m: number): number {
  return 1 / wavenumber_per_m;
}

/** Vacuum wavelength in metres. */
export function wavelengthFromAngularFrequency(angularFrequency_rad_per_s: number): number {
  return (2 * Math.PI * SPEED_OF_LIGHT_m_per_s) / angularFrequency_rad_per_s;
}

/** Width in metres of vacuum wavelength of a band of small width in frequency: L^2 d_nu / c. */
export function wavelengthWidthFromFrequencyWidth(vacuumWavelength_m: number, width_Hz: number): number {
  return (vacuumWavelength_m ** 2 * width_Hz) / SPEED_OF_LIGHT_m_per_s;
}

/** Width in Hz of a band of small width in vacuum wavelength: c d_L / L^2. */
export function frequencyWidthFromWavelengthWidth(vacuumWavelength_m: number, width_m: number): number {
  return (SPEED_OF_LIGHT_m_per_s * width_m) / vacuumWavelength_m ** 2;
}
