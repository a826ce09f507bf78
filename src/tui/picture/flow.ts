/** Items side by side in lines: as many to a line as fit, the optional ones left out where they do not. */
import { displayWidth } from '../../term/display-width.ts';
import type { Item, Row } from './item.ts';

/** Between two items of a line; the mark of the focus stands in the second of them. */
export const ITEM_GAP = 2;

/** Columns an item takes in a line: label, blank, text. */
export function itemWidth(item: Item): number {
  const label = displayWidth(item.label);
  return label + (label > 0 ? 1 : 0) + displayWidth(item.text);
}

const lineWidth = (items: readonly Item[]): number =>
  items.reduce((sum, item) => sum + itemWidth(item) + ITEM_GAP, 0);

export function flowItems(items: readonly Item[], columns: number): readonly Row[] {
  const kept = dropOptional(items, columns);
  const rows: Item[][] = [];
  let line: Item[] = [];
  for (const item of kept) {
    if (line.length > 0 && lineWidth([...line, item]) > columns) {
      rows.push(line);
      line = [];
    }
    line.push(item);
  }
  if (line.length > 0) rows.push(line);
  return rows;
}

/** Takes optional items away, last first, until one line is enough or none is left. */
function dropOptional(items: readonly Item[], columns: number): readonly Item[] {
  let kept = items;
  while (lineWidth(kept) > columns) {
    const at = kept.findLastIndex((item) => item.optional === true);
    if (at < 0) return kept;
    kept = kept.filter((_, i) => i !== at);
  }
  return kept;
}
