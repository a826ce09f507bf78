/**
 * A beam of finite width: peak irradiance and fluence, peak field, what a tilted surface or an aperture takes of it, and
 * the nonlinear phase it gathers.
 *
 * `radius_m` is the 1/e^2 radius w of the intensity for a gaussian (FWHM = w sqrt(2 ln2)), the radius for a flat top.
 * Sources: Saleh & Teich, Fundamentals of Photonics, 3.1; Siegman, Lasers, 17; Agrawal, Nonlinear Fiber Optics, 4.1
 * (B-integral); Jackson, Classical Electrodynamics, 7.1.
 */
import { SPEED_OF_LIGHT_m_per_s, VACUUM_IMPEDANCE_ohm } from '../units/constants.ts';
import { StackRefusal } from './stack-refusal.ts';

export type BeamProfile = 'gaussian' | 'flat';

/** Irradiance at the centre: 2 P/(pi w^2) for a gaussian, P/(pi a^2) for a flat top. Fluence of a pulse likewise from its energy. */
export function peakIrradiance_W_per_m2(power_W: number, radius_m: number, profile: BeamProfile): number {
  checkRadius(radius_m);
  return ((profile === 'gaussian' ? 2 : 1) * power_W) / (Math.PI * radius_m ** 2);
}

/** Fluence at the centre; see `peakIrradiance_W_per_m2`. */
export function peakFluence_J_per_m2(energy_J: number, radius_m: number, profile: BeamProfile): number {
  return peakIrradiance_W_per_m2(energy_J, radius_m, profile);
}

/** The radius at which a power gives a peak irradiance. */
export function radiusForIrradiance_m(
  power_W: number,
  irradiance_W_per_m2: number,
  profile: BeamProfile,
): number {
  if (!(power_W > 0 && irradiance_W_per_m2 > 0)) {
    throw new StackRefusal('out-of-range', 'no power or no irradiance', 'give both above zero');
  }
  return Math.sqrt(((profile === 'gaussian' ? 2 : 1) * power_W) / (Math.PI * irradiance_W_per_m2));
}

/** Peak electric field of a linearly polarised wave: sqrt(2 I Z0 mu/n), transparent medium. */
export function peakField_V_per_m(irradiance_W_per_m2: number, n = 1, relativePermeability = 1): number {
  return Math.sqrt((2 * irradiance_W_per_m2 * VACUUM_IMPEDANCE_ohm * relativePermeability) / n);
}

/** 1/e^2 radius of a gaussian from the full width at half maximum of its intensity. */
export function radiusFromFwhm_m(fwhm_m: number): number {
  return fwhm_m / Math.sqrt(2 * Math.LN2);
}

export interface Footprint {
  /** Across the plane of incidence, and along the surface in it: radius/cos. */
  readonly acrossRadius_m: number;
  readonly alongRadius_m: number;
  /** Irradiance on the surface over that across the beam, cos(theta). */
  readonly irradianceFactor: number;
}

/** What a surface at an angle of incidence sees of the beam. */
export function footprint(radius_m: number, incidenceAngle_rad: number): Footprint {
  checkRadius(radius_m);
  if (!(incidenceAngle_rad >= 0 && incidenceAngle_rad < Math.PI / 2)) {
    throw new StackRefusal(
      'angle-out-of-range',
      `an angle of incidence of ${incidenceAngle_rad} rad leaves no footprint`,
      'angles run from 0 to below 90 degrees',
    );
  }
  const cos = Math.cos(incidenceAngle_rad);
  return { acrossRadius_m: radius_m, alongRadius_m: radius_m / cos, irradianceFactor: cos };
}

/** Share of the power through a centred circular aperture: 1 - exp(-2 a^2/w^2), or the ratio of areas for a flat top. */
export function apertureTransmittance(
  apertureRadius_m: number,
  radius_m: number,
  profile: BeamProfile,
): number {
  checkRadius(radius_m);
  if (!(apertureRadius_m >= 0)) {
    throw new StackRefusal('out-of-range', 'an aperture of negative radius', 'give a radius from zero on');
  }
  const ratio2 = (apertureRadius_m / radius_m) ** 2;
  return profile === 'gaussian' ? -Math.expm1(-2 * ratio2) : Math.min(1, ratio2);
}

/** A stretch of path in one medium, for the B-integral. */
export interface NonlinearStretch {
  readonly length_m: number;
  /** n = n0 + n2 I, linear polarisation. */
  readonly nonlinearIndex_m2_per_W: number;
  /** On the axis, at the peak of the pulse, where the stretch begins. */
  readonly irradiance_W_per_m2: number;
  /** Power absorption along the stretch; 0 if absent. */
  readonly absorptionCoefficient_per_m?: number;
}

/** B = (2 pi/lambda) integral of n2 I dz, in rad; an absorbing stretch counts with its effective length (1 - exp(-alpha L))/alpha. */
export function bIntegral_rad(stretches: readonly NonlinearStretch[], vacuumWavelength_m: number): number {
  let sum = 0;
  for (const s of stretches) {
    const alpha = s.absorptionCoefficient_per_m ?? 0;
    const length = alpha > 0 ? -Math.expm1(-alpha * s.length_m) / alpha : s.length_m;
    sum += s.nonlinearIndex_m2_per_W * s.irradiance_W_per_m2 * length;
  }
  return (2 * Math.PI * sum) / vacuumWavelength_m;
}

/** n2 in m^2/W from gaussian units: 40 pi n2[esu]/(c n0), c in m/s; that is n2[cm^2/W] = 4.19e-3 n2[esu]/n0. Source: Boyd, Nonlinear Optics, 4.1. */
export function nonlinearIndexFromEsu_m2_per_W(nonlinearIndex_esu: number, n: number): number {
  return (40 * Math.PI * nonlinearIndex_esu) / (SPEED_OF_LIGHT_m_per_s * n);
}

function checkRadius(radius_m: number): void {
  if (!(radius_m > 0 && Number.isFinite(radius_m))) {
    throw new StackRefusal('out-of-range', `a beam radius of ${radius_m} m`, 'give a radius above zero');
  }
}
