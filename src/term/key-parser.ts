/**
 * From the text a terminal sends to keys and pastes. Pure: no timers and no streams; the owner of the parser asks
 * `hold_ms` how long to wait for the rest of an unfinished sequence and calls `expire` when nothing came.
 *
 * Promises: one event per key, however keys are glued together or sequences torn apart; a bracketed paste is one event
 * and never a key; replies and reports of the terminal (colours, attributes, focus, mouse, positions) give no event,
 * and no part of a sequence is ever taken for text.
 * Special cases: ESC and a key in one piece are Alt and that key, as terminals send it, but Ctrl-C and Ctrl-Z act whatever a
 * slow link or a busy program has glued to them: they are Escape and that key; ESC at the end of one piece and
 * ESC at the start of the next are two key presses; a sequence that never ends is dropped, a paste that never ends is
 * handed over as far as it came; CR LF is one Enter.
 */
import { stripEscapes } from './display-width.ts';
import { charKey, type Key, namedKey } from './key.ts';
import { keyOfConsoleFunction, keyOfControlSequence, keyOfSingleShift } from './key-sequences.ts';

export type InputEvent =
  | { readonly kind: 'key'; readonly key: Key }
  | { readonly kind: 'paste'; readonly text: string };

/** A lone ESC acts within 60 ms, the owner's reaction included; an arrow torn by a slow link has 50 ms to arrive. */
export const ESCAPE_HOLD_MS = 56;
/** After `ESC [` or `ESC O` a key is certain to follow: waiting longer costs nothing. */
const SEQUENCE_HOLD_MS = 150;
/** Replies are long and may come in several packets; typed text never starts like one. */
const REPLY_HOLD_MS = 1000;
const PASTE_HOLD_MS = 5000;
const MAX_SEQUENCE_LENGTH = 64;
const MAX_REPLY_LENGTH = 4096;

const ESC = '\x1b';
const CTRL_C = '\x03';
const CTRL_Z = '\x1a';
const PASTE_START = '\x1b[200~';
const PASTE_END = '\x1b[201~';
const CONTROL_SEQUENCE = /^\x1b\[([0-?]*)([ -/]*)([@-~])/;
const CONTROL_SEQUENCE_START = /^\x1b\[[0-?]*[ -/]*/;
const RXVT_SHIFTED = /^\x1b\[(\d+)\$/;
/** The starts of operating-system, device and application strings as terminals send them. */
const REPLY_START = /^\x1b(?:\]\d|P[\d!$+=>|]|_G)/;
const REPLY = /^\x1b[\]P_][^\x07\x1b\x9c]*(?:\x07|\x1b\\|\x9c)/;

/** What stands at the start of the text: a key or nothing (null), and its length; or a start without an end. */
type Scan = { readonly length: number; readonly key: Key | null } | 'unfinished';

export class KeyParser {
  #rest = '';
  #paste: string | null = null;

  /** Takes the next piece of text, as it was read, and gives the events that are certain. */
  push(text: string): InputEvent[] {
    const events: InputEvent[] = [];
    if (this.#paste === null && this.#rest === ESC && text.startsWith(ESC)) {
      events.push({ kind: 'key', key: namedKey('escape') });
      this.#rest = '';
    }
    this.#rest += text;
    this.#read(events, false);
    return events;
  }

  /** How long to wait for more before `expire`; null where nothing is held back. */
  get hold_ms(): number | null {
    if (this.#paste !== null) return PASTE_HOLD_MS;
    if (this.#rest === '') return null;
    if (this.#rest === ESC) return ESCAPE_HOLD_MS;
    return REPLY_START.test(this.#rest) ? REPLY_HOLD_MS : SEQUENCE_HOLD_MS;
  }

  /** Decides what was held back, because nothing followed in time. */
  expire(): InputEvent[] {
    const events: InputEvent[] = [];
    this.#read(events, true);
    return events;
  }

  #read(events: InputEvent[], isFinal: boolean): void {
    for (;;) {
      if (this.#paste !== null) {
        if (!this.#readPaste(events, isFinal)) return;
      } else if (this.#rest.startsWith(PASTE_START)) {
        this.#rest = this.#rest.slice(PASTE_START.length);
        this.#paste = '';
      } else {
        if (this.#rest === '') return;
        const found = scan(this.#rest);
        if (found === 'unfinished' && !isFinal) return;
        const { length, key } = found === 'unfinished' ? giveUp(this.#rest) : found;
        this.#rest = this.#rest.slice(length);
        if (key !== null) events.push({ kind: 'key', key });
      }
    }
  }

  /** Reads on in a paste; false where its end has not come yet. */
  #readPaste(events: InputEvent[], isFinal: boolean): boolean {
    const end = this.#rest.indexOf(PASTE_END);
    if (end < 0 && !isFinal) {
      // The end mark itself may be torn: its possible start stays.
      const safe = Math.max(0, this.#rest.length - PASTE_END.length + 1);
      this.#paste += this.#rest.slice(0, safe);
      this.#rest = this.#rest.slice(safe);
      return false;
    }
    const text = this.#paste + (end < 0 ? this.#rest : this.#rest.slice(0, end));
    this.#rest = end < 0 ? '' : this.#rest.slice(end + PASTE_END.length);
    this.#paste = null;
    events.push({ kind: 'paste', text: cleanPaste(text) });
    return true;
  }
}

/** Line ends become '\n'; escape sequences and control characters other than tab are taken out. */
function cleanPaste(text: string): string {
  return stripEscapes(text.replace(/\r\n?/g, '\n')).replace(/[\0-\x08\x0b-\x1f\x7f-\x9f]/g, '');
}

function scan(text: string): Scan {
  if (text[0] !== ESC) return scanCharacter(text);
  if (text === ESC) return 'unfinished';
  switch (text[1]) {
    case '[':
      return scanControlSequence(text);
    case 'O':
      return scanSingleShift(text);
    case ESC:
      return scanDoubleEscape(text);
    case ']':
    case 'P':
    case '_':
      return scanReply(text);
    case CTRL_C:
    case CTRL_Z:
      return { length: 1, key: namedKey('escape') };
    default:
      return withAlt(scanCharacter(text.slice(1)));
  }
}

function scanCharacter(text: string): { length: number; key: Key | null } {
  const code = text.codePointAt(0) ?? 0;
  const char = String.fromCodePoint(code);
  if (char === '\r') return { length: text[1] === '\n' ? 2 : 1, key: namedKey('enter') };
  return { length: char.length, key: keyOfCharacter(code, char) };
}

function keyOfCharacter(code: number, char: string): Key | null {
  if (code === 0x0a) return namedKey('enter');
  if (code === 0x09) return namedKey('tab');
  if (code === 0x08 || code === 0x7f) return namedKey('backspace');
  if (code === 0) return charKey(' ', { ctrl: true });
  if (code < 0x20) return charKey(String.fromCharCode(code + 0x40).toLowerCase(), { ctrl: true });
  // C1 controls are no keys; U+FFFD stands for bytes that were no UTF-8.
  if ((code >= 0x80 && code < 0xa0) || code === 0xfffd) return null;
  return charKey(char);
}

function scanControlSequence(text: string): Scan {
  if (text.startsWith('\x1b[[')) {
    return text.length < 4 ? 'unfinished' : { length: 4, key: keyOfConsoleFunction(text[3] ?? '') };
  }
  // The oldest mouse report carries three characters after its end.
  if (text.startsWith('\x1b[M')) return text.length < 6 ? 'unfinished' : { length: 6, key: null };
  const shifted = RXVT_SHIFTED.exec(text);
  if (shifted !== null)
    return { length: shifted[0].length, key: keyOfControlSequence(shifted[1] ?? '', '$') };
  const match = CONTROL_SEQUENCE.exec(text);
  if (match !== null) {
    const [whole, parameters = '', intermediates, final = ''] = match;
    const key = intermediates === '' ? keyOfControlSequence(parameters, final) : null;
    return { length: whole.length, key };
  }
  const started = CONTROL_SEQUENCE_START.exec(text)?.[0].length ?? text.length;
  const mayGoOn = started === text.length && started <= MAX_SEQUENCE_LENGTH;
  return mayGoOn ? 'unfinished' : { length: started, key: null };
}

function scanSingleShift(text: string): Scan {
  if (text.length < 3) return 'unfinished';
  const key = keyOfSingleShift(text[2] ?? '');
  return key === null ? withAlt(scanCharacter('O')) : { length: 3, key };
}

/** Some terminals send Alt and an arrow as ESC before the arrow's sequence; anything else is two key presses. */
function scanDoubleEscape(text: string): Scan {
  if (text.length === 2) return 'unfinished';
  if (text[2] !== '[' && text[2] !== 'O') return { length: 1, key: namedKey('escape') };
  const inner = scan(text.slice(1));
  return inner === 'unfinished' ? 'unfinished' : withAlt(inner);
}

function scanReply(text: string): Scan {
  if (text.length < 3) return 'unfinished';
  if (!REPLY_START.test(text)) return withAlt(scanCharacter(text.slice(1)));
  const match = REPLY.exec(text);
  if (match !== null) return { length: match[0].length, key: null };
  return text.length <= MAX_REPLY_LENGTH ? 'unfinished' : { length: text.length, key: null };
}

function withAlt({ length, key }: { length: number; key: Key | null }): { length: number; key: Key | null } {
  return { length: length + 1, key: key === null ? null : { ...key, alt: true } };
}

/** What an unfinished text was after all. */
function giveUp(text: string): { length: number; key: Key | null } {
  if (text === ESC || text.startsWith('\x1b\x1b')) return { length: 1, key: namedKey('escape') };
  if (text.length === 2) return withAlt(scanCharacter(text.slice(1)));
  return { length: text.length, key: null };
}
