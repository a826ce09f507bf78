/**
 * Drude term plus oscillators whose positions are spread by a Gaussian: the band transitions of metals without the too wide
 * wings of Lorentz lines.
 *
 *   eps(E) = 1 - f0 wp^2/(E (E + i G0)) + sum chi_j
 *   chi_j  = i sqrt(pi) f_j wp^2/(2 sqrt(2) a_j s_j) [w((a_j - w_j)/(sqrt(2) s_j)) + w((a_j + w_j)/(sqrt(2) s_j))]
 *   a_j    = sqrt(E^2 + i E G_j), Im a_j > 0;   w(z) = exp(-z^2) erfc(-i z)
 *
 * All energies in eV; relative to vacuum, L the vacuum wavelength in um. Sources: R. Brendel, D. Bormann, J. Appl. Phys. 71, 1
 * (1992); A. D. Rakic, A. B. Djurisic, J. M. Elazar, M. L. Majewski, Appl. Opt. 37, 5271 (1998).
 * Special case: a width of 0 is the Lorentz oscillator, the limit of the formula.
 */
import * as C from '../num/complex-jet.ts';
import { faddeevaJet } from '../num/faddeeva.ts';
import * as J from '../num/jet.ts';
import type { BoundModel } from './evaluator.ts';
import { drudeTerm, lorentzTerm } from './oscillators.ts';
import type { BrendelBormannParameters } from './parameters.ts';
import { photonEnergy_eV } from './spectral-variable.ts';
import { writePermittivity } from './write-index.ts';

export function bindBrendelBormann(p: BrendelBormannParameters): BoundModel {
  const plasma2 = p.plasma_eV ** 2;
  return {
    used: {},
    hasDerivative: true,
    derivativeOrder: 3,
    complex: true,
    evaluate(wavelength_um, out) {
      const E = photonEnergy_eV(wavelength_um);
      let eps = C.shift(drudeTerm(E, p.drude.strength * plasma2, p.drude.damping_eV), 1);
      for (const { strength, position_eV, damping_eV, width_eV } of p.oscillators) {
        const S = strength * plasma2;
        const term =
          width_eV === 0
            ? lorentzTerm(E, S, position_eV, damping_eV)
            : spread(E, S, position_eV, damping_eV, width_eV);
        eps = C.add(eps, term);
      }
      writePermittivity(out, eps);
    },
  };
}

function spread(E: J.Jet, S: number, position: number, damping: number, width: number): C.ComplexJet {
  const a = C.sqrtDecaying(C.complexJet(J.mul(E, E), J.scale(E, damping)));
  const toZ = 1 / (Math.SQRT2 * width);
  const sum = C.add(
    faddeevaJet(C.scale(C.shift(a, -position), toZ)),
    faddeevaJet(C.scale(C.shift(a, position), toZ)),
  );
  const factor = (Math.sqrt(Math.PI) * S * toZ) / 2;
  return C.scale(C.timesI(C.div(sum, a)), factor);
}
