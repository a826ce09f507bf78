/**
 * Pages to read: sources (each in its half), cautions, keys, what was copied. A page takes the place of the numbers; wave
 * and geometry stay in sight above.
 */
import { toAscii } from '../../units/to-ascii.ts';
import type { Side } from '../fields/medium-fields.ts';
import { answerOf, type Page, type State } from '../state.ts';
import type { World } from '../world.ts';
import { keyLines } from './key-lines.ts';
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
      return finish(keyLines(state, page.filter?.text ?? '', world), state, columns, false);
    case 'cautions':
      return finish(filtered(cautionLines(state), page), state, wide);
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

const isAscii = (state: State): boolean => state.preferences.glyphs === 'ascii';

function filtered(lines: readonly PageLine[], page: Page): readonly PageLine[] {
  const word = page.filter?.text.trim().toLowerCase() ?? '';
  return word === '' ? lines : lines.filter((l) => l.text.toLowerCase().includes(word));
}

function cautionLines(state: State): readonly PageLine[] {
  const cautions = answerOf(state)?.cautions ?? [];
  if (cautions.length === 0) return [pageLine('no cautions for this question')];
  return cautions.map((c) =>
    c.level === 'note' ? pageLine(c.text, 'note', '-') : pageLine(c.text, c.level, '!'),
  );
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
    if (!wraps || text === '') return [{ ...line, text }];
    return wrapText(text, columns - PAGE_MARGIN - 1).map((piece, i) =>
      i === 0 ? { ...line, text: piece } : { ...line, mark: '', text: piece },
    );
  });
}
