/**
 * What stays beyond the surface in total reflection, and where the reflected beam comes out.
 */
import { div } from '../num/complex.ts';
import { fresnel, fresnelAngleDerivative } from './fresnel.ts';
import type { Optics } from './optics.ts';

export interface TotalReflection {
  /** Depth at which the field amplitude has fallen to 1/e; the intensity falls twice as fast. */
  readonly evanescentDepth_m: number;
  /** Displacement of the reflected beam, perpendicular to it, per polarization. Null at normal incidence of a denser conductor etc. */
  readonly goosHanchenS_m: number | null;
  readonly goosHanchenP_m: number | null;
}

/**
 * d = lambda/(2 pi Im kappa2); displacement D = -(lambda/(2 pi n1)) dphi/dtheta with phi the phase of r (Artmann 1948).
 * Not valid within the divergence of a real beam from the critical angle, where D diverges. Call only in total reflection.
 */
export function totalReflection(
  from: Optics,
  into: Optics,
  incidenceAngle_rad: number,
  vacuumWavelength_m: number,
): TotalReflection {
  const { rs, rp, kappa2 } = fresnel(from, into, incidenceAngle_rad);
  const { drs, drp } = fresnelAngleDerivative(from, into, incidenceAngle_rad);
  const reduced_m = vacuumWavelength_m / (2 * Math.PI);
  const shift = (dphi: number): number | null =>
    Number.isFinite(dphi) ? (-reduced_m / from.n.re) * dphi : null;
  return {
    evanescentDepth_m: reduced_m / kappa2.im,
    goosHanchenS_m: shift(div(drs, rs).im),
    goosHanchenP_m: shift(div(drp, rp).im),
  };
}
