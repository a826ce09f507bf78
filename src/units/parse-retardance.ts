/** Retardance of a waveplate, in waves: `quarter`, `half`, `full`, or a number of waves, `0.25`. Above 0. */
import { parseNumber } from './parse-number.ts';
import { isProblem, type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';

const NAMED: Readonly<Record<string, number>> = { quarter: 0.25, half: 0.5, full: 1 };
const EXAMPLES = 'write quarter, half, full or a number of waves such as 0.25';
/** More is no plate anybody names by its retardance. */
const MOST_waves = 1000;

export function parseRetardance(text: string): number | Problem {
  const word = text.trim().toLowerCase();
  const named = Object.hasOwn(NAMED, word) ? NAMED[word] : undefined;
  if (named !== undefined) return named;
  const waves = parseNumber(text);
  if (isProblem(waves)) return problem(waves.code, `${quoteInput(text)} is no retardance`, EXAMPLES);
  if (waves > 0 && waves <= MOST_waves) return waves;
  return problem('out-of-range', `${quoteInput(text)} is out of range: a retardance is above 0`, EXAMPLES);
}
