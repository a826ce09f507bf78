/** One word out of a fixed list, in any case. */
import { type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';

/** A parser for these words; `what` with its article: "a polarization". */
export function choiceParser<Word extends string>(
  what: string,
  words: readonly Word[],
): (text: string) => Word | Problem {
  return (text) => {
    const typed = text.trim().toLowerCase();
    const word = words.find((w) => w.toLowerCase() === typed);
    return word ?? problem('not-a-choice', `${quoteInput(text)} is not ${what}`, `write ${orList(words)}`);
  };
}

/** "a", "a or b", "a, b or c". */
export function orList(words: readonly string[]): string {
  const last = words.at(-1) ?? '';
  return words.length < 2 ? last : `${words.slice(0, -1).join(', ')} or ${last}`;
}
