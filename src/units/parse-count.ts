/** A whole number of things, from 1 on: `8`. */
import { parseNumber } from './parse-number.ts';
import { isProblem, type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';

/** A parser for counts up to `most`; `what` with its article: "a number of pairs". */
export function countParser(what: string, most: number): (text: string) => number | Problem {
  return (text) => {
    const count = parseNumber(text);
    if (!isProblem(count) && Number.isInteger(count) && count >= 1 && count <= most) return count;
    const remedy = `write a whole number from 1 to ${most}`;
    return isProblem(count)
      ? problem(count.code, `${quoteInput(text)} is not ${what}`, remedy)
      : problem('out-of-range', `${quoteInput(text)} is not ${what}`, remedy);
  };
}
