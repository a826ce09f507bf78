/**
 * Short pulses: what dispersion does to their length, what their spectrum allows, what power they peak at. Durations are
 * full widths at half maximum of the intensity (FWHM).
 *
 * Sources: Agrawal, Nonlinear Fiber Optics, 3.2 (gaussian broadening); Diels & Rudolph, Ultrashort Laser Pulse Phenomena,
 * 1.1 (time-bandwidth products).
 */
import { SPEED_OF_LIGHT_m_per_s } from '../units/constants.ts';
import { StackRefusal } from './stack-refusal.ts';

export type PulseShape = 'gaussian' | 'sech2' | 'square';

const LN2 = Math.LN2;
/** arcosh(sqrt 2): half maximum of sech^2 lies here. */
const SECH_HALF = Math.log(1 + Math.SQRT2);

/** Least product of duration and spectral width (both FWHM): 2 ln2/pi, (2 arcosh(sqrt 2)/pi)^2; square: 0.8859. */
export const TIME_BANDWIDTH: Readonly<Record<PulseShape, number>> = {
  gaussian: (2 * LN2) / Math.PI,
  sech2: ((2 * SECH_HALF) / Math.PI) ** 2,
  // FWHM of sinc^2: sin(x)/x = 1/sqrt 2 at x = 1.3915573782515103, width 2 x/pi.
  square: (2 * 1.3915573782515103) / Math.PI,
};

/** Peak power times FWHM over energy: 2 sqrt(ln2/pi), arcosh(sqrt 2), 1. */
export const PEAK_POWER_FACTOR: Readonly<Record<PulseShape, number>> = {
  gaussian: 2 * Math.sqrt(LN2 / Math.PI),
  sech2: SECH_HALF,
  square: 1,
};

export function peakPower_W(energy_J: number, duration_s: number, shape: PulseShape): number {
  checkDuration(duration_s);
  return (PEAK_POWER_FACTOR[shape] * energy_J) / duration_s;
}

/** Shortest duration a spectral width allows. */
export function transformLimit_s(bandwidth_Hz: number, shape: PulseShape): number {
  if (!(bandwidth_Hz > 0)) {
    throw new StackRefusal(
      'out-of-range',
      `a spectral width of ${bandwidth_Hz} Hz`,
      'give a width above zero',
    );
  }
  return TIME_BANDWIDTH[shape] / bandwidth_Hz;
}

/** Frequency width of a band of wavelengths, exact: difference of the two edges at the centre plus and minus half. */
export function bandwidth_Hz(centreVacuumWavelength_m: number, width_m: number): number {
  if (!(width_m >= 0 && width_m < 2 * centreVacuumWavelength_m)) {
    throw new StackRefusal(
      'out-of-range',
      'a band this wide reaches past zero wavelength',
      'give a width below twice the centre wavelength',
    );
  }
  const half = width_m / 2;
  return (
    (SPEED_OF_LIGHT_m_per_s * width_m) /
    ((centreVacuumWavelength_m - half) * (centreVacuumWavelength_m + half))
  );
}

/** FWHM of a transform-limited gaussian after group-delay dispersion: FWHM sqrt(1 + (4 ln2 GDD/FWHM^2)^2). */
export function broadenedDuration_s(duration_s: number, gdd_s2: number): number {
  checkDuration(duration_s);
  return Math.hypot(duration_s, (4 * LN2 * gdd_s2) / duration_s);
}

/** The same for the 1/e half-width of the intensity, t0 = FWHM/(2 sqrt(ln2)): t0 sqrt(1 + (GDD/t0^2)^2). */
export function broadenedHalfWidth_s(halfWidth_s: number, gdd_s2: number): number {
  checkDuration(halfWidth_s);
  return Math.hypot(halfWidth_s, gdd_s2 / halfWidth_s);
}

/** Magnitude of the dispersion that broadens a gaussian from one duration to another: FWHM^2/(4 ln2) sqrt(ratio^2 - 1). */
export function gddForDuration_s2(duration_s: number, broadened_s: number): number {
  checkDuration(duration_s);
  if (!(broadened_s >= duration_s)) {
    throw new StackRefusal(
      'out-of-range',
      'dispersion does not shorten a transform-limited pulse',
      'give a broadened duration that is not below the first',
    );
  }
  return (duration_s * Math.sqrt((broadened_s - duration_s) * (broadened_s + duration_s))) / (4 * LN2);
}

/**
 * |TOD|/(FWHM |GDD|), both of the whole path: above 1 third-order dispersion distorts the pulse and the gaussian formula
 * is not to be trusted. Null without any dispersion; infinite without GDD.
 */
export function thirdOrderRatio(duration_s: number, gdd_s2: number, tod_s3: number): number | null {
  checkDuration(duration_s);
  if (gdd_s2 === 0 && tod_s3 === 0) return null;
  return Math.abs(tod_s3) / (duration_s * Math.abs(gdd_s2));
}

function checkDuration(duration_s: number): void {
  if (!(duration_s > 0 && Number.isFinite(duration_s))) {
    throw new StackRefusal(
      'out-of-range',
      `a duration of ${duration_s} s is that of no pulse`,
      'give a duration above zero',
    );
  }
}
