/** Conduction as a permittivity: i sigma/(w eps0), which is i sigma L/(2 pi c eps0): a jet linear in the wavelength. */
import type { ComplexJet } from '../num/complex-jet.ts';
import { SPEED_OF_LIGHT_m_per_s, VACUUM_PERMITTIVITY_F_per_m } from '../units/constants.ts';

/** eps'' per (S/m) and per um of vacuum wavelength. */
export const LOSS_PER_SIEMENS_AND_um =
  1e-6 / (2 * Math.PI * SPEED_OF_LIGHT_m_per_s * VACUUM_PERMITTIVITY_F_per_m);

export function conduction(sigma_S_per_m: number, wavelength_um: number): ComplexJet {
  const slope = sigma_S_per_m * LOSS_PER_SIEMENS_AND_um;
  return { re: [0, 0, 0, 0], im: [slope * wavelength_um, slope, 0, 0] };
}
