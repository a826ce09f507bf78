/** A crystal at a cut: its two waves, the plate, waveplates. */
import type { CrystalAnswer, CrystalWaveAnswer, WaveplateAnswer } from '../answer/crystal-shape.ts';
import { METRE, PER_CENT } from '../units/display-unit.ts';
import { formatNumber, type Precision } from '../units/format-number.ts';
import { formatQuantity } from '../units/format-quantity.ts';
import { formatUncertain } from '../units/format-uncertain.ts';
import { degreesText } from './interface-rows.ts';
import { precisionFor } from './known.ts';
import { RowList } from './row-list.ts';
import type { PresentStyle, Shown } from './shown.ts';

const FOUR = { significant: 4 } as const;
const MOST_DIGITS = 7;

/** The four facts that digits of a birefringence and of what follows from it are chosen by. */
type Digits = Pick<
  CrystalAnswer,
  'birefringence' | 'birefringence_uncertainty' | 'birefringence_digitsGuide'
>;

/** An index to the digits that the accuracy of the principal ones supports. */
const indexDigits = (value: number, { birefringence_digitsGuide: guide }: Digits): Precision =>
  precisionFor(value, guide / Math.SQRT2, MOST_DIGITS);

/** `0.0088(3)`; as many digits as hold where an accuracy is not stated. */
export function birefringenceText(digits: Digits, style: PresentStyle): string {
  const { birefringence: value, birefringence_uncertainty: u, birefringence_digitsGuide: guide } = digits;
  return formatUncertain(value, u || null, precisionFor(value, guide, MOST_DIGITS), style);
}

/** `3.42(5) waves`, from the uncertainty stated or as many digits as the birefringence supports. */
export function wavesText(
  waves: number,
  uncertainty: number | null,
  digits: Digits,
  style: PresentStyle,
): string {
  const guide = Math.abs((waves * digits.birefringence_digitsGuide) / (digits.birefringence || 1));
  return `${formatUncertain(waves, uncertainty || null, precisionFor(waves, guide, MOST_DIGITS), style)} waves`;
}

/** A thickness that a birefringence gives: three digits at least, so that no power of ten stands among lengths. */
export function plateDigits(
  thickness_m: number,
  { birefringence, birefringence_digitsGuide }: Digits,
): Precision {
  const guide = Math.abs((thickness_m * birefringence_digitsGuide) / (birefringence || 1));
  const digits = precisionFor(thickness_m, guide, 5);
  return typeof digits === 'object' && 'significant' in digits
    ? { significant: Math.max(3, digits.significant) }
    : digits;
}

export function crystalRows(crystal: CrystalAnswer | null, style: PresentStyle): readonly Shown[] {
  if (!crystal) return [];
  const rows = new RowList(style);
  const { cutAngle_rad, azimuth_rad, plate, waveplate } = crystal;
  const angle = (x: number | null): string => degreesText(x, 3, style);
  const place =
    crystal.orientation === 'normal-incidence' ? '' : `, azimuth ${degreesText(azimuth_rad, 2, style)}`;
  rows.add(
    'cutAngle_rad',
    'cut',
    'optic axis from the normal',
    `${degreesText(cutAngle_rad, 2, style)}${place}`,
  );
  rows.add('birefringence', 'n_e - n_o', 'birefringence', birefringenceText(crystal, style));
  waveRows(rows, 'ordinary', crystal.ordinary, crystal, style);
  waveRows(rows, 'extraordinary', crystal.extraordinary, crystal, style);
  if (crystal.extraordinary.walkOff_rad !== null) {
    rows.add('walkOff_rad', 'ρ', 'walk-off, away from the axis', angle(crystal.extraordinary.walkOff_rad));
  }
  rows.add(
    'brewsterAngle_rad',
    'Brewster',
    'Brewster angle with this cut',
    degreesText(crystal.brewsterAngle_rad, 2, style),
  );
  if (plate) {
    rows.add(
      'retardance_waves',
      'Γ',
      `retardance of ${formatQuantity(plate.thickness_m, METRE, 'shortest', { style })}`,
      wavesText(plate.retardance_waves, plate.retardance_uncertainty_waves, crystal, style),
    );
    if (plate.walkOffDisplacement_m !== 0) {
      rows.add(
        'walkOffDisplacement_m',
        'd tan ρ',
        'the two rays part by',
        formatQuantity(Math.abs(plate.walkOffDisplacement_m), METRE, FOUR, { style }),
      );
    }
  }
  if (waveplate) for (const row of waveplateRows(waveplate, crystal, style)) rows.list.push(row);
  return rows.list;
}

function waveRows(
  rows: RowList,
  name: 'ordinary' | 'extraordinary',
  wave: CrystalWaveAnswer,
  crystal: CrystalAnswer,
  style: PresentStyle,
): void {
  const letter = name === 'ordinary' ? 'o' : 'e';
  const field = wave.polarization === null ? '' : `, ${wave.polarization}`;
  const towards =
    wave.angleToAxis_rad === null ? '' : `, ${degreesText(wave.angleToAxis_rad, 2, style)} from axis`;
  rows.add(
    `n_${letter}`,
    name === 'ordinary' ? 'n_o' : 'n(θ)',
    `${name}${field}${name === 'ordinary' ? '' : towards}`,
    formatNumber(wave.n, indexDigits(wave.n, crystal), style),
  );
  rows.add(
    `R_${letter}`,
    `R_${letter}`,
    `reflectance, ${name}`,
    formatQuantity(wave.R, PER_CENT, FOUR, { style }),
  );
}

/** "quarter", "half", "0.3 waves". */
export function retardanceName(waves: number, style: PresentStyle): string {
  const named: Readonly<Record<string, string>> = {
    '0.25': 'quarter wave',
    '0.5': 'half wave',
    '1': 'full wave',
  };
  return named[String(waves)] ?? `${formatNumber(waves, 'shortest', style)} waves`;
}

export function waveplateRows(plate: WaveplateAnswer, digits: Digits, style: PresentStyle): readonly Shown[] {
  const rows = new RowList(style);
  const length = (x: number): string => formatQuantity(x, METRE, plateDigits(x, digits), { style });
  const id = `waveplate_${plate.retardance_waves}`;
  const name = retardanceName(plate.retardance_waves, style);
  rows.add(id, 'plate', `${name}, zero order`, length(plate.zeroOrderThickness_m));
  for (const { order, thickness_m } of plate.orders) {
    rows.add(`${id}_order${order}`, '', `${name}, order ${order}`, length(thickness_m));
  }
  return rows.list;
}
