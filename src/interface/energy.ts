/**
 * Field, flux density and energy density on both sides of an interface, at the boundary itself.
 *
 * Amplitudes are peak values of a linearly polarised wave; where the field rotates (total reflection, p) the value is
 * sqrt(|Ex|^2 + |Ez|^2). Irradiance is the magnitude of the time-averaged Poynting vector.
 *   S_s = |E|^2/(2 Z0) (Re(q/mu), Re(kappa/mu)),  S_p = |Z0 H|^2/(2 Z0) (Re(q/eps), Re(kappa/eps))
 * Lossless, dispersive: energy density u = I n_g/c. In absorbing media u has no simple form and is null
 * (Jackson 6.8). Sources: Jackson 6.7-6.8, 7.1-7.3; Born & Wolf 1.4.
 */
import { abs, abs2, type Complex, div } from '../num/complex.ts';
import { SPEED_OF_LIGHT_m_per_s as c, PLANCK_J_s, VACUUM_IMPEDANCE_ohm as Z0 } from '../units/constants.ts';
import type { FresnelResult } from './fresnel.ts';
import type { Optics } from './optics.ts';

export interface WaveEnergy {
  readonly irradiance_W_per_m2: number;
  readonly peakE_V_per_m: number;
  readonly peakB_T: number;
  /** Time average; null in absorbing media and in evanescent fields. */
  readonly energyDensity_J_per_m3: number | null;
}

/** Absorption beyond this ratio k/n makes an energy density from n_g meaningless. */
const ABSORBING = 1e-3;

/** Irradiance of a plane wave of peak field E in a medium: |E|^2 Re(n/mu)/(2 Z0). */
export function irradianceOfField(side: Optics, peakE_V_per_m: number): number {
  return (peakE_V_per_m ** 2 * div(side.n, side.mu).re) / (2 * Z0);
}

/** Peak field of a plane wave of given irradiance: sqrt(2 Z0 I / Re(n/mu)). */
export function fieldOfIrradiance(side: Optics, irradiance_W_per_m2: number): number {
  return Math.sqrt((2 * Z0 * irradiance_W_per_m2) / div(side.n, side.mu).re);
}

/** A homogeneous plane wave (incident or reflected) of given irradiance. */
export function planeWaveEnergy(
  side: Optics,
  groupIndex: number | null,
  irradiance_W_per_m2: number,
): WaveEnergy {
  const peakE_V_per_m = fieldOfIrradiance(side, irradiance_W_per_m2);
  return {
    irradiance_W_per_m2,
    peakE_V_per_m,
    peakB_T: (abs(side.n) * peakE_V_per_m) / c,
    energyDensity_J_per_m3: energyDensity(side, groupIndex, irradiance_W_per_m2),
  };
}

function energyDensity(side: Optics, groupIndex: number | null, irradiance_W_per_m2: number): number | null {
  if (groupIndex === null || side.n.im > ABSORBING * Math.abs(side.n.re)) return null;
  return (irradiance_W_per_m2 * groupIndex) / c;
}

/** The wave just beyond the boundary, for an incident peak field, one polarization. */
export function transmittedEnergy(
  into: Optics,
  groupIndex: number | null,
  wave: FresnelResult,
  polarization: 's' | 'p',
  incidentE_V_per_m: number,
): WaveEnergy {
  const { q, kappa2 } = wave;
  const t = polarization === 's' ? wave.ts : wave.tp;
  const amplitude2 = abs2(t) * incidentE_V_per_m ** 2;
  // E of the p wave is t E0 (cos2, -sin2) with complex cos2, sin2; of the s wave t E0. H follows from the curl.
  const spread = (abs2(kappa2) + abs2(q)) / abs2(into.n);
  const E2 = polarization === 's' ? amplitude2 : amplitude2 * spread;
  const H2 = (polarization === 's' ? amplitude2 * spread : amplitude2) * abs2(div(into.n, into.mu));
  const along = (over: Complex): number => Math.hypot(div(q, over).re, div(kappa2, over).re);
  const S =
    polarization === 's' ? (amplitude2 * along(into.mu)) / (2 * Z0) : (H2 * along(into.eps)) / (2 * Z0);
  const evanescent = kappa2.re < 1e-9 * abs(kappa2);
  return {
    irradiance_W_per_m2: S,
    peakE_V_per_m: Math.sqrt(E2),
    peakB_T: (Math.sqrt(H2) * abs(into.mu)) / c,
    energyDensity_J_per_m3: evanescent ? null : energyDensity(into, groupIndex, S),
  };
}

/** Mean over two polarizations: powers add, fields as the root of the mean square. */
export function meanEnergy(a: WaveEnergy, b: WaveEnergy): WaveEnergy {
  const rms = (x: number, y: number): number => Math.sqrt((x * x + y * y) / 2);
  return {
    irradiance_W_per_m2: (a.irradiance_W_per_m2 + b.irradiance_W_per_m2) / 2,
    peakE_V_per_m: rms(a.peakE_V_per_m, b.peakE_V_per_m),
    peakB_T: rms(a.peakB_T, b.peakB_T),
    energyDensity_J_per_m3:
      a.energyDensity_J_per_m3 === null || b.energyDensity_J_per_m3 === null
        ? null
        : (a.energyDensity_J_per_m3 + b.energyDensity_J_per_m3) / 2,
  };
}

/**
 * Normal component of the radiation pressure on the interface, or on all that stands between the two media, Minkowski bookkeeping
 * (momentum n h nu/c per photon): p = (I/c) cos1 [n1 cos1 (1 + R) - n2 cos2 T], n2 cos2 = Re kappa2; negative pulls outward. Null
 * into an absorbing medium at oblique incidence. Of a body in vacuum: (I/c) cos^2 (1 + R - T), no matter what convention.
 * The split of momentum between field and matter is a convention (Pfeifer et al., Rev. Mod. Phys. 79, 1197 (2007)).
 */
export function radiationPressure_Pa(
  from: Optics,
  into: Optics,
  kappa2: Complex,
  R: number,
  T: number,
  incidenceAngle_rad: number,
  irradiance_W_per_m2: number,
): number | null {
  if (into.n.im > ABSORBING * Math.abs(into.n.re) && incidenceAngle_rad > 0) return null;
  const cos1 = Math.cos(incidenceAngle_rad);
  const carried = T === 0 ? 0 : kappa2.re * T;
  return (irradiance_W_per_m2 / c) * cos1 * (from.n.re * cos1 * (1 + R) - carried);
}

/** Photons per second in a beam of given power: P lambda/(h c), vacuum wavelength. */
export function photonFlux_per_s(power_W: number, vacuumWavelength_m: number): number {
  return (power_W * vacuumWavelength_m) / (PLANCK_J_s * c);
}
