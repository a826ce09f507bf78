/** The half in which a medium is being chosen. */
import { keyText } from '../keys/key-names.ts';
import { listLines } from '../picture/hit-list.ts';
import type { Search, State } from '../state.ts';
import type { World } from '../world.ts';
import { BLANK_LINE, entrySpans, lineOfSpans, type Pen, span } from './pen.ts';

export function listView(
  state: State,
  search: Search,
  columns: number,
  pen: Pen,
  world: World,
): readonly string[] {
  const ascii = state.preferences.glyphs === 'ascii';
  const label = ` ${search.side} `;
  const typed = lineOfSpans(
    [span(label), ...entrySpans(search.line, false, columns - label.length - 1), ...emptyHint(search, ascii)],
    columns,
    pen,
  );
  const lines = listLines(state, search, world, columns).map((line) => {
    if (line.kind === 'blank') return BLANK_LINE;
    if (line.kind === 'detail') return lineOfSpans([span('  '), span(line.text, 'aside')], columns, pen);
    const mark = line.isSelected ? pen.glyphs.focus : ' ';
    return lineOfSpans(
      [span(mark, 'marker'), span(line.text, line.isSelected ? 'focus' : 'text')],
      columns,
      pen,
    );
  });
  return [typed, ...lines];
}

function emptyHint(search: Search, ascii: boolean): ReturnType<typeof span>[] {
  return search.line.text === '' ? [span(`type a name; ${keyText('enter', ascii)} takes`, 'aside')] : [];
}
