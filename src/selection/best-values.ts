/**
 * Which of several values is the best, where a person would say so: the least of a loss, the most of a hardness. Values closer
 * than a thousandth are equal; where all are equal, or only one is known, none is marked.
 */
export type Direction = 'least' | 'most';

const ALIKE = 1e-3;

export function bestOf(values: readonly (number | null)[], direction: Direction): readonly boolean[] {
  const known = values.filter((v) => v !== null);
  const best = direction === 'least' ? Math.min(...known) : Math.max(...known);
  const marks = values.map((v) => v !== null && Math.abs(v - best) <= ALIKE * Math.abs(best));
  return known.length < 2 || marks.filter(Boolean).length === known.length ? marks.map(() => false) : marks;
}
