/**
 * Angles of incidence at which something particular happens. All from the normal, in radians; null where there is none.
 */
import { fresnel } from './fresnel.ts';
import type { Optics } from './optics.ts';

/** R_p below this at the Brewster angle of the real parts counts as vanishing (absorption too weak to fill the zero). */
const VANISHING_REFLECTANCE = 1e-9;

/**
 * Brewster angles of a lossless pair, magnetic media included: with e = eps2/eps1, m = mu2/mu1,
 * p: sin^2 = e (e - m)/(e^2 - 1);  s: sin^2 = m (m - e)/(m^2 - 1); exists where 0 < sin^2 < 1.
 * For m = 1 the first is tan = n2/n1. Source: Giles & Wild, Int. J. Infrared Millimeter Waves 6, 187 (1985).
 * Weakly absorbing media count as lossless while the reflectance there stays below 1e-9.
 */
export function brewsterAngles(
  from: Optics,
  into: Optics,
): { readonly p: number | null; readonly s: number | null } {
  const e = into.eps.re / from.eps.re;
  const m = into.mu.re / from.mu.re;
  const p = e === 1 ? null : angleFromSquaredSine((e * (e - m)) / ((e - 1) * (e + 1)));
  const s = m === 1 ? null : angleFromSquaredSine((m * (m - e)) / ((m - 1) * (m + 1)));
  return {
    p: p !== null && fresnel(from, into, p).Rp < VANISHING_REFLECTANCE ? p : null,
    s: s !== null && fresnel(from, into, s).Rs < VANISHING_REFLECTANCE ? s : null,
  };
}

function angleFromSquaredSine(sin2: number): number | null {
  if (!(sin2 > 0 && sin2 < 1)) return null;
  return Math.atan2(Math.sqrt(sin2), Math.sqrt(1 - sin2));
}

/** From this ratio k/n of the medium of incidence on, T as a fraction of the incident power has no meaning. */
export const LOSSY_INCIDENCE = 1e-3;

/** Absorption beyond up to this ratio k/n leaves the critical angle and total reflection meaningful (1 - R stays below about 1e-3). */
export const WEAK_ABSORPTION = 1e-4;

/** sin(theta_c) = n2/n1 for n2 < n1; null otherwise and where either side absorbs more than that. */
export function criticalAngle(from: Optics, into: Optics): number | null {
  if (from.n.re <= 0 || into.n.re < 0) return null;
  if (from.n.im > LOSSY_INCIDENCE * from.n.re || into.n.im > WEAK_ABSORPTION * into.n.re) return null;
  const ratio = into.n.re / from.n.re;
  return ratio < 1 ? Math.asin(ratio) : null;
}
