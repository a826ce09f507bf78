import { describe, expect, it } from 'vitest';
import { parseAngle, parseAngleTolerance, parseIncidence } from '../../src/units/parse-angle.ts';
import { outcome } from './outcome.ts';

const DEGREE = Math.PI / 180;

describe('angles, in radians', () => {
  it.each<[string, number]>([
    ['45', Math.PI / 4],
    ['45deg', Math.PI / 4],
    ['45 deg', Math.PI / 4],
    ['45°', Math.PI / 4],
    ['45 º', Math.PI / 4],
    ['45 degrees', Math.PI / 4],
    ['60', Math.PI / 3],
    ['0', 0],
    ['0.78rad', 0.78],
    ['30mrad', 0.03],
    ['50 µrad', 50e-6],
    ["30'", 0.5 * DEGREE],
    ['30′', 0.5 * DEGREE],
    ['30arcmin', 0.5 * DEGREE],
    ['36"', 0.01 * DEGREE],
    ['36″', 0.01 * DEGREE],
    ['56°18\'36"', 56.31 * DEGREE],
    ['56° 18′ 36″', 56.31 * DEGREE],
    ["56°18'", 56.3 * DEGREE],
    ['89.999', 89.999 * DEGREE],
  ])('%j', (text, angle_rad) => {
    expect(parseIncidence(text)).toBeCloseTo(angle_rad, 15);
  });

  it('may be negative where it is not an angle of incidence', () => {
    expect(parseAngle('-10')).toBeCloseTo(-10 * DEGREE, 15);
  });

  it('has less than 60 minutes and 60 seconds beside degrees', () => {
    expect(outcome(parseAngle("5°60'"))).toBe(
      'out-of-range: "5°60\'" has 60 or more minutes or seconds of arc; carry them over to the next larger part',
    );
  });
});

describe('angles of incidence are counted from the normal, below 90 degrees', () => {
  it.each(['90', '90deg', '91', '-1', '1.5707963267948966rad', '2rad', '100000', '5400arcmin'])(
    '%j is refused',
    (text) => {
      expect(outcome(parseIncidence(text))).toBe(
        `out-of-range: "${text}" is no angle of incidence: it is counted from the surface normal, 0 <= angle < 90 deg; write for example 45deg; a grazing angle of 5 deg is written 85deg`,
      );
    },
  );

  it('a unit of another kind is named', () => {
    expect(outcome(parseIncidence('45nm'))).toBe(
      'unit-of-another-kind: "45nm" is a length, not an angle; write for example 45, 45deg, 0.78rad, 30mrad or 30\'',
    );
  });
});

describe('tolerances of an angle', () => {
  it('are in degrees unless said otherwise, and not negative', () => {
    expect(parseAngleTolerance('0.5')).toBeCloseTo(0.5 * DEGREE, 15);
    expect(parseAngleTolerance('1mrad')).toBe(1e-3);
    expect(outcome(parseAngleTolerance('-1'))).toMatch(/^out-of-range: "-1" .* must be 0 or above/);
  });
});
