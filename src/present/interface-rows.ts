/** What belongs to the interface: first the numbers a person came for. */
import type { Answer, InterfaceAnswer } from '../answer/answer.ts';
import { DECIBEL, DEGREE, METRE, PER_CENT } from '../units/display-unit.ts';
import { formatQuantity, formatUncertainQuantity } from '../units/format-quantity.ts';
import { precisionFor } from './known.ts';
import { RowList } from './row-list.ts';
import type { PresentStyle, Shown } from './shown.ts';

const EXACT_DIGITS = 6;
/** An uncertainty below this part of its value lies among the last bits of the sum that made the value. */
const RESOLVED = 1e-13;
const PER_RADIAN = 180 / Math.PI;

/** Reflectance or transmittance in per cent: `3.4794(4) %`. */
export function powerText(
  value: number | null,
  uncertainty: number | null,
  guide: number | null,
  style: PresentStyle,
): string {
  // Exactly nothing (total reflection) has no digits to doubt.
  if (value === 0) return formatQuantity(0, PER_CENT, { significant: 1 }, { style });
  const otherwise = precisionFor(value, guide ?? 0, EXACT_DIGITS);
  const meant = uncertainty !== null && uncertainty > RESOLVED * Math.abs(value ?? 0) ? uncertainty : null;
  return formatUncertainQuantity(value, meant, PER_CENT, otherwise, { style });
}

export function degreesText(angle_rad: number | null, decimals: number, style: PresentStyle): string {
  return formatQuantity(angle_rad === null ? null : angle_rad * PER_RADIAN, DEGREE, { decimals }, { style });
}

/** A phase: half a turn either way reads 180, not -180. */
function phaseText(phase_rad: number | null, style: PresentStyle): string {
  const almostMinusHalf = phase_rad !== null && phase_rad < -Math.PI + 5e-5;
  return degreesText(almostMinusHalf ? -phase_rad : phase_rad, 2, style);
}

export function interfaceRows(answer: Answer, style: PresentStyle): readonly Shown[] {
  const rows = new RowList(style);
  const surface = answer.interface;
  const { polarization } = answer.geometry;
  const suffix = polarization === 'unpolarized' ? '' : `_${polarization}`;
  rows.add(
    'R',
    `R${suffix}`,
    'reflectance',
    powerText(surface.R, surface.R_uncertainty, surface.R_digitsGuide, style),
  );
  rows.add(
    'T',
    `T${suffix}`,
    answer.layers.length > 0 ? 'transmittance of the path' : 'transmittance of the surface',
    powerText(surface.T, surface.T_uncertainty, surface.T_digitsGuide, style),
  );
  lossRows(rows, surface, style);
  angleRows(rows, answer, style);
  if (answer.geometry.incidenceAngle_rad > 0) {
    rows.add('Rs', 'R_s', 'reflectance, s', powerText(surface.Rs, null, surface.R_digitsGuide, style));
    rows.add('Rp', 'R_p', 'reflectance, p', powerText(surface.Rp, null, surface.R_digitsGuide, style));
  }
  if (surface.totalReflection) tunnelRows(rows, surface, style);
  if (!surface.rs) return rows.list;
  rows.add('phaseRs_rad', 'arg r_s', 'phase of reflection, s', phaseText(surface.phaseRs_rad, style));
  rows.add('phaseRp_rad', 'arg r_p', 'phase of reflection, p', phaseText(surface.phaseRp_rad, style));
  return rows.list;
}

function lossRows(rows: RowList, surface: InterfaceAnswer, style: PresentStyle): void {
  rows.add(
    'reflectionLoss_dB',
    'loss',
    'reflection loss',
    surface.reflectionLoss_dB === null && surface.R >= 1 && surface.T !== null
      ? 'all reflected'
      : formatQuantity(surface.reflectionLoss_dB, DECIBEL, { decimals: 3 }, { style }),
  );
  rows.add(
    'returnLoss_dB',
    'return',
    'return loss',
    surface.returnLoss_dB === null
      ? 'no reflection'
      : formatQuantity(surface.returnLoss_dB, DECIBEL, { decimals: 2 }, { style }),
  );
}

function angleRows(rows: RowList, answer: Answer, style: PresentStyle): void {
  const surface = answer.interface;
  if (answer.geometry.incidenceAngle_rad > 0) {
    const refraction = surface.totalReflection
      ? 'total reflection'
      : degreesText(surface.refractionAngle_rad, 2, style);
    rows.add('refractionAngle_rad', 'θ_t', 'angle of refraction', refraction);
  }
  if (answer.layers.length > 0) return;
  if (surface.brewsterAngle_rad === null && surface.pseudoBrewsterAngle_rad !== null) {
    const pseudo = degreesText(surface.pseudoBrewsterAngle_rad, 2, style);
    rows.add('pseudoBrewsterAngle_rad', 'pseudo-Brewster', 'pseudo-Brewster angle (least R_p)', pseudo);
  } else {
    const brewster =
      surface.brewsterAngle_rad === null ? 'none' : degreesText(surface.brewsterAngle_rad, 2, style);
    rows.add('brewsterAngle_rad', 'Brewster', 'Brewster angle', brewster);
  }
  const critical =
    surface.criticalAngle_rad === null ? 'none' : degreesText(surface.criticalAngle_rad, 2, style);
  rows.add('criticalAngle_rad', 'critical', 'critical angle', critical);
}

function tunnelRows(rows: RowList, surface: InterfaceAnswer, style: PresentStyle): void {
  const length = (x: number | null): string => formatQuantity(x, METRE, { significant: 4 }, { style });
  rows.add(
    'evanescentDepth_m',
    'depth',
    'evanescent depth (field to 1/e)',
    length(surface.evanescentDepth_m),
  );
  rows.add('goosHanchenS_m', 'D_s', 'Goos-Haenchen shift, s', length(surface.goosHanchenS_m));
  rows.add('goosHanchenP_m', 'D_p', 'Goos-Haenchen shift, p', length(surface.goosHanchenP_m));
}
