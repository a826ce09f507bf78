/**
 * A quantity that runs through a range: `angle=0..89:1`, `wave=400nm..700nm:5nm`, `temperature=20C..80C:5C`. The unit may
 * stand at any of the three numbers; those that have one have the same. Points are counted and written in decimal, so that
 * tenths stay tenths; the last point is the last that the range holds.
 */
import { type Decimal, isZero, plainDecimal } from '../units/decimal.ts';
import { scanNumber } from '../units/parse-number.ts';
import { isProblem, type Problem, problem } from '../units/problem.ts';
import { printedInput, quoteInput } from '../units/quote-input.ts';

export interface SweepRange {
  /** What is swept, as typed. */
  readonly name: string;
  /** As typed; empty where none of the numbers has one. */
  readonly unit: string;
  /** First point and step, both times 10^exponent. */
  readonly first: bigint;
  readonly step: bigint;
  readonly exponent: number;
  readonly points: number;
}

export const MOST_POINTS = 1e7;

const EXAMPLES = 'write for example angle=0..89:1, wave=400nm..700nm:5nm or temperature=20C..80C:5C';

export function parseSweep(text: string): SweepRange | Problem {
  const [name = '', range, ...more] = text.split('=').map((part) => part.trim());
  if (range === undefined || more.length > 0 || name === '') {
    return problem('not-a-number', `${quoteInput(text)} is no sweep`, EXAMPLES);
  }
  const ends = range.split('..');
  const [low = '', rest = ''] = ends;
  if (ends.length !== 2 || low === '' || rest === '') {
    return problem('not-a-number', `${quoteInput(range)} has no two ends with two dots between`, EXAMPLES);
  }
  const colon = rest.lastIndexOf(':');
  if (colon < 0) {
    const message = `${quoteInput(text)} has no step`;
    return problem(
      'empty',
      message,
      `write it behind a colon: ${printedInput(name)}=${printedInput(range)}:STEP`,
    );
  }
  const parts = [low, rest.slice(0, colon), rest.slice(colon + 1)];
  const numbers = parts.map((part) => scanNumber(part));
  const bad = numbers.find(isProblem);
  if (bad) return { ...bad, message: `${quoteInput(text)}: ${bad.message}` };
  const [from, to, step] = numbers as { readonly decimal: Decimal; readonly rest: string }[];
  if (!from || !to || !step) return problem('empty', 'no range', EXAMPLES);
  const [lower, upper, by] = parts.map((part) => part.trim());
  return countPoints(name, text, from, to, step, `${name}=${upper}..${lower}:${by}`);
}

interface Typed {
  readonly decimal: Decimal;
  /** The unit, perhaps with blanks around. */
  readonly rest: string;
}

function countPoints(
  name: string,
  text: string,
  from: Typed,
  to: Typed,
  step: Typed,
  turned: string,
): SweepRange | Problem {
  const units = [...new Set([from, to, step].map(({ rest }) => rest.trim()).filter((unit) => unit !== ''))];
  // A step of temperature may be in kelvin.
  const unit =
    units.length === 2 && units.includes('K') && units.some(isCelsius) ? units.find(isCelsius) : units[0];
  if (units.length > 1 && !(isCelsius(unit ?? '') && step.rest.trim() === 'K')) {
    const message = `${quoteInput(text)} has the units ${units.map(printedInput).join(' and ')}`;
    return problem('unit-ambiguous', message, 'give both ends and the step in one unit');
  }
  const exponent = Math.min(from.decimal.exponent, to.decimal.exponent, step.decimal.exponent);
  if (Math.max(from.decimal.exponent, to.decimal.exponent) - exponent > 300)
    return tooMany(text, Infinity, name);
  const first = scaled(from.decimal, exponent);
  const last = scaled(to.decimal, exponent);
  const width = scaled(step.decimal, exponent);
  if (width <= 0n) {
    const zero = isZero(step.decimal) ? 'is 0' : 'is below 0';
    const order = zero === 'is 0' ? '' : ', the lower end first';
    return problem('out-of-range', `the step of ${quoteInput(text)} ${zero}`, `give a step above 0${order}`);
  }
  if (first > last) {
    const message = `${quoteInput(text)} runs backwards`;
    const example = printedInput(turned) === turned ? `: ${turned}` : '';
    return problem('out-of-range', message, `write the lower end first${example}`);
  }
  const points = Number((last - first) / width) + 1;
  if (points > MOST_POINTS) return tooMany(text, points, name);
  return { name, unit: unit ?? '', first, step: width, exponent, points };
}

export function tooMany(text: string, points: number, name: string): Problem {
  const count = Number.isFinite(points) ? `${points.toPrecision(2)} points` : 'too many points';
  const message = `${quoteInput(text)} would be ${count}, and ${MOST_POINTS} are the most`;
  return problem(
    'out-of-range',
    message,
    `take a larger step of the ${printedInput(name)}, or put the rows into halfspace stream`,
  );
}

const isCelsius = (unit: string): boolean => /^(?:\u00b0|deg)?C$/.test(unit);

const scaled = (d: Decimal, exponent: number): bigint =>
  BigInt(d.digits) * 10n ** BigInt(d.exponent - exponent) * (d.negative ? -1n : 1n);

/** Point number `i`, from 0, without its unit; all points of a range have the same decimals. */
export function pointText({ first, step, exponent }: SweepRange, i: number): string {
  const value = first + BigInt(i) * step;
  const digits = String(value < 0n ? -value : value);
  return plainDecimal({ negative: value < 0n, digits, exponent });
}
