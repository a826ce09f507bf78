/** What the keys mean in a state. */
import type { Context } from '../keys/actions.ts';
import type { State } from '../state.ts';

export function contextOf(state: State): Context {
  if (state.entry) return 'entry';
  if (state.search) return 'search';
  if (state.page) return state.page.isFiltering ? 'entry' : 'page';
  return state.curve ? 'curve' : 'picture';
}
