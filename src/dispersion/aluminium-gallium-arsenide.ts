/**
 * Al_x Ga_(1-x) As from the band gap to the far side of the lattice bands.
 *
 *   n^2 = A + C0/(E0 - E^2) + C1/(E1 - E^2) + (1 - x) g0/(g1 - E^2) + x a0/(a1 - E^2),  E = 1/L in um^-1
 *   A   = A_T(T) + A_x(x);  1/C0 = invC0_x(x);  E1 = E1_T(T) + E1_x(x);  C1 = C1_x(x);  E0 = (EG(T)/eV_um + E0_x(x))^2
 *   EG  = EG0 + s1 w1 [1 - coth(w1/(2 k T))] + s2 w2 [1 - coth(w2/(2 k T))]   (eV)
 *
 * L is the vacuum wavelength in um, T in K. Source: S. Gehrsitz, F. K. Reinhart, C. Gourgon, N. Herres, A. Vonlanthen,
 * H. Sigg, J. Appl. Phys. 87, 7825 (2000). Special case: at 0 K the gap is EG0, the limit of the formula.
 */
import { polynomial } from '../num/polynomial.ts';
import type { BoundModel, Conditions } from './evaluator.ts';
import type { AluminiumGalliumArsenideParameters } from './parameters.ts';
import { boundSquareForm } from './sellmeier.ts';

/** energy (1 - coth(energy/(2 k T))) = -2 energy/(exp(energy/(k T)) - 1). */
function phonons(energy_eV: number, kT_eV: number): number {
  return kT_eV === 0 ? 0 : (-2 * energy_eV) / Math.expm1(energy_eV / kT_eV);
}

export function bindAluminiumGalliumArsenide(
  p: AluminiumGalliumArsenideParameters,
  conditions: Conditions,
): BoundModel {
  const T = conditions.temperature_K ?? p.default_K;
  const { x } = p;
  const withoutConstant = (c: readonly number[]): number => x * polynomial(c, x);
  const kT = p.k_eV_per_K * T;
  const [gap, s1, w1, s2, w2] = p.EG;
  const gap_eV = gap + s1 * phonons(w1, kT) + s2 * phonons(w2, kT);
  const E0 = (gap_eV / p.eV_um + withoutConstant(p.E0_x)) ** 2;
  const E1 = polynomial(p.E1_T, T) + withoutConstant(p.E1_x);
  const resonances: [number, number][] = [
    [1 / polynomial(p.invC0_x, x), E0],
    [polynomial(p.C1_x, x), E1],
    [(1 - x) * p.R_GaAs[0], p.R_GaAs[1]],
    [x * p.R_AlAs[0], p.R_AlAs[1]],
  ];
  // strength/(position - 1/L^2) = (strength/position) L^2/(L^2 - 1/position)
  const poles = resonances.flatMap(([strength, position]) => {
    const b = strength / position;
    return [b, 0, 1 / position, b / position];
  });
  return {
    ...boundSquareForm({
      offset: polynomial(p.A_T, T) + withoutConstant(p.A_x),
      poles: Float64Array.from(poles),
      rising: new Float64Array(0),
      falling: new Float64Array(0),
    }),
    used: { temperature_K: T },
  };
}
