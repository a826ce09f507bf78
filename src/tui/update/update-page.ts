/** Reading a page, and taking what its lines offer. */
import type { ActionId } from '../keys/actions.ts';
import { EMPTY_LINE, insertText, type Line, pasteText } from '../line-edit.ts';
import type { PageLine } from '../picture/page-line.ts';
import { fullLines, markedLine, nextMark, pageLength, pageRows } from '../picture/pages.ts';
import { sceneOf } from '../picture/scene.ts';
import { askAnew, type Page, type PageName, refusalOf, type State } from '../state.ts';
import type { World } from '../world.ts';
import { applyLineAction } from './line-actions.ts';

/** Opens a page; the key that opened it closes it again. */
export function openPage(state: State, name: PageName): State {
  if (state.page?.name === name) return closePage(state);
  return {
    ...state,
    page: { name, top: 0, filter: null, isFiltering: false, selected: null },
    message: null,
  };
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
    case 'coatings':
    case 'compare':
      return openPage(state, action);
    case 'order-check':
      return openPage(state, 'order');
    case 'open':
      return takeLayers(state, page, world);
    case 'up':
      return moveMark(state, page, -1, world);
    case 'down':
      return moveMark(state, page, 1, world);
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

/** To the next line in view that offers something; where there is none the page scrolls. */
function moveMark(state: State, page: Page, by: 1 | -1, world: World): State {
  const selected = nextMark(page, linesOf(state, page, world), pageRows(state, world), by);
  return selected === undefined
    ? scroll(state, page, page.top + by, world)
    : withPage(state, { ...page, selected });
}

function linesOf(state: State, page: Page, world: World): readonly PageLine[] {
  return fullLines(state, page, world, sceneOf(state, world).plan.columns);
}

/** Puts the marked design between the two media. */
function takeLayers(state: State, page: Page, world: World): State {
  const lines = linesOf(state, page, world);
  const marked = markedLine(page, lines, pageRows(state, world));
  const layers = marked === undefined ? undefined : lines[marked]?.layers;
  if (!layers || layers.length === 0) return state;
  const before = state.question.layers.length;
  const asked = askAnew(closePage(state), { ...state.question, layers }, world);
  if (refusalOf(asked)) return asked;
  const text = `between the media now: ${layerCount(layers.length)}${before > 0 ? `, in place of ${layerCount(before)}` : ''}`;
  return { ...asked, message: { tone: 'said', text } };
}

const layerCount = (count: number): string => (count === 1 ? '1 layer' : `${count} layers`);

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
