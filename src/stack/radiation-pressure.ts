/**
 * Radiation pressure on a whole body in vacuum (plate, stack, mirror), from its reflectance and transmittance: the one case
 * in which the momentum balance needs no convention about momentum inside matter. The transmitted beam goes on in the
 * direction of the incident one, so both faces are parallel.
 * Source: Jackson, Classical Electrodynamics, 6.7; Born & Wolf, Principles of Optics, 1.1.
 */
import { SPEED_OF_LIGHT_m_per_s } from '../units/constants.ts';
import { StackRefusal } from './stack-refusal.ts';

export interface BodyPressure {
  /** Into the body, along the normal: (I/c) cos^2 (1 + R - T). */
  readonly normal_Pa: number;
  /** Along the surface, the way the wave goes: (I/c) sin cos (1 - R - T). */
  readonly tangential_Pa: number;
}

/** `irradiance_W_per_m2` across the beam, not on the surface. */
export function bodyPressure(
  irradiance_W_per_m2: number,
  incidenceAngle_rad: number,
  R: number,
  T: number,
): BodyPressure {
  checkFractions(R, T);
  const [sin, cos] = [Math.sin(incidenceAngle_rad), Math.cos(incidenceAngle_rad)];
  const pressure = irradiance_W_per_m2 / SPEED_OF_LIGHT_m_per_s;
  return { normal_Pa: pressure * cos * cos * (1 + R - T), tangential_Pa: pressure * sin * cos * (1 - R - T) };
}

/** Force along the normal of a beam met at an angle, whatever its width: (P/c) cos (1 + R - T). */
export function bodyForce_N(power_W: number, incidenceAngle_rad: number, R: number, T: number): number {
  checkFractions(R, T);
  return (power_W / SPEED_OF_LIGHT_m_per_s) * Math.cos(incidenceAngle_rad) * (1 + R - T);
}

function checkFractions(R: number, T: number): void {
  if (!(R >= 0 && T >= 0 && R + T <= 1 + 1e-9)) {
    throw new StackRefusal(
      'out-of-range',
      `R = ${R} and T = ${T} are not what a passive body does`,
      'give fractions from 0 on that add up to 1 at most',
    );
  }
}
