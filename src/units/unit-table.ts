/**
 * Every unit that is understood, by kind. Families are expanded from a base unit and the prefixes in use with it, those of a
 * kind when it is first asked for: there are some three hundred, and a question names two or three.
 */
import { addDecimals, type Decimal, decimalOf, decimalToNumber } from './decimal.ts';
import { SI_PREFIXES } from './si-prefix.ts';
import { byFactor, byPower, type Unit, type UnitKind } from './unit.ts';

/** `letters` lists the prefixes, a space standing for none: "nu mk". */
function family(kind: UnitKind, base: string, name: string, letters: string, basePower = 0): Unit[] {
  return SI_PREFIXES.filter((p) => letters.includes(p.typed || ' ')).map((p) => ({
    symbol: p.typed + base,
    name: p.name + name,
    kind,
    toSI: byPower(p.power + basePower),
  }));
}

/** Base unit over an area or a length: W/cm2, V/m. */
function over(
  kind: UnitKind,
  base: string,
  name: string,
  letters: string,
  divisors: readonly Divisor[],
): Unit[] {
  return divisors.flatMap(([symbol, words, power]) =>
    family(kind, `${base}/${symbol}`, `${name} per ${words}`, letters, -power),
  );
}

type Divisor = readonly [symbol: string, name: string, power: number];
const AREAS: readonly Divisor[] = [
  ['m2', 'square metre', 0],
  ['cm2', 'square centimetre', -4],
  ['mm2', 'square millimetre', -6],
  ['um2', 'square micrometre', -12],
];
const LENGTHS: readonly Divisor[] = [
  ['m', 'metre', 0],
  ['cm', 'centimetre', -2],
  ['mm', 'millimetre', -3],
  ['um', 'micrometre', -6],
  ['nm', 'nanometre', -9],
];

const one = (symbol: string, name: string, kind: UnitKind, toSI: Unit['toSI']): Unit => ({
  symbol,
  name,
  kind,
  toSI,
});

/** Reciprocal lengths, each in the three ways it is written. */
const wavenumbers = (): Unit[] =>
  LENGTHS.flatMap(([symbol, name, power]) =>
    [`${symbol}-1`, `1/${symbol}`, `/${symbol}`].map((s) =>
      one(s, `reciprocal ${name}`, 'wavenumber', byPower(-power)),
    ),
  );

const DEGREE = Math.PI / 180;
const degrees: Unit['toSI'] = (number) => (decimalToNumber(number) * Math.PI) / 180;
const angles = (): Unit[] => [
  ...['deg', 'degree', 'degrees', '°'].map((s) => one(s, 'degree', 'angle', degrees)),
  ...family('angle', 'rad', 'radian', ' mu'),
  ...['arcmin', "'"].map((s) => one(s, 'minute of arc', 'angle', byFactor(DEGREE / 60))),
  ...['arcsec', '"', "''"].map((s) => one(s, 'second of arc', 'angle', byFactor(DEGREE / 3600))),
];

/** Added in decimal, so that -40C is 233.15 K and not a neighbouring double. */
const above = (zero: Decimal, number: Decimal): number => decimalToNumber(addDecimals(number, zero));

/** Where the scales lie above absolute zero: 273.15 K and 459.67 degrees Fahrenheit. */
function temperatures(): Unit[] {
  const ice_K = decimalOf(273.15);
  const zero_F = decimalOf(459.67);
  return [
    ...['C', '°C', 'degC'].map((s) =>
      one(s, 'degree Celsius', 'temperature', (number) => above(ice_K, number)),
    ),
    one('K', 'kelvin', 'temperature', byPower(0)),
    ...['F', '°F', 'degF'].map((s) =>
      one(s, 'degree Fahrenheit', 'temperature', (number) => above(zero_F, number) / 1.8),
    ),
  ];
}

/** Conventional millimetre of mercury, torr = 1/760 atm and pound-force per square inch: NIST SP 811 (2008), appendix B. */
const pressures = (): Unit[] => [
  ...family('pressure', 'Pa', 'pascal', 'm kM'),
  one('hPa', 'hectopascal', 'pressure', byPower(2)),
  ...family('pressure', 'bar', 'bar', 'um k', 5),
  one('atm', 'standard atmosphere', 'pressure', byFactor(101_325)),
  one('mmHg', 'millimetre of mercury', 'pressure', byFactor(133.322_387_415)),
  one('Torr', 'torr', 'pressure', byFactor(101_325 / 760)),
  one('mTorr', 'millitorr', 'pressure', byFactor(101.325 / 760)),
  one('psi', 'pound-force per square inch', 'pressure', byFactor(6_894.757_293_168)),
];

const FAMILIES: Readonly<Record<UnitKind, () => Unit[]>> = {
  length: () => [
    ...family('length', 'm', 'metre', 'fpnum k'),
    one('cm', 'centimetre', 'length', byPower(-2)),
    { ...one('Mm', 'megametre', 'length', byPower(6)), mistakenFor: 'mm' },
    ...['Å', 'angstrom'].map((s) => one(s, 'angstrom', 'length', byPower(-10))),
    ...['micron', 'microns'].map((s) => one(s, 'micrometre', 'length', byPower(-6))),
  ],
  frequency: () => [
    ...family('frequency', 'Hz', 'hertz', ' kMGTP'),
    { ...one('mHz', 'millihertz', 'frequency', byPower(-3)), mistakenFor: 'MHz' },
  ],
  'photon-energy': () => [
    ...family('photon-energy', 'eV', 'electronvolt', 'um k'),
    { ...one('MeV', 'megaelectronvolt', 'photon-energy', byPower(6)), mistakenFor: 'meV' },
  ],
  wavenumber: wavenumbers,
  angle: angles,
  temperature: temperatures,
  power: () => [
    ...family('power', 'W', 'watt', 'fpnum kMGTP'),
    one('dBm', 'decibel over one milliwatt', 'power', (number) => 10 ** (decimalToNumber(number) / 10 - 3)),
  ],
  energy: () => family('energy', 'J', 'joule', 'afpnum kM'),
  time: () => family('time', 's', 'second', 'afpnum '),
  irradiance: () => over('irradiance', 'W', 'watt', 'pnum kMGTP', AREAS),
  field: () => over('field', 'V', 'volt', 'num kMG', LENGTHS),
  pressure: pressures,
  conductivity: () => over('conductivity', 'S', 'siemens', 'num kM', LENGTHS.slice(0, 2)),
  'nonlinear-index': () => [
    one('m2/W', 'square metre per watt', 'nonlinear-index', byPower(0)),
    one('cm2/W', 'square centimetre per watt', 'nonlinear-index', byPower(-4)),
  ],
  fraction: () => [one('', 'one', 'fraction', byPower(0)), one('%', 'per cent', 'fraction', byPower(-2))],
  'mole-fraction': () =>
    ['ppm', 'umol/mol'].map((s) => one(s, 'micromole per mole', 'mole-fraction', byPower(0))),
  salinity: () => ['g/kg', '‰'].map((s) => one(s, 'gram per kilogram', 'salinity', byPower(0))),
};

const made = new Map<UnitKind, readonly Unit[]>();

/** The units of one kind. */
export function unitsOf(kind: UnitKind): readonly Unit[] {
  let units = made.get(kind);
  if (!units) {
    units = FAMILIES[kind]();
    made.set(kind, units);
  }
  return units;
}

/** Every unit. */
export const allUnits = (): readonly Unit[] => (Object.keys(FAMILIES) as UnitKind[]).flatMap(unitsOf);
