/**
 * Ratios out of one run: every variant once a round, in an order that turns, so that what slows the machine down for a
 * while slows all of them down; the figure is the median of the ratios of the same round.
 */
import { median } from './figure.ts';

/** One run of a variant: milliseconds, or whatever is to be compared. */
export type Variant = () => number | Promise<number>;

export interface Measured {
  /** Median of the ratios to the base. */
  readonly ratio: number;
  readonly values: readonly number[];
}

export async function compare<Name extends string>(
  rounds: number,
  base: Variant,
  variants: Readonly<Record<Name, Variant>>,
): Promise<Record<Name, Measured>> {
  const names = Object.keys(variants) as Name[];
  const all = [base, ...names.map((name) => variants[name])];
  const taken: number[][] = all.map(() => []);
  // One round unmeasured: files in the page cache, code read once.
  for (const variant of all) await variant();
  for (let round = 0; round < rounds; round++) {
    for (let i = 0; i < all.length; i++) {
      const which = (i + round) % all.length;
      taken[which]?.push((await all[which]?.()) ?? Number.NaN);
    }
  }
  const [bases = []] = taken;
  return Object.fromEntries(
    names.map((name, i) => {
      const values = taken[i + 1] ?? [];
      return [name, { ratio: median(values.map((v, r) => v / (bases[r] ?? Number.NaN))), values }];
    }),
  ) as unknown as Record<Name, Measured>;
}
