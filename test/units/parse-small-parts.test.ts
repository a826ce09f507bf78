/** Counts, retardances, salinity, CO2 and angles between lines: what each takes, up to its limits, and the line it refuses with. */
import { describe, expect, it } from 'vitest';
import { parseAngle, parseAngleTolerance, parseLineAngle } from '../../src/units/parse-angle.ts';
import { parseCo2 } from '../../src/units/parse-co2.ts';
import { countParser } from '../../src/units/parse-count.ts';
import { parseRetardance } from '../../src/units/parse-retardance.ts';
import { parseSalinity } from '../../src/units/parse-salinity.ts';
import { outcome } from './outcome.ts';

describe('a count', () => {
  const parse = countParser('a number of pairs', 100);
  it.each<[string, number]>([
    ['1', 1],
    ['8', 8],
    ['1e2', 100],
  ])('%j', (text, count) => {
    expect(parse(text)).toBe(count);
  });

  it.each(['0', '101', '2.5', '-3'])('%j is out of range', (text) => {
    expect(outcome(parse(text))).toBe(
      `out-of-range: "${text}" is not a number of pairs; write a whole number from 1 to 100`,
    );
  });

  it('of words is no number', () => {
    expect(outcome(parse('many'))).toBe(
      'not-a-number: "many" is not a number of pairs; write a whole number from 1 to 100',
    );
  });
});

describe('a retardance, in waves', () => {
  it.each<[string, number]>([
    ['quarter', 0.25],
    [' Half ', 0.5],
    ['FULL', 1],
    ['0.25', 0.25],
    ['1000', 1000],
  ])('%j', (text, waves) => {
    expect(parseRetardance(text)).toBe(waves);
  });

  const examples = 'write quarter, half, full or a number of waves such as 0.25';
  it.each(['0', '-1', '1000.1'])('%j is out of range', (text) => {
    expect(outcome(parseRetardance(text))).toBe(
      `out-of-range: "${text}" is out of range: a retardance is above 0; ${examples}`,
    );
  });

  it.each(['third', 'constructor'])('%j is none', (text) => {
    expect(outcome(parseRetardance(text))).toBe(`not-a-number: "${text}" is no retardance; ${examples}`);
  });
});

describe('contents of air and sea water', () => {
  it.each(['0', '35', '360', '35g/kg'])('salinity %j', (text) => {
    expect(parseSalinity(text)).toBe(Number.parseFloat(text));
  });

  it.each(['-1', '360.1'])('salinity %j is out of range', (text) => {
    expect(outcome(parseSalinity(text))).toContain('from 0 to 360 g/kg');
  });

  it.each(['0', '450', '1e6'])('CO2 %j', (text) => {
    expect(parseCo2(text)).toBe(Number(text));
  });

  it.each(['-1', '1000001'])('CO2 %j is out of range', (text) => {
    expect(outcome(parseCo2(text))).toContain('from 0 to 1000000 umol/mol');
  });
});

describe('an angle between two lines', () => {
  it('goes from 0 to 90 degrees, ends included, and never beyond a right angle', () => {
    expect(parseLineAngle('0')).toBe(0);
    expect(parseLineAngle('90')).toBe(Math.PI / 2);
    expect(parseLineAngle('1.5707963267948968rad')).toBe(Math.PI / 2);
    expect(parseLineAngle('30')).toBeCloseTo(Math.PI / 6, 15);
  });

  it.each(['-0.1', '90.0001', '180'])('%j is out of range', (text) => {
    expect(outcome(parseLineAngle(text))).toBe(
      `out-of-range: "${text}" is out of range: an angle between two lines goes from 0 to 90 deg; write for example 45 or 0.78rad`,
    );
  });

  it('refuses what is no angle', () => {
    expect(outcome(parseLineAngle('45nm'))).toContain('is a length, not an angle');
  });
});

describe('degrees, minutes and seconds', () => {
  it('may stand among blanks and with either ring', () => {
    expect(parseAngle(' 56°18\'36" ')).toBeCloseTo((56.31 * Math.PI) / 180, 14);
    expect(parseAngle("56º18'36''")).toBeCloseTo((56.31 * Math.PI) / 180, 14);
  });

  it('carry at sixty seconds', () => {
    expect(outcome(parseAngle('5°10\'60"'))).toContain('60 or more minutes or seconds');
  });

  it('names the tolerance of an angle', () => {
    expect(outcome(parseAngleTolerance('1nm'))).toContain('not a tolerance of the angle');
    expect(outcome(parseAngleTolerance('-1'))).toContain('out-of-range');
  });
});
