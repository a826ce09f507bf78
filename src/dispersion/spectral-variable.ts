/** Photon energy, frequency and wavenumber as jets of the vacuum wavelength in um. All are inversely proportional to it. */
import type { Jet } from '../num/jet.ts';
import { ELEMENTARY_CHARGE_C, PLANCK_J_s, SPEED_OF_LIGHT_m_per_s } from '../units/constants.ts';

/** h c / e in eV um: 1.239841984... */
export const HC_eV_um = ((PLANCK_J_s * SPEED_OF_LIGHT_m_per_s) / ELEMENTARY_CHARGE_C) * 1e6;
const C_um_per_s = SPEED_OF_LIGHT_m_per_s * 1e6;

/** factor / L. */
export function inverse(factor: number, wavelength_um: number): Jet {
  const r = 1 / wavelength_um;
  const v = factor * r;
  return [v, -v * r, v * r * r, -v * r * r * r];
}

export const photonEnergy_eV = (wavelength_um: number): Jet => inverse(HC_eV_um, wavelength_um);
export const wavenumber_per_cm = (wavelength_um: number): Jet => inverse(1e4, wavelength_um);
export const frequency_Hz = (wavelength_um: number): Jet => inverse(C_um_per_s, wavelength_um);
export const frequency_GHz = (wavelength_um: number): Jet => inverse(C_um_per_s * 1e-9, wavelength_um);
export const angularFrequency_rad_per_s = (wavelength_um: number): Jet =>
  inverse(2 * Math.PI * C_um_per_s, wavelength_um);
