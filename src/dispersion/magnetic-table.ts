/**
 * Ferrites: permeability and permittivity tabulated against frequency on grids of their own.
 *
 *   mu = mu1 + i mu2, linear in log f;  eps = eps' + i sigma/(w eps0), log eps' and log sigma linear in log f;  n + ik = sqrt(eps mu)
 *
 * Relative to vacuum, L the vacuum wavelength in um. Source: the fit's (measured rows of a maker).
 * Special cases: outside a grid its end piece continues; only the first derivative means something (straight lines).
 */
import * as C from '../num/complex-jet.ts';
import { type Interpolant, linear, taylorAt } from '../num/interpolate.ts';
import * as J from '../num/jet.ts';
import type { BoundModel } from './evaluator.ts';
import { LOSS_PER_SIEMENS_AND_um } from './ionic-conduction.ts';
import type { MagneticTableParameters } from './parameters.ts';
import { frequency_Hz } from './spectral-variable.ts';
import { writePermittivity } from './write-index.ts';

const at = (f: Interpolant, x: J.Jet): J.Jet => J.compose(...taylorAt(f, x[0]), x);

export function bindMagneticTable(p: MagneticTableParameters): BoundModel {
  const logs = (values: readonly number[]): number[] => values.map(Math.log);
  const muGrid = logs(p.permeability.f_Hz);
  const epsGrid = logs(p.permittivity.f_Hz);
  const mu1 = linear(muGrid, p.permeability.mu1);
  const mu2 = linear(muGrid, p.permeability.mu2);
  const eps1 = linear(epsGrid, logs(p.permittivity.eps1));
  const sigma = linear(epsGrid, logs(p.permittivity.sigma_S_per_m));
  const permeability = (logF: J.Jet): C.ComplexJet => C.complexJet(at(mu1, logF), at(mu2, logF));
  const logFrequency = (wavelength_um: number): J.Jet => J.log(frequency_Hz(wavelength_um));
  return {
    used: {},
    hasDerivative: true,
    derivativeOrder: 1,
    complex: true,
    evaluate(wavelength_um, out) {
      const logF = logFrequency(wavelength_um);
      const loss = J.mul(J.exp(at(sigma, logF)), J.variable(wavelength_um));
      const eps = C.complexJet(J.exp(at(eps1, logF)), J.scale(loss, LOSS_PER_SIEMENS_AND_um));
      writePermittivity(out, eps, permeability(logF));
    },
    permeability(wavelength_um, out) {
      const mu = permeability(logFrequency(wavelength_um));
      out[0] = mu.re[0];
      out[1] = mu.im[0];
    },
  };
}
