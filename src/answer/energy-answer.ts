/** The energy part of the answer: what a stated beam carries before, in and beyond the layers, and the cautions that go with it. */
import { irradianceOfField, photonFlux_per_s, radiationPressure_Pa } from '../interface/energy.ts';
import type { CautionNote } from '../medium/caution.ts';
import {
  peakIrradiance_W_per_m2 as beamIrradiance_W_per_m2,
  bIntegral_rad,
  footprint,
} from '../stack/beam.ts';
import { peakPower_W } from '../stack/pulse.ts';
import type { BeamAnswer, FootprintAnswer, NonlinearAnswer, PulsedBeamAnswer } from './beam-answer.ts';
import { beamNotes } from './beam-notes.ts';
import type { MediumSide } from './medium-side.ts';
import type { Beam, PulseTrain, Question } from './question.ts';
import { fieldsFor, type Scene } from './wave-fields.ts';

export interface EnergyParts {
  readonly answer: BeamAnswer;
  readonly notes: readonly CautionNote[];
}

type WideBeam = Extract<Beam, { readonly profile: unknown }>;

const isWide = (beam: Beam): beam is WideBeam => beam.kind === 'power' || beam.kind === 'pulse';

/** Peak of a profile that carries `amount` (power or energy); null without a diameter. */
function centreOf(amount: number | null, beam: WideBeam): number | null {
  if (amount === null || beam.diameter_m === undefined) return null;
  return beamIrradiance_W_per_m2(amount, beam.diameter_m / 2, beam.profile);
}

/** Mean irradiance at the centre of the beam; null where no power or no diameter is known. */
function meanIrradiance_W_per_m2(beam: Beam, from: MediumSide): number | null {
  if (beam.kind === 'irradiance') return beam.irradiance_W_per_m2;
  if (beam.kind === 'field') return irradianceOfField(from.optics, beam.peakE_V_per_m);
  return beam.kind === 'power' ? centreOf(beam.power_W, beam) : null;
}

/** `stretched`: see `fieldsFor`. */
export function energyParts(
  question: Question,
  beam: Beam,
  scene: Scene,
  vacuumWavelength_m: number,
  stretched: number,
): EnergyParts {
  const { from, into, powers, angle_rad } = scene;
  const I = meanIrradiance_W_per_m2(beam, from);
  const power_W = beam.kind === 'power' ? beam.power_W : null;
  const fields = I === null ? null : fieldsFor(I, scene);
  const { R, T, kappa2 } = powers;
  const pressure =
    I === null || T === null
      ? null
      : radiationPressure_Pa(from.optics, into.optics, kappa2, R, T, angle_rad, I);
  const train = isWide(beam) ? beam.pulse : undefined;
  const pulse =
    train && isWide(beam) ? pulsedBeam(train, beam, power_W, scene, vacuumWavelength_m, stretched) : null;
  const nonlinear = nonlinearPart(question, scene, pulse?.peakIrradiance_W_per_m2 ?? I, vacuumWavelength_m);
  const answer: BeamAnswer = {
    incident: fields?.incident ?? null,
    reflected: fields?.reflected ?? null,
    transmitted: fields?.transmitted ?? null,
    radiationPressure_Pa: pressure,
    photonFlux_per_s: power_W === null ? null : photonFlux_per_s(power_W, vacuumWavelength_m),
    incidentPower_W: power_W,
    reflectedPower_W: power_W === null ? null : R * power_W,
    transmittedPower_W: power_W === null || T === null ? null : T * power_W,
    layers: fields?.layers ?? [],
    fieldMaximum: fields?.fieldMaximum ?? null,
    fieldMaximumBefore: fields?.fieldMaximumBefore ?? null,
    footprint: footprintPart(beam, angle_rad, I),
    pulse,
    nonlinear,
  };
  return { answer, notes: beamNotes(beam, R, angle_rad, vacuumWavelength_m, answer) };
}

function footprintPart(beam: Beam, angle_rad: number, I: number | null): FootprintAnswer | null {
  if (!isWide(beam) || beam.diameter_m === undefined) return null;
  const seen = footprint(beam.diameter_m / 2, angle_rad);
  return {
    acrossDiameter_m: 2 * seen.acrossRadius_m,
    alongDiameter_m: 2 * seen.alongRadius_m,
    irradianceOnSurface_W_per_m2: I === null ? null : I * seen.irradianceFactor,
  };
}

function pulsedBeam(
  train: PulseTrain,
  beam: WideBeam,
  averagePower_W: number | null,
  scene: Scene,
  vacuumWavelength_m: number,
  stretched: number,
): PulsedBeamAnswer {
  const { energy_J, duration_s = null, repetition_Hz = null } = train;
  const peak_W = duration_s === null ? null : peakPower_W(energy_J, duration_s, 'gaussian');
  const peak = centreOf(peak_W, beam);
  const fluence = centreOf(energy_J, beam);
  const { R, T } = scene.powers;
  return {
    energy_J,
    duration_s,
    repetition_Hz,
    averagePower_W,
    dutyCycle: duration_s === null || repetition_Hz === null ? null : duration_s * repetition_Hz,
    peakPower_W: peak_W,
    peakIrradiance_W_per_m2: peak,
    peakFluence_J_per_m2: fluence,
    fluenceOnSurface_J_per_m2: fluence === null ? null : fluence * Math.cos(scene.angle_rad),
    reflectedEnergy_J: R * energy_J,
    transmittedEnergy_J: T === null ? null : T * energy_J,
    photonsPerPulse: photonFlux_per_s(energy_J, vacuumWavelength_m),
    fields: peak === null ? null : fieldsFor(peak, scene, stretched),
  };
}

/** Null where no n2 was given or no irradiance is known. Absorption along a layer is taken off. */
function nonlinearPart(
  question: Question,
  { fields }: Scene,
  irradiance_W_per_m2: number | null,
  vacuumWavelength_m: number,
): NonlinearAnswer | null {
  if (irradiance_W_per_m2 === null) return null;
  const layers = question.layers.flatMap(({ nonlinearIndex_m2_per_W: n2 }, i) => {
    const field = fields.layers[i];
    if (n2 === undefined || !field || field.enteringShare === null || field.rayLength_m === null) return [];
    const stretch = {
      length_m: field.rayLength_m,
      nonlinearIndex_m2_per_W: n2,
      irradiance_W_per_m2: field.enteringShare * irradiance_W_per_m2,
      absorptionCoefficient_per_m: field.absorptionCoefficient_per_m,
    };
    return [
      {
        layer: i + 1,
        nonlinearIndex_m2_per_W: n2,
        rayLength_m: field.rayLength_m,
        bIntegral_rad: bIntegral_rad([stretch], vacuumWavelength_m),
      },
    ];
  });
  if (layers.length === 0) return null;
  return { bIntegral_rad: layers.reduce((sum, l) => sum + l.bIntegral_rad, 0), layers };
}
