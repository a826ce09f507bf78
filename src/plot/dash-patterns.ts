/** Lines told apart without colour: runs of drawn and left out, in units of a line's width. Empty for a solid line. */
export const DASHES: readonly (readonly number[])[] = [
  [],
  [6, 4],
  [1, 2],
  [6, 3, 1, 3],
  [12, 4],
  [3, 3],
  [12, 3, 1, 3],
  [2, 6],
];

export function dashOf(seriesIndex: number): readonly number[] {
  return DASHES[seriesIndex % DASHES.length] ?? [];
}

/** The same for lines made of whole cells: half as long. */
export function coarseDashOf(seriesIndex: number): readonly number[] {
  return dashOf(seriesIndex).map((run) => Math.ceil(run / 2));
}

/** True where the pattern draws at so many units along the line. */
export function isDrawn(pattern: readonly number[], along: number): boolean {
  const period = pattern.reduce((sum, run) => sum + run, 0);
  if (period === 0) return true;
  let rest = along % period;
  for (let i = 0; i < pattern.length; i++) {
    rest -= pattern[i] ?? 0;
    if (rest < 0) return i % 2 === 0;
  }
  return true;
}

/** One letter a series, for places where a line is a row of letters. */
export function letterOf(seriesIndex: number): string {
  return '*o+x#@%&'[seriesIndex % 8] ?? '*';
}
