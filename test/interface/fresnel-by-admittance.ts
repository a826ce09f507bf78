/**
 * The law of `src/interface/fresnel-kernel.ts` written down once more in complex admittances, as Born & Wolf 1.5 and 1.6 have it:
 *   y_s = kappa/mu,  y_p = eps/kappa,  r_tan = (y1 - y2)/(y1 + y2),  t_tan = 2 y1/(y1 + y2),  T = Re(y2)/Re(y1) |t_tan|^2
 */
import type { FresnelResult } from '../../src/interface/fresnel.ts';
import { isLossless, type Optics } from '../../src/interface/optics.ts';
import {
  abs2,
  add,
  type Complex,
  div,
  mul,
  neg,
  scale,
  sqrt,
  sqrtDecaying,
  sub,
} from '../../src/num/complex.ts';

/** Decaying, but forward where a wave out of an absorber fades along the surface; backward in a doubly negative medium. */
function normalComponent(from: Optics, into: Optics, kappa1: Complex): Complex {
  const square = add(sub(mul(into.n, into.n), mul(from.n, from.n)), mul(kappa1, kappa1));
  if (into.n.re >= 0 && square.re >= 0) return sqrt(square);
  const kappa = sqrtDecaying(square);
  return into.n.re < 0 && kappa.im === 0 ? neg(kappa) : kappa;
}

const admittanceS = (side: Optics, kappa: Complex): Complex => div(kappa, side.mu);
const admittanceP = (side: Optics, kappa: Complex): Complex => div(side.eps, kappa);

/** `incidenceAngle_rad` from the normal, 0 <= angle < pi/2. */
export function fresnelByAdmittance(from: Optics, into: Optics, incidenceAngle_rad: number): FresnelResult {
  const sin = Math.sin(incidenceAngle_rad);
  const cos = Math.cos(incidenceAngle_rad);
  const q = scale(from.n, sin);
  const kappa1 = scale(from.n, cos);
  const kappa2 = normalComponent(from, into, kappa1);
  const ys1 = admittanceS(from, kappa1);
  const ys2 = admittanceS(into, kappa2);
  const yp1 = admittanceP(from, kappa1);
  const yp2 = admittanceP(into, kappa2);

  const sumS = add(ys1, ys2);
  const rs = div(sub(ys1, ys2), sumS);
  const ts = div(scale(ys1, 2), sumS);

  // p in the form eps/kappa has no finite value at kappa2 = 0 (the critical angle); multiplied through by kappa2 it has.
  const a = mul(yp1, kappa2);
  const sumP = add(a, into.eps);
  const rp = div(sub(into.eps, a), sumP);
  const tpOverKappa2 = div(scale(yp1, 2), sumP);
  const tp = scale(mul(tpOverKappa2, into.n), cos);

  const evanescent = isLossless(into) && kappa2.re === 0;
  const Ts = evanescent ? 0 : (ys2.re / ys1.re) * abs2(ts);
  const Tp = evanescent ? 0 : (yp2.re / yp1.re) * abs2(mul(tpOverKappa2, kappa2));
  // Nothing crosses, so all returns: exactly, where |r|^2 would miss it by a rounding.
  const all = evanescent && isLossless(from);
  return {
    rs,
    rp,
    ts,
    tp,
    Rs: all ? 1 : abs2(rs),
    Rp: all ? 1 : abs2(rp),
    Ts,
    Tp,
    q,
    kappa1,
    kappa2,
  };
}
