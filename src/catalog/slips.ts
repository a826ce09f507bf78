/**
 * Typing slips between a typed text and a name: letters missing, added, wrong or swapped with their neighbour (the optimal
 * string alignment distance; F. J. Damerau, Comm. ACM 7, 171 (1964)).
 */
export interface Slips {
  /** To the whole name. */
  readonly whole: number;
  /** To the beginning of the name that comes closest. */
  readonly beginning: number;
}

/** @param most slips of interest: a count above it is infinite, and costs less to find. */
export function countSlips(typed: string, name: string, most = Number.POSITIVE_INFINITY): Slips {
  // No beginning longer than this is within reach.
  const width = Math.min(name.length, typed.length + most);
  let [beforeLast, last, row] = rowsOf(width + 1);
  for (let j = 0; j <= width; j++) last[j] = j;
  let leastBefore = 0;
  for (let i = 1; i <= typed.length; i++) {
    const letter = typed.charCodeAt(i - 1);
    const letterBefore = typed.charCodeAt(i - 2);
    let left = i;
    let least = i;
    row[0] = i;
    for (let j = 1; j <= width; j++) {
      const other = name.charCodeAt(j - 1);
      let best = Math.min(last[j]! + 1, left + 1, last[j - 1]! + (letter === other ? 0 : 1));
      if (i > 1 && j > 1 && letter === name.charCodeAt(j - 2) && letterBefore === other)
        best = Math.min(best, beforeLast[j - 2]! + 1);
      row[j] = best;
      left = best;
      if (best < least) least = best;
    }
    // A swap looks back two rows: two in a row above the limit, and all later ones are.
    if (least > most && leastBefore > most) return BEYOND;
    leastBefore = least;
    [beforeLast, last, row] = [last, row, beforeLast];
  }
  let beginning = Number.POSITIVE_INFINITY;
  for (let j = 0; j <= width; j++) beginning = Math.min(beginning, last[j]!);
  const whole = width === name.length ? last[width]! : Number.POSITIVE_INFINITY;
  return { whole: within(whole, most), beginning: within(beginning, most) };
}

const BEYOND: Slips = { whole: Number.POSITIVE_INFINITY, beginning: Number.POSITIVE_INFINITY };

const within = (count: number, most: number): number => (count > most ? Number.POSITIVE_INFINITY : count);

type Rows = [Uint32Array, Uint32Array, Uint32Array];
let rows: Rows = [new Uint32Array(0), new Uint32Array(0), new Uint32Array(0)];

/** The same three for every call; what they hold is written before it is read. */
function rowsOf(length: number): Rows {
  if (rows[0].length < length)
    rows = [new Uint32Array(2 * length), new Uint32Array(2 * length), new Uint32Array(2 * length)];
  return [...rows];
}
