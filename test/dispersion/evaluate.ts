/** Short ways to evaluate fits in tests. */
import { type Conditions, JET_LENGTH, K, N } from '../../src/dispersion/evaluator.ts';
import type { ModelParameters } from '../../src/dispersion/parameters.ts';
import { bindModel } from '../../src/dispersion/registry.ts';
import * as C from '../../src/num/complex.ts';

export function index(parameters: ModelParameters, um: number, conditions: Conditions = {}): C.Complex {
  const out = new Float64Array(JET_LENGTH);
  bindModel(parameters, conditions).evaluate(um, out);
  return { re: out[N] as number, im: out[K] as number };
}

export const permittivity = (p: ModelParameters, um: number, conditions: Conditions = {}): C.Complex => {
  const n = index(p, um, conditions);
  return C.mul(n, n);
};

export const named = (
  fits: readonly { name: string; parameters: ModelParameters }[],
  start: string,
): ModelParameters => {
  const fit = fits.find((f) => f.name.startsWith(start));
  if (!fit) throw new Error(`no fit named ${start}`);
  return fit.parameters;
};
