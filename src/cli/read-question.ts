/** From operands and options to the question, or to the refusal that says what is not understood. */
import type { CrystalCut, Layer, MediumSpec, Question, Tolerances, WaveSpec } from '../answer/question.ts';
import { makeQuestion } from '../answer/question.ts';
import type { IndexedCatalogue } from '../catalog/entries.ts';
import { isRefusal, type Refusal, refuse } from '../medium/refusal.ts';
import { coherenceLength_m } from '../stack/coherence.ts';
import { linewidth_m } from '../units/parse-linewidth.ts';
import type { TypedNonlinearIndex } from '../units/parse-nonlinear-index.ts';
import { type TypedTolerances, wavelengthTolerance_m } from '../units/parse-tolerance.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { findMedium, suggestMedia } from './find-medium.ts';
import { nameOptions } from './misplaced-operand.ts';
import type { OptionValues } from './options.ts';
import { readBeam } from './read-beam.ts';
import { isGroupMark, isUnread, readLayers } from './read-path.ts';

/** `operands`: FROM [LAYER@THICKNESS ...] INTO WAVE. */
export function readQuestion(
  operands: readonly string[],
  options: OptionValues,
  catalogue: IndexedCatalogue,
): Question | Refusal | Promise<Refusal> {
  const question = readOperands(operands, options, catalogue);
  if (question instanceof Promise) return question.then((refusal) => nameOptions(refusal, operands));
  return isRefusal(question) ? nameOptions(question, operands) : question;
}

function readOperands(
  operands: readonly string[],
  options: OptionValues,
  catalogue: IndexedCatalogue,
): Question | Refusal | Promise<Refusal> {
  const wave = readWave(operands.at(-1) ?? '', options);
  if (isRefusal(wave)) return wave;
  const media = operands.slice(0, -1);
  const from = readEnd(media[0] ?? '', catalogue);
  if (isRefusal(from)) return suggestMedia(from, media[0] ?? '', catalogue);
  const typed = readLayers(media.slice(1, -1), catalogue);
  if (isUnread(typed)) return suggestMedia(typed.refusal, typed.name, catalogue);
  const into = readEnd(media.at(-1) ?? '', catalogue);
  if (isRefusal(into)) return suggestMedia(into, media.at(-1) ?? '', catalogue);
  const layers = options.nonlinearIndex ? withNonlinearIndex(typed, options.nonlinearIndex) : typed;
  if (isRefusal(layers)) return layers;
  const stated = questionOptions(options, wave);
  if (isRefusal(stated)) return stated;
  if (options.retardance_waves !== undefined && !stated.cut) {
    return refuse(
      'retardance-without-cut',
      2,
      '--retardance says nothing here without --cut-angle',
      'give the cut too (--cut-angle 90 for an axis in the surface), or ask halfspace crystal',
    );
  }
  const { beam } = stated;
  if (options.nonlinearIndex && beam && 'profile' in beam && beam.diameter_m === undefined) {
    return refuse(
      'nonlinear-index-without-irradiance',
      2,
      '--nonlinear-index needs an irradiance, and the beam has no width',
      'give --beam too',
    );
  }
  return makeQuestion(from, into, wave, { layers, ...stated });
}

/** Everything of a question that options state. */
export function questionOptions(
  options: OptionValues,
  wave: WaveSpec,
): Partial<Omit<Question, 'from' | 'into' | 'wave'>> | Refusal {
  const { temperature_K, pressure_Pa, humidity, co2_ppm, salinity_g_per_kg, composition, linewidth } =
    options;
  const beam = readBeam(options);
  if (isRefusal(beam)) return beam;
  const designWave = options.designWave && readWave(options.designWave.text, options);
  if (isRefusal(designWave)) return designWave;
  return {
    incidenceAngle_rad: options.angle_rad ?? 0,
    polarization: options.polarization ?? 'unpolarized',
    conditions: dropUndefined({
      temperature_K,
      pressure_Pa,
      humidity,
      co2_ppm,
      salinity_g_per_kg,
      composition,
    }),
    beam,
    tolerances: options.tolerances ? readTolerances(options.tolerances, wave) : {},
    extrapolate: options.extrapolate === true,
    designWave,
    coherenceLength_m: linewidth
      ? coherenceLength_m(wave.wavelength_m, linewidth_m(linewidth, wave.wavelength_m))
      : options.coherenceLength_m,
    pulseDuration_s: options.pulseDuration_s,
    fieldProfile: options.fieldProfile,
    cut: readCut(options),
  };
}

function readCut(options: OptionValues): CrystalCut | undefined {
  const { cutAngle_rad, cutAzimuth_rad, retardance_waves } = options;
  if (cutAngle_rad === undefined) return undefined;
  return {
    angle_rad: cutAngle_rad,
    azimuth_rad: cutAzimuth_rad ?? 0,
    ...(retardance_waves === undefined ? {} : { retardance_waves }),
  };
}

export function readWave(text: string, options: OptionValues): WaveSpec | Refusal {
  const wave = parseWave(text, { airWavelength: options.airWavelength === true });
  return isProblem(wave) ? refuse('bad-wave', 2, wave.message, wave.remedy) : wave;
}

function readEnd(text: string, catalogue: IndexedCatalogue): MediumSpec | Refusal {
  if (isGroupMark(text)) {
    return refuse(
      'bad-group',
      2,
      `${quoteInput(text)} stands where the first or the last medium belongs`,
      'a group of layers stands between them: air 8x: n=2.3@qw n=1.46@qw : n-bk7 633nm',
    );
  }
  if (text.includes('@')) {
    return refuse(
      'end-with-thickness',
      2,
      `${quoteInput(text)} has a thickness, but the first and the last medium fill their half-spaces`,
      'give a thickness to the layers between them only, and a medium beyond',
    );
  }
  return findMedium(text, catalogue);
}

/** The layers that a nonlinear index is stated for; without a number it belongs to all of them, if they are of one medium. */
function withNonlinearIndex(
  layers: readonly Layer[],
  typed: readonly TypedNonlinearIndex[],
): readonly Layer[] | Refusal {
  const [first] = typed;
  if (layers.length === 0) {
    return refuse(
      'nonlinear-index-without-layer',
      2,
      '--nonlinear-index needs a layer: the B-integral grows along a thickness',
      'write the medium as a layer, such as fused-silica@10mm, and a medium beyond',
    );
  }
  if (first && first.layer === undefined) {
    const media = new Set(layers.map((l) => mediumName(l.medium)));
    if (media.size > 1) {
      return refuse(
        'nonlinear-index-without-layer',
        2,
        `the path has layers of ${media.size} media, and --nonlinear-index names none`,
        'give it by the number of the layer: --nonlinear-index 2=2.7e-20m2/W',
      );
    }
    return layers.map((l) => ({ ...l, nonlinearIndex_m2_per_W: first.value_m2_per_W }));
  }
  const beyond = typed.find(({ layer = 0 }) => layer > layers.length);
  if (beyond) {
    return refuse(
      'nonlinear-index-without-layer',
      2,
      `there is no layer ${beyond.layer} for --nonlinear-index`,
      layers.length === 1 ? 'the path has one layer' : `layers are numbered from 1 to ${layers.length}`,
    );
  }
  return layers.map((l, i) => {
    const own = typed.find(({ layer }) => layer === i + 1);
    return own ? { ...l, nonlinearIndex_m2_per_W: own.value_m2_per_W } : l;
  });
}

const mediumName = (medium: MediumSpec): string =>
  medium.kind === 'literal' ? medium.text : `${medium.material.key}:${medium.axis ?? ''}`;

function readTolerances(typed: TypedTolerances, wave: WaveSpec): Tolerances {
  const { wave: ofWave, ...rest } = typed;
  return ofWave ? { ...rest, wavelength_m: wavelengthTolerance_m(ofWave, wave.wavelength_m) } : rest;
}

function dropUndefined<T extends object>(record: T): T {
  return Object.fromEntries(Object.entries(record).filter(([, v]) => v !== undefined)) as T;
}
