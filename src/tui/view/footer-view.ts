/** The last line: at most six keys of the moment, the one for all keys always among them. */
import type { ActionId, Context } from '../keys/actions.ts';
import { keyText } from '../keys/key-names.ts';
import type { State } from '../state.ts';
import { contextOf } from '../update/context.ts';
import type { World } from '../world.ts';
import { lineOfSpans, type Pen, type Span, span } from './pen.ts';

const FOOTERS: Readonly<Record<Context, readonly ActionId[]>> = {
  picture: ['go-from', 'go-into', 'go-wave', 'go-angle', 'polarization', 'help'],
  entry: ['take', 'take-next', 'cancel', 'kill-to-start'],
  search: ['down', 'take', 'cancel', 'kill-to-start'],
  page: ['down', 'page-down', 'search', 'back', 'help'],
};

export function footerView(state: State, columns: number, pen: Pen, world: World): string {
  const context = contextOf(state);
  const ascii = state.preferences.glyphs === 'ascii';
  const items = FOOTERS[context].map((id) => footerItem(id, context, ascii, world));
  // While typing "?" is text: the keys are one Esc away.
  if (context === 'entry' || context === 'search') {
    const back = keyText(world.bindings.keyOf(context, 'cancel') ?? 'escape', ascii);
    const help = keyText(world.bindings.keyOf('picture', 'help') ?? '?', ascii);
    items.push([span(`${back} ${help}`, 'key'), span(' keys')]);
  }
  const gap = columns >= 60 ? '   ' : '  ';
  const spans = items.flatMap((item, i) => [span(i === 0 ? ' ' : gap), ...item]);
  return lineOfSpans(spans, columns, pen);
}

function footerItem(id: ActionId, context: Context, ascii: boolean, world: World): Span[] {
  const { bindings } = world;
  const action = bindings.actions.find((a) => a.id === id && a.contexts.includes(context));
  return [span(keyText(bindings.keyOf(context, id) ?? '', ascii), 'key'), span(` ${action?.label ?? id}`)];
}
