/** The state at the start: the question of last time, else the usual one; what is wrong with the settings is said first. */
import type { ScreenSize } from '../term/cell-writer.ts';
import { firstQuestion } from './first-question.ts';
import type { Start } from './main.tsx';
import { readQuestion } from './settings/plain-question.ts';
import { initialState, refusalOf, type State } from './state.ts';
import type { World } from './world.ts';

export function firstState(
  start: Start,
  size: ScreenSize,
  world: World,
  keyProblems: readonly string[],
): State {
  const materialOf = (key: string) => world.material(key);
  const usual = firstQuestion(materialOf);
  const { last, recent } = start.settings;
  const { question, problems } =
    last === undefined
      ? { question: usual, problems: [] }
      : readQuestion(last, usual, materialOf, (text) => world.readLayers(text));
  const begin = (q: typeof question): State => initialState(q, size, start.preferences, world, recent);
  const asked = begin(question);
  const state = refusalOf(asked) ? { ...asked, answered: usual } : asked;
  const wrong = [...start.problems, ...keyProblems, ...problems];
  const [only] = wrong;
  if (only === undefined) return state;
  const more = wrong.length > 1 ? ` (and ${wrong.length - 1} more)` : '';
  return { ...state, message: { tone: 'refused', text: `settings: ${only}${more}` } };
}
