/**
 * Cauchy: n = sum c L^e, L in um or nm as printed, in the fit's own reference. Also polynomials of n itself in L^2 and 1/L^2.
 * Source: A. L. Cauchy, Memoire sur la dispersion de la lumiere (1836); the coefficients' source is the fit's.
 * Special cases: absorption is not described, k = 0. Odd exponents take the slower path through jets.
 */
import * as J from '../num/jet.ts';
import type { BoundModel } from './evaluator.ts';
import { type SquareForm, splitEven, taylorInSquare, valueInSquare } from './in-square.ts';
import type { CauchyParameters } from './parameters.ts';
import { writeReal } from './write-index.ts';

const NO_POLES = new Float64Array(0);

export function bindCauchy(p: CauchyParameters): BoundModel {
  const perUm = p.wavelengthUnit === 'nm' ? 1e3 : 1;
  const terms = p.terms.map(({ c, power }) => ({ c: c * perUm ** power, power }));
  const common = { used: {}, hasDerivative: true, derivativeOrder: 3, complex: false } as const;
  const even = splitEven(terms);
  if (even) return { ...common, ...evaluatorsInSquare({ ...even, poles: NO_POLES }) };
  return {
    ...common,
    evaluate(wavelength_um, out) {
      const L = J.variable(wavelength_um);
      let n = J.constant(0);
      for (const { c, power } of terms) n = J.add(n, J.scale(J.pow(L, power), c));
      writeReal(out, n);
    },
  };
}

/** Evaluators of a model whose n itself is a form in L^2. */
export function evaluatorsInSquare(form: SquareForm): Pick<BoundModel, 'evaluate' | 'index'> {
  const f = new Float64Array(4);
  return {
    evaluate(wavelength_um, out) {
      const x = wavelength_um * wavelength_um;
      taylorInSquare(form, x, f);
      out[7] = 0;
      out[0] = f[0]!;
      out[1] = 2 * wavelength_um * f[1]!;
      out[2] = 2 * f[1]! + 8 * x * f[2]!;
      out[3] = 24 * wavelength_um * (f[2]! + 2 * x * f[3]!);
      out[4] = 0;
      out[5] = 0;
      out[6] = 0;
    },
    index: (wavelength_um) => valueInSquare(form, wavelength_um * wavelength_um),
  };
}
