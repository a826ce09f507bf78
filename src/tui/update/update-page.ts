/** Reading a page: sources, cautions, keys, what was copied. */
import type { ActionId } from '../keys/actions.ts';
import { EMPTY_LINE, insertText, type Line, pasteText } from '../line-edit.ts';
import { pageLength, pageRows } from '../picture/pages.ts';
import type { Page, PageName, State } from '../state.ts';
import type { World } from '../world.ts';
import { applyLineAction } from './line-actions.ts';

/** Opens a page; the key that opened it closes it again. */
export function openPage(state: State, name: PageName): State {
  if (state.page?.name === name) return closePage(state);
  return { ...state, page: { name, top: 0, filter: null, isFiltering: false }, message: null };
}

function closePage(state: State): State {
  return { ...state, page: null, message: null, copied: null };
}

export function actOnPage(state: State, action: ActionId, world: World): State {
  const { page } = state;
  if (!page) return state;
  if (page.isFiltering) return actInFilter(state, page, action);
  const rows = Math.max(1, pageRows(state, world));
  switch (action) {
    case 'back':
      return page.filter ? withPage(state, { ...page, filter: null, top: 0 }) : closePage(state);
    case 'sources':
    case 'cautions':
      return openPage(state, action);
    case 'help':
      return openPage(state, 'keys');
    case 'search':
      return withPage(state, { ...page, filter: EMPTY_LINE, isFiltering: true, top: 0 });
    case 'up':
      return scroll(state, page, page.top - 1, world);
    case 'down':
      return scroll(state, page, page.top + 1, world);
    case 'page-up':
      return scroll(state, page, page.top - rows, world);
    case 'page-down':
      return scroll(state, page, page.top + rows, world);
    case 'first':
      return scroll(state, page, 0, world);
    case 'last':
      return scroll(state, page, Number.MAX_SAFE_INTEGER, world);
    default:
      return state;
  }
}

const withPage = (state: State, page: Page): State => ({ ...state, page });

function scroll(state: State, page: Page, top: number, world: World): State {
  const last = Math.max(0, pageLength(state, world) - pageRows(state, world));
  return withPage(state, { ...page, top: Math.max(0, Math.min(last, top)) });
}

/** Enter keeps the filter, Esc clears it. */
function actInFilter(state: State, page: Page, action: ActionId): State {
  if (action === 'take' || action === 'take-next') return withPage(state, { ...page, isFiltering: false });
  if (action === 'cancel') return withPage(state, { ...page, filter: null, isFiltering: false, top: 0 });
  const line = page.filter && applyLineAction(page.filter, action);
  return line ? withPage(state, { ...page, filter: line, top: 0 }) : state;
}

export function typeInFilter(state: State, character: string): State {
  return withFilter(state, (line) => insertText(line, character));
}

export function pasteInFilter(state: State, text: string): State {
  return withFilter(state, (line) => pasteText(line, text));
}

function withFilter(state: State, change: (line: Line) => Line): State {
  const { page } = state;
  return page ? withPage(state, { ...page, filter: change(page.filter ?? EMPTY_LINE), top: 0 }) : state;
}
