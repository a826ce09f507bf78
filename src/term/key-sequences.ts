/**
 * The key behind one complete control sequence (CSI) or single shift (SS3), in the encodings that terminals use:
 * xterm (normal and application mode, modifiers as second parameter), the Linux console, rxvt, and the two
 * extended forms `CSI code;modifiers u` and `CSI 27;modifiers;code ~`.
 * Everything that is no key (replies, focus and mouse reports, unknown sequences) gives null.
 */
import { charKey, type Key, type KeyName, type Modifiers, namedKey } from './key.ts';

type NamedKey = Exclude<KeyName, 'char'>;

const BY_LETTER: Readonly<Record<string, NamedKey>> = {
  A: 'up',
  B: 'down',
  C: 'right',
  D: 'left',
  F: 'end',
  H: 'home',
  P: 'f1',
  Q: 'f2',
  R: 'f3',
  S: 'f4',
};

const BY_NUMBER: Readonly<Record<number, NamedKey>> = {
  1: 'home',
  2: 'insert',
  3: 'delete',
  4: 'end',
  5: 'page-up',
  6: 'page-down',
  7: 'home',
  8: 'end',
  11: 'f1',
  12: 'f2',
  13: 'f3',
  14: 'f4',
  15: 'f5',
  17: 'f6',
  18: 'f7',
  19: 'f8',
  20: 'f9',
  21: 'f10',
  23: 'f11',
  24: 'f12',
};

const CONSOLE_FUNCTION: Readonly<Record<string, NamedKey>> = { A: 'f1', B: 'f2', C: 'f3', D: 'f4', E: 'f5' };

/** rxvt marks modifiers by the last character of a numbered key. */
const RXVT_ENDINGS: Readonly<Record<string, Modifiers>> = {
  $: { shift: true },
  '^': { ctrl: true },
  '@': { ctrl: true, shift: true },
};

/** The key of `ESC O letter`; lower-case arrows are rxvt's with Ctrl. */
export function keyOfSingleShift(letter: string): Key | null {
  const name = BY_LETTER[letter];
  if (name !== undefined) return namedKey(name);
  if (letter === 'M') return namedKey('enter');
  const arrow = 'abcd'.includes(letter) ? BY_LETTER[letter.toUpperCase()] : undefined;
  return arrow === undefined ? null : namedKey(arrow, { ctrl: true });
}

/** The key of `ESC [ [ letter`, the Linux console's first five function keys. */
export function keyOfConsoleFunction(letter: string): Key | null {
  const name = CONSOLE_FUNCTION[letter];
  return name === undefined ? null : namedKey(name);
}

/** The key of `ESC [ parameters final`, null for anything else that has this form. */
export function keyOfControlSequence(parameters: string, final: string): Key | null {
  if (/^[<=>?]/.test(parameters)) return null;
  const [first, second, third] = parameters.split(';').map((part) => Number.parseInt(part, 10));
  if (final === 'u') return keyOfCode(first, modifiersOf(second));
  if (final === '~' && first === 27) return keyOfCode(third, modifiersOf(second));
  if (final === '~') return named(BY_NUMBER[first ?? 0], modifiersOf(second));
  const rxvt = RXVT_ENDINGS[final];
  if (rxvt !== undefined) return named(BY_NUMBER[first ?? 0], rxvt);
  if (final === 'Z') return namedKey('tab', { shift: true });
  if (parameters === '' && 'abcd'.includes(final))
    return named(BY_LETTER[final.toUpperCase()], { shift: true });
  // `ESC [ row ; column R` is also the report of the cursor's position; as a key the first number is always 1.
  if (final === 'R' && parameters !== '' && (first !== 1 || (second ?? 0) < 2 || (second ?? 0) > 16))
    return null;
  return named(BY_LETTER[final], modifiersOf(second));
}

function named(name: NamedKey | undefined, modifiers: Modifiers): Key | null {
  return name === undefined ? null : namedKey(name, modifiers);
}

/** The second parameter counts from 1: 1 + shift 1 + alt 2 + ctrl 4. */
function modifiersOf(parameter: number | undefined): Modifiers {
  const bits = Number.isInteger(parameter) ? (parameter ?? 1) - 1 : 0;
  return { shift: (bits & 1) !== 0, alt: (bits & 2) !== 0, ctrl: (bits & 4) !== 0 };
}

function keyOfCode(code: number | undefined, modifiers: Modifiers): Key | null {
  if (code === undefined || !Number.isInteger(code) || code > 0x10ffff) return null;
  if (code === 13) return namedKey('enter', modifiers);
  if (code === 27) return namedKey('escape', modifiers);
  if (code === 9) return namedKey('tab', modifiers);
  if (code === 127 || code === 8) return namedKey('backspace', modifiers);
  const char = String.fromCodePoint(code);
  // The functional keys of these encodings lie in the private-use area.
  if (!/[\p{L}\p{M}\p{N}\p{P}\p{S}\p{Zs}]/u.test(char)) return null;
  const { ctrl = false, alt = false, shift = false } = modifiers;
  return charKey(ctrl ? char.toLowerCase() : shift ? char.toUpperCase() : char, { ctrl, alt });
}
