/** Where a curve is worked out: dense enough for its fringes, and at the places that must not be missed. */

/** Points a fringe needs to look like one. */
const POINTS_PER_FRINGE = 24;
export const MOST_POINTS = 6000;

/** How many points a picture is worth. */
export interface PointLimits {
  readonly least: number;
  readonly most: number;
}

export interface PointCount {
  readonly count: number;
  /** Fringes are finer than the points; the curve shows their beat and not them. */
  readonly isTooFine: boolean;
}

/** @param fringes how many of them the span holds */
export function pointCount(fringes: number, { least, most }: PointLimits): PointCount {
  const wanted = Math.ceil(POINTS_PER_FRINGE * fringes) + 1;
  return { count: Math.max(least, Math.min(most, wanted)), isTooFine: wanted > 4 * most };
}

/** Evenly spaced, both ends exact; by equal ratios where asked. */
export function spacedPoints(low: number, high: number, count: number, byRatio = false): number[] {
  const last = count - 1;
  return Array.from({ length: count }, (_, i) => {
    if (i === 0) return low;
    if (i === last) return high;
    return byRatio ? low * (high / low) ** (i / last) : low + ((high - low) * i) / last;
  });
}

/** With further points where they lie within the ends; ascending, each once. */
export function withPoints(points: readonly number[], more: readonly number[]): number[] {
  const low = points[0] ?? 0;
  const high = points.at(-1) ?? 0;
  const inside = more.filter((x) => x > low && x < high);
  return [...new Set([...points, ...inside])].sort((a, b) => a - b);
}
