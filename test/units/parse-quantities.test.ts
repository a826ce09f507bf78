import { describe, expect, it } from 'vitest';
import { choiceParser } from '../../src/units/parse-choice.ts';
import { parseCo2 } from '../../src/units/parse-co2.ts';
import { parseConductivity } from '../../src/units/parse-conductivity.ts';
import { parseEnergy } from '../../src/units/parse-energy.ts';
import { parseField } from '../../src/units/parse-field.ts';
import { parseFraction } from '../../src/units/parse-fraction.ts';
import { parseIrradiance } from '../../src/units/parse-irradiance.ts';
import { parseLength } from '../../src/units/parse-length.ts';
import { parsePower } from '../../src/units/parse-power.ts';
import { parsePressure } from '../../src/units/parse-pressure.ts';
import { parseRate } from '../../src/units/parse-rate.ts';
import { parseSalinity } from '../../src/units/parse-salinity.ts';
import { parseTime } from '../../src/units/parse-time.ts';
import { outcome } from './outcome.ts';

type Row = [text: string, result: number | string];

/** Numbers must agree to a few units in the last place; refusals word for word. */
function table(name: string, parse: (text: string) => unknown, rows: readonly Row[]): void {
  describe(name, () => {
    it.each(rows)('%j', (text, expected) => {
      const result = outcome(parse(text));
      if (typeof expected === 'string' || expected === 0) expect(result).toBe(expected);
      else expect(Math.abs((result as number) / expected - 1)).toBeLessThan(4e-16);
    });
  });
}

const powerExamples = 'write for example 5mW, 1kW or 10dBm';
table('parsePower, in W', parsePower, [
  ['5mW', 5e-3],
  ['5 mW', 5e-3],
  ['5MW', 5e6],
  ['250\u00b5W', 250e-6],
  ['250 \u03bcW', 250e-6],
  ['250uW', 250e-6],
  ['1kW', 1e3],
  ['1kw', 1e3],
  ['10TW', 1e13],
  ['3fW', 3e-15],
  ['0dBm', 1e-3],
  ['10dBm', 1e-2],
  ['-30 dBm', 1e-6],
  [
    '5mw',
    'unit-ambiguous: "5mw" may be read as 5 mW (milliwatt) or 5 MW (megawatt); write 5mW or 5MW in exact case',
  ],
  [
    '5pw',
    'unit-ambiguous: "5pw" may be read as 5 pW (picowatt) or 5 PW (petawatt); write 5pW or 5PW in exact case',
  ],
  ['5', `unit-missing: 5 what? a power needs a unit; ${powerExamples}`],
  ['0W', `out-of-range: "0W" is out of range: a power must be above 0; ${powerExamples}`],
  ['-1W', `out-of-range: "-1W" is out of range: a power must be above 0; ${powerExamples}`],
  ['5mJ', `unit-of-another-kind: "5mJ" is an energy, not a power; ${powerExamples}`],
  ['9999dBm', `out-of-range: "9999dBm" is out of range: a power must be above 0; ${powerExamples}`],
]);

table('parseIrradiance, in W/m^2', parseIrradiance, [
  ['1kW/m2', 1e3],
  ['1 kW/m^2', 1e3],
  ['1 kW / m²', 1e3],
  ['1 kW m⁻²', 1e3],
  ['1 kW·m⁻²', 1e3],
  ['1kW m^-2', 1e3],
  ['5W/cm2', 5e4],
  ['2mW/mm2', 2e3],
  ['1GW/cm2', 1e13],
  ['1mW/um2', 1e9],
  [
    '5mw/cm2',
    'unit-ambiguous: "5mw/cm2" may be read as 5 mW/cm2 (milliwatt per square centimetre) or 5 MW/cm2 (megawatt per square centimetre); write 5mW/cm2 or 5MW/cm2 in exact case',
  ],
  [
    '1W',
    'unit-of-another-kind: "1W" is a power, not an irradiance; write for example 1kW/m2, 5W/cm2 or 2mW/mm2',
  ],
]);

table('parseField, in V/m', parseField, [
  ['100V/m', 100],
  ['100 V m-1', 100],
  ['2kV/m', 2e3],
  ['3 V/cm', 300],
  ['1MV/m', 1e6],
  ['5V/nm', 5e9],
  [
    '1V',
    'unit-unknown: "V" is no unit of a field strength; units are V/m, V/cm, V/mm, V/um and V/nm with an SI prefix',
  ],
]);

table('parseLength, in m', parseLength, [
  ['1mm', 1e-3],
  ['6.35 mm', 6.35e-3],
  ['250um', 250e-6],
  ['2cm', 2e-2],
  ['1', 'unit-missing: 1 what? a length needs a unit; write for example 1mm, 250um or 2cm'],
  ['1MHz', 'unit-of-another-kind: "1MHz" is a frequency, not a length; write for example 1mm, 250um or 2cm'],
]);

table('parseTime, in s', parseTime, [
  ['100fs', 1e-13],
  ['2 ps', 2e-12],
  ['10ns', 1e-8],
  ['5\u00b5s', 5e-6],
  ['1ms', 1e-3],
  ['1s', 1],
  ['300as', 3e-16],
  ['1h', 'unit-unknown: "h" is no unit of a duration; units are as, fs, ps, ns, us, ms and s'],
]);

table('parseEnergy, in J', parseEnergy, [
  ['1mJ', 1e-3],
  ['200uJ', 2e-4],
  ['3nJ', 3e-9],
  ['2MJ', 2e6],
  [
    '2mj',
    'unit-ambiguous: "2mj" may be read as 2 mJ (millijoule) or 2 MJ (megajoule); write 2mJ or 2MJ in exact case',
  ],
]);

// NIST SP 811 (2008), appendix B.8: conventional mmHg 133.3224 Pa, torr 133.3224 Pa, atm 101325 Pa, psi 6894.757 Pa.
table('parsePressure, in Pa', parsePressure, [
  ['101325Pa', 101325],
  ['1013.25hPa', 101325],
  ['101.325kPa', 101325],
  ['1atm', 101325],
  ['1bar', 1e5],
  ['1mbar', 100],
  ['760torr', 101325],
  ['1mmHg', 133.322387415],
  ['1psi', 6894.757293168],
  ['0Pa', 0],
  [
    '-1Pa',
    'out-of-range: "-1Pa" is out of range: a pressure must be 0 or above; write for example 101.325kPa, 1013hPa, 1atm or 760Torr',
  ],
]);

table('parseFraction', parseFraction, [
  ['50%', 0.5],
  ['50 %', 0.5],
  ['0.5', 0.5],
  ['0', 0],
  ['100%', 1],
  [
    '50',
    'out-of-range: "50" is out of range: a fraction must be from 0 to 1 (0% to 100%); write for example 50% or 0.5',
  ],
  [
    'half',
    'not-a-number: "half" is not a fraction: it does not begin with a number; write for example 50% or 0.5',
  ],
]);

table('parseRate, in Hz', parseRate, [
  ['80MHz', 8e7],
  ['1 kHz', 1e3],
  [
    '80mhz',
    'unit-ambiguous: "80mhz" may be read as 80 MHz (megahertz) or 80 mHz (millihertz); write 80MHz, or another unit',
  ],
]);

table('parseConductivity, in S/m', parseConductivity, [
  ['4S/m', 4],
  ['4', 4],
  ['50mS/cm', 5],
  ['50 \u00b5S/cm', 5e-3],
  ['5.8e7', 5.8e7],
  ['0', 0],
]);

table('parseCo2, in umol/mol', parseCo2, [
  ['450', 450],
  ['450 µmol/mol', 450],
  ['450ppm', 450],
  [
    '-1',
    'out-of-range: "-1" is out of range: a CO2 content must be from 0 to 1000000 umol/mol; write for example 450 or 450umol/mol',
  ],
]);

table('parseSalinity, in g/kg', parseSalinity, [
  ['35', 35],
  ['35 g/kg', 35],
  ['35‰', 35],
]);

table('choiceParser', choiceParser('a polarization', ['s', 'p', 'unpolarized']), [
  ['s', 's'],
  ['P', 'p'],
  [' Unpolarized ', 'unpolarized'],
  ['te', 'not-a-choice: "te" is not a polarization; write s, p or unpolarized'],
  ['', 'not-a-choice: "" is not a polarization; write s, p or unpolarized'],
]);
