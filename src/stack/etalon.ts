/**
 * Two mirrors, or two faces of a plate, whose waves interfere: the Airy function and the numbers people quote of it.
 *
 *   T = T_max/(1 + F sin^2(delta/2)),  F = 4 Re/(1 - Re)^2,  Re = sqrt(R1 R2) tau,  delta = 4 pi n d cos/lambda
 *
 * Source: Born & Wolf, Principles of Optics, 7.6; Saleh & Teich, Fundamentals of Photonics, 10.1. Phases on reflection
 * are left out of delta: they shift the fringes, not their shape.
 */
import { SPEED_OF_LIGHT_m_per_s } from '../units/constants.ts';
import { StackRefusal } from './stack-refusal.ts';

export interface EtalonMirrors {
  readonly R1: number;
  readonly R2: number;
  /** One pass between them; 1 if absent. */
  readonly internalTransmittance?: number;
  /** Absorptance of each mirror; 0 if absent. */
  readonly mirrorAbsorptance?: number;
}

export interface EtalonFringes {
  readonly coefficientOfFinesse: number;
  /** pi sqrt(Re)/(1 - Re): the usual figure, good above Re = 0.5. */
  readonly finesse: number;
  /** Spacing over full width at half maximum, pi/(2 asin((1 - Re)/(2 sqrt Re))); null below Re = 0.1716, where no half maximum exists. */
  readonly finesseFromWidth: number | null;
  readonly T_max: number;
  readonly T_min: number;
  /** T_max/T_min; null where T_min is zero. */
  readonly contrast: number | null;
  /** The same in dB; null likewise. */
  readonly ripple_dB: number | null;
}

export function etalonFringes(mirrors: EtalonMirrors): EtalonFringes {
  const { R1, R2, internalTransmittance: tau = 1, mirrorAbsorptance: A = 0 } = mirrors;
  for (const [value, name] of [
    [R1, 'R1'],
    [R2, 'R2'],
    [tau, 'the internal transmittance'],
    [A, 'the absorptance of the mirrors'],
    [R1 + A, 'R1 plus the absorptance of the mirrors'],
    [R2 + A, 'R2 plus the absorptance of the mirrors'],
  ] as const) {
    if (!(value >= 0 && value <= 1)) {
      throw new StackRefusal('out-of-range', `${name} is ${value}`, 'a power fraction lies between 0 and 1');
    }
  }
  const Re = Math.sqrt(R1 * R2) * tau;
  const through = (1 - R1 - A) * (1 - R2 - A) * tau;
  const sine = (1 - Re) / (2 * Math.sqrt(Re));
  const T_max = through / (1 - Re) ** 2;
  const T_min = through / (1 + Re) ** 2;
  const contrast = through > 0 ? ((1 + Re) / (1 - Re)) ** 2 : null;
  return {
    coefficientOfFinesse: (4 * Re) / (1 - Re) ** 2,
    finesse: (Math.PI * Math.sqrt(Re)) / (1 - Re),
    finesseFromWidth: sine <= 1 ? Math.PI / (2 * Math.asin(sine)) : null,
    T_max,
    T_min,
    contrast,
    ripple_dB: contrast === null ? null : 10 * Math.log10(contrast),
  };
}

/** Airy transmittance at a round-trip phase (reflection phases included by the caller, if wanted). */
export function etalonTransmittance(fringes: EtalonFringes, roundTripPhase_rad: number): number {
  return fringes.T_max / (1 + fringes.coefficientOfFinesse * Math.sin(roundTripPhase_rad / 2) ** 2);
}

export interface EtalonSpacing {
  readonly freeSpectralRange_Hz: number;
  /** The same as a wavelength interval at the wavelength given. */
  readonly freeSpectralRange_m: number;
  /** Order of interference 2 n d cos/lambda. */
  readonly order: number;
  readonly roundTripPhase_rad: number;
  /** Full width of a fringe at half maximum, and lambda over it; null where the fringes have no half maximum. */
  readonly linewidth_Hz: number | null;
  readonly resolvingPower: number | null;
}

/**
 * Spacing of the fringes as the wave is tuned at a fixed angle of incidence: the round trip 2 n d cos changes with
 * frequency through n_g and through the angle inside, which gives c n cos/(2 d (n n_g - q^2)), q = n0 sin(theta);
 * c/(2 n_g d) at normal incidence and c/(2 n d cos) without dispersion.
 */
export function etalonSpacing(
  thickness_m: number,
  n: number,
  groupIndex: number,
  tangentialIndex: number,
  vacuumWavelength_m: number,
  finesseFromWidth: number | null,
): EtalonSpacing {
  if (!(thickness_m > 0)) {
    throw new StackRefusal(
      'negative-thickness',
      `an etalon of thickness ${thickness_m} m has no fringes`,
      'give a thickness above zero',
    );
  }
  if (!(tangentialIndex >= 0 && tangentialIndex < n)) {
    throw new StackRefusal(
      'angle-out-of-range',
      'the wave is totally reflected before it enters the etalon',
      'take a smaller angle of incidence',
    );
  }
  const nCos = Math.sqrt((n - tangentialIndex) * (n + tangentialIndex));
  const freeSpectralRange_Hz =
    (SPEED_OF_LIGHT_m_per_s * nCos) / (2 * thickness_m * (n * groupIndex - tangentialIndex ** 2));
  const order = (2 * thickness_m * nCos) / vacuumWavelength_m;
  return {
    freeSpectralRange_Hz,
    freeSpectralRange_m: (freeSpectralRange_Hz * vacuumWavelength_m ** 2) / SPEED_OF_LIGHT_m_per_s,
    order,
    roundTripPhase_rad: 2 * Math.PI * order,
    linewidth_Hz: finesseFromWidth === null ? null : freeSpectralRange_Hz / finesseFromWidth,
    resolvingPower:
      finesseFromWidth === null
        ? null
        : (SPEED_OF_LIGHT_m_per_s / vacuumWavelength_m / freeSpectralRange_Hz) * finesseFromWidth,
  };
}

export interface GhostRipple {
  /** Highest and lowest power over that without the ghost, in dB. */
  readonly inPhase_dB: number;
  readonly outOfPhase_dB: number;
  readonly peakToPeak_dB: number;
}

/** Ripple from one ghost of relative power g: 20 log10(1 +- sqrt g). Source: two-beam interference. */
export function ghostRipple(relativePower: number): GhostRipple {
  if (!(relativePower >= 0 && relativePower < 1)) {
    throw new StackRefusal(
      'out-of-range',
      `a ghost of relative power ${relativePower} is no ghost`,
      'give its power over that of the main beam, below 1',
    );
  }
  const amplitude = Math.sqrt(relativePower);
  const inPhase_dB = 20 * Math.log10(1 + amplitude);
  const outOfPhase_dB = 20 * Math.log10(1 - amplitude);
  return { inPhase_dB, outOfPhase_dB, peakToPeak_dB: inPhase_dB - outOfPhase_dB };
}
