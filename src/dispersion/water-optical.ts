/**
 * Liquid water and steam in the visible and near infrared, from temperature and density.
 *
 *   (n^2 - 1)/(n^2 + 2)/r = a0 + a1 r + a2 T + a3 l^2 T + a4/l^2 + a5/(l^2 - poleUV^2) + a6/(l^2 - poleIR^2) + a7 r^2
 *
 * with T, r, l the temperature, density and vacuum wavelength over their reference values. Relative to vacuum.
 * Source: IAPWS R9-97 (A. H. Harvey, J. S. Gallagher, J. M. H. Levelt Sengers, J. Phys. Chem. Ref. Data 27, 761 (1998)).
 * The density is that of air-free water at 101325 Pa: M. Tanaka et al., Metrologia 38, 301 (2001) from 0 to 40 C, G. S. Kell,
 * J. Chem. Eng. Data 20, 97 (1975) elsewhere (they differ by 3e-3 kg/m^3, 1e-6 in n, where they meet).
 * Special case: the pressure of the question is not used; a change of 100 kPa moves n by 1.5e-5.
 */
import * as J from '../num/jet.ts';
import type { BoundModel, Conditions } from './evaluator.ts';
import type { WaterOpticalParameters } from './parameters.ts';
import { writeNothing, writeReal } from './write-index.ts';

/** kg/m^3 of air-free water at 101325 Pa. */
export function waterDensity_kg_per_m3(temperature_K: number): number {
  const t = temperature_K - 273.15;
  if (t >= 0 && t <= 40) {
    return 999.97495 * (1 - ((t - 3.983035) ** 2 * (t + 301.797)) / (522528.9 * (t + 69.34881)));
  }
  const numerator =
    999.83952 +
    t * (16.945176 + t * (-7.9870401e-3 + t * (-46.170461e-6 + t * (105.56302e-9 + t * -280.54253e-12))));
  return numerator / (1 + 16.87985e-3 * t);
}

export function bindWaterOptical(p: WaterOpticalParameters, conditions: Conditions): BoundModel {
  const temperature_K = conditions.temperature_K ?? p.default_K;
  const T = temperature_K / p.referenceTemperature_K;
  const r = waterDensity_kg_per_m3(temperature_K) / p.referenceDensity_kg_per_m3;
  const a = (i: number): number => p.a[i]!;
  const fixed = a(0) + (a(1) + a(7) * r) * r + a(2) * T;
  return {
    used: { temperature_K },
    hasDerivative: true,
    derivativeOrder: 3,
    complex: false,
    evaluate(wavelength_um, out) {
      const l = J.scale(J.variable(wavelength_um), 1 / p.referenceWavelength_um);
      const l2 = J.mul(l, l);
      const pole = (strength: number, place: number): J.Jet =>
        J.div(J.constant(strength), J.shift(l2, -place * place));
      const refraction = J.add(
        J.add(J.shift(J.scale(l2, a(3) * T), fixed), J.div(J.constant(a(4)), l2)),
        J.add(pole(a(5), p.poleUV), pole(a(6), p.poleIR)),
      );
      const B = J.scale(refraction, r);
      const square = J.div(J.shift(J.scale(B, 2), 1), J.shift(J.neg(B), 1));
      if (square[0] > 0) writeReal(out, J.sqrt(square));
      else writeNothing(out);
    },
  };
}
