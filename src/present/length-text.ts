/** Wavelength and wavelength range of a fit as text: what is printed in um, at the prefix that reads best. */
import { SPEED_OF_LIGHT_m_per_s } from '../units/constants.ts';
import { HERTZ, METRE } from '../units/display-unit.ts';
import { columnPrefix, formatQuantity, formatRange } from '../units/format-quantity.ts';
import type { NumberStyle } from '../units/number-style.ts';

/** "589.3 nm". */
export function lengthAt(wavelength_um: number, style: NumberStyle): string {
  return formatQuantity(metres(wavelength_um), METRE, 'shortest', { style });
}

/** "0.21 µm to 3.71 µm"; one length where both ends are the same; the frequencies too where a person thinks in them. */
export function lengthRange([lo, hi]: readonly [number, number], style: NumberStyle): string {
  if (lo === hi) return lengthAt(lo, style);
  const range = formatRange([shortened(lo * 1e-6), shortened(hi * 1e-6)], METRE, 'shortest', { style });
  return hi < RADIO_FROM_um ? range : `${range} (${frequencyRange(lo, hi, style)})`;
}

const RADIO_FROM_um = 1e3;

function frequencyRange(lo_um: number, hi_um: number, style: NumberStyle): string {
  const frequency = (um: number): number => shortened((SPEED_OF_LIGHT_m_per_s / um) * 1e6);
  return formatRange([frequency(hi_um), frequency(lo_um)], HERTZ, 'shortest', { style });
}

/** To six digits, which no limit of a fit exceeds. */
const shortened = (x: number): number => Number(x.toPrecision(6));

/** Wavelengths of one column, all with one prefix. */
export function lengthColumn(wavelengths_um: readonly number[], style: NumberStyle): readonly string[] {
  const values = wavelengths_um.map(metres);
  const prefix = columnPrefix(values, METRE);
  return values.map((value) => formatQuantity(value, METRE, 'shortest', { style, prefix }));
}

/** More digits than any wavelength is measured to by hand. */
const SHOWN = 8;

/** Without the last bits of the conversion. */
const metres = (um: number): number => Number((um * 1e-6).toPrecision(SHOWN));
