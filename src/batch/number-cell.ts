/**
 * Bare numbers in a column whose unit is known, turned into SI without a text in between: the digits as `decimal-bytes.ts`
 * reads them and the power of ten of the unit. The results are those of the parsers of src/units to the last bit; a number
 * they would refuse gives NaN, and the words are left to them.
 */
import type { Decimal } from '../units/decimal.ts';
import { findUnit } from '../units/find-unit.ts';
import { LONGEST_WAVE_m, SHORTEST_WAVE_m, WAVE_KINDS } from '../units/parse-wave.ts';
import type { Unit } from '../units/unit.ts';
import {
  wavelengthFromFrequency,
  wavelengthFromPhotonEnergy,
  wavelengthFromWavenumber,
} from '../units/wave.ts';
import { decimalValue } from './decimal-bytes.ts';

/** SI value of mantissa x 10^exponent in the unit of the column; NaN where it is to be read as a text. */
export type NumberCell = (mantissa: number, exponent: number) => number;

/** Vacuum (or air) wavelength in metres; undefined for a unit that is no plain power of ten. */
export function waveCell(unit: string): NumberCell | undefined {
  const lookup = findUnit(unit, WAVE_KINDS);
  const power = lookup.found === 'one' ? powerOf(lookup.unit) : undefined;
  if (lookup.found !== 'one' || power === undefined) return undefined;
  const wavelength_m = WAVELENGTH_OF[lookup.unit.kind];
  return (mantissa, exponent) => {
    const value = decimalValue(mantissa, exponent + power);
    const length_m = value > 0 ? wavelength_m(value) : Number.NaN;
    return length_m >= SHORTEST_WAVE_m && length_m <= LONGEST_WAVE_m ? length_m : Number.NaN;
  };
}

const WAVELENGTH_OF = {
  length: (value: number): number => value,
  frequency: wavelengthFromFrequency,
  'photon-energy': wavelengthFromPhotonEnergy,
  wavenumber: wavelengthFromWavenumber,
} as const;

/** Angle of incidence in radians; a column without a unit is in degrees. */
export function angleCell(unit: string): NumberCell | undefined {
  const lookup = findUnit(unit === '' ? 'deg' : unit, ['angle']);
  if (lookup.found !== 'one') return undefined;
  const power = powerOf(lookup.unit);
  const degrees = lookup.unit.name === 'degree';
  if (power === undefined && !degrees) return undefined;
  return (mantissa, exponent) => {
    const value = decimalValue(mantissa, exponent + (power ?? 0));
    const angle_rad = degrees ? (value * Math.PI) / 180 : value;
    return angle_rad >= 0 && angle_rad < Math.PI / 2 ? angle_rad : Number.NaN;
  };
}

const SEVEN: Decimal = { negative: false, digits: '7', exponent: 0 };

/** The power of ten that a unit is of its SI unit; undefined for any other factor. */
function powerOf(unit: Unit): number | undefined {
  const power = Math.round(Math.log10(unit.toSI(SEVEN) / 7));
  return unit.toSI(SEVEN) === Number(`7e${power}`) ? power : undefined;
}
