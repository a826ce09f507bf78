/** Numbers as the findings say them: few digits, with their units, in the signs of the screen. */
import { DEGREE, HERTZ, METRE, PER_CENT, WATT, WATT_PER_SQUARE_METRE } from '../../units/display-unit.ts';
import { formatNumber } from '../../units/format-number.ts';
import { formatQuantity, formatRange } from '../../units/format-quantity.ts';

/** Less than this is below what dust and scatter make of any surface. */
const NEGLIGIBLE = 1e-6;

export const percent = (fraction: number, digits = 3): string =>
  fraction < NEGLIGIBLE ? 'less than 0.0001 %' : formatQuantity(fraction, PER_CENT, { significant: digits });

export const watts = (power_W: number): string => formatQuantity(power_W, WATT, { significant: 3 });

/** A share of a beam: "5.10 W (17.0 %)" where its power is known. */
export const share = (fraction: number, power_W: number | null): string =>
  power_W === null || fraction < NEGLIGIBLE
    ? percent(fraction)
    : `${watts(fraction * power_W)} (${percent(fraction)})`;

/** Damage thresholds are quoted per square centimetre. */
export const irradiance = (value_W_per_m2: number): string =>
  `${formatQuantity(value_W_per_m2, WATT_PER_SQUARE_METRE, { significant: 3 })} (${formatNumber(value_W_per_m2 * 1e-4, { significant: 3 })} W/cm²)`;

export const length = (length_m: number, digits = 4): string =>
  formatQuantity(Number(length_m.toPrecision(digits)), METRE, 'shortest');

export const lengthRange = ([from_m, to_m]: readonly [number, number]): string =>
  formatRange([Number(from_m.toPrecision(6)), Number(to_m.toPrecision(6))], METRE, 'shortest');

export const hertz = (value_Hz: number): string => formatQuantity(value_Hz, HERTZ, { significant: 3 });

export const degrees = (angle_rad: number, decimals = 2): string =>
  formatQuantity((angle_rad * 180) / Math.PI, DEGREE, { decimals });

/** Whole numbers of three digits and more stay whole: 1464, not 1.46e3. */
export const number = (value: number, digits = 3): string =>
  Math.abs(value) >= 100 && Math.abs(value) < 1e5
    ? formatNumber(value, { decimals: 0 })
    : formatNumber(value, { significant: digits });

export const signed = (value: number, digits = 3): string =>
  `${value > 0 ? '+' : ''}${number(value, digits)}`;

/** "2.4 × 10⁻⁶ /K" written as a multiple of 1e-6. */
export const perKelvin = (value_per_K: number): string => `${signed(value_per_K * 1e6)} × 10⁻⁶ /K`;
