import { describe, expect, it } from 'vitest';
import { parseTemperature, parseTemperatureInterval } from '../../src/units/parse-temperature.ts';
import { outcome } from './outcome.ts';

describe('temperatures, in kelvin', () => {
  it.each<[string, number]>([
    ['25C', 298.15],
    ['25 °C', 298.15],
    ['25℃', 298.15],
    ['25 degC', 298.15],
    ['25c', 298.15],
    ['298.15K', 298.15],
    ['298.15 k', 298.15],
    ['-40C', 233.15],
    ['\u221240C', 233.15],
    ['0C', 273.15],
    ['20.1C', 293.25],
    ['77F', 298.15],
    ['-40F', 233.15],
    ['77.4K', 77.4],
    ['-273.149C', 0.001],
  ])('%j', (text, kelvin) => {
    expect(parseTemperature(text)).toBe(kelvin);
  });

  it.each<[string, string]>([
    ['25', 'unit-missing: 25 what? a temperature needs a unit; write 25C, 25K or 25F'],
    ['-40', 'unit-missing: -40 what? a temperature needs a unit; write -40C, -40K or -40F'],
    [
      '0K',
      'out-of-range: "0K" is out of range: a temperature must be above absolute zero (0 K, -273.15 C); write for example 25C, 298.15K or 77F',
    ],
    [
      '-273.15C',
      'out-of-range: "-273.15C" is out of range: a temperature must be above absolute zero (0 K, -273.15 C); write for example 25C, 298.15K or 77F',
    ],
    [
      '25nm',
      'unit-of-another-kind: "25nm" is a length, not a temperature; write for example 25C, 298.15K or 77F',
    ],
    ['25R', 'unit-unknown: "R" is no unit of a temperature; units are C, K and F'],
    [
      'warm',
      'not-a-number: "warm" is not a temperature: it does not begin with a number; write for example 25C, 298.15K or 77F',
    ],
  ])('%j is refused', (text, line) => {
    expect(outcome(parseTemperature(text))).toBe(line);
  });
});

describe('temperature differences, in kelvin', () => {
  it.each<[string, number]>([
    ['0.5C', 0.5],
    ['0.5 °C', 0.5],
    ['0.5K', 0.5],
    ['9F', 5],
    ['0K', 0],
  ])('%j', (text, kelvin) => {
    expect(parseTemperatureInterval(text)).toBe(kelvin);
  });

  it.each(['1', '-1K', 'K', '1,5K', ''])('%j is refused', (text) => {
    expect(outcome(parseTemperatureInterval(text))).toBe(
      `not-a-tolerance: "${text}" is no temperature difference; write for example 0.5C or 0.5K`,
    );
  });
});
