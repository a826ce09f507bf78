/**
 * Copying text to the clipboard of the machine the user sits at, over any number of SSH hops, by the terminal's
 * operating-system command 52 (write only; the clipboard is never read).
 *
 * Promises: one write to the terminal; at most `MAX_COPY_BYTES` bytes of UTF-8; the message says what was done and
 * never claims more than is known, because no terminal confirms the copy.
 * Special cases: inside tmux the text goes through `tmux load-buffer -w -`, which works with its default settings, and
 * as a plain sequence where that fails; inside GNU Screen the sequence is cut into device control strings of
 * `SCREEN_PIECE_BYTES`, which Screen passes on.
 */
import { spawn } from 'node:child_process';
import type { Environment } from './ability.ts';

/** xterm takes at most 100,000 bytes of sequence: this much text after base64 and the sequence's own bytes. */
export const MAX_COPY_BYTES = 74_994;
/** Screen drops longer strings. */
const SCREEN_PIECE_BYTES = 200;
const TMUX_TIMEOUT_MS = 1000;

export interface CopyResult {
  /** `none`: nothing was copied. */
  readonly way: 'terminal' | 'tmux' | 'screen' | 'none';
  /** One sentence for the user. */
  readonly message: string;
}

export interface CopyMeans {
  readonly env: Environment;
  /** Writes to the terminal. */
  readonly write: (sequence: string) => void;
  /** Hands the text to tmux; false where tmux did not take it. */
  readonly loadTmuxBuffer?: (text: string) => Promise<boolean>;
}

/** Copies `text`; never throws. */
export async function copyText(text: string, means: CopyMeans): Promise<CopyResult> {
  const { env, write, loadTmuxBuffer: loadBuffer = loadTmuxBuffer } = means;
  const bytes = Buffer.byteLength(text);
  if (bytes > MAX_COPY_BYTES) {
    const limit = `terminals take at most ${MAX_COPY_BYTES} bytes`;
    return { way: 'none', message: `Not copied: ${limit} and this is ${bytes}; write it to a file instead.` };
  }
  if (env['TMUX'] && (await loadBuffer(text))) {
    return {
      way: 'tmux',
      message: 'In the tmux buffer (prefix ]), and on your clipboard if your terminal allows it.',
    };
  }
  if (env['STY'] && !env['TMUX']) {
    write(screenSequence(text));
    return { way: 'screen', message: SENT };
  }
  write(clipboardSequence(text));
  return { way: 'terminal', message: SENT };
}

const SENT = 'Sent to your clipboard, if your terminal allows it.';

/** The plain sequence. */
export function clipboardSequence(text: string): string {
  return `\x1b]52;c;${Buffer.from(text, 'utf8').toString('base64')}\x07`;
}

/** The sequence in pieces that GNU Screen passes on to the terminal outside. */
export function screenSequence(text: string): string {
  const whole = clipboardSequence(text);
  let pieces = '';
  for (let at = 0; at < whole.length; at += SCREEN_PIECE_BYTES) {
    pieces += `\x1bP${whole.slice(at, at + SCREEN_PIECE_BYTES)}\x1b\\`;
  }
  return pieces;
}

/** Runs `tmux load-buffer -w -` with the text as its input. */
function loadTmuxBuffer(text: string): Promise<boolean> {
  return new Promise((resolve) => {
    const child = spawn('tmux', ['load-buffer', '-w', '-'], {
      stdio: ['pipe', 'ignore', 'ignore'],
      timeout: TMUX_TIMEOUT_MS,
    });
    child.on('error', () => resolve(false));
    child.on('close', (code) => resolve(code === 0));
    // A tmux that ends before it has read everything reports that by its exit code.
    child.stdin.on('error', () => {});
    child.stdin.end(text);
  });
}
