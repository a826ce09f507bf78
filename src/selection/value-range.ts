/** A closed range of values, open where an end is absent. */
export interface ValueRange {
  readonly from?: number;
  readonly to?: number;
}

/** True where the value lies inside, ends included; the ends are printed numbers, so rounding of the last bit does not count. */
export function within(range: ValueRange, value: number): boolean {
  const hair = 1e-12 * Math.abs(value);
  return (
    (range.from === undefined || value >= range.from - hair) &&
    (range.to === undefined || value <= range.to + hair)
  );
}

/** "1.37 to 1.39", "from 1.37 on", "up to 1.39". */
export function rangeWords(
  range: ValueRange,
  show: (value: number) => string = (value) => String(value),
): string {
  const { from, to } = range;
  if (from === undefined) return to === undefined ? 'any' : `up to ${show(to)}`;
  return to === undefined ? `from ${show(from)} on` : `${show(from)} to ${show(to)}`;
}
