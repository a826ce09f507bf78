/**
 * What a key press is to the program: one record per key, whatever bytes the terminal sent for it.
 *
 * Promises: a printable key is `char` with exactly one code point in `char`; letters with Ctrl are lower case.
 * Special cases: 0x7f and 0x08 are both `backspace`; CR and LF are both `enter`; what a terminal cannot tell apart
 * (Ctrl-I and Tab, Ctrl-M and Enter, Ctrl-[ and Escape) has the name of the key. `shift` is set only where the
 * terminal reports it and the character does not show it already.
 */
export type KeyName =
  | 'char'
  | 'enter'
  | 'escape'
  | 'backspace'
  | 'delete'
  | 'insert'
  | 'tab'
  | 'up'
  | 'down'
  | 'left'
  | 'right'
  | 'home'
  | 'end'
  | 'page-up'
  | 'page-down'
  | `f${1 | 2 | 3 | 4 | 5 | 6 | 7 | 8 | 9 | 10 | 11 | 12}`;

export interface Key {
  readonly name: KeyName;
  readonly char?: string;
  readonly ctrl: boolean;
  readonly alt: boolean;
  readonly shift: boolean;
}

export interface Modifiers {
  readonly ctrl?: boolean;
  readonly alt?: boolean;
  readonly shift?: boolean;
}

/** A key that is not printable. */
export function namedKey(name: Exclude<KeyName, 'char'>, modifiers: Modifiers = {}): Key {
  const { ctrl = false, alt = false, shift = false } = modifiers;
  return { name, ctrl, alt, shift };
}

/** A printable key. */
export function charKey(char: string, modifiers: Modifiers = {}): Key {
  const { ctrl = false, alt = false, shift = false } = modifiers;
  return { name: 'char', char, ctrl, alt, shift };
}

/** True for a key that is text in a text field: printable, without Ctrl and Alt. */
export function isTextKey(key: Key): key is Key & { readonly char: string } {
  return key.name === 'char' && !key.ctrl && !key.alt;
}

/**
 * The name of a key for tables of bindings: the character or the key's name after its modifiers, as in
 * 'q', 'G', 'space', 'ctrl+c', 'alt+v', 'shift+tab', 'page-down'.
 */
export function keyChord(key: Key): string {
  const base = key.name === 'char' ? (key.char === ' ' ? 'space' : (key.char ?? '')) : key.name;
  return `${key.ctrl ? 'ctrl+' : ''}${key.alt ? 'alt+' : ''}${key.shift ? 'shift+' : ''}${base}`;
}
