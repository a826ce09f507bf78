/**
 * Applies a thermal form (`thermal-form.ts`) to an index with its derivatives by wavelength, exactly.
 *
 * What is added is the form at the new temperature minus the form at the temperature of the fit, so that nothing changes there
 * even where the form counts from another reference (glass makers print indices at 22 C and thermal constants from 20 C).
 * The form `dispersive` describes the ABSOLUTE index: apply it to the index relative to vacuum at the vacuum wavelength. The
 * others belong to the fit's own reference and wavelength. k is left alone.
 *
 * Sources: dispersive form, TIE-19 of Schott (derivation: G. Ghosh et al., J. Lightwave Technol. 12, 1338 (1994) and Hoffmann,
 * Jochs, Westenberger, Proc. SPIE 1780 (1992)); band-edge form, T. Skauli et al., J. Appl. Phys. 94, 6447 (2003).
 */
import * as J from '../num/jet.ts';
import type { IndexJet } from './evaluator.ts';
import { photonEnergy_eV } from './spectral-variable.ts';
import type { ThermalForm } from './thermal-form.ts';

type Form<F extends ThermalForm['form']> = Extract<ThermalForm, { form: F }>;

const ZERO_CELSIUS_K = 273.15;

/** True where the form has to be applied to the index relative to vacuum. */
export const describesAbsoluteIndex = (form: ThermalForm): boolean => form.form === 'dispersive';

/**
 * Changes n and its derivatives in `jet` from the temperature of the fit to another.
 * @param fit_K temperature the fit holds at; @param temperature_K the one asked for; @param wavelength_um see above.
 */
export function applyThermalForm(
  form: ThermalForm,
  fit_K: number,
  temperature_K: number,
  wavelength_um: number,
  jet: IndexJet,
): void {
  const n: J.Jet = [jet[0]!, jet[1]!, jet[2]! / 2, jet[3]! / 6];
  const change = changeOf(form, fit_K - ZERO_CELSIUS_K, temperature_K - ZERO_CELSIUS_K, wavelength_um, n);
  jet[0] = n[0] + change[0];
  jet[1] = n[1] + change[1];
  jet[2] = 2 * (n[2] + change[2]);
  jet[3] = 6 * (n[3] + change[3]);
}

function changeOf(form: ThermalForm, from_C: number, to_C: number, L_um: number, n: J.Jet): J.Jet {
  switch (form.form) {
    case 'constant':
      return J.constant(form.dn_dT_per_K * (to_C - from_C));
    case 'dispersive':
      return dispersive(form, from_C, to_C, L_um, n);
    case 'wavelength-polynomial':
      return wavelengthPolynomial(form, from_C, to_C, L_um);
    case 'band-edge':
      return J.sub(bandEdge(form, to_C, L_um), bandEdge(form, from_C, L_um));
  }
}

function dispersive(p: Form<'dispersive'>, from_C: number, to_C: number, L_um: number, n: J.Jet): J.Jet {
  const a = from_C - p.referenceTemperature_C;
  const b = to_C - p.referenceTemperature_C;
  // Differences of powers of dT.
  const d1 = b - a;
  const d2 = d1 * (a + b);
  const d3 = d1 * (a * a + a * b + b * b);
  const L = J.variable(L_um);
  const resonant = J.div(
    J.constant(p.E0 * d1 + p.E1 * d2),
    J.shift(J.mul(L, L), -p.lambdaTK_um * p.lambdaTK_um),
  );
  const bracket = J.shift(resonant, p.D0 * d1 + p.D1 * d2 + p.D2 * d3);
  // (n^2 - 1)/(2 n)
  const factor = J.scale(J.sub(n, J.reciprocal(n)), 0.5);
  return J.mul(factor, bracket);
}

function wavelengthPolynomial(
  p: Form<'wavelength-polynomial'>,
  from_C: number,
  to_C: number,
  L_um: number,
): J.Jet {
  const reference = p.referenceTemperature_C;
  const drive = (t: number): number => {
    const dT = t - reference;
    return dT + (p.quadratic_per_K ?? 0) * dT * dT + ((p.k_per_C ?? 0) * (t * t - reference * reference)) / 2;
  };
  const L = J.variable(L_um);
  let g = J.constant(0);
  for (const [i, gi] of p.g.entries()) g = J.add(g, J.scale(J.pow(L, p.exponents[i] ?? 0), gi));
  return J.scale(g, p.scale * (drive(to_C) - drive(from_C)));
}

/** n of the band-edge form at t. */
function bandEdge(p: Form<'band-edge'>, t: number, L_um: number): J.Jet {
  const d = t - p.referenceTemperature_C;
  const E = photonEnergy_eV(L_um);
  const E2 = J.mul(E, E);
  /** position^2 - E^2 */
  const below = (position: readonly number[]): J.Jet =>
    J.shift(J.neg(E2), J.polynomial(position, J.constant(d))[0] ** 2);
  const [b0, b1, b2, b3] = [below(p.E0), below(p.E1), below(p.E2), below(p.E3)] as const;
  const logRatio = (over: J.Jet, under: J.Jet): J.Jet => J.log(J.div(over, under));
  const gap = J.scale(logRatio(b1, b0), p.a / Math.PI);
  const upper = J.scale(logRatio(b2, b1), p.e2 / Math.PI);
  const lattice = J.div(J.constant(p.G3), b3);
  return J.sqrt(J.shift(J.add(J.add(gap, upper), lattice), 1));
}
