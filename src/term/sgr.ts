/**
 * Text styles (SGR: select graphic rendition) as interned values, and the shortest way from one style to another.
 *
 * Promises: two equal styles are the same object, so styles compare by `===`; a transition is at most as long as
 * "reset and set anew".
 * Special cases: blinking, hidden text and anything else this program never writes are ignored on input.
 */
export interface Style {
  /** Parameters that switch the style on from the default, joined by ';' ('' for the default style). */
  readonly code: string;
  /** True where a blank cell in this style looks different from a blank cell in the default style. */
  readonly showsOnBlank: boolean;
  readonly slots: Slots;
}

/** One entry per independent attribute, in this order; '' means off. */
type Slots = readonly string[];
const BOLD = 0;
const DIM = 1;
const ITALIC = 2;
const UNDERLINE = 3;
const INVERSE = 4;
const STRIKE = 5;
const FOREGROUND = 6;
const BACKGROUND = 7;
const OFF_CODES = ['22', '22', '23', '24', '27', '29', '39', '49'] as const;

const interned = new Map<string, Style>();

function intern(slots: Slots): Style {
  const code = slots.filter((slot) => slot !== '').join(';');
  let style = interned.get(code);
  if (style === undefined) {
    const showsOnBlank = [UNDERLINE, INVERSE, STRIKE, BACKGROUND].some((slot) => slots[slot] !== '');
    style = { code, showsOnBlank, slots };
    interned.set(code, style);
  }
  return style;
}

/** The terminal's default style. */
export const PLAIN: Style = intern(['', '', '', '', '', '', '', '']);

/** The style after the parameters of one SGR sequence (the text between `ESC[` and `m`). */
export function applySgr(style: Style, parameters: string): Style {
  const codes = parameters.split(';');
  const slots = [...style.slots];
  for (let i = 0; i < codes.length; i++) {
    const text = codes[i] ?? '';
    const code = Number(text);
    if (code === 0) slots.fill('');
    else if (code === 1) slots[BOLD] = '1';
    else if (code === 2) slots[DIM] = '2';
    else if (code === 3) slots[ITALIC] = '3';
    else if (code === 4) slots[UNDERLINE] = '4';
    else if (code === 7) slots[INVERSE] = '7';
    else if (code === 9) slots[STRIKE] = '9';
    else if (code === 22) slots[BOLD] = slots[DIM] = '';
    else if (code === 23) slots[ITALIC] = '';
    else if (code === 24) slots[UNDERLINE] = '';
    else if (code === 27) slots[INVERSE] = '';
    else if (code === 29) slots[STRIKE] = '';
    else if (code === 39) slots[FOREGROUND] = '';
    else if (code === 49) slots[BACKGROUND] = '';
    else if ((code >= 30 && code <= 37) || (code >= 90 && code <= 97)) slots[FOREGROUND] = text;
    else if ((code >= 40 && code <= 47) || (code >= 100 && code <= 107)) slots[BACKGROUND] = text;
    else if (code === 38 || code === 48) {
      const length = codes[i + 1] === '5' ? 3 : 5;
      slots[code === 38 ? FOREGROUND : BACKGROUND] = codes.slice(i, i + length).join(';');
      i += length - 1;
    }
  }
  return intern(slots);
}

const transitions = new Map<Style, Map<Style, string>>();

/** The shortest sequence that takes the terminal from one style to another ('' where they are the same). */
export function styleTransition(from: Style, to: Style): string {
  if (from === to) return '';
  let row = transitions.get(from);
  if (row === undefined) {
    row = new Map();
    transitions.set(from, row);
  }
  let sequence = row.get(to);
  if (sequence === undefined) {
    sequence = shortestTransition(from, to);
    row.set(to, sequence);
  }
  return sequence;
}

function shortestTransition(from: Style, to: Style): string {
  if (to === PLAIN) return '\x1b[m';
  const anew = from === PLAIN ? `\x1b[${to.code}m` : `\x1b[;${to.code}m`;
  const changes: string[] = [];
  // Bold and dim share one "off" code, so that switching one off may mean switching the other on again.
  const clearsWeight = [BOLD, DIM].some((slot) => from.slots[slot] !== '' && to.slots[slot] === '');
  if (clearsWeight) changes.push(OFF_CODES[BOLD]);
  to.slots.forEach((slot, index) => {
    const before = clearsWeight && index <= DIM ? '' : from.slots[index];
    if (slot !== before) changes.push(slot === '' ? (OFF_CODES[index] ?? '') : slot);
  });
  const stepwise = `\x1b[${changes.join(';')}m`;
  return stepwise.length <= anew.length ? stepwise : anew;
}
