/** The path of an order in words: "Air, Zinc selenide (CVD) 3 mm, Air"; and where and how the wave meets it. */
import type { Layer, MediumSpec, Question } from '../../answer/question.ts';
import { degrees, length, watts } from './shown-numbers.ts';

export const mediumName = (spec: MediumSpec): string => {
  if (spec.kind === 'literal') return spec.text;
  return spec.axis && spec.axis !== 'isotropic' ? `${spec.material.name}, ${spec.axis}` : spec.material.name;
};

const layerWords = ({ medium, thickness }: Layer): string =>
  `${mediumName(medium)} ${thickness.kind === 'length' ? length(thickness.thickness_m, 6) : `${thickness.waves} waves`}`;

export function pathWords({ from, layers, into }: Question): string {
  return [mediumName(from), ...layers.map(layerWords), mediumName(into)].join(' → ');
}

/** "normal incidence, unpolarized, 30 W, 6 mm". */
export function geometryWords({ incidenceAngle_rad, polarization, beam, conditions }: Question): string {
  const angle =
    incidenceAngle_rad === 0 ? 'normal incidence' : `${degrees(incidenceAngle_rad)} from the normal`;
  const power = beam && 'power_W' in beam && beam.power_W !== undefined ? [watts(beam.power_W)] : [];
  const diameter_m = beam && 'profile' in beam ? beam.diameter_m : undefined;
  const { temperature_K } = conditions;
  return [
    angle,
    polarization,
    ...power,
    ...(diameter_m === undefined ? [] : [`${length(diameter_m)} beam`]),
    ...(temperature_K === undefined ? [] : [`${Number((temperature_K - 273.15).toFixed(2))} °C`]),
  ].join(', ');
}
