/**
 * A pure gas: the published index at a reference state, carried to other temperatures and pressures by its density.
 *
 *   refractivity: n - 1 = A + sum B/(C - s^2), s = 1/L in um^-1      sellmeier: n^2 - 1 = sum B L^2/(L^2 - C)
 *   cauchy:       n - 1 = A (1 + B/L^2)
 *   (n^2 - 1)/(n^2 + 2) = (rho/rho_ref) (n_ref^2 - 1)/(n_ref^2 + 2),  rho = p/(Z R T),  Z = 1 + B2 p/(R T)
 *
 * L is the vacuum wavelength in um, B2 the second virial coefficient (0: ideal gas), taken as constant with temperature.
 * Sources: Lorentz-Lorenz, M. Born and E. Wolf, Principles of Optics, 2.3; the coefficients' source is the fit's.
 * Special cases: at the reference state the published index stands unchanged; meant for pressures below about 1 MPa.
 */
import * as J from '../num/jet.ts';
import { BOLTZMANN_J_per_K } from '../units/constants.ts';
import type { BoundModel, Conditions } from './evaluator.ts';
import type { GasParameters } from './parameters.ts';
import { writeReal } from './write-index.ts';

const AVOGADRO_per_mol = 6.022_140_76e23;
const R_J_per_mol_K = BOLTZMANN_J_per_K * AVOGADRO_per_mol;

export function bindGas(p: GasParameters, conditions: Conditions): BoundModel {
  const temperature_K = conditions.temperature_K ?? p.reference_K;
  const pressure_Pa = conditions.pressure_Pa ?? p.reference_Pa;
  const virial_m3_per_mol = (p.secondVirial_cm3_per_mol ?? 0) * 1e-6;
  const density = (T: number, pressure: number): number => {
    const ideal = pressure / (R_J_per_mol_K * T);
    return ideal / (1 + virial_m3_per_mol * ideal);
  };
  const ratio = density(temperature_K, pressure_Pa) / density(p.reference_K, p.reference_Pa);
  return {
    used: { temperature_K, pressure_Pa },
    hasDerivative: true,
    derivativeOrder: 3,
    complex: false,
    evaluate(wavelength_um, out) {
      const n = referenceIndex(p, wavelength_um);
      writeReal(out, ratio === 1 ? n : scaled(n, ratio));
    },
  };
}

/** Lorentz-Lorenz at `ratio` times the density. */
function scaled(n: J.Jet, ratio: number): J.Jet {
  const square = J.mul(n, n);
  const f = J.scale(J.div(J.shift(square, -1), J.shift(square, 2)), ratio);
  return J.sqrt(J.div(J.shift(J.scale(f, 2), 1), J.shift(J.neg(f), 1)));
}

function referenceIndex(p: GasParameters, wavelength_um: number): J.Jet {
  const L = J.variable(wavelength_um);
  const square = J.mul(L, L);
  if (p.form === 'cauchy') return J.shift(J.scale(J.pow(L, -2), p.A * p.B_um2), 1 + p.A);
  if (p.form === 'sellmeier') {
    let sum = J.constant(1);
    for (const { B, C_um2 } of p.poles) sum = J.add(sum, J.div(J.scale(square, B), J.shift(square, -C_um2)));
    return J.sqrt(sum);
  }
  const s2 = J.reciprocal(square);
  let n = J.constant(1 + p.A);
  for (const { B, C_per_um2 } of p.poles) n = J.add(n, J.div(J.constant(B), J.shift(J.neg(s2), C_per_um2)));
  return n;
}
