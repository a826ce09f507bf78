/**
 * Ranges as a person types them: `1.37..1.39`, `1.37..` (from there on), `..1.39` (up to there); with a unit on both ends or on
 * the second alone: `3um..5um`, `3..5um`.
 */
import { airToVacuum_um } from '../dispersion/air-index.ts';
import { parseNumber } from '../units/parse-number.ts';
import { parseWave } from '../units/parse-wave.ts';
import { isProblem, type Problem, problem } from '../units/problem.ts';
import { printedInput, quoteInput } from '../units/quote-input.ts';
import type { ValueRange } from './value-range.ts';

export interface RangeSpec {
  /** With its article: "a range of the index". */
  readonly what: string;
  /** "1.37..1.39, 1.7.. or ..1.4" */
  readonly examples: string;
  /** Whether a unit on the second end counts for both. */
  readonly hasUnit?: true;
  /** One end. */
  readonly parse: (text: string) => number | Problem;
}

export function parseRange(text: string, spec: RangeSpec): ValueRange | Problem {
  const trimmed = text.trim();
  const write = `write ${spec.examples}`;
  if (trimmed === '') return problem('empty', `${spec.what} is missing`, write);
  const ends = trimmed.split('..');
  const [low = '', high = ''] = ends.map((end) => end.trim());
  if (ends.length === 1) return notARange(trimmed, spec);
  if (isOverDotted(trimmed)) return overDotted(trimmed, spec);
  if (low === '' && high === '') return problem('empty', 'a range needs at least one end', write);
  const from = low === '' ? undefined : spec.parse(spec.hasUnit ? withUnitOf(low, high) : low);
  if (isProblem(from)) return from;
  const to = high === '' ? undefined : spec.parse(high);
  if (isProblem(to)) return to;
  if (from !== undefined && to !== undefined && from > to) {
    return problem(
      'out-of-range',
      `${quoteInput(trimmed)} runs backwards`,
      `write the lower end first: ${printedInput(high)}..${printedInput(low)}`,
    );
  }
  return { ...(from !== undefined && { from }), ...(to !== undefined && { to }) };
}

const isOverDotted = (text: string): boolean => text.includes('...') || text.split('..').length > 2;

function overDotted(text: string, { examples }: RangeSpec): Problem {
  const message = `${quoteInput(text)} is no range: two dots stand between two ends`;
  return problem('not-a-number', message, `write ${examples}`);
}

/** `3` beside `5um` is 3um. */
function withUnitOf(low: string, high: string): string {
  const unit = /^[-+]?[\d.]+(?:e[-+]?\d+)?\s*([^\d\s.].*)$/iu.exec(high)?.[1];
  return unit !== undefined && /^[-+]?[\d.]+(?:e[-+]?\d+)?$/i.test(low) ? low + unit : low;
}

/** What a single value, a dash or the word "to" was meant for. */
function notARange(text: string, spec: RangeSpec): Problem {
  const pair = /^(\S(?:.*?[^\s-])?)\s*(?:-|–|\bto\b|…)\s*([^\s-].*)$/iu.exec(text);
  if (pair && /\d/.test(pair[1] ?? '') && /^[\d.]/.test(pair[2] ?? '')) {
    const meant = quoteInput(`${pair[1]}..${pair[2]}`).slice(1, -1);
    return problem(
      'not-a-number',
      `${quoteInput(text)} is no range`,
      `write ${meant}, two dots between the ends`,
    );
  }
  const value = spec.parse(text);
  if (isProblem(value)) return value;
  const bare = quoteInput(text).slice(1, -1);
  return problem(
    'not-a-number',
    `${quoteInput(text)} is one value and no range`,
    `write ${bare}.. or ..${bare} or both ends, as in ${spec.examples}`,
  );
}

/** A spec for plain numbers. */
export const numberRange = (what: string, examples: string): RangeSpec => ({
  what,
  examples,
  parse: parseNumber,
});

export const INDEX_RANGE = numberRange('a range of the index', '1.37..1.39, 1.7.. or ..1.4');
export const GROUP_INDEX_RANGE = numberRange('a range of the group index', '1.4..1.5, 1.7.. or ..1.4');
export const ABBE_RANGE = numberRange('a range of the Abbe number', '60..70, 80.. or ..30');
export const BIREFRINGENCE_RANGE = numberRange('a range of the birefringence', '0.1.. or 0.005..0.02');

/** fs2/mm; ps2/km is the same number, s2/m is 1e27 of it. In s^2/m. */
export const GVD_RANGE: RangeSpec = {
  what: 'a range of the group-velocity dispersion',
  examples: '..50, -20..20 or 0..50fs2/mm',
  hasUnit: true,
  parse(text) {
    const bare = text.trim().replace(/\s*(?:fs(?:2|\^2|²)\/mm|ps(?:2|\^2|²)\/km)$/iu, '');
    const value = parseNumber(bare);
    return isProblem(value)
      ? problem(
          value.code,
          `${quoteInput(text)} is no group-velocity dispersion`,
          'write a number in fs2/mm, such as 36 or 36fs2/mm',
        )
      : value * 1e-27;
  },
};

const SPAN: RangeSpec = {
  what: 'a span of wavelengths',
  examples: '3um..5um, 400..700nm or 10.6um',
  hasUnit: true,
  parse(end) {
    const wave = parseWave(end);
    if (isProblem(wave)) return wave;
    return wave.inAir ? airToVacuum_um(wave.wavelength_m * 1e6) * 1e-6 : wave.wavelength_m;
  },
};

/**
 * The span of vacuum wavelengths in metres, shorter end first whichever way it was typed (frequencies run the other way);
 * a single wave is a span of no width.
 */
export function parseSpan(text: string): readonly [number, number] | Problem {
  const ends = text.split('..').map((end) => end.trim());
  const [low = '', high = ''] = ends;
  if (ends.length === 1) {
    const wave = SPAN.parse(text);
    if (!isProblem(wave)) return [wave, wave];
    const meantTwo = /\d\s*\p{L}*\s*(?:-|–|\bto\b)\s*\d/u.test(text.replace(/m-1/g, 'm'));
    return meantTwo ? notARange(text.trim(), SPAN) : wave;
  }
  if (isOverDotted(text)) return overDotted(text.trim(), SPAN);
  if (low === '' || high === '') {
    return problem('empty', `${quoteInput(text)} has no two ends`, `write both, as in ${SPAN.examples}`);
  }
  const first = SPAN.parse(withUnitOf(low, high));
  if (isProblem(first)) return first;
  const second = SPAN.parse(high);
  if (isProblem(second)) return second;
  return first <= second ? [first, second] : [second, first];
}
