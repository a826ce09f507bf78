/**
 * Coatings off the normal, by admittances: with y in place of n every formula for normal incidence holds, and a film's phase
 * thickness is 2 pi kappa d/lambda.
 *
 *   s: y = kappa,  p: y = n^2/kappa,  kappa = sqrt(n^2 - q^2),  q = n0 sin(theta)
 *
 * Source: Macleod, Thin-Film Optical Filters, 2.3 (tilted admittances), non-magnetic media.
 */
import type { Polarization } from './layered-path.ts';

/** Normal wave vector over k0; NaN where no wave runs. */
export const normalIndex = (n: number, tangentialIndex: number): number =>
  Math.sqrt((n - tangentialIndex) * (n + tangentialIndex));

/** NaN where no wave runs. */
export function tiltedAdmittance(n: number, tangentialIndex: number, polarization: Polarization): number {
  const kappa = normalIndex(n, tangentialIndex);
  return polarization === 's' ? kappa : (n * n) / kappa;
}

/**
 * The film index whose quarter wave removes the reflection of one polarization: y^2 = y0 ys. In p the admittance passes
 * a minimum of 2 q at n^2 = 2 q^2; the index on its upper side is given, the one that becomes sqrt(n0 ns) at the normal. Null
 * where no index does it.
 */
export function idealFilmIndexAt(
  outsideIndex: number,
  substrateIndex: number,
  tangentialIndex: number,
  polarization: Polarization,
): number | null {
  const q2 = tangentialIndex * tangentialIndex;
  const wanted2 =
    tiltedAdmittance(outsideIndex, tangentialIndex, polarization) *
    tiltedAdmittance(substrateIndex, tangentialIndex, polarization);
  if (!(wanted2 > 0)) return null;
  if (polarization === 's') return Math.sqrt(wanted2 + q2);
  // n^4/(n^2 - q^2) = y^2, quadratic in n^2.
  const discriminant = wanted2 * (wanted2 - 4 * q2);
  return discriminant >= 0 ? Math.sqrt((wanted2 + Math.sqrt(discriminant)) / 2) : null;
}
