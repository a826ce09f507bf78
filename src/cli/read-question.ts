/** From operands and options to the question, or to the refusal that says what is not understood. */
import type { Beam, Layer, MediumSpec, Question, Tolerances, WaveSpec } from '../answer/question.ts';
import { makeQuestion } from '../answer/question.ts';
import type { IndexedCatalogue } from '../catalog/entries.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { parseThickness } from '../units/parse-thickness.ts';
import { type TypedTolerances, wavelengthTolerance_m } from '../units/parse-tolerance.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { findMedium, suggestMedia } from './find-medium.ts';
import type { OptionValues } from './options.ts';

/** `operands`: FROM [LAYER@THICKNESS ...] INTO WAVE. */
export function readQuestion(
  operands: readonly string[],
  options: OptionValues,
  catalogue: IndexedCatalogue,
): Question | Refusal | Promise<Refusal> {
  const wave = readWave(operands.at(-1) ?? '', options);
  if (isRefusal(wave)) return wave;
  const media = operands.slice(0, -1);
  const from = readEnd(media[0] ?? '', catalogue);
  if (isRefusal(from)) return suggestMedia(from, media[0] ?? '', catalogue);
  const layers: Layer[] = [];
  for (const text of media.slice(1, -1)) {
    const layer = readLayer(text, catalogue);
    if (isRefusal(layer)) return suggestMedia(layer, layerName(text), catalogue);
    layers.push(layer);
  }
  const into = readEnd(media.at(-1) ?? '', catalogue);
  if (isRefusal(into)) return suggestMedia(into, media.at(-1) ?? '', catalogue);
  return makeQuestion(from, into, wave, { layers, ...questionOptions(options, wave) });
}

/** Everything of a question that options state. */
export function questionOptions(
  options: OptionValues,
  wave: WaveSpec,
): Partial<Omit<Question, 'from' | 'into' | 'wave'>> {
  const { temperature_K, pressure_Pa, humidity, co2_ppm, salinity_g_per_kg } = options;
  return {
    incidenceAngle_rad: options.angle_rad ?? 0,
    polarization: options.polarization ?? 'unpolarized',
    conditions: dropUndefined({ temperature_K, pressure_Pa, humidity, co2_ppm, salinity_g_per_kg }),
    beam: readBeam(options),
    tolerances: options.tolerances ? readTolerances(options.tolerances, wave) : {},
    extrapolate: options.extrapolate === true,
  };
}

export function readWave(text: string, options: OptionValues): WaveSpec | Refusal {
  const wave = parseWave(text, { airWavelength: options.airWavelength === true });
  return isProblem(wave) ? refuse('bad-wave', 2, wave.message, wave.remedy) : wave;
}

function readEnd(text: string, catalogue: IndexedCatalogue): MediumSpec | Refusal {
  if (/@/.test(text)) {
    return refuse(
      'end-with-thickness',
      2,
      `${quoteInput(text)} has a thickness, but the first and the last medium fill their half-spaces`,
      'give a thickness to the layers between them only, and a medium beyond',
    );
  }
  return findMedium(text, catalogue);
}

const layerName = (text: string): string => text.split('@')[0] ?? '';

export function readLayer(text: string, catalogue: IndexedCatalogue): Layer | Refusal {
  const [name = '', size, ...more] = text.split('@');
  if (size === undefined || more.length > 0) {
    return refuse(
      'layer-without-thickness',
      2,
      `${quoteInput(text)} stands between two media and has no thickness`,
      `write ${name}@THICKNESS, such as ${name}@100nm or ${name}@qw`,
    );
  }
  const thickness = parseThickness(size);
  if (isProblem(thickness)) return refuse('bad-thickness', 2, thickness.message, thickness.remedy);
  const medium = findMedium(name, catalogue);
  return isRefusal(medium) ? medium : { medium, thickness };
}

function readBeam(options: OptionValues): Beam | undefined {
  const { power_W, beamDiameter_m, irradiance_W_per_m2, field_V_per_m } = options;
  if (power_W !== undefined) {
    return {
      kind: 'power',
      power_W,
      profile: options.profile ?? 'gaussian',
      ...(beamDiameter_m === undefined ? {} : { diameter_m: beamDiameter_m }),
    };
  }
  if (irradiance_W_per_m2 !== undefined) return { kind: 'irradiance', irradiance_W_per_m2 };
  if (field_V_per_m !== undefined) return { kind: 'field', peakE_V_per_m: field_V_per_m };
  return undefined;
}

function readTolerances(typed: TypedTolerances, wave: WaveSpec): Tolerances {
  const { wave: ofWave, ...rest } = typed;
  return ofWave ? { ...rest, wavelength_m: wavelengthTolerance_m(ofWave, wave.wavelength_m) } : rest;
}

function dropUndefined<T extends object>(record: T): T {
  return Object.fromEntries(Object.entries(record).filter(([, v]) => v !== undefined)) as T;
}
