/**
 * A medium given by its numbers ("n=1.5", "eps=4,sigma=0.01"): non-dispersive, exact.
 *   eps = eps_r (1 + i tan delta) + i sigma/(eps0 w);  n = sqrt(eps mu), decaying branch.
 */

import { type Optics, opticsFromIndex, opticsFromPermittivity } from '../interface/optics.ts';
import { ONE } from '../num/complex.ts';
import { SPEED_OF_LIGHT_m_per_s, VACUUM_PERMITTIVITY_F_per_m } from '../units/constants.ts';
import type { TypedMedium } from '../units/parse-literal-medium.ts';

/** The numbers of a literal medium as typed. */
export type LiteralMedium = TypedMedium;

export function literalOptics(literal: LiteralMedium, vacuumWavelength_m: number): Optics {
  const mu = literal.mu ?? ONE;
  if (literal.n) return opticsFromIndex(literal.n, mu);
  const eps = literal.eps ?? ONE;
  const omega = (2 * Math.PI * SPEED_OF_LIGHT_m_per_s) / vacuumWavelength_m;
  const conduction = (literal.conductivity_S_per_m ?? 0) / (VACUUM_PERMITTIVITY_F_per_m * omega);
  return opticsFromPermittivity(
    { re: eps.re, im: eps.im + eps.re * (literal.lossTangent ?? 0) + conduction },
    mu,
  );
}
