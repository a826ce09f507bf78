/** The beam that the options state: a power, pulses, an irradiance or a field; none where none of them is given. */
import type { Beam, PulseTrain } from '../answer/question.ts';
import { type Refusal, refuse } from '../medium/refusal.ts';
import type { OptionValues } from './options.ts';

/** How far --power may be off energy times rate: people round both. */
const SAME_POWER = 0.01;

export function readBeam(options: OptionValues): Beam | undefined | Refusal {
  const { irradiance_W_per_m2, field_V_per_m } = options;
  if (irradiance_W_per_m2 !== undefined) return { kind: 'irradiance', irradiance_W_per_m2 };
  if (field_V_per_m !== undefined) return { kind: 'field', peakE_V_per_m: field_V_per_m };
  return poweredBeam(options);
}

/** P = E f: two of the three give the third; all three must agree. */
function poweredBeam(options: OptionValues): Beam | undefined | Refusal {
  const { power_W, pulseEnergy_J, repetition_Hz, pulseDuration_s, beamDiameter_m } = options;
  const width = {
    profile: options.profile ?? 'gaussian',
    ...(beamDiameter_m === undefined ? {} : { diameter_m: beamDiameter_m }),
  };
  const energy_J =
    pulseEnergy_J ??
    (power_W !== undefined && repetition_Hz !== undefined ? power_W / repetition_Hz : undefined);
  if (energy_J === undefined) return power_W === undefined ? undefined : { kind: 'power', power_W, ...width };

  const wrong = contradiction(options);
  if (wrong) return wrong;
  const rate_Hz = repetition_Hz ?? (power_W === undefined ? undefined : power_W / energy_J);
  const pulse: PulseTrain = {
    energy_J,
    ...(pulseDuration_s === undefined ? {} : { duration_s: pulseDuration_s }),
    ...(rate_Hz === undefined ? {} : { repetition_Hz: rate_Hz }),
  };
  return rate_Hz === undefined
    ? { kind: 'pulse', pulse, ...width }
    : { kind: 'power', power_W: power_W ?? energy_J * rate_Hz, pulse, ...width };
}

function contradiction(options: OptionValues): Refusal | undefined {
  const { power_W, pulseEnergy_J: energy_J, repetition_Hz: rate_Hz, pulseDuration_s } = options;
  if (power_W !== undefined && energy_J !== undefined && rate_Hz !== undefined) {
    const average_W = energy_J * rate_Hz;
    if (Math.abs(average_W - power_W) > SAME_POWER * power_W) {
      return refuse(
        'beam-contradiction',
        2,
        `--pulse-energy times --repetition is ${short(average_W)} W, but --power is ${short(power_W)} W`,
        'give two of the three',
      );
    }
  }
  const rate = rate_Hz ?? (power_W !== undefined && energy_J !== undefined ? power_W / energy_J : undefined);
  if (rate !== undefined && pulseDuration_s !== undefined && rate * pulseDuration_s >= 1) {
    return refuse(
      'beam-contradiction',
      2,
      `pulses of ${short(pulseDuration_s)} s at ${short(rate)} Hz run into each other`,
      'give a shorter --pulse or a lower --repetition',
    );
  }
  return undefined;
}

const short = (x: number): string => String(Number(x.toPrecision(4)));
