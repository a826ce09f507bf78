/**
 * The reducer: a state and an event in, the next state and what the outside has to do out. Pure; everything it needs to
 * know of the rest of the program comes with the world.
 */
import type { LogRecord } from '../../record/record.ts';
import { recordText } from '../../record/record-text.ts';
import type { ScreenSize } from '../../term/cell-writer.ts';
import { isTextKey, type Key, keyChord } from '../../term/key.ts';
import type { Message, State, Updated } from '../state.ts';
import type { World } from '../world.ts';
import { contextOf } from './context.ts';
import { actOnCurve } from './update-curve.ts';
import { actInEntry, pasteInEntry, typeInEntry } from './update-entry.ts';
import { actOnPage, openPage, pasteInFilter, typeInFilter } from './update-page.ts';
import { actInPicture, typeInPicture, typeOnField } from './update-picture.ts';
import { actInSearch, pasteInSearch, typeInSearch } from './update-search.ts';

export type Event =
  | { readonly kind: 'key'; readonly key: Key }
  | { readonly kind: 'paste'; readonly text: string }
  | { readonly kind: 'resize'; readonly size: ScreenSize }
  | { readonly kind: 'message'; readonly message: Message }
  /** A record could not be kept: it is shown, so that it can be taken by hand. */
  | { readonly kind: 'unkept'; readonly record: LogRecord; readonly text: string }
  /** Something the picture waits for has been worked out. */
  | { readonly kind: 'ready' };

export function update(state: State, event: Event, world: World): Updated {
  switch (event.kind) {
    case 'key':
      return updateKey(state, event.key, world);
    case 'paste':
      return plain(paste(state, event.text, world));
    case 'resize':
      return plain(sameSize(state.size, event.size) ? state : { ...state, size: event.size });
    case 'message':
      return plain({ ...state, message: event.message });
    case 'unkept':
      return plain(showUnkept(state, event.record, event.text));
    case 'ready':
      return plain({ ...state });
  }
}

export function plain(state: State): Updated {
  return { state, effects: [] };
}

function showUnkept(state: State, record: LogRecord, text: string): State {
  const copied = recordText(record, { ascii: state.preferences.glyphs === 'ascii' }).trimEnd();
  const shown = state.page?.name === 'copied' ? state : openPage(state, 'copied');
  return { ...shown, copied, message: { tone: 'refused', text: `${text}; the record is above` } };
}

const sameSize = (a: ScreenSize, b: ScreenSize): boolean => a.columns === b.columns && a.rows === b.rows;

function updateKey(state: State, key: Key, world: World): Updated {
  const context = contextOf(state);
  const action = world.bindings.actionOf(context, keyChord(key));
  if (action === 'interrupt') return { state, effects: [{ kind: 'quit', status: 130 }] };
  if (action === 'suspend') return { state, effects: [{ kind: 'suspend' }] };
  if (action === 'redraw') return { state, effects: [{ kind: 'redraw' }] };
  if (state.page && context === 'entry') {
    if (action) return plain(actOnPage(state, action, world));
    return plain(isTextKey(key) ? typeInFilter(state, key.char) : state);
  }
  switch (context) {
    case 'entry':
      if (action) return plain(actInEntry(state, action, world));
      return plain(isTextKey(key) ? typeInEntry(state, key.char) : state);
    case 'search':
      if (action) return plain(actInSearch(state, action, world));
      return plain(isTextKey(key) ? typeInSearch(state, key.char) : state);
    case 'page':
      return action === 'copy'
        ? actInPicture(state, action, world)
        : plain(action ? actOnPage(state, action, world) : state);
    case 'curve':
      if (action === 'log') return actInPicture(state, action, world);
      return action ? actOnCurve(state, action, world) : plain(state);
    case 'picture': {
      const typed = isTextKey(key) ? typeOnField(state, key.char, world) : undefined;
      if (typed) return plain(typed);
      if (action) return actInPicture(state, action, world);
      return plain(isTextKey(key) ? typeInPicture(state, key.char, world) : state);
    }
  }
}

/** A paste is text, never keys: it goes where text is typed, and opens that where the focus says so. */
function paste(state: State, text: string, world: World): State {
  if (state.entry) return pasteInEntry(state, text);
  if (state.search) return pasteInSearch(state, text);
  if (state.page) return state.page.isFiltering ? pasteInFilter(state, text) : state;
  if (state.curve) return state;
  const opened = typeInPicture(state, '', world);
  if (opened.entry) return pasteInEntry(opened, text);
  return opened.search ? pasteInSearch(opened, text) : opened;
}
