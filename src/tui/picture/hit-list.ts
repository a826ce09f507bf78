/**
 * The list of media inside a half: the line being typed, one line a medium with its index and transparency, and more about
 * the marked one below. It takes the place of the half's own rows; the other half stays as it is.
 */
import { displayWidth } from '../../term/display-width.ts';
import { fitToWidth, padEndToWidth, padStartToWidth } from '../../term/fit-width.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { hitsFor } from '../hits.ts';
import type { Search, State } from '../state.ts';
import type { World } from '../world.ts';
import { type HitFacts, hitFacts } from './hit-facts.ts';
import { BLOCK_WIDTH, sceneOf } from './scene.ts';
import { wrapText } from './wrap.ts';

export interface ListLine {
  readonly kind: 'typed' | 'hit' | 'detail' | 'blank';
  readonly text: string;
  readonly isSelected: boolean;
}

const DETAIL_LINES = 4;
const FEWEST_FOR_DETAILS = 9;

/** Lines of the half that hold media. */
export function listRows(state: State, world: World): number {
  const { body } = sceneOf(state, world).plan;
  return Math.max(1, body - 1 - detailLines(body));
}

const detailLines = (body: number): number => (body < FEWEST_FOR_DETAILS ? 0 : DETAIL_LINES);

/** The lines under the line being typed; that one is drawn by the half itself. */
export function listLines(state: State, search: Search, world: World, columns: number): readonly ListLine[] {
  const style = { ascii: state.preferences.glyphs === 'ascii' };
  const { body } = sceneOf(state, world).plan;
  const width = Math.min(columns, BLOCK_WIDTH);
  const rows = listRows(state, world);
  const hits = hitsFor(search.line.text, state.recent, state.question, world);
  const seen = hits.slice(search.top, search.top + rows);
  const facts = seen.map((hit) => hitFacts(hit, state.question, world, style));
  const lines: ListLine[] = facts.map((f, i) => ({
    kind: 'hit',
    text: hitLine(f, columnsFor(facts, width), style.ascii),
    isSelected: search.top + i === search.selected,
  }));
  while (lines.length < rows) lines.push(BLANK);
  const marked = facts[search.selected - search.top];
  const count = hits.length > rows ? `${search.selected + 1} of ${hits.length}. ` : '';
  const details = marked ? wrapText(`${count}${marked.details.join('; ')}`, width - 2) : [];
  const room = detailLines(body);
  for (let i = 0; i < room; i++) {
    const isCut = i === room - 1 && details.length > room;
    const text = isCut
      ? fitToWidth(`${details[i]} ${details[i + 1]}`, width - 2, style.ascii ? '.' : '…')
      : details[i];
    const shown = text !== undefined && style.ascii ? toAscii(text) : text;
    lines.push(shown === undefined ? BLANK : { kind: 'detail', text: shown, isSelected: false });
  }
  return lines;
}

const BLANK: ListLine = { kind: 'blank', text: '', isSelected: false };

interface HitColumns {
  readonly name: number;
  readonly index: number;
  readonly transparency: number;
}

/** As wide as what is in sight needs; the name takes the rest. */
function columnsFor(facts: readonly HitFacts[], width: number): HitColumns {
  const index = Math.max(1, ...facts.map((f) => displayWidth(f.index)));
  const transparency = Math.max(1, ...facts.map((f) => displayWidth(f.transparency)));
  return { name: Math.max(4, width - 2 - index - transparency - 2), index, transparency };
}

/** "Fused silica     1.4570 clear" */
function hitLine(facts: HitFacts, columns: HitColumns, ascii: boolean): string {
  const name = ascii ? toAscii(facts.name) : facts.name;
  const cut = fitToWidth(name, columns.name, ascii ? '.' : '…');
  return `${cut} ${padStartToWidth(facts.index, columns.index)} ${padEndToWidth(facts.transparency, columns.transparency)}`;
}
