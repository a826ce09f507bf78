/** The wave of a question in both references, and the conversions every answer states. Exact c, h, e (SI Brochure, 9th ed.). */
import type { FitWave } from '../catalog/choose-fit.ts';
import { airToVacuum_um, vacuumToAir_um } from '../dispersion/air-index.ts';
import { type Refusal, refuse } from '../medium/refusal.ts';
import { LONGEST_WAVE_m, SHORTEST_WAVE_m } from '../units/parse-wave.ts';
import { waveMeasures } from '../units/wave.ts';
import type { Answer } from './answer.ts';
import type { WaveSpec } from './question.ts';

/** Both wavelengths in um; the one given stays digit for digit. */
export function bothReferences(spec: WaveSpec): FitWave | Refusal {
  const { wavelength_m } = spec;
  if (!(wavelength_m >= SHORTEST_WAVE_m * (1 - 1e-9) && wavelength_m <= LONGEST_WAVE_m * (1 + 1e-9))) {
    return refuse(
      'wave-out-of-reach',
      2,
      `a wavelength of ${spec.text} is outside what the program covers`,
      'give a wave from 50 nm to 100 000 km',
    );
  }
  const um = wavelength_m * 1e6;
  return spec.inAir
    ? { vacuum_um: airToVacuum_um(um), air_um: um }
    : { vacuum_um: um, air_um: vacuumToAir_um(um) };
}

/** The wavelength given comes back to the last bit; the other one is exact up to rounding. */
export function waveAnswer(wave: FitWave, { wavelength_m, inAir }: WaveSpec): Answer['wave'] {
  return {
    ...waveMeasures(inAir ? wave.vacuum_um / 1e6 : wavelength_m),
    airWavelength_m: inAir ? wavelength_m : wave.air_um / 1e6,
    givenInAir: inAir,
  };
}
