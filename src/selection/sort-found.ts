/** The order of a list of hits. A hit without the value sorted by stands last, whichever way the order runs. */

import type { Candidate } from './candidate.ts';
import type { Criteria } from './criteria.ts';
import type { Found } from './find-materials.ts';
import type { SortKey, SortOrder } from './sort-order.ts';
import { isUndecided, type Undecided } from './undecided.ts';

/** By index where the index is asked for, else in the order of the keys. */
export function defaultOrder(criteria: Criteria): SortOrder {
  const { ranges, maxLoss } = criteria;
  const key: SortKey = ranges.n
    ? 'n'
    : maxLoss !== undefined
      ? 'loss'
      : ranges.gvd_s2_per_m
        ? 'gvd'
        : ranges.groupIndex
          ? 'group-index'
          : ranges.birefringence
            ? 'birefringence'
            : ranges.abbe
              ? 'abbe'
              : 'key';
  return { key, descending: false };
}

export function sortFound(
  found: readonly Found[],
  { key, descending }: SortOrder,
  criteria: Criteria,
): readonly Found[] {
  const values = found.map((f) => sortValue(f.candidate, key, criteria));
  const sign = descending ? -1 : 1;
  const order = (a: SortValue, b: SortValue): number =>
    a === undefined || b === undefined
      ? Number(a === undefined) - Number(b === undefined)
      : sign * compare(a, b);
  // Found in the order of the keys, thousands at a time, by a list that follows every key press.
  if (values.every((value, i) => i === 0 || order(values[i - 1], value) <= 0)) return found;
  // An array's own sort finds the runs that are in order already: bundled entries, then those of the user.
  const places = values.map((_, i) => i).sort((a, b) => order(values[a], values[b]));
  return places.flatMap((i) => found[i] ?? []);
}

type SortValue = number | string | undefined;

function compare(a: number | string, b: number | string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

function sortValue(candidate: Candidate, key: SortKey, criteria: Criteria): SortValue {
  const { material } = candidate;
  const number = (value: number | Undecided): number | undefined => (isUndecided(value) ? undefined : value);
  switch (key) {
    case 'key':
      return material.key;
    case 'name':
      return material.name.toLowerCase();
    case 'class':
      return material.class;
    case 'n':
      return number(candidate.n);
    case 'loss': {
      const loss = candidate.loss(criteria.thickness_m);
      return isUndecided(loss) ? undefined : loss.fraction;
    }
    case 'group-index':
      return number(candidate.groupIndex);
    case 'gvd':
      return number(candidate.gvd_s2_per_m);
    case 'birefringence': {
      const value = number(candidate.birefringence);
      return value === undefined ? undefined : Math.abs(value);
    }
    case 'abbe':
      return number(candidate.abbe);
    case 'hardness':
      return material.handling?.knoop;
    case 'density':
      return material.handling?.density_g_per_cm3;
  }
}
