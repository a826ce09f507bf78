import { describe, expect, it } from 'vitest';
import { JET_LENGTH, K, N } from '../../src/dispersion/evaluator.ts';
import { bindModel } from '../../src/dispersion/registry.ts';
import { ABSORBING_FITS } from './fits/absorbing.ts';
import type { PublishedFit, PublishedValue } from './fits/check.ts';
import { LIQUIDS_AND_TABLES } from './fits/liquids-and-tables.ts';
import { STATE_FITS } from './fits/thermal-state.ts';
import { TRANSPARENT_FITS } from './fits/transparent.ts';

function computed(
  fit: PublishedFit,
  value: PublishedValue,
): Required<Omit<PublishedValue, 'um' | 'conditions'>> {
  const out = new Float64Array(JET_LENGTH);
  bindModel(fit.parameters, value.conditions ?? {}).evaluate(value.um, out);
  const n = out[N] as number;
  const k = out[K] as number;
  const R = ((n - 1) ** 2 + k * k) / ((n + 1) ** 2 + k * k);
  return { n, k, R, eps1: n * n - k * k, eps2: 2 * n * k };
}

describe.each([...TRANSPARENT_FITS, ...STATE_FITS, ...LIQUIDS_AND_TABLES, ...ABSORBING_FITS])(
  '$name',
  (fit) => {
    it.each(fit.values)(`at $um um agrees with ${fit.source}`, (value) => {
      const got = computed(fit, value);
      for (const quantity of ['n', 'k', 'R', 'eps1', 'eps2'] as const) {
        const want = value[quantity];
        if (want !== undefined) expect(Math.abs(got[quantity] - want)).toBeLessThanOrEqual(fit.tolerance);
      }
    });
  },
);
