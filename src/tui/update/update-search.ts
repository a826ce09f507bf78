/** Choosing a medium from the list that is open in a half. */
import { problemText } from '../../units/problem.ts';
import { type Side, setMedium } from '../fields/medium-fields.ts';
import { hitsFor, latestFirst, mediumOfHit, whyNoHit } from '../hits.ts';
import type { ActionId } from '../keys/actions.ts';
import { EMPTY_LINE, insertText, type Line, pasteText } from '../line-edit.ts';
import { focusOn, leaveWords, moveToField } from '../moves.ts';
import { listRows } from '../picture/hit-list.ts';
import { askAnew, fieldStop, type Search, type State } from '../state.ts';
import type { World } from '../world.ts';
import { applyLineAction } from './line-actions.ts';

export function openSearch(state: State, side: Side, world: World): State {
  const search: Search = { side, line: EMPTY_LINE, selected: 0, top: 0 };
  return { ...focusOn(state, fieldStop(side), world), search, page: null, message: null };
}

export function typeInSearch(state: State, character: string): State {
  return withLine(state, (line) => insertText(line, character));
}

export function pasteInSearch(state: State, text: string): State {
  return withLine(state, (line) => pasteText(line, text));
}

function withLine(state: State, change: (line: Line) => Line): State {
  const { search } = state;
  if (!search) return state;
  return { ...state, search: { ...search, line: change(search.line), selected: 0, top: 0 }, message: null };
}

export function actInSearch(state: State, action: ActionId, world: World): State {
  const { search } = state;
  if (!search) return state;
  switch (action) {
    case 'cancel':
      return leaveWords({ ...state, search: null, message: null }, world);
    case 'take': {
      const chosen = choose(state, search, world);
      return chosen.search ? chosen : leaveWords(chosen, world);
    }
    case 'take-next':
    case 'take-previous': {
      const chosen = choose(state, search, world);
      return chosen.search ? chosen : moveToField(chosen, action === 'take-next' ? 1 : -1, world);
    }
    case 'up':
      return select(state, search, -1, world);
    case 'down':
      return select(state, search, 1, world);
    case 'page-up':
      return select(state, search, -listRows(state, world), world);
    case 'page-down':
      return select(state, search, listRows(state, world), world);
    default: {
      const line = applyLineAction(search.line, action);
      if (!line) return state;
      return line.text === search.line.text
        ? { ...state, search: { ...search, line } }
        : withLine(state, () => line);
    }
  }
}

/** Moves the mark; the list scrolls only where the mark would leave it. */
function select(state: State, search: Search, by: number, world: World): State {
  const count = hitsFor(search.line.text, state.recent, state.question, world).length;
  const selected = Math.max(0, Math.min(count - 1, search.selected + by));
  const rows = Math.max(1, listRows(state, world));
  const top = Math.max(selected - rows + 1, Math.min(search.top, selected));
  return { ...state, search: { ...search, selected, top } };
}

function choose(state: State, search: Search, world: World): State {
  const hit = hitsFor(search.line.text, state.recent, state.question, world).at(search.selected);
  const medium = hit && mediumOfHit(hit, state.question, world);
  if (!hit || !medium) {
    return {
      ...state,
      message: { tone: 'refused', text: problemText(whyNoHit(search.line.text, state.question, world)) },
    };
  }
  const recent = hit.kind === 'entry' ? latestFirst(state.recent, hit.entry.key) : state.recent;
  const closed: State = { ...state, search: null, recent, message: null };
  return askAnew(closed, setMedium(state.question, search.side, medium), world);
}
