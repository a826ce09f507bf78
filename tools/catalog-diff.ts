/** What changed between two states of an entry, in words a reviewer can use. Pure. */
import { bindFit, NO_STATE, opticsOf } from '../src/catalog/fit-optics.ts';
import type { Fit, Material } from '../src/catalog/types.ts';

/** Lines such as `fit malitson-1965: parameters.poles[0].B: 0.6961663 -> 0.6961664` and what it does to n. */
export function describeChange(before: Material | undefined, after: Material | undefined): readonly string[] {
  if (!before) return after ? [`new entry: ${after.name}, ${after.fits.length} fits`] : [];
  if (!after)
    return [`removed (keys are for ever: leave an alias of ${before.key} on the entry that takes over)`];
  const { fits: fitsBefore, ...restBefore } = before;
  const { fits: fitsAfter, ...restAfter } = after;
  const lines = [...differences(restBefore, restAfter, '')];
  const id = (fit: Fit): string => `${fit.id} (${fit.axis})`;
  for (const fit of fitsAfter) {
    const old = fitsBefore.find((f) => id(f) === id(fit));
    if (!old) lines.push(`new fit ${id(fit)}`);
    else {
      const { checks: checksBefore, ...bareBefore } = old;
      const { checks: checksAfter, ...bareAfter } = fit;
      const changes = [...differences(bareBefore, bareAfter, '')];
      lines.push(...changes.map((change) => `fit ${id(fit)}: ${change}`));
      if (changes.some((c) => c.startsWith('parameters')))
        lines.push(`fit ${id(fit)}: ${effectOnIndex(old, fit)}`);
      if (JSON.stringify(checksBefore) !== JSON.stringify(checksAfter))
        lines.push(`fit ${id(fit)}: check values changed, ${countRows(old)} -> ${countRows(fit)} rows`);
    }
  }
  for (const fit of fitsBefore)
    if (!fitsAfter.some((f) => id(f) === id(fit))) lines.push(`fit ${id(fit)} removed`);
  return lines;
}

const countRows = (fit: Fit): number => fit.checks.reduce((sum, group) => sum + group.rows.length, 0);

function* differences(before: unknown, after: unknown, path: string): Generator<string> {
  if (JSON.stringify(before) === JSON.stringify(after)) return;
  if (isTree(before) && isTree(after) && Array.isArray(before) === Array.isArray(after)) {
    for (const key of new Set([...Object.keys(before), ...Object.keys(after)])) {
      const step = Array.isArray(before) ? `${path}[${key}]` : path === '' ? key : `${path}.${key}`;
      yield* differences(before[key], after[key], step);
    }
    return;
  }
  yield `${path}: ${show(before)} -> ${show(after)}`;
}

const isTree = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null;

function show(value: unknown): string {
  if (value === undefined) return 'absent';
  const text = JSON.stringify(value);
  return text.length > 60 ? `${text.slice(0, 57)}...` : text;
}

/** The largest change of n over the range common to both. */
function effectOnIndex(before: Fit, after: Fit): string {
  const lo = Math.max(before.range_um[0], after.range_um[0]);
  const hi = Math.min(before.range_um[1], after.range_um[1]);
  if (lo > hi) return 'the ranges no longer overlap';
  let largest = { wavelength_um: lo, change: 0 };
  for (let i = 0; i <= 200; i++) {
    const wavelength_um = lo * (hi / lo) ** (i / 200);
    const change = index(after, wavelength_um) - index(before, wavelength_um);
    if (!(Math.abs(change) <= Math.abs(largest.change))) largest = { wavelength_um, change };
  }
  const { wavelength_um, change } = largest;
  return Number.isNaN(change)
    ? `n can no longer be computed at ${wavelength_um.toPrecision(4)} um`
    : `n changes by up to ${change.toExponential(1)} (at ${wavelength_um.toPrecision(4)} um)`;
}

const index = (fit: Fit, wavelength_um: number): number =>
  opticsOf(fit, wavelength_um, bindFit(fit, NO_STATE)).n;
