/**
 * Propagation in a uniaxial crystal, transparent: index of the extraordinary wave, walk-off, retardance, waveplates.
 * Angles are between the WAVE VECTOR (not the ray) and the optic axis.
 *
 *   1/n(theta)^2 = cos^2/no^2 + sin^2/ne^2,   tan(theta_ray) = (no/ne)^2 tan(theta),   rho = theta_ray - theta
 *
 * Sources: Born & Wolf, Principles of Optics, 15.2-15.4; Yariv & Yeh, Photonics, 1.7.
 */
import { StackRefusal } from './stack-refusal.ts';

/** Index of the extraordinary wave at an angle to the axis: no along it, ne across it. */
export function extraordinaryIndex(no: number, ne: number, angle_rad: number): number {
  checkIndices(no, ne);
  return (no * ne) / Math.hypot(ne * Math.cos(angle_rad), no * Math.sin(angle_rad));
}

/**
 * Walk-off: angle from wave vector to ray, positive away from the axis (negative crystals, ne < no). Zero along and
 * across the axis. From tan(rho) = (no^2 - ne^2) sin cos/(ne^2 cos^2 + no^2 sin^2), which loses no digits.
 */
export function walkOffAngle_rad(no: number, ne: number, angle_rad: number): number {
  checkIndices(no, ne);
  const [sin, cos] = [Math.sin(angle_rad), Math.cos(angle_rad)];
  return Math.atan(((no - ne) * (no + ne) * sin * cos) / ((ne * cos) ** 2 + (no * sin) ** 2));
}

/** Greatest walk-off and the angle of the wave vector at which it occurs: tan rho = (no^2 - ne^2)/(2 no ne), tan theta = ne/no. */
export function greatestWalkOff(
  no: number,
  ne: number,
): { readonly walkOff_rad: number; readonly angle_rad: number } {
  checkIndices(no, ne);
  return {
    walkOff_rad: Math.atan(((no - ne) * (no + ne)) / (2 * no * ne)),
    angle_rad: Math.atan(ne / no),
  };
}

/** Separation of ordinary and extraordinary ray after a plate met normally: d tan(rho), signed as rho. */
export function walkOffDisplacement_m(
  no: number,
  ne: number,
  angle_rad: number,
  thickness_m: number,
): number {
  return thickness_m * Math.tan(walkOffAngle_rad(no, ne, angle_rad));
}

/**
 * Retardance of a plate met normally, phase of the extraordinary over the ordinary wave in rad: 2 pi (n(theta) - no) d/lambda,
 * theta the angle of the axis to the normal (90 degrees: axis in the surface). Negative in negative crystals.
 */
export function retardance_rad(
  no: number,
  ne: number,
  thickness_m: number,
  vacuumWavelength_m: number,
  axisAngle_rad = Math.PI / 2,
): number {
  const difference = extraordinaryIndex(no, ne, axisAngle_rad) - no;
  return (2 * Math.PI * difference * thickness_m) / vacuumWavelength_m;
}

/**
 * Thickness of a waveplate with its axis in the surface: (order + part) lambda/|ne - no|; part of a wave wanted (0.25 for a
 * quarter-wave plate), order 0 for the thinnest.
 */
export function waveplateThickness_m(
  no: number,
  ne: number,
  vacuumWavelength_m: number,
  waves: number,
  order = 0,
): number {
  checkIndices(no, ne);
  if (no === ne) {
    throw new StackRefusal(
      'out-of-range',
      'equal ordinary and extraordinary indices retard nothing',
      'take a birefringent crystal',
    );
  }
  if (!(waves >= 0 && Number.isInteger(order) && order >= 0)) {
    throw new StackRefusal(
      'out-of-range',
      `a retardance of ${waves} waves in order ${order}`,
      'give a part of a wave from 0 on and a whole order from 0 on',
    );
  }
  return ((order + waves) * vacuumWavelength_m) / Math.abs(ne - no);
}

function checkIndices(no: number, ne: number): void {
  if (!(no > 0 && ne > 0 && Number.isFinite(no) && Number.isFinite(ne))) {
    throw new StackRefusal(
      'not-transparent',
      `principal indices ${no} and ${ne} are not those of a transparent crystal`,
      'give real indices above zero',
    );
  }
}
