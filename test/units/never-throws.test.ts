import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseAngle, parseAngleTolerance, parseIncidence } from '../../src/units/parse-angle.ts';
import { choiceParser } from '../../src/units/parse-choice.ts';
import { parseCo2 } from '../../src/units/parse-co2.ts';
import { parseComplex } from '../../src/units/parse-complex.ts';
import { parseConductivity } from '../../src/units/parse-conductivity.ts';
import { parseEnergy } from '../../src/units/parse-energy.ts';
import { parseField } from '../../src/units/parse-field.ts';
import { parseFraction } from '../../src/units/parse-fraction.ts';
import { parseIrradiance } from '../../src/units/parse-irradiance.ts';
import { parseLength } from '../../src/units/parse-length.ts';
import { parseLiteralMedium } from '../../src/units/parse-literal-medium.ts';
import { parseNumber } from '../../src/units/parse-number.ts';
import { parsePower } from '../../src/units/parse-power.ts';
import { parsePressure } from '../../src/units/parse-pressure.ts';
import { parseRate } from '../../src/units/parse-rate.ts';
import { parseSalinity } from '../../src/units/parse-salinity.ts';
import { parseTemperature, parseTemperatureInterval } from '../../src/units/parse-temperature.ts';
import { parseThickness } from '../../src/units/parse-thickness.ts';
import { parseTime } from '../../src/units/parse-time.ts';
import { parseTolerances } from '../../src/units/parse-tolerance.ts';
import { parseWave } from '../../src/units/parse-wave.ts';
import { isProblem, problemText } from '../../src/units/problem.ts';
import { allUnits } from '../../src/units/unit-table.ts';

const UNITS = allUnits();

const PARSERS: readonly ((text: string) => unknown)[] = [
  parseAngle,
  parseAngleTolerance,
  parseIncidence,
  choiceParser('a profile', ['gaussian', 'flat']),
  parseCo2,
  parseComplex,
  parseConductivity,
  parseEnergy,
  parseField,
  parseFraction,
  parseIrradiance,
  parseLength,
  parseLiteralMedium,
  parseNumber,
  parsePower,
  parsePressure,
  parseRate,
  parseSalinity,
  parseTemperature,
  parseTemperatureInterval,
  parseThickness,
  parseTime,
  parseTolerances,
  (text) => parseWave(text),
  (text) => parseWave(text, { airWavelength: true }),
];

const number = fc.oneof(
  fc.double().map(String),
  fc.string({ unit: fc.constantFrom(...'0123456789.,eE+-−'), maxLength: 8 }),
  fc.constantFrom('', '0e-9999999999', '1e9999999999', '-0', '1e308', '-1e308', '5e-324'),
);
const unit = fc.oneof(fc.constantFrom(...UNITS.map((u) => u.symbol)), fc.string({ maxLength: 4 }));
const quantity = fc.tuple(number, fc.constantFrom('', ' '), unit).map((parts) => parts.join(''));
const assignments = fc
  .array(fc.tuple(fc.constantFrom('n', 'k', 'eps', 'mu', 'tand', 'sigma', 'wave', 'angle', ''), quantity), {
    maxLength: 4,
  })
  .map((pairs) => pairs.map((pair) => pair.join('=')).join(','));
const anyText = fc.oneof(
  fc.string({ unit: 'binary', maxLength: 60 }),
  fc.string({ maxLength: 60 }),
  quantity,
  assignments,
);

/** Every number anywhere in a result. */
function numbersIn(result: unknown): number[] {
  if (typeof result === 'number') return [result];
  return typeof result === 'object' && result !== null ? Object.values(result).flatMap(numbersIn) : [];
}

describe('every parser, for any text', () => {
  it('gives finite numbers or one printable line, and never throws', () => {
    fc.assert(
      fc.property(anyText, (text) => {
        for (const parse of PARSERS) {
          const result = parse(text);
          if (isProblem(result)) {
            expect(problemText(result)).toMatch(
              /^[^\p{Cc}\p{Cs}\p{Zl}\p{Zp}]+; [^\p{Cc}\p{Cs}\p{Zl}\p{Zp}]+$/u,
            );
            expect(problemText(result).length).toBeLessThan(400);
          } else {
            for (const x of numbersIn(result)) expect(Number.isFinite(x) && !Object.is(x, -0)).toBe(true);
          }
        }
      }),
      { numRuns: 3000 },
    );
  });
});
