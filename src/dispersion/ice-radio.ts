/**
 * Pure ice at radio frequencies: eps' = e0 + e1 t, eps'' = alpha/f + beta f, f in GHz, t in C, T in K, th = 300/T - 1.
 *
 *   alpha = (a0 + a1 th) exp(a2 th)
 *   maetzler: beta = (B1/T) exp(b/T)/(exp(b/T) - 1)^2 + B2 f^2 + exp(db0 + db1 t)
 *   hufford:  beta = [h0 + h1 th/(1 + th)] 1e-4 + h2 1e-6 [(1 + th)/(th + h3)]^2
 *
 * Relative to vacuum, L the vacuum wavelength in um. Sources: C. Maetzler in Thermal Microwave Radiation (IET, 2006), ch. 5;
 * G. Hufford, Int. J. Infrared Millimeter Waves 12, 677 (1991).
 */
import * as J from '../num/jet.ts';
import type { BoundModel, Conditions } from './evaluator.ts';
import type { IceRadioParameters } from './parameters.ts';
import { frequency_GHz } from './spectral-variable.ts';
import { writePermittivity } from './write-index.ts';

export function bindIceRadio(p: IceRadioParameters, conditions: Conditions): BoundModel {
  const T = conditions.temperature_K ?? p.default_K;
  const t = T - 273.15;
  const th = 300 / T - 1;
  const alpha = (p.alpha[0] + p.alpha[1] * th) * Math.exp(p.alpha[2] * th);
  const eps1 = J.constant(p.e[0] + p.e[1] * t);
  const fixed = fixedBeta(p, T, t, th);
  const cubic = p.form === 'maetzler' ? p.B2 : 0;
  return {
    used: { temperature_K: T },
    hasDerivative: true,
    derivativeOrder: 3,
    complex: true,
    evaluate(wavelength_um, out) {
      const f = frequency_GHz(wavelength_um);
      const rising = J.mul(f, J.shift(J.scale(J.mul(f, f), cubic), fixed));
      writePermittivity(out, { re: eps1, im: J.add(J.scale(J.reciprocal(f), alpha), rising) });
    },
  };
}

/** The part of beta that does not depend on the frequency. */
function fixedBeta(p: IceRadioParameters, T: number, t: number, th: number): number {
  if (p.form === 'hufford') {
    const [h0, h1, h2, h3] = p.h;
    return (h0 + (h1 * th) / (1 + th)) * 1e-4 + h2 * 1e-6 * ((1 + th) / (th + h3)) ** 2;
  }
  const e = Math.exp(p.b_K / T);
  return ((p.B1 / T) * e) / (e - 1) ** 2 + Math.exp(p.db[0] + p.db[1] * t);
}
