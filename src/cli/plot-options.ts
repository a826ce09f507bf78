/** Rows of the table of options (options.ts) that ask for a picture in place of the numbers. */
import { choiceParser } from '../units/parse-choice.ts';
import { type Problem, problem } from '../units/problem.ts';
import { quoteInput } from '../units/quote-input.ts';
import { choice, type OptionSpec, value } from './option-spec.ts';

const PLOTS = ['angle', 'wave', 'field'] as const;
export type PlotKind = (typeof PLOTS)[number];

/** Both ends as typed: what they mean depends on the plot. */
export interface TypedSpan {
  readonly low: string;
  readonly high: string;
}

export const PLOT_OPTION_ROWS = {
  plot: choice({
    name: 'plot',
    choices: PLOTS,
    meaning:
      'a chart in place of the numbers: R over the angle, R and T and the indices over the wavelength (of media compared, the indices), or |E|^2 through the path; its points with --json or --csv, a table with --linear',
    group: 'form',
    excludes: ['sweep', 'columns', 'digits'],
    parse: choiceParser('a plot', PLOTS),
  }),
  span: value({
    name: 'span',
    placeholder: 'A..B',
    meaning: 'what the plot shows: 400nm..700nm, 8..12GHz for a wave, 40..60 for an angle',
    fallback: 'all angles; the waves around the one given that the data cover',
    group: 'form',
    needs: 'plot',
    parse: parseTypedSpan,
  }),
  svg: value({
    name: 'svg',
    placeholder: 'FILE',
    meaning: 'the plot as a picture too, with axes, legend and sources; - is standard output',
    group: 'output',
    needs: 'plot',
    completes: 'file',
    parse(text: string): string | Problem {
      return text === '' || text.includes('\0')
        ? problem('empty', 'the name is empty or holds a null character', 'write a path such as chart.svg')
        : text;
    },
  }),
} as const satisfies Readonly<Record<string, OptionSpec>>;

const EXAMPLES = 'write both ends with two dots between, as in 400nm..700nm or 40..60';

function parseTypedSpan(text: string): TypedSpan | Problem {
  const ends = text.split('..').map((end) => end.trim());
  const [low = '', high = ''] = ends;
  if (ends.length !== 2 || low === '' || high === '' || /^\.|\.$/.test(low + high))
    return problem('not-a-number', `${quoteInput(text)} is no span`, EXAMPLES);
  return { low, high };
}
