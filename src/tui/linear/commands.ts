/** The words of the linear layout. */
import type { LogRecord } from '../../record/record.ts';
import { answerOf, askAnew, redo, refusalOf, type State, undo } from '../state.ts';
import { setAngle, swapMedia } from '../update/question-changes.ts';
import type { World } from '../world.ts';
import {
  cautionsSpoken,
  curvesSpoken,
  fieldLines,
  mediumLines,
  pageWords,
  sourcesSpoken,
  summaryLines,
  surfaceLines,
} from './linear-lines.ts';
import { coatWords, compareWords, orderWords } from './page-words.ts';

export interface Command {
  readonly words: readonly string[];
  readonly help: string;
  readonly run: (
    state: State,
    world: World,
  ) => {
    readonly state: State;
    readonly lines: readonly string[];
    /** To be put into the logbook. */
    readonly keep?: LogRecord;
  };
}

const read = (
  words: readonly string[],
  help: string,
  lines: (state: State) => readonly string[],
): Command => ({
  words,
  help,
  run: (state) => ({ state, lines: lines(state) }),
});

const change = (
  words: readonly string[],
  help: string,
  act: (state: State, world: World) => State,
): Command => ({
  words,
  help,
  run: (state, world) => {
    const next = act(state, world);
    const said = next.message && next.message !== state.message ? [next.message.text] : [];
    return { state: { ...next, message: null }, lines: [...said, ...summaryLines(next)] };
  },
});

const refuse = (state: State, text: string): State => ({ ...state, message: { tone: 'refused', text } });

function goTo(state: State, angle_rad: number | null | undefined, none: string, world: World): State {
  return angle_rad === null || angle_rad === undefined
    ? refuse(state, none)
    : askAnew(state, setAngle(state.question, angle_rad), world);
}

export const COMMANDS: readonly Command[] = [
  read(['list', 'l'], 'what can be changed, numbered', fieldLines),
  read(['surface', 'r'], 'all results of the surface', surfaceLines),
  read(['first', 'm1'], 'all results of the first medium', (s) => mediumLines(s, 'from')),
  read(['second', 'm2'], 'all results of the second medium', (s) => mediumLines(s, 'into')),
  read(['sources', 's'], 'where the numbers come from', sourcesSpoken),
  read(['cautions', '!'], 'all cautions', cautionsSpoken),
  {
    words: ['curves'],
    help: 'reflectance over the angle and over the wave, as sentences and tables',
    run: (state, world) => ({ state, lines: curvesSpoken(state, world) }),
  },
  {
    words: ['coat', 'F'],
    help: 'films and mirrors for these two media',
    run: (state, world) => ({ state, lines: pageWords(coatWords, state, world) }),
  },
  {
    words: ['order', 'O'],
    help: 'what to settle before this part is ordered',
    run: (state, world) => ({ state, lines: pageWords(orderWords, state, world) }),
  },
  {
    words: ['compare', 'V'],
    help: 'the second medium versus the media chosen last',
    run: (state, world) => ({ state, lines: pageWords(compareWords, state, world) }),
  },
  {
    words: ['log'],
    help: 'keep the answer in the logbook; halfspace log shows what is there',
    run: (state, world) => {
      const answer = answerOf(state);
      return answer
        ? { state, lines: [], keep: world.record(state.question, answer) }
        : { state, lines: ['there is no answer to keep yet'] };
    },
  },
  change(['swap', 'x'], 'swap the two media', (s, w) => askAnew(s, swapMedia(s.question), w)),
  change(['brewster', 'B'], 'go to the Brewster angle', (s, w) => {
    const surface = answerOf(s)?.interface;
    const angle = surface?.brewsterAngle_rad ?? surface?.pseudoBrewsterAngle_rad;
    return goTo(s, angle, 'there is no Brewster angle for these media', w);
  }),
  change(['critical', 'C'], 'go to the critical angle', (s, w) =>
    goTo(s, answerOf(s)?.interface.criticalAngle_rad, 'there is no critical angle for these media', w),
  ),
  change(['extrapolate', 'E'], 'use a fit outside its range, or stop doing so', (s, w) =>
    askAnew(s, { ...s.question, extrapolate: !s.question.extrapolate }, w),
  ),
  change(['undo', 'u'], 'undo the last change', undo),
  change(['redo'], 'do it again', redo),
  change(['back'], 'back to the last question that had an answer', (s, w) =>
    refusalOf(s) ? askAnew(s, s.answered, w) : s,
  ),
  {
    words: ['help', 'h', '?'],
    help: 'these words',
    run: (state) => ({
      state,
      lines: [
        'a number changes that line of the list; a name and a value do it at once, as in: angle 45',
        ...COMMANDS.map((c) => `${c.words.join(' or ')}: ${c.help}`),
        'the same answers from the command line: halfspace --help',
      ],
    }),
  },
  { words: ['quit', 'q'], help: 'quit', run: (state) => ({ state, lines: [] }) },
];
