/** For tables of typed text and what it must give: the value, or the code and the whole line of the refusal. */
import { isProblem, problemText } from '../../src/units/problem.ts';

export function outcome<T>(result: T): T | string {
  return isProblem(result) ? `${result.code}: ${problemText(result)}` : result;
}
