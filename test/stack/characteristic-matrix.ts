/**
 * The textbook form, as a second opinion for thin stacks: layer [[cos D, -i sin D/y], [-i y sin D, cos D]],
 * (B, C) = product (1, y_exit), r_tan = (y0 B - C)/(y0 B + C), t_tan = 2 y0/(y0 B + C)
 * (Abeles; Born & Wolf, Principles of Optics, 1.6). Overflows in thick absorbers and fails at kappa = 0; tests only.
 */
import {
  add,
  type Complex,
  complex,
  div,
  exp,
  mul,
  neg,
  scale,
  sqrtDecaying,
  sub,
} from '../../src/num/complex.ts';
import type { LayeredPath, Substance } from '../../src/stack/layered-path.ts';

const I = complex(0, 1);
const cos = (z: Complex): Complex => scale(add(exp(mul(I, z)), exp(neg(mul(I, z)))), 0.5);
const sin = (z: Complex): Complex => mul(scale(sub(exp(mul(I, z)), exp(neg(mul(I, z)))), 0.5), neg(I));

function admittance(x: Substance, kappa2: Complex, polarization: 's' | 'p'): Complex {
  let kappa = sqrtDecaying(kappa2);
  if (x.mu.re < 0 && kappa.im === 0) kappa = neg(kappa);
  return polarization === 's' ? div(kappa, x.mu) : div(x.eps, kappa);
}

export function characteristicMatrix(
  path: LayeredPath,
  vacuumWavelength_m: number,
  incidenceAngle_rad: number,
  polarization: 's' | 'p',
): { rTangential: Complex; tTangential: Complex; R: number; T: number } {
  const k0 = (2 * Math.PI) / vacuumWavelength_m;
  const q2 = scale(mul(path.incidence.eps, path.incidence.mu), Math.sin(incidenceAngle_rad) ** 2);
  const kappa2 = (x: Substance): Complex => sub(mul(x.eps, x.mu), q2);
  const y0 = admittance(path.incidence, kappa2(path.incidence), polarization);
  const yExit = admittance(path.exit, kappa2(path.exit), polarization);
  let B = complex(1);
  let C = yExit;
  for (const layer of [...path.layers].reverse()) {
    const w = kappa2(layer);
    const y = admittance(layer, w, polarization);
    let kappa = sqrtDecaying(w);
    if (layer.mu.re < 0 && kappa.im === 0) kappa = neg(kappa);
    const D = scale(kappa, k0 * layer.thickness_m);
    const c = cos(D);
    const s = mul(neg(I), sin(D));
    [B, C] = [add(mul(c, B), mul(div(s, y), C)), add(mul(mul(s, y), B), mul(c, C))];
  }
  const sum = add(mul(y0, B), C);
  const rTangential = div(sub(mul(y0, B), C), sum);
  const tTangential = div(scale(y0, 2), sum);
  const T = (yExit.re / y0.re) * (tTangential.re ** 2 + tTangential.im ** 2);
  return { rTangential, tTangential, R: rTangential.re ** 2 + rTangential.im ** 2, T };
}
