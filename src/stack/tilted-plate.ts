/**
 * Where a plane parallel or slightly wedged plate puts the beam, and what it adds to path and delay. Ray optics of a
 * transparent plate; indices relative to vacuum. Sources: Born & Wolf, Principles of Optics, 4.7 and 7.6; Hecht, Optics, 4.
 */
import { SPEED_OF_LIGHT_m_per_s } from '../units/constants.ts';
import { StackRefusal } from './stack-refusal.ts';

export interface PlatePassage {
  readonly refractionAngle_rad: number;
  /** Length of the ray inside, d/cos(theta inside). */
  readonly path_m: number;
  /** n times that. */
  readonly opticalPath_m: number;
  /** Parallel shift of the transmitted beam, perpendicular to it: d sin(theta - theta inside)/cos(theta inside). */
  readonly lateralDisplacement_m: number;
  /** What the plate adds to the optical path between two planes across the beam: d (n cos inside - n0 cos). */
  readonly addedOpticalPath_m: number;
  /** Transit time of a pulse, n_g d/(c cos inside). */
  readonly groupDelay_s: number;
  /** beta2 d/cos inside; null without beta2. */
  readonly gdd_s2: number | null;
}

/** Throws `StackRefusal` where the wave does not enter. */
export function platePassage(
  thickness_m: number,
  outsideIndex: number,
  n: number,
  groupIndex: number,
  incidenceAngle_rad: number,
  gvd_s2_per_m: number | null = null,
): PlatePassage {
  const sin = (outsideIndex * Math.sin(incidenceAngle_rad)) / n;
  if (!(incidenceAngle_rad >= 0 && incidenceAngle_rad < Math.PI / 2 && sin < 1)) {
    throw new StackRefusal(
      'angle-out-of-range',
      'no ray enters the plate at this angle',
      'take an angle from 0 to below 90 degrees that is not totally reflected',
    );
  }
  if (!(thickness_m >= 0)) {
    throw new StackRefusal(
      'negative-thickness',
      `a thickness of ${thickness_m} m`,
      'a thickness is zero or more',
    );
  }
  const cos = Math.sqrt((1 - sin) * (1 + sin));
  const refractionAngle_rad = Math.asin(sin);
  const path_m = thickness_m / cos;
  return {
    refractionAngle_rad,
    path_m,
    opticalPath_m: n * path_m,
    lateralDisplacement_m: path_m * Math.sin(incidenceAngle_rad - refractionAngle_rad),
    addedOpticalPath_m: thickness_m * (n * cos - outsideIndex * Math.cos(incidenceAngle_rad)),
    groupDelay_s: (groupIndex * path_m) / SPEED_OF_LIGHT_m_per_s,
    gdd_s2: gvd_s2_per_m === null ? null : gvd_s2_per_m * path_m,
  };
}

export interface WedgeNote {
  /** Deviation of the transmitted beam near normal incidence, (n/n0 - 1) wedge. */
  readonly deviation_rad: number;
  /** Angle between the reflections of the two faces, and between transmitted beam and first ghost, 2 (n/n0) wedge. */
  readonly ghostSeparation_rad: number;
}

/** Small wedge angle, near normal incidence. */
export function wedgeNote(wedge_rad: number, n: number, outsideIndex = 1): WedgeNote {
  const relative = n / outsideIndex;
  return { deviation_rad: (relative - 1) * wedge_rad, ghostSeparation_rad: 2 * relative * wedge_rad };
}
