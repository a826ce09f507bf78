/**
 * Units as they are shown. A unit with prefixes takes the SI prefix that suits the value (589.3 nm, 2.55 kW/m²); one
 * without is shown as it is. `power` sets the shown unit against the SI unit: 1 fs²/mm is 10^-27 s²/m, so its power is -27.
 */
import { SI_PREFIXES, type SiPrefix } from './si-prefix.ts';

export interface DisplayUnit {
  /** With the signs of the screen: `W/m²`, `°`, `%`. Empty for a plain number. */
  readonly symbol: string;
  readonly power: number;
  /** Prefixes allowed, by the letter typed (`u` for micro, a space for none); undefined for none at all. */
  readonly prefixes?: string;
}

const ALL = 'fpnum kMGTP';

export const METRE: DisplayUnit = { symbol: 'm', power: 0, prefixes: 'fpnum k' };
export const SECOND: DisplayUnit = { symbol: 's', power: 0, prefixes: 'fpnum ' };
export const HERTZ: DisplayUnit = { symbol: 'Hz', power: 0, prefixes: ' kMGTP' };
export const ELECTRONVOLT: DisplayUnit = { symbol: 'eV', power: 0, prefixes: 'num k' };
export const WATT: DisplayUnit = { symbol: 'W', power: 0, prefixes: ALL };
export const JOULE: DisplayUnit = { symbol: 'J', power: 0, prefixes: ALL };
export const PASCAL: DisplayUnit = { symbol: 'Pa', power: 0, prefixes: 'fpnum kMG' };
export const TESLA: DisplayUnit = { symbol: 'T', power: 0, prefixes: 'fpnum k' };
export const OHM: DisplayUnit = { symbol: 'Ω', power: 0, prefixes: 'um kM' };
export const VOLT_PER_METRE: DisplayUnit = { symbol: 'V/m', power: 0, prefixes: ALL };
export const WATT_PER_SQUARE_METRE: DisplayUnit = { symbol: 'W/m²', power: 0, prefixes: ALL };
export const JOULE_PER_CUBIC_METRE: DisplayUnit = { symbol: 'J/m³', power: 0, prefixes: ALL };
export const METRE_PER_SECOND: DisplayUnit = { symbol: 'm/s', power: 0 };
export const RADIAN_PER_SECOND: DisplayUnit = { symbol: 'rad/s', power: 0 };
/** Of a number of degrees. */
export const DEGREE: DisplayUnit = { symbol: '°', power: 0 };
/** Of a number of degrees Celsius. */
export const CELSIUS: DisplayUnit = { symbol: '°C', power: 0 };
/** Of a fraction. */
export const PER_CENT: DisplayUnit = { symbol: '%', power: -2 };
export const DECIBEL: DisplayUnit = { symbol: 'dB', power: 0 };
/** Of a number per metre. */
export const PER_CENTIMETRE: DisplayUnit = { symbol: 'cm⁻¹', power: 2 };
/** Of s^2/m. */
export const FS2_PER_MM: DisplayUnit = { symbol: 'fs²/mm', power: -27 };
export const NUMBER: DisplayUnit = { symbol: '', power: 0 };

/** The prefixes a unit may take, smallest first. */
export function prefixesOf(unit: DisplayUnit): readonly SiPrefix[] {
  const letters = unit.prefixes ?? ' ';
  return SI_PREFIXES.filter((p) => letters.includes(p.typed || ' '));
}

/** Prefix and symbol: `µm`. */
export function prefixedSymbol(unit: DisplayUnit, prefix: SiPrefix): string {
  return prefix.shown + unit.symbol;
}
