/** Where a medium's numbers come from, and under which conditions they hold, each on one line. */
import type { FitAnswer, MediumAnswer } from '../answer/answer.ts';
import { CELSIUS, METRE, PASCAL } from '../units/display-unit.ts';
import { formatNumber } from '../units/format-number.ts';
import { formatQuantity, formatRange } from '../units/format-quantity.ts';
import { mediumTitle } from './question-line.ts';
import type { PresentStyle } from './shown.ts';

export const GRADE_WORDS: Readonly<Record<FitAnswer['grade'], string>> = {
  A: 'coefficients and an independent value both read in publications',
  B: 'one of the two read, the other recalled',
  C: 'both recalled; verify before relying on it',
};

/** "20 °C"; "15 °C, 101.325 kPa, dry" for air; empty where nothing is stated. */
export function conditionsText(medium: MediumAnswer, style: PresentStyle): string {
  const parts: string[] = [];
  if (medium.temperature_K !== null) {
    const celsius = Number((medium.temperature_K - 273.15).toFixed(6));
    parts.push(formatQuantity(celsius, CELSIUS, 'shortest', { style }));
  }
  if (medium.pressure_Pa !== null)
    parts.push(formatQuantity(medium.pressure_Pa, PASCAL, 'shortest', { style }));
  if (medium.humidity !== null) {
    parts.push(
      medium.humidity === 0
        ? 'dry'
        : `${formatNumber(medium.humidity * 100, { significant: 3 }, style)} % RH`,
    );
  }
  if (medium.co2_ppm !== null && medium.co2_ppm !== 450)
    parts.push(`CO2 ${formatNumber(medium.co2_ppm, 'shortest', style)}e-6`);
  if (medium.salinity_g_per_kg !== null)
    parts.push(`${formatNumber(medium.salinity_g_per_kg, 'shortest', style)} g/kg salt`);
  if (medium.composition !== null)
    parts.push(`composition ${formatNumber(medium.composition, 'shortest', style)}`);
  return parts.join(', ');
}

/** One line for the fit, one for a second opinion; none for literal media. */
export function fitLine(medium: MediumAnswer, style: PresentStyle): readonly string[] {
  const { fit } = medium;
  if (!fit) return [];
  const ends = fit.range_m.map((x) => Number(x.toPrecision(6))) as [number, number];
  const range = formatRange(ends, METRE, 'shortest', { style });
  const reference = medium.publishedReference === 'air' ? 'relative to air' : 'absolute';
  const published = `n ${formatNumber(Number(medium.n_published.toPrecision(8)), 'shortest', style)} as published, ${reference}`;
  const lines = [`${mediumTitle(medium)}: ${fit.source.text} [grade ${fit.grade}, ${range}; ${published}]`];
  if (fit.secondOpinion) {
    const { difference, source } = fit.secondOpinion;
    const sign = difference < 0 ? '-' : '+';
    lines.push(
      `second opinion: ${source.text}: n differs by ${sign}${formatNumber(Math.abs(difference), { significant: 2 }, style)}`,
    );
  }
  return lines;
}
