/** What a coating is designed for, on one line. */
import type { CoatingReport } from '../answer/coating-shape.ts';
import { degreesText } from './interface-rows.ts';
import { mediumTitle, wavelengthOf } from './question-line.ts';
import type { PresentStyle } from './shown.ts';

export function coatHeadline({ from, into, wave, geometry }: CoatingReport, style: PresentStyle): string {
  const { incidenceAngle_rad, polarization } = geometry;
  const angle =
    incidenceAngle_rad === 0
      ? 'normal incidence'
      : `${degreesText(Number(incidenceAngle_rad.toPrecision(12)), 2, style)} from the normal`;
  return `Coatings between ${mediumTitle(from)} and ${mediumTitle(into)}, ${wavelengthOf(wave, style)}, ${angle}, ${polarization}`;
}
