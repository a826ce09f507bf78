/**
 * The temperature at which two media would have the same index, to first order:
 *   n1 + d1 (T - T1) = n2 + d2 (T - T2)   =>   T = (n2 - n1 + d1 T1 - d2 T2)/(d1 - d2)
 * with d = dn/dT and T1, T2 the temperatures that n1, n2 hold at. Where only one slope is known the other counts as 0, and the
 * result says so.
 */
import type { Material } from '../catalog/types.ts';
import type { ThermalSlope } from './thermal-slope.ts';

export interface ThermalSide {
  readonly n: number;
  readonly slope: ThermalSlope | null;
}

export interface ThermalMatch {
  readonly temperature_K: number;
  readonly uncertainty_K: number;
  /** False where one of the two slopes is not known and counts as 0. */
  readonly bothSlopesKnown: boolean;
}

/** A slope at room temperature says nothing about a cryostat or a furnace. */
const COLDEST_K = 233.15;
const HOTTEST_K = 423.15;
const ZERO_CELSIUS_K = 273.15;

/** Null where no slope is known, the slopes are alike, or the temperature lies beyond what a first order can reach. */
export function thermalMatch(
  a: ThermalSide,
  b: ThermalSide,
  difference_uncertainty: number,
): ThermalMatch | null {
  if (!a.slope && !b.slope) return null;
  const ofA = a.slope ?? standing(b.slope);
  const ofB = b.slope ?? standing(a.slope);
  const relative = ofA.dn_dT_per_K - ofB.dn_dT_per_K;
  if (relative === 0) return null;
  const offset = ofA.dn_dT_per_K * ofA.at_K - ofB.dn_dT_per_K * ofB.at_K;
  const temperature_K = (b.n - a.n + offset) / relative;
  if (!(temperature_K >= COLDEST_K && temperature_K <= HOTTEST_K)) return null;
  return {
    temperature_K,
    uncertainty_K: difference_uncertainty / Math.abs(relative),
    bothSlopesKnown: a.slope !== null && b.slope !== null,
  };
}

const standing = (other: ThermalSlope | null): ThermalSlope => ({
  dn_dT_per_K: 0,
  at_K: other?.at_K ?? ZERO_CELSIUS_K,
  isSingleValue: true,
});

/** False where the medium freezes, boils or gives way before, by its entry; a liquid of unknown freezing point is asked above 0 C only. */
export function standsTemperature(material: Material, temperature_K: number): boolean {
  const handling = material.handling ?? {};
  const celsius = temperature_K - ZERO_CELSIUS_K;
  const above = ['boiling_C', 'softening_C', 'glassTransition_C', 'decomposes_C', 'thermalLimit_C'];
  const limit = (key: string): number | undefined => {
    const value = handling[key];
    return typeof value === 'number' ? value : undefined;
  };
  if (above.some((key) => celsius >= (limit(key) ?? Number.POSITIVE_INFINITY))) return false;
  const melting = handling.melting_C ?? (material.class === 'liquid' ? 0 : undefined);
  if (melting === undefined) return true;
  return material.class === 'liquid' ? celsius > melting : celsius < melting;
}
