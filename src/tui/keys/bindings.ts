/**
 * The bindings in force: the table of actions with the user's own keys in place of its own, checked for clashes.
 * Promises: a remapping that cannot hold is named and left out, the rest holds; in a text field no printable key is
 * ever bound; Ctrl-C always quits.
 */
import { ACTION_IDS, ACTIONS, type Action, type ActionId, CONTEXTS, type Context } from './actions.ts';

export type KeyMap = Readonly<Partial<Record<ActionId, readonly string[]>>>;

export interface Bindings {
  readonly actions: readonly Action[];
  /** The action of a chord in a context; undefined where it has none there. */
  actionOf(context: Context, chord: string): ActionId | undefined;
  /** The first key of an action in a context, for footer and help. */
  keyOf(context: Context, id: ActionId): string | undefined;
}

export interface BindingResult {
  readonly bindings: Bindings;
  /** One line for each thing that is wrong with the user's keys. */
  readonly problems: readonly string[];
}

/** Two actions that answer to one key in one context. */
export interface Clash {
  readonly context: Context;
  readonly chord: string;
  readonly actions: readonly [ActionId, ActionId];
}

const TEXT_CONTEXTS: readonly Context[] = ['entry', 'search'];
/** Never remapped: the way out must not get lost. */
const FIXED: readonly ActionId[] = ['interrupt'];

export function bindKeys(remapped: KeyMap = {}): BindingResult {
  const problems: string[] = [];
  let actions = ACTIONS;
  for (const id of ACTION_IDS) {
    const keys = remapped[id];
    if (keys === undefined) continue;
    const next = withKeys(actions, id, keys);
    const wrong = whyNot(id, keys) ?? clashText(clashesOf(next)[0], id);
    if (wrong === undefined) actions = next;
    else problems.push(wrong);
  }
  return { bindings: compile(actions), problems };
}

/** Every key that would mean two things at once. */
export function clashesOf(actions: readonly Action[]): readonly Clash[] {
  const clashes: Clash[] = [];
  for (const context of CONTEXTS) {
    const owners = new Map<string, ActionId>();
    for (const action of actions) {
      if (!action.contexts.includes(context)) continue;
      for (const chord of action.keys) {
        const owner = owners.get(chord);
        if (owner !== undefined && owner !== action.id)
          clashes.push({ context, chord, actions: [owner, action.id] });
        else owners.set(chord, action.id);
      }
    }
  }
  return clashes;
}

/** True for a chord that is text in a text field. */
export function isPrintable(chord: string): boolean {
  return chord === 'space' || [...chord].length === 1;
}

function withKeys(actions: readonly Action[], id: ActionId, keys: readonly string[]): readonly Action[] {
  return actions.map((action) => {
    if (action.id !== id) return action;
    const isText = action.contexts.some((c) => TEXT_CONTEXTS.includes(c));
    const allowed = isText ? keys.filter((k) => !isPrintable(k)) : keys;
    return allowed.length === 0 ? action : { ...action, keys: allowed };
  });
}

const CHORD =
  /^(?:ctrl\+)?(?:alt\+)?(?:shift\+)?(?:space|enter|escape|backspace|delete|insert|tab|up|down|left|right|home|end|page-up|page-down|f(?:[1-9]|1[0-2])|[^\s\p{Cc}])$/u;

function whyNot(id: ActionId, keys: readonly string[]): string | undefined {
  if (FIXED.includes(id)) return `keys.${id} cannot be changed`;
  if (keys.length === 0) return `keys.${id} names no key`;
  const bad = keys.find((key) => !CHORD.test(key));
  return bad === undefined
    ? undefined
    : `keys.${id}: "${bad}" is no key; write for example "x", "ctrl+x", "alt+x", "shift+tab" or "page-down"`;
}

function clashText(clash: Clash | undefined, id: ActionId): string | undefined {
  if (!clash) return undefined;
  const other = clash.actions[0] === id ? clash.actions[1] : clash.actions[0];
  return `keys.${id}: "${clash.chord}" already means ${other}; give ${other} another key first`;
}

function compile(actions: readonly Action[]): Bindings {
  const tables = new Map<Context, Map<string, ActionId>>();
  for (const context of CONTEXTS) {
    const table = new Map<string, ActionId>();
    for (const action of actions) {
      if (action.contexts.includes(context)) for (const chord of action.keys) table.set(chord, action.id);
    }
    tables.set(context, table);
  }
  return {
    actions,
    actionOf: (context, chord) => tables.get(context)?.get(chord),
    keyOf: (context, id) => actions.find((a) => a.id === id && a.contexts.includes(context))?.keys[0],
  };
}
