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

export function countSlips(typed: string, name: string): Slips {
  const width = name.length + 1;
  let beforeLast = new Array<number>(width).fill(0);
  let last = Array.from({ length: width }, (_, j) => j);
  for (let i = 1; i <= typed.length; i++) {
    const row = [i];
    for (let j = 1; j < width; j++) {
      const same = typed[i - 1] === name[j - 1];
      let best = Math.min((last[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1, (last[j - 1] ?? 0) + (same ? 0 : 1));
      if (i > 1 && j > 1 && typed[i - 1] === name[j - 2] && typed[i - 2] === name[j - 1])
        best = Math.min(best, (beforeLast[j - 2] ?? 0) + 1);
      row.push(best);
    }
    beforeLast = last;
    last = row;
  }
  return { whole: last[name.length] ?? 0, beginning: Math.min(...last) };
}
