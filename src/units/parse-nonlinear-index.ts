/**
 * Nonlinear indices n2 (n = n0 + n2 I) in m^2/W: `2.7e-20m2/W`, `2.7e-16cm2/W`; with several layers each by its number:
 * `2=2.7e-20m2/W,5=1e-19m2/W`. Negative ones defocus and are taken too.
 */
import { parseValue, type QuantitySpec } from './parse-quantity.ts';
import { isProblem, type Problem, problem } from './problem.ts';
import { quoteInput } from './quote-input.ts';

export interface TypedNonlinearIndex {
  /** Number of the layer, from 1; absent where it goes without saying. */
  readonly layer?: number;
  readonly value_m2_per_W: number;
}

const SPEC: QuantitySpec = {
  what: 'a nonlinear index',
  kinds: ['nonlinear-index'],
  examples: '2.7e-20m2/W, 2.7e-16cm2/W or, for layer 2 alone, 2=2.7e-20m2/W',
  unitNames: 'm2/W and cm2/W',
};

export function parseNonlinearIndex(text: string): readonly TypedNonlinearIndex[] | Problem {
  const all: TypedNonlinearIndex[] = [];
  for (const part of text.split(',')) {
    const [first = '', second, ...more] = part.split('=');
    if (more.length > 0 || (second !== undefined && !/^\s*[1-9]\d{0,4}\s*$/.test(first))) {
      return problem(
        'not-a-number',
        `${quoteInput(part.trim())} names no layer`,
        `write for example ${SPEC.examples}`,
      );
    }
    const value_m2_per_W = parseValue(second ?? first, SPEC);
    if (isProblem(value_m2_per_W)) return value_m2_per_W;
    const layer = second === undefined ? undefined : Number(first);
    if (all.some((x) => x.layer === layer)) {
      const which = layer === undefined ? 'the nonlinear index' : `the nonlinear index of layer ${layer}`;
      return problem('not-a-number', `${which} is given twice`, 'give it once');
    }
    all.push(layer === undefined ? { value_m2_per_W } : { layer, value_m2_per_W });
  }
  if (all.length > 1 && all.some((x) => x.layer === undefined)) {
    return problem(
      'not-a-number',
      'one nonlinear index names no layer',
      `write for example ${SPEC.examples}`,
    );
  }
  return all;
}
