/**
 * The shortest escape sequence that moves the terminal's cursor.
 * Promises: only sequences that xterm, the Linux console, screen, tmux and PuTTY agree on; no step relies on what a
 * terminal does at the right edge after its last column was written.
 */

/** Column and row counted from 0; `UNKNOWN` where the terminal's own position is not certain. */
export interface CursorPosition {
  readonly x: number;
  readonly y: number;
}

export const UNKNOWN = -1;

/** Next line (NEL). Not CR LF: the line discipline of the terminal device would add a second CR to that. */
const NEXT_LINE = '\x1bE';

/** The shortest move; '' where the cursor is certain to be there already. */
export function cursorMove(from: CursorPosition, to: CursorPosition): string {
  if (from.x === to.x && from.y === to.y) return '';
  let best = absolute(to);
  const consider = (candidate: string): void => {
    if (candidate.length < best.length) best = candidate;
  };
  if (from.y === UNKNOWN) return best;
  if (from.y === to.y) {
    consider(to.x === 0 ? '\r' : `\x1b[${to.x + 1}G`);
    if (from.x !== UNKNOWN) consider(sideways(to.x - from.x));
  } else if (to.x === 0 && to.y === from.y + 1) {
    consider(NEXT_LINE);
  } else if (from.x === to.x) {
    consider(counted(Math.abs(to.y - from.y), to.y > from.y ? 'B' : 'A'));
  }
  return best;
}

function absolute({ x, y }: CursorPosition): string {
  if (x === 0) return y === 0 ? '\x1b[H' : `\x1b[${y + 1}H`;
  return `\x1b[${y === 0 ? '' : y + 1};${x + 1}H`;
}

function sideways(columns: number): string {
  if (columns > 0) return counted(columns, 'C');
  return columns >= -3 ? '\b'.repeat(-columns) : counted(-columns, 'D');
}

const counted = (count: number, letter: string): string => `\x1b[${count === 1 ? '' : count}${letter}`;
