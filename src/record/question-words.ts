/**
 * A question as the words of the command line that asks it, for faces in which nobody typed one: long options only, media by their
 * keys, every number so written that it reads back as the same double. `catalog` and the like, which no question holds, are
 * the caller's to add.
 *
 * Limit: a design wave in air beside a wave in vacuum, or the other way round, is written as if both were the same.
 */
import type { Beam, CrystalCut, Layer, MediumSpec, Question, WaveSpec } from '../answer/question.ts';
import { repeatedRuns } from '../present/layer-runs.ts';
import { HERTZ, JOULE, METRE, PASCAL, SECOND, WATT } from '../units/display-unit.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { ASCII } from '../units/number-style.ts';
import { parseIncidence, parseLineAngle } from '../units/parse-angle.ts';
import { parseEnergy } from '../units/parse-energy.ts';
import { parseLength } from '../units/parse-length.ts';
import { parsePower } from '../units/parse-power.ts';
import { parsePressure } from '../units/parse-pressure.ts';
import { parseRate } from '../units/parse-rate.ts';
import { parseTemperature } from '../units/parse-temperature.ts';
import { parseThickness } from '../units/parse-thickness.ts';
import { parseTime } from '../units/parse-time.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem, type Problem } from '../units/problem.ts';
import { angleWord, exactSpelling, quantityWord } from './exact-spelling.ts';
import { toleranceWords } from './tolerance-words.ts';

const ZERO_CELSIUS_K = 273.15;

export function questionWords(question: Question): readonly string[] {
  const { from, layers, into, wave, incidenceAngle_rad, polarization, tolerances } = question;
  return [
    'halfspace',
    mediumWord(from),
    ...layerWords(layers),
    mediumWord(into),
    waveWord(wave, flagFor(wave)),
    ...(flagFor(wave) ? ['--air-wavelength'] : []),
    ...(incidenceAngle_rad === 0 ? [] : ['--angle', angleWord(incidenceAngle_rad, parseIncidence)]),
    ...(polarization === 'unpolarized' ? [] : ['--pol', polarization]),
    ...conditionWords(question),
    ...(question.beam ? beamWords(question.beam) : []),
    ...pulseWords(question),
    ...nonlinearWords(layers),
    ...toleranceWords(tolerances),
    ...(question.extrapolate ? ['--extrapolate'] : []),
    ...(question.designWave ? ['--design-wave', waveWord(question.designWave, flagFor(wave))] : []),
    ...(question.coherenceLength_m === undefined
      ? []
      : ['--coherence', quantityWord(question.coherenceLength_m, METRE, parseLength)]),
    ...(question.cut ? cutWords(question.cut) : []),
    ...(question.fieldProfile ? ['--field-profile'] : []),
  ];
}

function mediumWord(medium: MediumSpec): string {
  if (medium.kind === 'literal') return medium.text;
  const { axis, material } = medium;
  return axis === undefined ? material.key : `${material.key}:${axis}`;
}

/** Groups that repeat are written once, as `8x: A@qw B@qw :`. */
function layerWords(layers: readonly Layer[]): readonly string[] {
  const words = layers.map(({ medium, thickness }) => {
    const size =
      thickness.kind === 'waves'
        ? waveShareWord(thickness.waves)
        : quantityWord(thickness.thickness_m, METRE, parseLength);
    return `${mediumWord(medium)}@${size}`;
  });
  return repeatedRuns(words).flatMap(({ start, period, times }) => {
    const group = words.slice(start, start + period);
    return times === 1 ? group : [`${times}x:`, ...group, ':'];
  });
}

function waveShareWord(waves: number): string {
  if (waves === 0.5) return 'hw';
  return waves === 0.25
    ? 'qw'
    : exactSpelling(waves, [`${waves * 4}qw`, `${waves * 2}hw`], (text) => {
        const read = parseThickness(text);
        return !isProblem(read) && read.kind === 'waves' ? read.waves : Number.NaN;
      });
}

/** Whether the wave is one in air that its own text does not say. */
function flagFor({ inAir, text }: WaveSpec): boolean {
  const read = parseWave(text);
  return inAir && !(!isProblem(read) && read.inAir);
}

function waveWord({ wavelength_m, inAir, text }: WaveSpec, airWavelength: boolean): string {
  const same = (a: number, b: number): boolean => a === b;
  const read = (typed: string): number | Problem => {
    const wave = parseWave(typed, { airWavelength });
    return isProblem(wave) ? wave : wave.inAir === inAir ? wave.wavelength_m : Number.NaN;
  };
  const length = formatQuantity(wavelength_m, METRE, 'shortest', { style: ASCII }).replace(' ', '');
  const typed = text === '' ? [] : [text.replace(/\s+/g, ''), text];
  return exactSpelling(wavelength_m, [...typed, length, `${wavelength_m}m`], read, same);
}

function conditionWords({ conditions }: Question): readonly string[] {
  const { temperature_K, pressure_Pa, humidity, co2_ppm, salinity_g_per_kg, composition } = conditions;
  const words: string[] = [];
  if (temperature_K !== undefined) {
    const celsius = Number((temperature_K - ZERO_CELSIUS_K).toFixed(9));
    const word = exactSpelling(temperature_K, [`${celsius}C`, `${temperature_K}K`], parseTemperature);
    words.push(`--temperature=${word}`);
  }
  if (pressure_Pa !== undefined) words.push('--pressure', quantityWord(pressure_Pa, PASCAL, parsePressure));
  if (humidity !== undefined) words.push('--humidity', String(humidity));
  if (co2_ppm !== undefined) words.push('--co2', String(co2_ppm));
  if (salinity_g_per_kg !== undefined) words.push('--salinity', String(salinity_g_per_kg));
  if (composition !== undefined) words.push('--composition', String(composition));
  return words;
}

function beamWords(beam: Beam): readonly string[] {
  if (beam.kind === 'irradiance') return ['--irradiance', `${beam.irradiance_W_per_m2}W/m2`];
  if (beam.kind === 'field') return ['--field', `${beam.peakE_V_per_m}V/m`];
  const { diameter_m, profile, pulse } = beam;
  return [
    ...(beam.kind === 'power' ? ['--power', quantityWord(beam.power_W, WATT, parsePower)] : []),
    ...(pulse ? ['--pulse-energy', quantityWord(pulse.energy_J, JOULE, parseEnergy)] : []),
    ...(pulse?.repetition_Hz === undefined
      ? []
      : ['--repetition', quantityWord(pulse.repetition_Hz, HERTZ, parseRate)]),
    ...(diameter_m === undefined ? [] : ['--beam', quantityWord(diameter_m, METRE, parseLength)]),
    // Without a width the profile says nothing.
    ...(profile === 'gaussian' || diameter_m === undefined ? [] : ['--profile', profile]),
  ];
}

function pulseWords({ beam, pulseDuration_s }: Question): readonly string[] {
  const ofBeam = beam && 'pulse' in beam ? beam.pulse?.duration_s : undefined;
  const duration_s = pulseDuration_s ?? ofBeam;
  return duration_s === undefined ? [] : ['--pulse', quantityWord(duration_s, SECOND, parseTime)];
}

function nonlinearWords(layers: readonly Layer[]): readonly string[] {
  const stated = layers.flatMap(({ nonlinearIndex_m2_per_W: n2 }, i) =>
    n2 === undefined ? [] : [`${i + 1}=${n2}m2/W`],
  );
  return stated.length === 0 ? [] : ['--nonlinear-index', stated.join(',')];
}

function cutWords({ angle_rad, azimuth_rad, retardance_waves }: CrystalCut): readonly string[] {
  return [
    '--cut-angle',
    angleWord(angle_rad, parseLineAngle),
    ...(azimuth_rad === 0 ? [] : ['--cut-azimuth', angleWord(azimuth_rad, parseLineAngle)]),
    ...(retardance_waves === undefined ? [] : ['--retardance', String(retardance_waves)]),
  ];
}
