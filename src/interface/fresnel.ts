/**
 * Reflection and transmission of a plane wave at a plane interface between two homogeneous media, any complex permittivity
 * and permeability, in admittance form.
 *
 *   kappa_j = sqrt(eps_j mu_j - q^2), Im >= 0, then Re >= 0;   q = n1 sin(theta) is the same on both sides (Snell)
 *   y_s = kappa/mu,  y_p = eps/kappa                            (tangential admittance in units of 1/Z0)
 *   r_tan = (y1 - y2)/(y1 + y2),  t_tan = 2 y1/(y1 + y2)
 *   r_s = r_tan, t_s = t_tan;  r_p = -r_tan, t_p = t_tan cos1/cos2 (ratio of E amplitudes, cos_j = kappa_j/n_j)
 *   R = |r|^2,  T = Re(y2)/Re(y1) |t_tan|^2
 *
 * Source: Born & Wolf, Principles of Optics, 7th ed., 1.5 and 1.6; Jackson, Classical Electrodynamics, 7.3.
 * At normal incidence r_p = -r_s (the sign of Born & Wolf).
 *
 * Special cases: total reflection between lossless media gives Re(y2) = 0, hence T = 0 exactly and R = 1 to rounding.
 * An absorbing medium of incidence has no power fractions (incident and reflected wave interfere in the energy flow):
 * R is then |r|^2 and T the formula above; the caller cautions.
 */
import { abs2, add, type Complex, div, mul, neg, scale, sqrt, sqrtDecaying, sub } from '../num/complex.ts';
import { isLossless, type Optics } from './optics.ts';

export interface FresnelResult {
  readonly rs: Complex;
  readonly rp: Complex;
  readonly ts: Complex;
  readonly tp: Complex;
  readonly Rs: number;
  readonly Rp: number;
  readonly Ts: number;
  readonly Tp: number;
  /** Tangential wave vector over k0, n1 sin(theta). */
  readonly q: Complex;
  /** Normal wave vector over k0 in the medium of incidence and beyond the interface. */
  readonly kappa1: Complex;
  readonly kappa2: Complex;
}

/**
 * Normal component of the wave vector over k0 beyond the interface; backward in a doubly negative medium.
 * From kappa2^2 = n2^2 - n1^2 + kappa1^2 rather than n2^2 - q^2: exact for like media, no cancellation at grazing incidence.
 *
 * The root decays, with one exception. A wave that comes out of an absorbing medium at an angle fades along the surface, and
 * the wave beyond fades with it: in a clear medium its planes of constant amplitude are tilted so that Im kappa2 is a little
 * negative. It still goes forward; the decaying root would be the wave that comes back.
 */
function normalComponent(from: Optics, into: Optics, kappa1: Complex): Complex {
  const square = add(sub(mul(into.n, into.n), mul(from.n, from.n)), mul(kappa1, kappa1));
  if (into.n.re >= 0 && square.re >= 0) return sqrt(square);
  const kappa = sqrtDecaying(square);
  return into.n.re < 0 && kappa.im === 0 ? neg(kappa) : kappa;
}

export const admittanceS = (side: Optics, kappa: Complex): Complex => div(kappa, side.mu);
export const admittanceP = (side: Optics, kappa: Complex): Complex => div(side.eps, kappa);

/** `incidenceAngle_rad` from the normal, 0 <= angle < pi/2. */
export function fresnel(from: Optics, into: Optics, incidenceAngle_rad: number): FresnelResult {
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

/** Derivatives of r_s and r_p by the angle of incidence, per rad. Source: differentiation of the forms above. */
export function fresnelAngleDerivative(
  from: Optics,
  into: Optics,
  incidenceAngle_rad: number,
): { readonly drs: Complex; readonly drp: Complex } {
  const sin = Math.sin(incidenceAngle_rad);
  const cos = Math.cos(incidenceAngle_rad);
  const q = scale(from.n, sin);
  const dq = scale(from.n, cos);
  const kappa1 = dq;
  const dkappa1 = neg(q);
  const kappa2 = normalComponent(from, into, kappa1);
  const dkappa2 = neg(div(mul(q, dq), kappa2));

  const ys1 = admittanceS(from, kappa1);
  const ys2 = admittanceS(into, kappa2);
  const drs = derivativeOfRatio(ys1, div(dkappa1, from.mu), ys2, div(dkappa2, into.mu));

  const yp1 = admittanceP(from, kappa1);
  const yp2 = admittanceP(into, kappa2);
  const dyp1 = neg(div(mul(yp1, dkappa1), kappa1));
  const dyp2 = neg(div(mul(yp2, dkappa2), kappa2));
  const drp = neg(derivativeOfRatio(yp1, dyp1, yp2, dyp2));
  return { drs, drp };
}

/** d[(a - b)/(a + b)] = 2 (b da - a db)/(a + b)^2 */
function derivativeOfRatio(a: Complex, da: Complex, b: Complex, db: Complex): Complex {
  const sum = add(a, b);
  return div(scale(sub(mul(b, da), mul(a, db)), 2), mul(sum, sum));
}
