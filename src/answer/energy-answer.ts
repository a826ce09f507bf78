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
import type { Answer } from './answer.ts';
import { powerOf } from './interface-answer.ts';
import type { MediumSide } from './medium-side.ts';
import type { Beam, Polarization } from './question.ts';

export interface EnergyParts {
  readonly answer: NonNullable<Answer['energy']>;
  readonly notes: readonly CautionNote[];
}

/**
 * Peak irradiance across the beam: 2P/(pi w^2) for a gaussian of 1/e^2 radius w, P/(pi a^2) for a flat-top of radius a
 * (common practice; ISO 11145 defines both widths). `null` where a power came without a diameter.
 */
export function peakIrradiance_W_per_m2(beam: Beam, from: MediumSide): number | null {
  if (beam.kind === 'irradiance') return beam.irradiance_W_per_m2;
  if (beam.kind === 'field') return irradianceOfField(from.optics, beam.peakE_V_per_m);
  if (beam.diameter_m === undefined) return null;
  const area_m2 = Math.PI * (beam.diameter_m / 2) ** 2;
  return ((beam.profile === 'gaussian' ? 2 : 1) * beam.power_W) / area_m2;
}

export function energyParts(
  beam: Beam,
  from: MediumSide,
  into: MediumSide,
  wave: FresnelResult,
  polarization: Polarization,
  angle_rad: number,
  vacuumWavelength_m: number,
  powersKnown: boolean,
): EnergyParts {
  const I = peakIrradiance_W_per_m2(beam, from);
  const R = powerOf(polarization, wave.Rs, wave.Rp);
  const T = powerOf(polarization, wave.Ts, wave.Tp);
  const power_W = beam.kind === 'power' ? beam.power_W : null;
  const fields = I === null ? null : fieldsOf(I, from, into, wave, polarization, R);
  const pressure =
    I === null || !powersKnown
      ? null
      : radiationPressure_Pa(from.optics, into.optics, wave, R, T, angle_rad, I);
  return {
    answer: {
      incident: fields?.incident ?? null,
      reflected: fields?.reflected ?? null,
      transmitted: fields?.transmitted ?? null,
      radiationPressure_Pa: pressure,
      photonFlux_per_s: power_W === null ? null : photonFlux_per_s(power_W, vacuumWavelength_m),
      incidentPower_W: power_W,
      reflectedPower_W: power_W === null ? null : R * power_W,
      transmittedPower_W: power_W === null || !powersKnown ? null : T * power_W,
    },
    notes: beamNotes(beam, R, angle_rad, vacuumWavelength_m, I, pressure),
  };
}

function fieldsOf(
  I: number,
  from: MediumSide,
  into: MediumSide,
  wave: FresnelResult,
  polarization: Polarization,
  R: number,
): Pick<NonNullable<Answer['energy']>, 'incident' | 'reflected' | 'transmitted'> {
  const E0 = fieldOfIrradiance(from.optics, I);
  const beyond = (p: 's' | 'p') => transmittedEnergy(into.optics, into.groupIndex, wave, p, E0);
  return {
    incident: planeWaveEnergy(from.optics, from.groupIndex, I),
    reflected: planeWaveEnergy(from.optics, from.groupIndex, R * I),
    transmitted: polarization === 'unpolarized' ? meanEnergy(beyond('s'), beyond('p')) : beyond(polarization),
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
