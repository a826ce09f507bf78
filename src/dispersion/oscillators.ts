/**
 * Free and bound charges: Drude term and Lorentz oscillators.
 *
 *   eps(w) = epsInfinity - S0/(w (w + i G0)) + sum S_j/(w_j^2 - w^2 - i w G_j),   n + ik = sqrt(eps)
 *   S0 = f0 wp^2;  S_j = f_j wp^2 (per plasma) or f_j w_j^2 (per resonance: f_j is the static contribution to eps)
 *
 * All energies in eV or all in cm^-1; relative to vacuum, L the vacuum wavelength in um. Sources: P. Drude, Ann. Phys. 306, 566
 * (1900); H. A. Lorentz, The Theory of Electrons (1909); combined for metals by A. D. Rakic et al., Appl. Opt. 37, 5271 (1998).
 */
import * as C from '../num/complex-jet.ts';
import * as J from '../num/jet.ts';
import type { BoundModel } from './evaluator.ts';
import type { OscillatorParameters } from './parameters.ts';
import { photonEnergy_eV, wavenumber_per_cm } from './spectral-variable.ts';
import { writePermittivity } from './write-index.ts';

/** -strength/(w (w + i damping)). */
export function drudeTerm(w: J.Jet, strength: number, damping: number): C.ComplexJet {
  const denominator = C.complexJet(J.mul(w, w), J.scale(w, damping));
  return C.scale(C.reciprocal(denominator), -strength);
}

/** strength/(position^2 - w^2 - i w damping). */
export function lorentzTerm(w: J.Jet, strength: number, position: number, damping: number): C.ComplexJet {
  const detuning = J.shift(J.neg(J.mul(w, w)), position * position);
  return C.scale(C.reciprocal(C.complexJet(detuning, J.scale(w, -damping))), strength);
}

export function bindOscillators(p: OscillatorParameters): BoundModel {
  const plasma2 = (p.plasma ?? 0) ** 2;
  const energyOf = p.unit === 'eV' ? photonEnergy_eV : wavenumber_per_cm;
  const oscillators = (p.lorentz ?? []).map(({ strength, position, damping }) => ({
    strength: strength * (p.per === 'resonance' ? position * position : plasma2),
    position,
    damping,
  }));
  return {
    used: {},
    hasDerivative: true,
    derivativeOrder: 3,
    complex: true,
    evaluate(wavelength_um, out) {
      const w = energyOf(wavelength_um);
      let eps = C.constant({ re: p.epsInfinity, im: 0 });
      if (p.drude) eps = C.add(eps, drudeTerm(w, p.drude.strength * plasma2, p.drude.damping));
      for (const o of oscillators) eps = C.add(eps, lorentzTerm(w, o.strength, o.position, o.damping));
      writePermittivity(out, eps);
    },
  };
}
