/** Powers over the angle of incidence, from the normal to grazing or over a part of that. */
import type { Answer } from './answer.ts';
import type { CurvePath } from './curve-path.ts';
import { MOST_POINTS, type PointLimits, pointCount, spacedPoints, withPoints } from './curve-points.ts';

export interface AngleCurve {
  readonly kind: 'angle';
  readonly angle_rad: readonly number[];
  /** NaN where there is no value. */
  readonly Rs: readonly number[];
  readonly Rp: readonly number[];
  readonly Ts: readonly number[];
  readonly Tp: readonly number[];
  readonly isTooFine: boolean;
}

const RIGHT_ANGLE_rad = Math.PI / 2;
/** Quarters of a degree. */
const LIMITS: PointLimits = { least: 361, most: MOST_POINTS };
/** R meets 1 at the critical angle with an upright tangent: points crowd there. */
const BESIDE_rad = [1e-7, 1e-6, 1e-5, 1e-4, 3e-4, 1e-3, 2e-3];

export function angleCurve(
  path: CurvePath,
  answer: Answer,
  [low_rad, high_rad]: readonly [number, number] = [0, RIGHT_ANGLE_rad],
  limits = LIMITS,
): AngleCurve {
  const { brewsterAngle_rad, pseudoBrewsterAngle_rad, criticalAngle_rad } = answer.interface;
  const orders = (2 * path.coherentLength_m) / path.wavelength_m;
  const { count, isTooFine } = pointCount(orders * fringesAcross(low_rad, high_rad), limits);
  const beside =
    criticalAngle_rad === null
      ? []
      : BESIDE_rad.flatMap((by) => [criticalAngle_rad - by, criticalAngle_rad + by]);
  const marked = [
    brewsterAngle_rad,
    pseudoBrewsterAngle_rad,
    criticalAngle_rad,
    answer.geometry.incidenceAngle_rad,
  ];
  const angle_rad = withPoints(spacedPoints(low_rad, high_rad, count), [
    ...marked.filter((x) => x !== null),
    ...beside,
  ]);
  const powers = angle_rad.map((angle) => path.powersAt(path.wavelength_m, angle));
  const part = (of: 'Rs' | 'Rp' | 'Ts' | 'Tp'): number[] => powers.map((p) => p?.[of] ?? Number.NaN);
  return {
    kind: 'angle',
    angle_rad,
    Rs: part('Rs'),
    Rp: part('Rp'),
    Ts: part('Ts'),
    Tp: part('Tp'),
    isTooFine,
  };
}

/** The part of the orders of interference that an angle takes away, at most: that of a layer as thin as the first medium. */
function fringesAcross(low_rad: number, high_rad: number): number {
  return Math.cos(low_rad) - Math.cos(high_rad);
}
