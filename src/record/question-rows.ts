/** The question in words, one row for each thing that was asked or assumed, so that a record is complete without the program. */
import type { Beam, Layer, MediumSpec, Question, Tolerances, WaveSpec } from '../answer/question.ts';
import type { Conditions } from '../dispersion/evaluator.ts';
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

export function questionRows(question: Question): readonly RecordRow[] {
  const { from, layers, into, wave, beam, designWave, coherenceLength_m } = question;
  return [
    row('medium of incidence', mediumText(from)),
    ...layers.map((layer, i) => row(`layer ${i + 1}`, layerText(layer))),
    row('medium beyond', mediumText(into)),
    row('wave', waveText(wave)),
    row('angle of incidence', angleText(question.incidenceAngle_rad)),
    row('polarization', question.polarization),
    row('conditions', conditionsText(question.conditions)),
    row('beam', beam ? beamText(beam) : 'none stated'),
    row('tolerances', tolerancesText(question.tolerances)),
    row('outside the range of a fit', question.extrapolate ? 'extrapolated, as asked' : 'refused'),
    ...(layers.length > 0 ? [row('design wave', designWave ? waveText(designWave) : 'the wave above')] : []),
    ...(coherenceLength_m === undefined ? [] : [row('coherence length', exact(coherenceLength_m, METRE))]),
  ];
}

function row(label: string, text: string): RecordRow {
  return { about: '', symbol: '', label, text };
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

function layerText({ medium, thickness }: Layer): string {
  const size =
    thickness.kind === 'length'
      ? exact(thickness.thickness_m, METRE)
      : `${exact(thickness.waves, NUMBER)} wavelengths thick`;
  return `${mediumText(medium)}, ${size}`;
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
  const { wavelength_m, angle_rad, index, indexFrom, temperature_K, thickness_m } = tolerances;
  const stated = [
    wavelength_m === undefined ? '' : `wavelength ${exact(wavelength_m, METRE)}`,
    angle_rad === undefined ? '' : `angle ${exact((angle_rad * 180) / Math.PI, DEGREE)}`,
    index === undefined ? '' : `n beyond ${exact(index, NUMBER)}`,
    indexFrom === undefined ? '' : `n of incidence ${exact(indexFrom, NUMBER)}`,
    temperature_K === undefined ? '' : `temperature ${exact(temperature_K, KELVIN)}`,
    thickness_m === undefined ? '' : `thickness ${exact(thickness_m, METRE)}`,
  ].filter((text) => text !== '');
  return stated.length === 0 ? 'none stated' : `${stated.join(', ')} (standard uncertainties)`;
}
