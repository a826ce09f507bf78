/**
 * Reflection and transmission at one surface as every answer gives them: the law of `fresnel.ts`, and which medium of incidence
 * it is asked with.
 *
 * Total reflection out of a weak absorber. The plane wave of the law fades along such a surface, and what comes back to a point
 * went in a little upstream, where the wave was stronger: |r|^2 = 1 + O(k/n) and T = -O(k/n), a flow from beyond the surface back
 * to the wave. No beam gains by that. In an absorbing medium incident and reflected power are told apart to k/n only, so in
 * total reflection the absorption of the medium of incidence is left out, as it is before layers: then R + T = 1, R <= 1.
 */
import { complex } from '../num/complex.ts';
import { type FresnelResult, fresnel } from './fresnel.ts';
import { isLossless, type Optics, opticsFromIndex } from './optics.ts';
import { criticalAngle, LOSSY_INCIDENCE, WEAK_ABSORPTION } from './special-angles.ts';

export interface SurfaceWave {
  /** The medium of incidence the law was asked with. */
  readonly from: Optics;
  readonly wave: FresnelResult;
  readonly criticalAngle_rad: number | null;
  readonly totalReflection: boolean;
  /** False where the medium of incidence absorbs too much for a fraction of its power to mean anything: T has no meaning. */
  readonly powersKnown: boolean;
}

/** `incidenceAngle_rad` from the normal, 0 <= angle < pi/2. */
export function surfaceWave(from: Optics, into: Optics, incidenceAngle_rad: number): SurfaceWave {
  const wave = fresnel(from, into, incidenceAngle_rad);
  const criticalAngle_rad = criticalAngle(from, into);
  const totalReflection =
    criticalAngle_rad !== null &&
    incidenceAngle_rad > criticalAngle_rad &&
    into.n.im <= WEAK_ABSORPTION * into.n.re &&
    wave.kappa2.im > 0;
  const powersKnown = from.n.im <= LOSSY_INCIDENCE * Math.abs(from.n.re);
  if (!totalReflection || isLossless(from)) {
    return { from, wave, criticalAngle_rad, totalReflection, powersKnown };
  }
  const clear = opticsFromIndex(complex(from.n.re), complex(from.mu.re));
  const without = fresnel(clear, into, incidenceAngle_rad);
  return { from: clear, wave: without, criticalAngle_rad, totalReflection, powersKnown };
}
