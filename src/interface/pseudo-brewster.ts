/**
 * The angle of least R_p where the far side absorbs, so that R_p has a minimum but no zero.
 *
 * Between media without magnetism, the first one transparent, with eps = eps2/eps1 and u = sin^2: R_p is stationary where
 * rho (eps - u (eps + 1)) is imaginary, rho = sqrt(eps - u)/(eps cos), which gives, with t = cos^2 = 1 - u,
 *   t^2 + w (1 - t)^2 (2a - 1 - 2 (1 + a) t) = 0,   w = 1/|eps|^2,  a = Re eps/|eps|^2
 * (and the same in u), a cubic without cancellation, whose roots in (0, 1) are the minima and maxima. Derived from the law
 * itself; it agrees with the cubic of Azzam & Ugbo, Appl. Opt. 28, 5222 (1989). Other pairs are scanned.
 */
import { fresnel, fresnelAngleDerivative } from './fresnel.ts';
import { POWER_RP, SURFACE_LENGTH, writeSurfaceOf } from './fresnel-kernel.ts';
import { isLossless, type Optics } from './optics.ts';

/**
 * From the normal, rad. Null where R_p rises from normal incidence on (its minimum is then at 0 itself), and where the far
 * side does not absorb.
 */
export function pseudoBrewsterAngle(from: Optics, into: Optics): number | null {
  if (into.eps.im === 0 && into.mu.im === 0) return null;
  if (!(isPlain(from) && isLossless(from) && isPlain(into))) return scanned(from, into);
  const reflectance = reflectanceP(from, into);
  let best: number | null = null;
  let least = reflectance(0);
  for (const angle_rad of stationary(from, into)) {
    const R = reflectance(angle_rad);
    if (R < least) {
      least = R;
      best = angle_rad;
    }
  }
  return best;
}

const isPlain = ({ n, mu }: Optics): boolean => mu.re === 1 && mu.im === 0 && n.re > 0;

function reflectanceP(from: Optics, into: Optics): (incidenceAngle_rad: number) => number {
  const out = new Float64Array(SURFACE_LENGTH);
  return (incidenceAngle_rad) => {
    writeSurfaceOf(from, into, incidenceAngle_rad, out);
    return out[POWER_RP]!;
  };
}

/** Angles in (0, pi/2) at which R_p is stationary. */
function stationary(from: Optics, into: Optics): readonly number[] {
  const re = into.eps.re / from.eps.re;
  const im = into.eps.im / from.eps.re;
  const w = 1 / (re * re + im * im);
  const a = re * w;
  const b = 2 * a - 1;
  const d = -2 * (1 + a);
  const angle = (sin2: number, cos2: number): number => Math.atan2(Math.sqrt(sin2), Math.sqrt(cos2));
  // In sin^2 beyond a rare medium, in cos^2 beyond a dense one: each is small where the roots crowd together.
  if (w > 1) {
    const cubic = (u: number): number => (1 - u) * (1 - u) + w * u * u * (-d * u - 3);
    return rootsInside(cubic, -3 * w * d, 2 * (1 - 3 * w), -2).map((u) => angle(u, 1 - u));
  }
  const cubic = (t: number): number => t * t + w * (1 - t) * (1 - t) * (b + d * t);
  return rootsInside(cubic, 3 * w * d, 2 * (1 + w * (b - 2 * d)), w * (d - 2 * b)).map((t) =>
    angle(1 - t, t),
  );
}

/** Roots in (0, 1); a, b, c are the coefficients of the derivative, whose zeros part it into pieces with one root at most. */
function rootsInside(cubic: (t: number) => number, a: number, b: number, c: number): readonly number[] {
  const turns = quadraticRoots(a, b, c).filter((t) => t > 0 && t < 1);
  const ends = [0, ...turns.sort((p, q) => p - q), 1];
  return ends.flatMap((end, i) => {
    const root = i === 0 ? null : rootBetween(cubic, ends[i - 1]!, end);
    return root !== null && root > 0 && root < 1 ? [root] : [];
  });
}

/** Real roots of a t^2 + b t + c, without cancellation. */
function quadraticRoots(a: number, b: number, c: number): readonly number[] {
  const square = b * b - 4 * a * c;
  if (!(square >= 0)) return [];
  const q = -(b + (b < 0 ? -1 : 1) * Math.sqrt(square)) / 2;
  return [q / a, c / q].filter(Number.isFinite);
}

/** By halving, in the logarithm while the bracket spans decades: t is tiny where the far side conducts very well. */
function rootBetween(f: (t: number) => number, from: number, to: number): number | null {
  let low = from;
  let high = to;
  const isNegativeLow = f(low) < 0;
  if (isNegativeLow === f(high) < 0) return null;
  for (let i = 0; i < 400; i++) {
    const mid =
      low > 0 && high > 4 * low
        ? Math.sqrt(low * high)
        : low === 0 && high > 1e-300
          ? high / 16
          : (low + high) / 2;
    if (mid <= low || mid >= high) break;
    if (f(mid) < 0 === isNegativeLow) low = mid;
    else high = mid;
  }
  return (low + high) / 2;
}

const STEPS = 720;

/** The zero of dR_p/dtheta about the lowest point of a scan in steps of an eighth of a degree. */
function scanned(from: Optics, into: Optics): number | null {
  const reflectance = reflectanceP(from, into);
  const step = Math.PI / 2 / STEPS;
  let lowest = 0;
  let lowestR = reflectance(0);
  for (let i = 1; i < STEPS; i++) {
    const R = reflectance(i * step);
    if (R < lowestR) {
      lowestR = R;
      lowest = i;
    }
  }
  if (lowest === 0) return null;
  const slope = (angle_rad: number): number => {
    const { rp } = fresnel(from, into, angle_rad);
    const { drp } = fresnelAngleDerivative(from, into, angle_rad);
    return rp.re * drp.re + rp.im * drp.im;
  };
  let low = (lowest - 1) * step;
  // The minimum of a very good conductor lies closer to grazing than one step: the last bracket reaches there.
  let high = Math.min((lowest + 1) * step, Math.PI / 2 - 1e-12);
  const isNegativeLow = slope(low === 0 ? 1e-9 : low) < 0;
  for (let i = 0; i < 200 && high - low > 1e-15; i++) {
    const mid = (low + high) / 2;
    const s = slope(mid);
    if (s === 0) return mid;
    if (s < 0 === isNegativeLow) low = mid;
    else high = mid;
  }
  return (low + high) / 2;
}
