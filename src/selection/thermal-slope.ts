/**
 * dn/dT of a medium at a wave around the temperature asked for or its index is given for, taken off the index itself at that temperature
 * plus and minus one kelvin: the model's own temperature, the fit's thermal form, or the single value among the handling facts.
 */
import type { FitWave } from '../catalog/choose-fit.ts';
import type { Axis, Material } from '../catalog/types.ts';
import { type MediumAtWave, mediumAtWave } from '../medium/optics-at.ts';
import { isRefusal } from '../medium/refusal.ts';

const ZERO_CELSIUS_K = 273.15;
const STEP_K = 1;

export interface ThermalSlope {
  readonly dn_dT_per_K: number;
  /** Where the index itself holds. */
  readonly at_K: number;
  /** True where it is one figure for all waves and temperatures, from the handling facts. */
  readonly isSingleValue: boolean;
}

/** Null where nothing on file says how the index changes, or the temperature of the index is not known. */
export function thermalSlope(
  material: Material,
  axis: Axis,
  wave: FitWave,
  around_K?: number,
): ThermalSlope | null {
  const base = mediumAtWave(material, axis, wave, { temperature_K: around_K }, false);
  if (isRefusal(base)) return null;
  const at_K = base.used.temperature_K ?? temperatureOf(base);
  if (at_K === undefined) return null;
  const warm = at(at_K + STEP_K);
  const cool = at(at_K - STEP_K);
  if (warm && cool) {
    return {
      dn_dT_per_K: (warm.optics.n.re - cool.optics.n.re) / (2 * STEP_K) + 0,
      at_K,
      isSingleValue: warm.notes.some((note) => note.code === 'temperature-first-order'),
    };
  }
  const slope = material.handling?.dn_dT_1e6_per_K;
  return slope === undefined ? null : { dn_dT_per_K: slope * 1e-6, at_K, isSingleValue: true };

  /** Undefined where another fit would answer, or the temperature would not change the index. */
  function at(temperature_K: number): MediumAtWave | undefined {
    const medium = mediumAtWave(material, axis, wave, { temperature_K }, false);
    if (isRefusal(medium) || isRefusal(base) || medium.fit !== base.fit) return undefined;
    return medium.notes.some((note) => note.code === 'temperature-not-modelled') ? undefined : medium;
  }
}

function temperatureOf({ fit }: MediumAtWave): number | undefined {
  return fit.temperature_C === undefined ? undefined : fit.temperature_C + ZERO_CELSIUS_K;
}
