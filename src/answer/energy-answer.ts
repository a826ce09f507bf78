/** The energy part of the answer: what a stated beam carries before and beyond the interface, and the cautions that go with it. */
import {
  fieldOfIrradiance,
  irradianceOfField,
  meanEnergy,
  photonFlux_per_s,
  planeWaveEnergy,
  radiationPressure_Pa,
  transmittedEnergy,
} from '../interface/energy.ts';
import type { FresnelResult } from '../interface/fresnel.ts';
import type { CautionNote } from '../medium/caution.ts';
import { peakIrradiance_W_per_m2 as beamIrradiance_W_per_m2 } from '../stack/beam.ts';
import type { Answer, EnergyAnswer } from './answer.ts';
import type { MediumSide } from './medium-side.ts';
import type { Beam, Polarization } from './question.ts';

export interface EnergyParts {
  readonly answer: NonNullable<Answer['energy']>;
  readonly notes: readonly CautionNote[];
}

/** Peak irradiance across the beam; null where a power came without a diameter. */
export function peakIrradiance_W_per_m2(beam: Beam, from: MediumSide): number | null {
  if (beam.kind === 'irradiance') return beam.irradiance_W_per_m2;
  if (beam.kind === 'field') return irradianceOfField(from.optics, beam.peakE_V_per_m);
  if (beam.diameter_m === undefined) return null;
  return beamIrradiance_W_per_m2(beam.power_W, beam.diameter_m / 2, beam.profile);
}

/** Power fractions of the surface or the path, for the asked polarization; T null where it has no meaning. */
export interface PowerFractions {
  readonly R: number;
  readonly T: number | null;
  /** Fields just beyond the surface follow from its amplitudes; behind a path of layers only powers are given. */
  readonly surface: FresnelResult | null;
}

export function energyParts(
  beam: Beam,
  from: MediumSide,
  into: MediumSide,
  powers: PowerFractions,
  polarization: Polarization,
  angle_rad: number,
  vacuumWavelength_m: number,
): EnergyParts {
  const I = peakIrradiance_W_per_m2(beam, from);
  const { R, T, surface } = powers;
  const power_W = beam.kind === 'power' ? beam.power_W : null;
  const fields = I === null ? null : fieldsOf(I, from, into, powers, polarization, angle_rad);
  const pressure =
    I === null || T === null || !surface
      ? null
      : radiationPressure_Pa(from.optics, into.optics, surface, R, T, angle_rad, I);
  return {
    answer: {
      incident: fields?.incident ?? null,
      reflected: fields?.reflected ?? null,
      transmitted: fields?.transmitted ?? null,
      radiationPressure_Pa: pressure,
      photonFlux_per_s: power_W === null ? null : photonFlux_per_s(power_W, vacuumWavelength_m),
      incidentPower_W: power_W,
      reflectedPower_W: power_W === null ? null : R * power_W,
      transmittedPower_W: power_W === null || T === null ? null : T * power_W,
    },
    notes: beamNotes(beam, R, angle_rad, vacuumWavelength_m, I, pressure),
  };
}

function fieldsOf(
  I: number,
  from: MediumSide,
  into: MediumSide,
  { R, T, surface }: PowerFractions,
  polarization: Polarization,
  angle_rad: number,
): Pick<NonNullable<Answer['energy']>, 'incident' | 'reflected' | 'transmitted'> {
  const E0 = fieldOfIrradiance(from.optics, I);
  const beyond = (p: 's' | 'p', wave: FresnelResult) =>
    transmittedEnergy(into.optics, into.groupIndex, wave, p, E0);
  const transmitted = (): EnergyAnswer | null => {
    if (surface) {
      return polarization === 'unpolarized'
        ? meanEnergy(beyond('s', surface), beyond('p', surface))
        : beyond(polarization, surface);
    }
    // Behind layers: the flux that leaves them, spread over the refracted beam's cross-section.
    const sin = (from.optics.n.re * Math.sin(angle_rad)) / into.optics.n.re;
    if (T === null || T === 0 || sin >= 1) return null;
    const I_out = (T * I * Math.cos(angle_rad)) / Math.sqrt(1 - sin * sin);
    return planeWaveEnergy(into.optics, into.groupIndex, I_out);
  };
  return {
    incident: planeWaveEnergy(from.optics, from.groupIndex, I),
    reflected: planeWaveEnergy(from.optics, from.groupIndex, R * I),
    transmitted: transmitted(),
  };
}

const VISIBLE_m = [400e-9, 700e-9] as const;
/** Longer waves fall under the radio exposure guidelines instead of the laser ones (300 GHz). */
const RADIO_FROM_m = 1e-3;

function beamNotes(
  beam: Beam,
  R: number,
  angle_rad: number,
  vacuumWavelength_m: number,
  I: number | null,
  pressure: number | null,
): readonly CautionNote[] {
  const notes: CautionNote[] = [];
  if (vacuumWavelength_m >= RADIO_FROM_m) notes.push({ code: 'rf-exposure', details: {} });
  else {
    const reflected =
      beam.kind === 'power'
        ? `${short(R * beam.power_W)} W`
        : I === null
          ? 'the reflection'
          : `${short(R * I)} W/m2`;
    const angle = `${((angle_rad * 180) / Math.PI).toFixed(1)} deg`;
    if (R > 0) notes.push({ code: 'stray-reflection', details: { power: reflected, angle } });
    notes.push({ code: 'laser-hazard', details: {} });
    if (vacuumWavelength_m < VISIBLE_m[0] || vacuumWavelength_m > VISIBLE_m[1]) {
      notes.push({ code: 'invisible-beam', details: {} });
    }
  }
  if (beam.kind === 'power' && beam.pulse) notes.push({ code: 'damage-definition', details: {} });
  if (pressure !== null) notes.push({ code: 'momentum-convention', details: {} });
  notes.push({ code: 'ideal-surface', details: {} });
  return notes;
}

const short = (x: number): string => String(Number(x.toPrecision(2)));
