/** Rows of the table of options for glasses. */
import { type Problem, problem } from '../units/problem.ts';
import { value } from './option-spec.ts';

export const GLASS_OPTION_ROWS = {
  maker: value({
    name: 'maker',
    placeholder: 'NAME',
    meaning: 'glasses of this maker only, by the beginning of a word of its name: schott, ohara',
    fallback: 'every other maker',
    group: 'selection',
    parse: parseName,
  }),
};

function parseName(text: string): string | Problem {
  return text.trim() === ''
    ? problem('empty', 'the name is empty', 'write a maker such as schott')
    : text.trim();
}
