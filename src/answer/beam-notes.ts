/** The cautions that go with a stated beam. */
import type { CautionNote } from '../medium/caution.ts';
import { type DisplayUnit, JOULE, WATT, WATT_PER_SQUARE_METRE } from '../units/display-unit.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { ASCII } from '../units/number-style.ts';
import type { BeamAnswer } from './beam-answer.ts';
import type { Beam } from './question.ts';

const VISIBLE_m = [400e-9, 700e-9] as const;
/** Longer waves fall under the radio exposure guidelines instead of the laser ones (300 GHz). */
const RADIO_FROM_m = 1e-3;
/** From about here on the phase front suffers (common practice). */
const B_INTEGRAL_MATTERS_rad = 1;
/** A standing wave above this is worth a word: the field, not the irradiance of the beam, breaks a coating. */
const STANDING_WAVE_MATTERS = 1.5;

export function beamNotes(
  beam: Beam,
  R: number,
  angle_rad: number,
  vacuumWavelength_m: number,
  answer: BeamAnswer,
): readonly CautionNote[] {
  const notes: CautionNote[] = [];
  if (vacuumWavelength_m >= RADIO_FROM_m) notes.push({ code: 'rf-exposure', details: {} });
  else {
    const angle = `${((angle_rad * 180) / Math.PI).toFixed(1)} deg`;
    if (R > 0)
      notes.push({ code: 'stray-reflection', details: { power: reflected(beam, R, answer), angle } });
    notes.push({ code: 'laser-hazard', details: {} });
    if (vacuumWavelength_m < VISIBLE_m[0] || vacuumWavelength_m > VISIBLE_m[1]) {
      notes.push({ code: 'invisible-beam', details: {} });
    }
  }
  const { pulse, nonlinear } = answer;
  const maximum = (pulse?.fields ?? answer).fieldMaximum?.intensity ?? 0;
  if (pulse || (answer.incident && maximum > STANDING_WAVE_MATTERS)) {
    notes.push({ code: 'damage-definition', details: {} });
  }
  if (pulse) notes.push({ code: 'pulse-train', details: {} });
  if (nonlinear && Math.abs(nonlinear.bIntegral_rad) > B_INTEGRAL_MATTERS_rad) {
    notes.push({ code: 'self-focusing', details: { radians: nonlinear.bIntegral_rad.toFixed(1) } });
  }
  if (answer.radiationPressure_Pa !== null) notes.push({ code: 'momentum-convention', details: {} });
  notes.push({ code: 'ideal-surface', details: {} });
  return notes;
}

function reflected(beam: Beam, R: number, answer: BeamAnswer): string {
  if (beam.kind === 'power') return short(R * beam.power_W, WATT);
  if (beam.kind === 'pulse') return `${short(R * beam.pulse.energy_J, JOULE)} per pulse`;
  const { reflected: wave } = answer;
  return wave ? short(wave.irradiance_W_per_m2, WATT_PER_SQUARE_METRE) : 'the reflection';
}

const short = (value: number, unit: DisplayUnit): string =>
  formatQuantity(value, unit, { significant: 2 }, { style: ASCII });
