/** On a small screen: which of the three parts is shown, and what lies to its left and right. */
import { cutToWidth } from '../../term/fit-width.ts';
import { toAscii } from '../../units/to-ascii.ts';
import { mediumName } from '../fields/medium-fields.ts';
import { PLACES, type Place } from '../picture/scene.ts';
import type { State } from '../state.ts';
import { lineOfSpans, type Pen, type Span, span } from './pen.ts';

const SURFACE = 'surface';

export function pathView(state: State, columns: number, pen: Pen): string {
  const ascii = state.preferences.glyphs === 'ascii';
  const room = Math.max(4, Math.floor((columns - SURFACE.length - 8) / 2));
  const nameOf = (place: Place): string => {
    if (place === 'interface') return SURFACE;
    const name = mediumName(state.question[place]);
    return cutToWidth(ascii ? toAscii(name) : name, room, pen.glyphs.more);
  };
  const spans = PLACES.flatMap((place, i): Span[] => {
    const isHere = place === state.place;
    return [
      ...(i === 0 ? [] : [span(` ${pen.glyphs.rail}`, 'boundary')]),
      span(isHere ? pen.glyphs.focus : ' ', 'marker'),
      span(nameOf(place), isHere ? 'heading' : 'text'),
    ];
  });
  return lineOfSpans(spans, columns, pen);
}
