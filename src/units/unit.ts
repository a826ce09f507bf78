/**
 * A unit a person may type: its spelling, what kind of quantity it belongs to and how a number in it becomes SI.
 * Units that are a power of ten of the SI unit convert through the decimal text, so that `0.5876um` is exactly 5.876e-7 m.
 */
import { type Decimal, decimalToNumber } from './decimal.ts';

export type UnitKind =
  | 'length'
  | 'frequency'
  | 'photon-energy'
  | 'wavenumber'
  | 'angle'
  | 'temperature'
  | 'power'
  | 'energy'
  | 'time'
  | 'irradiance'
  | 'field'
  | 'pressure'
  | 'conductivity'
  | 'nonlinear-index'
  | 'fraction'
  | 'mole-fraction'
  | 'salinity';

export interface Unit {
  /** As typed, after `canonicalUnit`: ASCII `u` for micro, `/` for one division, no `^`. */
  readonly symbol: string;
  /** In words, for messages that must tell two readings apart: "millihertz". */
  readonly name: string;
  readonly kind: UnitKind;
  /** Value in the SI unit of the kind; photon energy in eV, amount fraction in 1e-6, salinity in g/kg. */
  readonly toSI: (number: Decimal) => number;
  /** Almost never meant and one letter's case away from this one: such a unit is refused, both readings named. */
  readonly mistakenFor?: string;
}

export type UnitOf<Kind extends UnitKind> = Unit & { readonly kind: Kind };

export const byPower =
  (powerOfTen: number) =>
  (number: Decimal): number =>
    decimalToNumber(number, powerOfTen);

export const byFactor =
  (factor: number) =>
  (number: Decimal): number =>
    decimalToNumber(number) * factor;

/** What each kind is called in messages, with its article. */
export const KIND_NAMES: Readonly<Record<UnitKind, string>> = {
  length: 'a length',
  frequency: 'a frequency',
  'photon-energy': 'a photon energy',
  wavenumber: 'a wavenumber',
  angle: 'an angle',
  temperature: 'a temperature',
  power: 'a power',
  energy: 'an energy',
  time: 'a time',
  irradiance: 'an irradiance',
  field: 'a field strength',
  pressure: 'a pressure',
  conductivity: 'a conductivity',
  'nonlinear-index': 'a nonlinear index',
  fraction: 'a fraction',
  'mole-fraction': 'an amount fraction',
  salinity: 'a salinity',
};
