/**
 * A conductor at low frequency: eps = permittivity + i sigma/(w eps0), mu_r real and constant; n + ik = sqrt(eps mu).
 * Relative to vacuum, L the vacuum wavelength in um. Source: J. D. Jackson, Classical Electrodynamics, 5.18 and 8.1.
 * Holds where the frequency is far below the collision rate of the carriers (metals: below about 1 THz) and without the
 * anomalous skin effect; the range of the fit says so.
 */
import * as C from '../num/complex-jet.ts';
import type { BoundModel } from './evaluator.ts';
import { conduction } from './ionic-conduction.ts';
import type { ConductorParameters } from './parameters.ts';
import { writePermittivity } from './write-index.ts';

export function bindConductor(p: ConductorParameters): BoundModel {
  const mu = p.permeability ?? 1;
  return {
    used: {},
    hasDerivative: true,
    derivativeOrder: 3,
    complex: true,
    evaluate(wavelength_um, out) {
      const eps = C.shift(conduction(p.sigma_S_per_m, wavelength_um), p.permittivity ?? 1);
      writePermittivity(out, mu === 1 ? eps : C.scale(eps, mu));
    },
    ...(mu === 1
      ? {}
      : {
          permeability(_: number, out: Float64Array) {
            out[0] = mu;
            out[1] = 0;
          },
        }),
  };
}
