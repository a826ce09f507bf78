/** Keys as they are written on screen: arrows as signs where the terminal has them, "page-up" as "PgUp". */
const SIGNS: Readonly<Record<string, readonly [screen: string, ascii: string]>> = {
  up: ['↑', 'up'],
  down: ['↓', 'down'],
  left: ['←', 'left'],
  right: ['→', 'right'],
  enter: ['Enter', 'Enter'],
  escape: ['Esc', 'Esc'],
  tab: ['Tab', 'Tab'],
  backspace: ['Backspace', 'Backspace'],
  delete: ['Del', 'Del'],
  home: ['Home', 'Home'],
  end: ['End', 'End'],
  space: ['Space', 'Space'],
  'page-up': ['PgUp', 'PgUp'],
  'page-down': ['PgDn', 'PgDn'],
};

/** "ctrl+u" -> "Ctrl-U", "shift+tab" -> "Shift-Tab", "G" -> "G". */
export function keyText(chord: string, ascii: boolean): string {
  const parts = /^(ctrl\+)?(alt\+)?(shift\+)?(.+)$/.exec(chord);
  if (!parts) return chord;
  const [, ctrl, alt, shift, key = ''] = parts;
  const sign = SIGNS[key]?.[ascii ? 1 : 0];
  const base = sign ?? (ctrl ? key.toUpperCase() : key);
  return `${ctrl ? 'Ctrl-' : ''}${alt ? 'Alt-' : ''}${shift ? 'Shift-' : ''}${base}`;
}
