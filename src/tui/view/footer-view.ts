/** The last line: at most six keys of the moment, the one for all keys always among them. */
import type { ActionId, Context } from '../keys/actions.ts';
import { keyText } from '../keys/key-names.ts';
import { isWordStop } from '../moves.ts';
import type { State } from '../state.ts';
import { contextOf } from '../update/context.ts';
import type { World } from '../world.ts';
import { lineOfSpans, type Pen, type Span, span, spansWidth } from './pen.ts';

const FOOTERS: Readonly<Record<Context, readonly ActionId[]>> = {
  picture: ['go-from', 'go-into', 'go-wave', 'go-angle', 'log'],
  entry: ['take', 'take-next', 'cancel', 'kill-to-start'],
  search: ['down', 'take', 'cancel', 'kill-to-start'],
  page: ['down', 'page-down', 'search', 'back'],
  curve: ['right', 'curves', 'open', 'copy', 'back'],
};

/** On a field that takes words, letters are no commands. */
const WORD_FOOTER: readonly ActionId[] = ['open', 'next-field', 'back'];

/** Lines of this page can be taken. */
const COATING_FOOTER: readonly ActionId[] = ['down', 'open', 'page-down', 'back'];

function footerOf(state: State, context: Context): readonly ActionId[] {
  if (context === 'page' && state.page?.name === 'coatings') return COATING_FOOTER;
  return context === 'picture' && isWordStop(state.focus) ? WORD_FOOTER : FOOTERS[context];
}

export function footerView(state: State, columns: number, pen: Pen, world: World): string {
  const context = contextOf(state);
  const ascii = state.preferences.glyphs === 'ascii';
  const gap = columns >= 60 ? '   ' : '  ';
  const items = footerOf(state, context).map((id) => footerItem(id, context, ascii, world));
  const help = helpItem(context, ascii, world);
  // The key for all keys always finds room; others give way from the right.
  while (items.length > 0 && footerWidth([...items, help], gap) > columns) items.pop();
  const spans = [...items, help].flatMap((item, i) => [span(i === 0 ? ' ' : gap), ...item]);
  return lineOfSpans(spans, columns, pen);
}

const footerWidth = (items: readonly (readonly Span[])[], gap: string): number =>
  1 + items.reduce((sum, item) => sum + spansWidth(item), 0) + gap.length * (items.length - 1);

/** While typing "?" is text: the keys are one Esc away. */
function helpItem(context: Context, ascii: boolean, world: World): readonly Span[] {
  const { bindings } = world;
  const isTyping = context === 'entry' || context === 'search';
  const help = keyText(bindings.keyOf(isTyping ? 'picture' : context, 'help') ?? '?', ascii);
  const back = isTyping ? `${keyText(bindings.keyOf(context, 'cancel') ?? 'escape', ascii)} ` : '';
  return [span(`${back}${help}`, 'key'), span(' keys')];
}

function footerItem(id: ActionId, context: Context, ascii: boolean, world: World): Span[] {
  const { bindings } = world;
  const action = bindings.actions.find((a) => a.id === id && a.contexts.includes(context));
  return [span(keyText(bindings.keyOf(context, id) ?? '', ascii), 'key'), span(` ${action?.label ?? id}`)];
}
