/** The question in words, one row for each thing that was asked or assumed, so that a record is complete without the program. */
import type {
  Beam,
  CrystalCut,
  Layer,
  MediumSpec,
  Question,
  Tolerances,
  WaveSpec,
} from '../answer/question.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
import { repeatedRuns } from '../present/layer-runs.ts';
import {
  CELSIUS,
  DEGREE,
  type DisplayUnit,
  HERTZ,
  JOULE,
  METRE,
  NUMBER,
  PASCAL,
  PER_CENT,
  SECOND,
  VOLT_PER_METRE,
  WATT,
  WATT_PER_SQUARE_METRE,
} from '../units/display-unit.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import type { RecordRow } from './record.ts';

const ZERO_CELSIUS_K = 273.15;
const KELVIN: DisplayUnit = { symbol: 'K', power: 0 };
const SQUARE_METRE_PER_WATT: DisplayUnit = { symbol: 'm²/W', power: 0 };

/** One entry for every part of a question, in the order of the rows: a part added to questions asks for its row here. */
const ROWS: { readonly [Part in keyof Required<Question>]: (question: Question) => readonly RecordRow[] } = {
  from: ({ from }) => [row('medium of incidence', mediumText(from))],
  layers: ({ layers }) => layerRows(layers),
  into: ({ into }) => [row('medium beyond', mediumText(into))],
  wave: ({ wave }) => [row('wave', waveText(wave))],
  incidenceAngle_rad: (question) => [row('angle of incidence', angleText(question.incidenceAngle_rad))],
  polarization: ({ polarization }) => [row('polarization', polarization)],
  cut: ({ cut }) => (cut ? [row('cut of the crystal', cutText(cut))] : []),
  conditions: ({ conditions }) => [row('conditions', conditionsText(conditions))],
  beam: ({ beam }) => [row('beam', beam ? beamText(beam) : 'none stated')],
  pulseDuration_s: ({ pulseDuration_s }) =>
    pulseDuration_s === undefined
      ? []
      : [row('pulse through the path', `gaussian, ${exact(pulseDuration_s, SECOND)}`)],
  tolerances: ({ tolerances }) => [row('tolerances', tolerancesText(tolerances))],
  extrapolate: ({ extrapolate }) => [
    row('outside the range of a fit', extrapolate ? 'extrapolated, as asked' : 'refused'),
  ],
  designWave: ({ layers, designWave }) =>
    layers.length === 0 ? [] : [row('design wave', designWave ? waveText(designWave) : 'the wave above')],
  coherenceLength_m: ({ coherenceLength_m }) =>
    coherenceLength_m === undefined ? [] : [row('coherence length', exact(coherenceLength_m, METRE))],
  fieldProfile: ({ fieldProfile }) =>
    fieldProfile ? [row('field through the layers', 'point by point')] : [],
};

export function questionRows(question: Question): readonly RecordRow[] {
  return Object.values(ROWS).flatMap((rows) => rows(question));
}

function row(label: string, text: string): RecordRow {
  return { about: '', symbol: '', label, text };
}

function cutText({ angle_rad, azimuth_rad, retardance_waves }: CrystalCut): string {
  const degrees = (rad: number): string => exact((rad * 180) / Math.PI, DEGREE);
  const plate = retardance_waves === undefined ? '' : `, plate of ${exact(retardance_waves, NUMBER)} waves`;
  return `optic axis ${degrees(angle_rad)} from the normal, azimuth ${degrees(azimuth_rad)}${plate}`;
}

/** The value as it was given: twelve digits take off what the conversion of a typed unit added. */
function exact(value: number, unit: DisplayUnit): string {
  return formatQuantity(Number(value.toPrecision(12)), unit, 'shortest');
}

function mediumText(medium: MediumSpec): string {
  if (medium.kind === 'literal') return medium.text;
  const { key, name, own } = medium.material;
  const axis = medium.axis === undefined || medium.axis === 'isotropic' ? '' : `, ${medium.axis}`;
  return `${name} (${key})${axis}${own ? ', from the own folder' : ''}`;
}

/** A group that repeats is told once. */
function layerRows(layers: readonly Layer[]): readonly RecordRow[] {
  const texts = layers.map(layerText);
  return repeatedRuns(texts).map(({ start, period, times }) => {
    const group = texts.slice(start, start + period);
    return times === 1
      ? row(`layer ${start + 1}`, group.join('; '))
      : row(`layers ${start + 1} to ${start + period * times}`, `${times} times: ${group.join('; ')}`);
  });
}

function layerText({ medium, thickness, nonlinearIndex_m2_per_W }: Layer): string {
  const size =
    thickness.kind === 'length'
      ? exact(thickness.thickness_m, METRE)
      : `${exact(thickness.waves, NUMBER)} wavelengths thick`;
  const nonlinear =
    nonlinearIndex_m2_per_W === undefined
      ? ''
      : `, nonlinear index ${exact(nonlinearIndex_m2_per_W, SQUARE_METRE_PER_WATT)}`;
  return `${mediumText(medium)}, ${size}${nonlinear}`;
}

function waveText({ wavelength_m, inAir, text }: WaveSpec): string {
  const length = `${exact(wavelength_m, METRE)} in ${inAir ? 'standard air' : 'vacuum'}`;
  return text === '' ? length : `${length}, given as ${text}`;
}

function angleText(angle_rad: number): string {
  const degrees = exact((angle_rad * 180) / Math.PI, DEGREE);
  return angle_rad === 0 ? `${degrees}, normal incidence` : `${degrees} from the normal`;
}

function conditionsText(conditions: Conditions): string {
  const { temperature_K, pressure_Pa, humidity, co2_ppm, salinity_g_per_kg, composition } = conditions;
  const stated = [
    temperature_K === undefined ? '' : exact(temperature_K - ZERO_CELSIUS_K, CELSIUS),
    pressure_Pa === undefined ? '' : exact(pressure_Pa, PASCAL),
    humidity === undefined ? '' : `${exact(humidity, PER_CENT)} relative humidity`,
    co2_ppm === undefined ? '' : `CO2 ${exact(co2_ppm, NUMBER)} × 10⁻⁶`,
    salinity_g_per_kg === undefined ? '' : `${exact(salinity_g_per_kg, NUMBER)} g/kg of salt`,
    composition === undefined ? '' : `share of the second constituent ${exact(composition, NUMBER)}`,
  ].filter((text) => text !== '');
  return stated.length === 0 ? 'those of the fits' : `${stated.join(', ')}; else those of the fits`;
}

function beamText(beam: Beam): string {
  if (beam.kind === 'irradiance') return exact(beam.irradiance_W_per_m2, WATT_PER_SQUARE_METRE);
  if (beam.kind === 'field') return `peak field ${exact(beam.peakE_V_per_m, VOLT_PER_METRE)}`;
  const { diameter_m, profile, pulse } = beam;
  const shape = profile === 'gaussian' ? 'gaussian, diameter (1/e² of the irradiance)' : 'flat-top, diameter';
  const parts = beam.kind === 'power' ? [exact(beam.power_W, WATT)] : [];
  if (diameter_m !== undefined) parts.push(`${shape} ${exact(diameter_m, METRE)}`);
  if (pulse) {
    const time = pulse.duration_s === undefined ? '' : ` in ${exact(pulse.duration_s, SECOND)}`;
    const rate = pulse.repetition_Hz === undefined ? '' : ` at ${exact(pulse.repetition_Hz, HERTZ)}`;
    parts.push(`pulses of ${exact(pulse.energy_J, JOULE)}${time}${rate}`);
  }
  return parts.join(', ');
}

function tolerancesText(tolerances: Tolerances): string {
  const { wavelength_m, angle_rad, index, indexFrom, indexLayers, temperature_K } = tolerances;
  const { thickness_m, thicknessShare } = tolerances;
  const stated = [
    wavelength_m === undefined ? '' : `wavelength ${exact(wavelength_m, METRE)}`,
    angle_rad === undefined ? '' : `angle ${exact((angle_rad * 180) / Math.PI, DEGREE)}`,
    index === undefined ? '' : `n beyond ${exact(index, NUMBER)}`,
    indexFrom === undefined ? '' : `n of incidence ${exact(indexFrom, NUMBER)}`,
    indexLayers === undefined ? '' : `n of each layer ${exact(indexLayers, NUMBER)}`,
    temperature_K === undefined ? '' : `temperature ${exact(temperature_K, KELVIN)}`,
    thickness_m === undefined ? '' : `thickness ${exact(thickness_m, METRE)}`,
    thicknessShare === undefined ? '' : `thickness ${exact(thicknessShare, PER_CENT)}`,
  ].filter((text) => text !== '');
  return stated.length === 0 ? 'none stated' : `${stated.join(', ')} (standard uncertainties)`;
}
