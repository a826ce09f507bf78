/** Wavelength and wavelength range of a fit as text: what is printed in um, at the prefix that reads best. */
import { METRE } from '../../units/display-unit.ts';
import { columnPrefix, formatQuantity, formatRange } from '../../units/format-quantity.ts';
import type { NumberStyle } from '../../units/number-style.ts';

/** "589.3 nm". */
export function lengthAt(wavelength_um: number, style: NumberStyle): string {
  return formatQuantity(metres(wavelength_um), METRE, 'shortest', { style });
}

/** "0.21 µm to 3.71 µm"; one length where both ends are the same. */
export function lengthRange([lo, hi]: readonly [number, number], style: NumberStyle): string {
  return lo === hi
    ? lengthAt(lo, style)
    : formatRange([metres(lo), metres(hi)], METRE, 'shortest', { style });
}

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
