/**
 * Pages to read: sources (each in its half), cautions, keys, what was copied, coatings, order check, comparison. A page
 * takes the place of the numbers; wave and geometry stay in sight above.
 */
import { displayWidth } from '../../term/display-width.ts';
import type { NumberStyle } from '../../units/number-style.ts';
import { toAscii } from '../../units/to-ascii.ts';
import type { Side } from '../fields/medium-fields.ts';
import { answerOf, type Page, type State } from '../state.ts';
import type { World } from '../world.ts';
import { cautionLines } from './caution-lines.ts';
import { coatingLines } from './coating-lines.ts';
import { compareLines } from './compare-lines.ts';
import { keyLines } from './key-lines.ts';
import { orderLines } from './order-lines.ts';
import { type PageLine, pageLine } from './page-line.ts';
import { sceneOf } from './scene.ts';
import { sourceLines } from './source-lines.ts';
import { wrapText } from './wrap.ts';

/** Columns for text: a mark and a blank stand before it. */
export const PAGE_MARGIN = 2;
const WIDEST = 100;

/** Sources stand in their halves while there are two; every other page has the whole width. */
export function isSplitPage(page: Page, state: State, world: World): boolean {
  return page.name === 'sources' && sceneOf(state, world).plan.kind === 'full';
}

/** Lines a page can show at once. */
export function pageRows(state: State, world: World): number {
  const { plan } = sceneOf(state, world);
  if (state.page && isSplitPage(state.page, state, world)) return plan.body;
  return plan.strip + plan.joint + plan.body + plan.curve;
}

export function pageLength(state: State, world: World): number {
  const { page } = state;
  if (!page) return 0;
  const { plan } = sceneOf(state, world);
  if (isSplitPage(page, state, world)) {
    return Math.max(halfLines(state, 'from', plan.left).length, halfLines(state, 'into', plan.right).length);
  }
  return fullLines(state, page, world, plan.columns).length;
}

/** The sources of one half. */
export function halfLines(state: State, side: Side, columns: number): readonly PageLine[] {
  const answer = answerOf(state);
  if (!answer) return [pageLine('no answer, hence no sources')];
  const lines = sourceLines(answer[side], { ascii: isAscii(state) });
  return finish(state.page ? filtered(lines, state.page) : lines, state, columns);
}

/** All lines of a page that has the whole width. */
export function fullLines(state: State, page: Page, world: World, columns: number): readonly PageLine[] {
  const wide = Math.min(columns, WIDEST);
  switch (page.name) {
    case 'keys':
      return finish(
        keyLines(state, page.filter?.text ?? '', world, textWidth(columns)),
        state,
        columns,
        false,
      );
    case 'cautions':
      return finish(filtered(cautionsOf(state), page), state, wide);
    case 'coatings':
      return finish(filtered(coatingLines(state.question, styleOf(state), world), page), state, wide);
    case 'order': {
      const lines = orderLines(state.question, styleOf(state), world, textWidth(wide));
      return finish(filtered(lines, page), state, wide);
    }
    case 'compare': {
      const { question, recent } = state;
      const lines = compareLines(question, recent, styleOf(state), world, textWidth(columns));
      return finish(filtered(lines, page), state, columns);
    }
    case 'copied':
      return finish(
        (state.copied ?? '').split('\n').map((l) => pageLine(l)),
        state,
        columns,
        false,
      );
    case 'sources': {
      const answer = answerOf(state);
      const style = { ascii: isAscii(state) };
      const both = answer ? [...sourceLines(answer.from, style), ...sourceLines(answer.into, style)] : [];
      return finish(filtered(both, page), state, wide);
    }
  }
}

const styleOf = (state: State): NumberStyle => ({ ascii: isAscii(state) });

/** Columns of a line of text. */
const textWidth = (columns: number): number => columns - PAGE_MARGIN - 1;

const isAscii = (state: State): boolean => state.preferences.glyphs === 'ascii';

function filtered(lines: readonly PageLine[], page: Page): readonly PageLine[] {
  const word = page.filter?.text.trim().toLowerCase() ?? '';
  return word === '' ? lines : lines.filter((l) => l.text.toLowerCase().includes(word));
}

function cautionsOf(state: State): readonly PageLine[] {
  const cautions = answerOf(state)?.cautions ?? [];
  return cautions.length === 0 ? [pageLine('no cautions for this question')] : cautionLines(cautions);
}

/** Lines of the page in view that offer something, by their numbers. */
function offersInView(page: Page, lines: readonly PageLine[], rows: number): readonly number[] {
  const end = Math.min(lines.length, page.top + rows);
  const seen = Array.from({ length: Math.max(0, end - page.top) }, (_, i) => page.top + i);
  return seen.filter((i) => lines[i]?.layers !== undefined);
}

/** The line Enter acts on: the marked one while it is in view, else the first in view; undefined where none is. */
export function markedLine(page: Page, lines: readonly PageLine[], rows: number): number | undefined {
  const offers = offersInView(page, lines, rows);
  return offers.find((i) => i === page.selected) ?? offers[0];
}

/** The next line in view to mark, upwards or downwards. */
export function nextMark(
  page: Page,
  lines: readonly PageLine[],
  rows: number,
  by: 1 | -1,
): number | undefined {
  const marked = markedLine(page, lines, rows);
  if (marked === undefined) return undefined;
  const offers = offersInView(page, lines, rows);
  return offers[offers.indexOf(marked) + by];
}

/** A page as text to be taken elsewhere. */
export function pageText(state: State, page: Page, world: World): string {
  const { columns } = sceneOf(state, world).plan;
  return fullLines(state, page, world, columns)
    .map(({ mark, text, right }) => `${mark === '' ? '' : `${mark} `}${text}${right?.text ?? ''}`.trimEnd())
    .join('\n');
}

/** Wraps to the width; in ASCII where the terminal needs it. */
function finish(
  lines: readonly PageLine[],
  state: State,
  columns: number,
  wraps = true,
): readonly PageLine[] {
  return lines.flatMap((line) => {
    const text = isAscii(state) ? toAscii(line.text) : line.text;
    const isWide = displayWidth(text) > textWidth(columns);
    if (!wraps || text === '' || (line.isLaidOut && !isWide)) return [{ ...line, text }];
    return wrapText(text, textWidth(columns)).map((piece, i) =>
      i === 0 ? { ...line, text: piece } : continuation(line, piece),
    );
  });
}

function continuation({ role }: PageLine, text: string): PageLine {
  return { mark: '', role, text };
}
