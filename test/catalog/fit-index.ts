/** n and k of a fit at one wavelength of its own reference, through the program's own binding. */
import type { Fit } from '../../src/catalog/types.ts';
import type { Conditions } from '../../src/dispersion/evaluator.ts';
import { bindModel } from '../../src/dispersion/registry.ts';

export interface Index {
  readonly n: number;
  readonly k: number;
}

export function indexOf(fit: Fit, wavelength_um: number, conditions: Conditions = {}): Index {
  const out = new Float64Array(8);
  bindModel(fit.parameters, conditions).evaluate(wavelength_um, out);
  return { n: out[0] ?? Number.NaN, k: out[4] ?? Number.NaN };
}

/** Enough digits to tell any two doubles apart. */
export const digits17 = (x: number): string => x.toPrecision(17);
