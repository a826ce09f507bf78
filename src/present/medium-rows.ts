/** What belongs to a medium, most wanted first; radio media lead with permittivity and losses. */
import type { MediumAnswer } from '../answer/answer.ts';
import type { Complex } from '../num/complex.ts';
import { SPEED_OF_LIGHT_m_per_s } from '../units/constants.ts';
import { FS2_PER_MM, METRE, OHM, PER_CENTIMETRE } from '../units/display-unit.ts';
import { formatNumber } from '../units/format-number.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { formatUncertain } from '../units/format-uncertain.ts';
import { howKnown, type Known, precisionFor } from './known.ts';
import { RowList } from './row-list.ts';
import type { PresentStyle, Shown } from './shown.ts';

/** Digits of a quantity that follows from exact numbers. */
const EXACT_DIGITS = 7;

/** From this ratio k/n on a group velocity says nothing about a pulse. */
const PULSES_UP_TO_k = 0.1;

/** From this vacuum wavelength on a person thinks in permittivity. */
const RADIO_FROM_m = 1e-3;

export function mediumRows(
  medium: MediumAnswer,
  vacuumWavelength_m: number,
  style: PresentStyle,
): readonly Shown[] {
  const known = howKnown(medium);
  const rows = new RowList(style);
  const radio = vacuumWavelength_m >= RADIO_FROM_m || medium.relativePermeability.re !== 1;
  rows.add('n', 'n', 'refractive index', indexText(medium, known, style));
  if (medium.k > 0)
    rows.add('k', 'k', 'extinction coefficient', formatNumber(medium.k, { significant: 4 }, style));
  if (radio) electricRows(rows, medium, style);
  const share = known.uncertainty / Math.abs(medium.n || 1);
  const derived = (value: number | null) => precisionFor(value, Math.abs(value ?? 0) * share, EXACT_DIGITS);
  const wavelength = medium.wavelength_m;
  rows.add(
    'wavelength_m',
    'λ',
    'wavelength in the medium',
    formatQuantity(wavelength, METRE, derived(wavelength), { style }),
  );
  const v = medium.phaseVelocity_m_per_s;
  rows.add('phaseVelocity_m_per_s', 'v', 'phase velocity', ofLight(v, derived(v), style));
  if (medium.k < PULSES_UP_TO_k * Math.abs(medium.n)) groupRows(rows, medium, known, share, style);
  rows.add('absorption', 'α', 'absorption coefficient', absorptionText(medium, style));
  if (medium.penetrationDepth_m !== null) {
    const depth = formatQuantity(medium.penetrationDepth_m, METRE, { significant: 3 }, { style });
    rows.add('penetrationDepth_m', '1/α', 'penetration depth (power)', depth);
  }
  if (!radio && medium.k > 0.01 * Math.abs(medium.n)) electricRows(rows, medium, style);
  return rows.list;
}

/** How a pulse travels; left out where the medium swallows it within a wavelength or so. */
function groupRows(
  rows: RowList,
  medium: MediumAnswer,
  known: Known,
  share: number,
  style: PresentStyle,
): void {
  const { groupIndex } = medium;
  // A fit's slope is known less well than its value: one place less.
  const slope = precisionFor(groupIndex, known.uncertainty * 10, EXACT_DIGITS);
  const reference =
    medium.fit && medium.publishedReference === 'air' && groupIndex !== null ? ' rel. to air' : '';
  rows.add('groupIndex', 'n_g', 'group index', `${formatNumber(groupIndex, slope, style)}${reference}`);
  const vg = medium.absolute.groupVelocity_m_per_s;
  const vgDigits = precisionFor(vg, Math.abs(vg ?? 0) * share * 10, EXACT_DIGITS);
  rows.add('groupVelocity_m_per_s', 'v_g', 'group velocity', ofLight(vg, vgDigits, style));
  const gvd = formatQuantity(medium.gvd_s2_per_m, FS2_PER_MM, { significant: 3 }, { style });
  rows.add('gvd_s2_per_m', 'GVD', 'group-velocity dispersion', medium.gvd_s2_per_m === 0 ? 'none' : gvd);
}

/** 1.45702(3), or as many digits as hold. */
export function indexText(medium: MediumAnswer, known: Known, style: PresentStyle): string {
  if (known.kind === 'stated')
    return formatUncertain(medium.n, known.uncertainty, { significant: EXACT_DIGITS }, style);
  if (known.kind === 'exact') return formatNumber(Number(medium.n.toPrecision(10)), 'shortest', style);
  return formatNumber(medium.n, precisionFor(medium.n, known.uncertainty, EXACT_DIGITS), style);
}

/** n, or n + i k where the medium absorbs. */
export function complexIndexText(medium: MediumAnswer, known: Known, style: PresentStyle): string {
  const n = indexText(medium, known, style);
  return medium.k > 1e-6 ? `${n} + ${formatNumber(medium.k, { significant: 4 }, style)} i` : n;
}

function electricRows(rows: RowList, medium: MediumAnswer, style: PresentStyle): void {
  rows.add(
    'relativePermittivity',
    'ε_r',
    'relative permittivity',
    complexText(medium.relativePermittivity, style),
  );
  const mu = medium.relativePermeability;
  if (mu.re !== 1 || mu.im !== 0)
    rows.add('relativePermeability', 'µ_r', 'relative permeability', complexText(mu, style));
  if (medium.lossTangent !== null && medium.lossTangent > 0) {
    rows.add(
      'lossTangent',
      'tan δ',
      'loss tangent',
      formatNumber(medium.lossTangent, { significant: 3 }, style),
    );
  }
  if (medium.skinDepth_m !== null) {
    const depth = formatQuantity(medium.skinDepth_m, METRE, { significant: 4 }, { style });
    rows.add('skinDepth_m', 'δ', 'skin depth (field)', depth);
  }
  rows.add('impedance_ohm', 'Z', 'wave impedance', impedanceText(medium.impedance_ohm, style));
}

function absorptionText(medium: MediumAnswer, style: PresentStyle): string {
  const alpha = medium.absorptionCoefficient_per_m;
  if (alpha === null) return 'not known';
  if (alpha === 0) return 'none';
  return formatQuantity(alpha, PER_CENTIMETRE, { significant: 3 }, { style });
}

function ofLight(
  v: number | null,
  precision: Parameters<typeof formatNumber>[1],
  style: PresentStyle,
): string {
  if (v === null) return formatNumber(null, precision, style);
  return `${formatNumber(v / SPEED_OF_LIGHT_m_per_s, precision, style)} c`;
}

/** a + bi with four digits, the imaginary part left out where it is 0. */
export function complexText(z: Complex, style: PresentStyle): string {
  const re = formatNumber(z.re, { significant: 5 }, style);
  if (z.im === 0) return formatNumber(Number(z.re.toPrecision(6)), 'shortest', style);
  const im = formatNumber(Math.abs(z.im), { significant: 4 }, style);
  return `${re} ${z.im < 0 ? '-' : '+'} ${im} i`;
}

function impedanceText(z: Complex, style: PresentStyle): string {
  if (z.im === 0) return formatQuantity(z.re, OHM, { significant: 5 }, { style });
  return `(${complexText(z, style)}) ${style.ascii ? 'ohm' : 'Ω'}`;
}
