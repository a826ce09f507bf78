/**
 * Fitting plain text (no escape sequences) into a number of terminal columns: cut, pad, centre.
 * Promises: the result of `cutToWidth` is never wider than asked; the result of the pads is never narrower.
 * A wide character that would straddle the edge is left out.
 */
import { clusters, displayWidth } from './display-width.ts';

/**
 * Cuts `text` to at most `columns` columns, the mark included where something was cut off.
 * @param mark what stands for the missing rest: '…', or '...' on an ASCII terminal; left out where it does not fit.
 */
export function cutToWidth(text: string, columns: number, mark = '…'): string {
  if (displayWidth(text) <= columns) return text;
  const markWidth = displayWidth(mark);
  const ending = markWidth <= columns ? mark : '';
  const room = columns - displayWidth(ending);
  let used = 0;
  let kept = '';
  for (const cluster of clusters(text)) {
    if (used + cluster.width > room) break;
    kept += cluster.text;
    used += cluster.width;
  }
  return kept + ending;
}

/** Adds spaces after `text` until it takes `columns` columns; a wider text is returned as it is. */
export function padEndToWidth(text: string, columns: number): string {
  return text + ' '.repeat(Math.max(0, columns - displayWidth(text)));
}

/** Adds spaces before `text` until it takes `columns` columns; a wider text is returned as it is. */
export function padStartToWidth(text: string, columns: number): string {
  return ' '.repeat(Math.max(0, columns - displayWidth(text))) + text;
}

/** Centres `text` in `columns` columns, the odd space after it; a wider text is returned as it is. */
export function centreInWidth(text: string, columns: number): string {
  const spare = Math.max(0, columns - displayWidth(text));
  const before = spare >> 1;
  return ' '.repeat(before) + text + ' '.repeat(spare - before);
}

/** Cuts and pads: exactly `columns` columns, for cells of a table. */
export function fitToWidth(text: string, columns: number, mark = '…'): string {
  return padEndToWidth(cutToWidth(text, columns, mark), columns);
}
