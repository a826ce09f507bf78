/**
 * Standard air (15 C, 101325 Pa, dry, 450 ppm CO2) and the conversion between wavelengths in vacuum and in standard air.
 * Photon energy, frequency and wavenumber belong to the vacuum wavelength; makers print fits and lines in air wavelengths.
 * Dispersion: Ciddor 1996, see `ciddor.ts` for its limits (constant below 0.185 um; smooth to any long wave).
 */
import {
  type AirState,
  densityFactors,
  SHORTEST_um,
  STANDARD_AIR,
  STANDARD_STATE,
  standardAirRefractivity,
  waterVapourRefractivity,
} from './ciddor.ts';
import type { Conditions } from './evaluator.ts';
import { valueInSquare } from './in-square.ts';

/** n of standard air and its first three derivatives by the vacuum wavelength in um. */
export type AirIndexJet = readonly [number, number, number, number];

export function standardAirIndexJet(vacuum_um: number): AirIndexJet {
  const [r0, r1, r2, r3] = standardAirRefractivity(vacuum_um);
  return [1 + r0, r1, 2 * r2, 6 * r3];
}

/** n of standard air at a vacuum wavelength. */
export function standardAirIndex(vacuum_um: number): number {
  const L = Math.max(vacuum_um, SHORTEST_um);
  return 1 + valueInSquare(STANDARD_AIR, L * L);
}

/** n of air under stated conditions (standard where not stated) and its first three derivatives by the vacuum wavelength in um. */
export function airIndexJet(vacuum_um: number, conditions: Conditions): AirIndexJet {
  const { dry, water } = densityFactors(airState(conditions));
  const a = standardAirRefractivity(vacuum_um);
  if (water === 0) return [1 + dry * a[0], dry * a[1], 2 * dry * a[2], 6 * dry * a[3]];
  const w = waterVapourRefractivity(vacuum_um);
  return [
    1 + dry * a[0] + water * w[0],
    dry * a[1] + water * w[1],
    2 * (dry * a[2] + water * w[2]),
    6 * (dry * a[3] + water * w[3]),
  ];
}

/** The state of the air: what is stated, standard for the rest. */
export function airState(conditions: Conditions): AirState {
  return {
    temperature_K: conditions.temperature_K ?? STANDARD_STATE.temperature_K,
    pressure_Pa: conditions.pressure_Pa ?? STANDARD_STATE.pressure_Pa,
    humidity: conditions.humidity ?? STANDARD_STATE.humidity,
    co2_ppm: conditions.co2_ppm ?? STANDARD_STATE.co2_ppm,
  };
}

/** Wavelength in standard air of light with the given wavelength in vacuum. */
export const vacuumToAir_um = (vacuum_um: number): number => vacuum_um / standardAirIndex(vacuum_um);

/**
 * Wavelength in vacuum of light with the given wavelength in standard air: the fixed point of L = n(L) air_um. Each step gains
 * four digits or more, so five steps reach machine precision.
 */
export function airToVacuum_um(air_um: number): number {
  let vacuum_um = air_um;
  for (let step = 0; step < 8; step++) {
    const next = air_um * standardAirIndex(vacuum_um);
    if (next === vacuum_um) break;
    vacuum_um = next;
  }
  return vacuum_um;
}
