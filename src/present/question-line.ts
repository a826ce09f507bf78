/** The question as understood, on one line: media, wave with its reference, angle, polarization. */
import type { Answer, LayerAnswer, MediumAnswer } from '../answer/answer.ts';
import { ELECTRONVOLT, HERTZ, METRE } from '../units/display-unit.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { toAscii } from '../units/to-ascii.ts';
import { degreesText } from './interface-rows.ts';
import { layerRuns } from './layer-runs.ts';
import type { PresentStyle } from './shown.ts';

/** "Sapphire, ordinary". */
export function mediumTitle(medium: MediumAnswer): string {
  return medium.axis === 'isotropic' ? medium.name : `${medium.name}, ${medium.axis}`;
}

/** "632.8 nm in vacuum". */
export function wavelengthText(answer: Answer, style: PresentStyle): string {
  return wavelengthOf(answer.wave, style);
}

export function wavelengthOf(wave: Answer['wave'], style: PresentStyle): string {
  const { vacuumWavelength_m, airWavelength_m, givenInAir } = wave;
  const value = givenInAir ? airWavelength_m : vacuumWavelength_m;
  return `${formatQuantity(Number(value.toPrecision(9)), METRE, 'shortest', { style })} in ${givenInAir ? 'air' : 'vacuum'}`;
}

/** "473.755 THz", "1.95928 eV": six digits, the other names of the same wave. */
export function waveAliases(answer: Answer, style: PresentStyle): readonly string[] {
  const { frequency_Hz, photonEnergy_eV, vacuumWavelength_m, givenInAir } = answer.wave;
  const six = { significant: 7 } as const;
  return [
    ...(givenInAir ? [`${formatQuantity(vacuumWavelength_m, METRE, six, { style })} in vacuum`] : []),
    formatQuantity(frequency_Hz, HERTZ, six, { style }),
    ...(vacuumWavelength_m < 1e-3 ? [formatQuantity(photonEnergy_eV, ELECTRONVOLT, six, { style })] : []),
  ];
}

/** "Air → Magnesium fluoride film 99.6 nm → N-BK7"; "8 × (H → L)" for a group that repeats. */
export function pathText(answer: Answer, style: PresentStyle): string {
  const layer = (l: LayerAnswer): string => {
    const d = formatQuantity(Number(l.thickness_m.toPrecision(5)), METRE, 'shortest', { style });
    return `${mediumTitle(l.medium)} ${d}`;
  };
  const runs = layerRuns(answer.layers).map((run) => {
    const group = run.layers.map(layer).join(' → ');
    return run.times === 1 ? group : `${run.times} × (${group})`;
  });
  return [mediumTitle(answer.from), ...runs, mediumTitle(answer.into)].join(' → ');
}

export function questionLine(answer: Answer, style: PresentStyle): string {
  const { incidenceAngle_rad, polarization } = answer.geometry;
  const angle =
    incidenceAngle_rad === 0
      ? 'normal incidence'
      : `${degreesText(Number(incidenceAngle_rad.toPrecision(12)), 2, style)} from the normal`;
  const line = [pathText(answer, style), wavelengthText(answer, style), angle, polarization].join(', ');
  return style.ascii ? toAscii(line) : line;
}
