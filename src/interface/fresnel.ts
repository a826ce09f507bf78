/**
 * Reflection and transmission at one surface as a record of complex numbers; the law and its source stand in
 * `fresnel-kernel.ts`. Any complex permittivity and permeability.
 *
 *   r_s, r_p: at normal incidence r_p = -r_s (the sign of Born & Wolf)
 *   t_s, t_p: ratio of E amplitudes,  2 kappa1 mu2/D_s  and  2 kappa1 eps1 n2/(n1 D_p),  D = kappa1 z2 + kappa2 z1
 *
 * An absorbing medium of incidence has no power fractions (incident and reflected wave interfere in the energy flow):
 * R is then |r|^2 and T = Re(y2)/Re(y1) |t_tan|^2; `surface-wave.ts` says what becomes of that in answers.
 */
import { add, type Complex, div, mul, neg, scale, sqrt, sqrtDecaying, sub } from '../num/complex.ts';
import {
  POWER_RP,
  POWER_RS,
  POWER_TP,
  POWER_TS,
  RP_IM,
  RP_RE,
  RS_IM,
  RS_RE,
  SURFACE_LENGTH,
  writeSurfaceOf,
} from './fresnel-kernel.ts';
import type { Optics } from './optics.ts';

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

/** Normal component of the wave vector over k0 beyond the interface; see `fresnel-kernel.ts` for its branch. */
function normalComponent(from: Optics, into: Optics, kappa1: Complex): Complex {
  const square = add(sub(mul(into.n, into.n), mul(from.n, from.n)), mul(kappa1, kappa1));
  if (into.n.re >= 0 && square.re >= 0) return sqrt(square);
  const kappa = sqrtDecaying(square);
  return into.n.re < 0 && kappa.im === 0 ? neg(kappa) : kappa;
}

/** What the kernel writes in one call: a typed array costs more than the law itself. */
const w = new Float64Array(SURFACE_LENGTH);

/** `incidenceAngle_rad` from the normal, 0 <= angle < pi/2. */
export function fresnel(from: Optics, into: Optics, incidenceAngle_rad: number): FresnelResult {
  writeSurfaceOf(from, into, incidenceAngle_rad, w);
  const cos = Math.cos(incidenceAngle_rad);
  const kappa1 = scale(from.n, cos);
  const kappa2 = normalComponent(from, into, kappa1);
  return {
    rs: { re: w[RS_RE]!, im: w[RS_IM]! },
    rp: { re: w[RP_RE]!, im: w[RP_IM]! },
    ts: across(kappa1, from.mu, kappa2, into.mu, into.mu),
    // E over H is n/eps on either side.
    tp: across(kappa1, from.eps, kappa2, into.eps, div(mul(from.eps, into.n), from.n)),
    Rs: w[POWER_RS]!,
    Rp: w[POWER_RP]!,
    Ts: w[POWER_TS]!,
    Tp: w[POWER_TP]!,
    q: scale(from.n, Math.sin(incidenceAngle_rad)),
    kappa1,
    kappa2,
  };
}

/** 2 kappa1 over/D. */
const across = (kappa1: Complex, z1: Complex, kappa2: Complex, z2: Complex, over: Complex): Complex =>
  div(scale(mul(kappa1, over), 2), add(mul(kappa1, z2), mul(kappa2, z1)));

const admittanceS = (side: Optics, kappa: Complex): Complex => div(kappa, side.mu);
const admittanceP = (side: Optics, kappa: Complex): Complex => div(side.eps, kappa);

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
