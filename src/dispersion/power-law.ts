/**
 * Building materials and ground: eps' = a f^b, sigma = c f^d in S/m with f in GHz; eps = eps' + i sigma/(w eps0).
 * Relative to vacuum, L the vacuum wavelength in um. Source: ITU-R Recommendation P.2040.
 */
import * as J from '../num/jet.ts';
import type { BoundModel } from './evaluator.ts';
import { LOSS_PER_SIEMENS_AND_um } from './ionic-conduction.ts';
import type { PowerLawParameters } from './parameters.ts';
import { frequency_GHz } from './spectral-variable.ts';
import { writePermittivity } from './write-index.ts';

export function bindPowerLaw(p: PowerLawParameters): BoundModel {
  return {
    used: {},
    hasDerivative: true,
    derivativeOrder: 3,
    complex: true,
    evaluate(wavelength_um, out) {
      const f = frequency_GHz(wavelength_um);
      const sigma = J.scale(J.pow(f, p.d), p.c);
      const loss = J.scale(J.mul(sigma, J.variable(wavelength_um)), LOSS_PER_SIEMENS_AND_um);
      writePermittivity(out, { re: J.scale(J.pow(f, p.b), p.a), im: loss });
    },
  };
}
