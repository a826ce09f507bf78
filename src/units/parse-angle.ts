/**
 * Angles. Degrees unless a unit says otherwise: `45`, `45deg`, `45°`, `0.78rad`, `30mrad`, `30'`, `12arcsec`, `56°18'36"`.
 * `parseIncidence` takes an angle of incidence: from the surface normal, 0 <= angle < 90 degrees.
 */
import { NOT_BELOW_ZERO, parseValue, type QuantitySpec } from './parse-quantity.ts';
import { isProblem, type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';

const SPEC: QuantitySpec = {
  what: 'an angle',
  kinds: ['angle'],
  examples: "45, 45deg, 0.78rad, 30mrad or 30'",
  unitNames: 'deg, rad, mrad, urad, arcmin and arcsec',
  bare: 'deg',
};

const SEXAGESIMAL =
  /^(\d+)\s*[°º]\s*(\d+(?:\.\d+)?)\s*['\u2032\u2019]\s*(?:(\d+(?:\.\d+)?)\s*(?:["\u2033\u201d]|''|\u2032\u2032))?$/u;

/** Any plane angle, in radians. */
export function parseAngle(text: string): number | Problem {
  const parts = text.includes('°') || text.includes('º') ? SEXAGESIMAL.exec(text.trim()) : undefined;
  if (!parts) return parseValue(text, SPEC);
  const [degrees = 0, minutes = 0, seconds = 0] = parts.slice(1).map((part) => Number(part ?? 0));
  if (minutes < 60 && seconds < 60) return ((degrees + minutes / 60 + seconds / 3600) * Math.PI) / 180;
  const message = `${quoteInput(text)} has 60 or more minutes or seconds of arc`;
  return problem('out-of-range', message, 'carry them over to the next larger part');
}

/** An angle of incidence in radians. */
export function parseIncidence(text: string): number | Problem {
  const angle_rad = parseAngle(text);
  if (isProblem(angle_rad)) return angle_rad;
  if (angle_rad >= 0 && angle_rad < Math.PI / 2) return angle_rad;
  const message = `${quoteInput(text)} is no angle of incidence: it is counted from the surface normal, 0 <= angle < 90 deg`;
  return problem(
    'out-of-range',
    message,
    'write for example 45deg; a grazing angle of 5 deg is written 85deg',
  );
}

/** An angle between two lines, 0 to 90 degrees, in radians: of a crystal's optic axis to the normal, for one. */
export function parseLineAngle(text: string): number | Problem {
  const angle_rad = parseAngle(text);
  if (isProblem(angle_rad)) return angle_rad;
  // 90 degrees by way of pi/180 may come out a rounding too large.
  if (angle_rad >= 0 && angle_rad <= (Math.PI / 2) * (1 + 1e-15)) return Math.min(angle_rad, Math.PI / 2);
  const message = `${quoteInput(text)} is out of range: an angle between two lines goes from 0 to 90 deg`;
  return problem('out-of-range', message, 'write for example 45 or 0.78rad');
}

/** A standard uncertainty of an angle, in radians. */
export function parseAngleTolerance(text: string): number | Problem {
  return parseValue(text, { ...SPEC, what: 'a tolerance of the angle', range: NOT_BELOW_ZERO });
}
