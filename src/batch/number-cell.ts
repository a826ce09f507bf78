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

/** A column of bare numbers in a known unit. */
export interface NumberUnit {
  /** The unit is the SI unit of its kind times this power of ten. */
  readonly power: number;
  /** From the number in that SI unit to what is meant; NaN for what the parser would refuse. */
  readonly value: (number_SI: number) => number;
}

/** The value of the digits that `scanDecimal` found; NaN where they are to be read as a text. */
export const numberValue = ({ power, value }: NumberUnit, mantissa: number, exponent: number): number =>
  value(decimalValue(mantissa, exponent + power));

/** To a vacuum (or air) wavelength in metres; undefined for a unit that is no plain power of ten. */
export function waveUnit(unit: string): NumberUnit | undefined {
  const lookup = findUnit(unit, WAVE_KINDS);
  const power = lookup.found === 'one' ? powerOf(lookup.unit) : undefined;
  return lookup.found === 'one' && power !== undefined
    ? { power, value: WAVELENGTH_OF[lookup.unit.kind] }
    : undefined;
}

const covered = (length_m: number): number =>
  length_m >= SHORTEST_WAVE_m && length_m <= LONGEST_WAVE_m ? length_m : Number.NaN;

const WAVELENGTH_OF = {
  length: covered,
  frequency: (value: number): number => (value > 0 ? covered(wavelengthFromFrequency(value)) : Number.NaN),
  'photon-energy': (value: number): number =>
    value > 0 ? covered(wavelengthFromPhotonEnergy(value)) : Number.NaN,
  wavenumber: (value: number): number => (value > 0 ? covered(wavelengthFromWavenumber(value)) : Number.NaN),
} as const;

/** To an angle of incidence in radians; a column without a unit is in degrees. */
export function angleUnit(unit: string): NumberUnit | undefined {
  const lookup = findUnit(unit === '' ? 'deg' : unit, ['angle']);
  if (lookup.found !== 'one') return undefined;
  if (lookup.unit.name === 'degree') {
    return { power: 0, value: (degrees) => incidence((degrees * Math.PI) / 180) };
  }
  const power = powerOf(lookup.unit);
  return power === undefined ? undefined : { power, value: incidence };
}

const incidence = (angle_rad: number): number =>
  angle_rad >= 0 && angle_rad < Math.PI / 2 ? angle_rad : Number.NaN;

const SEVEN: Decimal = { negative: false, digits: '7', exponent: 0 };

/** The power of ten that a unit is of its SI unit; undefined for any other factor. */
function powerOf(unit: Unit): number | undefined {
  const power = Math.round(Math.log10(unit.toSI(SEVEN) / 7));
  return unit.toSI(SEVEN) === Number(`7e${power}`) ? power : undefined;
}
