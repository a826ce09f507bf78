/** The fields on both sides and in every layer, for one irradiance of the incident wave. */
import {
  fieldOfIrradiance,
  meanEnergy,
  planeWaveEnergy,
  transmittedEnergy,
  type WaveEnergy,
} from '../interface/energy.ts';
import type { FresnelResult } from '../interface/fresnel.ts';
import type { Complex } from '../num/complex.ts';
import type { EnergyAnswer, FieldsAnswer } from './beam-answer.ts';
import type { MediumSide } from './medium-side.ts';
import type { PathFields } from './path-fields.ts';
import type { Polarization } from './question.ts';

/** Power fractions of the surface or the path, for the asked polarization; T null where it has no meaning. */
export interface PowerFractions {
  readonly R: number;
  readonly T: number | null;
  /** Fields just beyond the surface follow from its amplitudes; behind a path of layers only powers are given. */
  readonly surface: FresnelResult | null;
  /** Normal component of the wave vector beyond, over k0. */
  readonly kappa2: Complex;
}

/** What a beam meets: the media, what they do with its power, the fields relative to the incident one. */
export interface Scene {
  readonly from: MediumSide;
  readonly into: MediumSide;
  readonly powers: PowerFractions;
  readonly fields: PathFields;
  readonly polarization: Polarization;
  readonly angle_rad: number;
}

/** `stretched`: how many times longer a pulse is behind the path than before it; its peak is that much lower. */
export function fieldsFor(irradiance_W_per_m2: number, scene: Scene, stretched = 1): FieldsAnswer {
  const { from, powers, fields } = scene;
  const E0 = fieldOfIrradiance(from.optics, irradiance_W_per_m2);
  const peak = (intensity: number): number => E0 * Math.sqrt(intensity);
  return {
    incident: planeWaveEnergy(from.optics, from.groupIndex, irradiance_W_per_m2),
    reflected: planeWaveEnergy(from.optics, from.groupIndex, powers.R * irradiance_W_per_m2),
    transmitted: transmitted(irradiance_W_per_m2, E0, scene, stretched),
    layers: fields.layers.map(({ intensity, position_m, enteringShare }, i) => ({
      layer: i + 1,
      peakE_V_per_m: intensity === null ? null : peak(intensity),
      intensity,
      position_m,
      enteringIrradiance_W_per_m2: enteringShare === null ? null : enteringShare * irradiance_W_per_m2,
    })),
    fieldMaximum: fields.maximum && {
      peakE_V_per_m: peak(fields.maximum.intensity),
      intensity: fields.maximum.intensity,
      position_m: fields.maximum.position_m,
      layer: fields.maximum.layer,
    },
    fieldMaximumBefore: fields.before && {
      peakE_V_per_m: peak(fields.before.intensity),
      intensity: fields.before.intensity,
      position_m: fields.before.position_m,
    },
  };
}

function transmitted(
  irradiance_W_per_m2: number,
  E0: number,
  { from, into, powers: { T, surface }, polarization, angle_rad }: Scene,
  stretched: number,
): EnergyAnswer | null {
  if (surface) {
    const beyond = (p: 's' | 'p'): WaveEnergy =>
      transmittedEnergy(into.optics, into.groupIndex, surface, p, E0);
    return polarization === 'unpolarized' ? meanEnergy(beyond('s'), beyond('p')) : beyond(polarization);
  }
  // Behind layers: the flux that leaves them, spread over the refracted beam's cross-section.
  const sin = (from.optics.n.re * Math.sin(angle_rad)) / into.optics.n.re;
  if (T === null || T === 0 || sin >= 1) return null;
  const I_out = (T * irradiance_W_per_m2 * Math.cos(angle_rad)) / Math.sqrt(1 - sin * sin);
  return planeWaveEnergy(into.optics, into.groupIndex, I_out / stretched);
}
