/**
 * Reflection and transmission of a plane wave at a plane interface between two homogeneous media, on bare numbers: nothing is
 * allocated, the results go into an array of the caller's. Everything that asks for one surface asks here, as a rule through
 * `fresnel.ts`.
 *
 *   kappa_j = sqrt(eps_j mu_j - q^2), Im >= 0, then Re >= 0;   q = n1 sin(theta) is the same on both sides (Snell)
 * Both polarizations have one form. With z = mu for s and z = eps for p,
 *   r = (kappa1 z2 - kappa2 z1)/D,  D = kappa1 z2 + kappa2 z1   (r_p in the sign of Born & Wolf)
 *   T = 4 |kappa1 z1|^2 Re(kappa2 z2*) / (Re(kappa1 z1*) |D|^2)
 * which needs no division by kappa2: nothing is lost at the critical angle.
 *
 * kappa2^2 = n2^2 - n1^2 + kappa1^2 rather than n2^2 - q^2: exact for like media, no cancellation at grazing incidence. The root
 * decays, with one exception: a wave that comes out of an absorbing medium at an angle fades along the surface, and the wave
 * beyond fades with it. In a clear medium its planes of constant amplitude are tilted so that Im kappa2 is a little negative; it
 * still goes forward, and the decaying root would be the wave that comes back.
 *
 * Source: Born & Wolf, Principles of Optics, 7th ed., 1.5 and 1.6; Jackson, Classical Electrodynamics, 7.3.
 * Special cases: total reflection between lossless media gives R = 1 and T = 0 exactly. The media without magnetism have forms
 * of their own, two to three times as fast as the general one.
 */
import { isLossless, type Optics } from './optics.ts';

/** Where each number stands behind `at`. */
export const RS_RE = 0;
export const RS_IM = 1;
export const RP_RE = 2;
export const RP_IM = 3;
export const POWER_RS = 4;
export const POWER_RP = 5;
export const POWER_TS = 6;
export const POWER_TP = 7;
export const SURFACE_LENGTH = 8;

/** Below this a square leaves the range of doubles. */
const TINY = 1e-150;

/**
 * Media without magnetism, by their complex indices n + ik relative to vacuum, n >= 0; `cos` of the angle of incidence, > 0.
 */
export function writeSurface(
  n1: number,
  k1: number,
  n2: number,
  k2: number,
  cos: number,
  out: Float64Array,
  at = 0,
): void {
  if (k1 !== 0) writeComplex(n1, k1, n2, k2, cos, out, at);
  else if (k2 !== 0 || n1 <= 0 || n2 <= 0) writeAbsorbing(n1, n2, k2, cos, out, at);
  else writeLossless(n1, n2, cos, out, at);
}

/** Transparent incidence, absorption beyond: the most frequent complex case, kept short enough to be inlined. */
function writeAbsorbing(
  n1: number,
  n2: number,
  k2: number,
  cos: number,
  out: Float64Array,
  at: number,
): void {
  const e1 = n1 * n1;
  const er = n2 * n2 - k2 * k2;
  const ei = 2 * n2 * k2;
  const a = n1 * cos;
  const wr = er - e1 + a * a;
  const size = Math.sqrt(wr * wr + ei * ei);
  let br: number;
  let bi: number;
  // ei >= 0, so that the principal root is the one with Im >= 0; the larger part first.
  if (wr >= 0) {
    br = Math.sqrt((size + wr) / 2);
    bi = br === 0 ? 0 : ei / (2 * br);
  } else {
    bi = Math.sqrt((size - wr) / 2);
    br = ei / (2 * bi);
  }
  const sr = a + br;
  const s = 1 / (sr * sr + bi * bi);
  const rsr = ((a - br) * sr - bi * bi) * s;
  const rsi = -2 * a * bi * s;
  const ur = a * er;
  const ui = a * ei;
  const vr = e1 * br;
  const vi = e1 * bi;
  const pr = ur + vr;
  const pi = ui + vi;
  const p = 1 / (pr * pr + pi * pi);
  const rpr = ((ur - vr) * pr + (ui - vi) * pi) * p;
  const rpi = 2 * (ui * vr - ur * vi) * p;
  out[at + 7] = 4 * a * e1 * (br * er + bi * ei) * p;
  out[at] = rsr;
  out[at + 1] = rsi;
  out[at + 2] = rpr;
  out[at + 3] = rpi;
  out[at + 4] = rsr * rsr + rsi * rsi;
  out[at + 5] = rpr * rpr + rpi * rpi;
  out[at + 6] = 4 * a * br * s;
}

function writeLossless(n1: number, n2: number, cos: number, out: Float64Array, at: number): void {
  const kappa1 = n1 * cos;
  const square = n2 * n2 - n1 * n1 + kappa1 * kappa1;
  const e1 = n1 * n1;
  const e2 = n2 * n2;
  const size = Math.sqrt(Math.abs(square));
  if (square > 0) {
    const a = e2 * kappa1;
    const b = e1 * size;
    const s = 1 / (kappa1 + size);
    const p = 1 / (a + b);
    const rs = (kappa1 - size) * s;
    const rp = (a - b) * p;
    out[at + 7] = 4 * a * b * p * p;
    out[at] = rs;
    out[at + 1] = 0;
    out[at + 2] = rp;
    out[at + 3] = 0;
    out[at + 4] = rs * rs;
    out[at + 5] = rp * rp;
    out[at + 6] = 4 * kappa1 * size * s * s;
    return;
  }
  // Total reflection: r = (a - ib)/(a + ib).
  const s = 1 / (kappa1 * kappa1 + size * size);
  const a = e2 * kappa1;
  const b = e1 * size;
  const p = 1 / (a * a + b * b);
  out[at + 7] = 0;
  out[at] = (kappa1 * kappa1 - size * size) * s;
  out[at + 1] = -2 * kappa1 * size * s;
  out[at + 2] = (a * a - b * b) * p;
  out[at + 3] = -2 * a * b * p;
  out[at + 4] = 1;
  out[at + 5] = 1;
  out[at + 6] = 0;
}

function writeComplex(
  n1: number,
  k1: number,
  n2: number,
  k2: number,
  cos: number,
  out: Float64Array,
  at: number,
): void {
  const e1r = n1 * n1 - k1 * k1;
  const e1i = 2 * n1 * k1;
  const e2r = n2 * n2 - k2 * k2;
  const e2i = 2 * n2 * k2;
  const c2 = cos * cos;
  // n2^2 - n1^2 + kappa1^2: exact for like media, no cancellation at grazing incidence.
  const wr = e2r - e1r + e1r * c2;
  const wi = e2i - e1i + e1i * c2;
  const ar = n1 * cos;
  const ai = k1 * cos;
  let size = Math.sqrt(wr * wr + wi * wi);
  if (size < TINY) size = Math.hypot(wr, wi);
  let br: number;
  let bi: number;
  // The larger part first. Behind an absorbing medium Im may be a little negative (see `fresnel.ts`).
  if (wr >= 0) {
    br = Math.sqrt((size + wr) / 2);
    bi = br === 0 ? 0 : wi / (2 * br);
  } else {
    bi = Math.sqrt((size - wr) / 2);
    br = wi / (2 * bi);
  }
  const sr = ar + br;
  const si = ai + bi;
  const s = 1 / (sr * sr + si * si);
  const dr = ar - br;
  const di = ai - bi;
  const rsr = (dr * sr + di * si) * s;
  const rsi = (di * sr - dr * si) * s;

  const ur = ar * e2r - ai * e2i;
  const ui = ar * e2i + ai * e2r;
  const vr = br * e1r - bi * e1i;
  const vi = br * e1i + bi * e1r;
  const pr = ur + vr;
  const pi = ui + vi;
  const p = 1 / (pr * pr + pi * pi);
  const gr = ur - vr;
  const gi = ui - vi;
  const rpr = (gr * pr + gi * pi) * p;
  const rpi = (gi * pr - gr * pi) * p;

  const evanescent = br === 0 && k2 === 0;
  const kappa1 = ar * ar + ai * ai;
  out[at + 7] = evanescent
    ? 0
    : (4 * kappa1 * (e1r * e1r + e1i * e1i) * (br * e2r + bi * e2i) * p) / (ar * e1r + ai * e1i);
  out[at] = rsr;
  out[at + 1] = rsi;
  out[at + 2] = rpr;
  out[at + 3] = rpi;
  out[at + 4] = rsr * rsr + rsi * rsi;
  out[at + 5] = rpr * rpr + rpi * rpi;
  out[at + 6] = evanescent ? 0 : (4 * kappa1 * br * s) / ar;
}

/** Any two media at an angle of incidence in [0, pi/2), magnetic and doubly negative ones included. */
export function writeSurfaceOf(
  from: Optics,
  into: Optics,
  incidenceAngle_rad: number,
  out: Float64Array,
  at = 0,
): void {
  const cos = Math.cos(incidenceAngle_rad);
  if (isPlain(from) && isPlain(into)) {
    writeSurface(from.n.re, from.n.im, into.n.re, into.n.im, cos, out, at);
    return;
  }
  const { n, mu, eps } = from;
  const ar = n.re * cos;
  const ai = n.im * cos;
  const wr = into.n.re ** 2 - into.n.im ** 2 - (n.re ** 2 - n.im ** 2) + (ar * ar - ai * ai);
  const wi = 2 * into.n.re * into.n.im - 2 * n.re * n.im + 2 * ar * ai;
  let br = 0;
  let bi = 0;
  if (wi === 0) {
    if (wr >= 0) br = into.n.re < 0 ? -Math.sqrt(wr) : Math.sqrt(wr);
    else bi = Math.sqrt(-wr);
  } else {
    const size = Math.hypot(wr, wi);
    if (wr >= 0) {
      br = Math.sqrt((size + wr) / 2);
      bi = wi / (2 * br);
    } else {
      bi = Math.sqrt((size - wr) / 2);
      br = wi / (2 * bi);
    }
    if (bi < 0 && (into.n.re < 0 || wr < 0)) {
      br = -br;
      bi = -bi;
    }
  }
  writePolarization(mu.re, mu.im, into.mu.re, into.mu.im, ar, ai, br, bi, out, at, at + 4);
  writePolarization(eps.re, eps.im, into.eps.re, into.eps.im, ar, ai, br, bi, out, at + 2, at + 5);
  if (br !== 0 || !isLossless(into)) return;
  out[at + 6] = 0;
  out[at + 7] = 0;
  if (!isLossless(from)) return;
  out[at + 4] = 1;
  out[at + 5] = 1;
}

const isPlain = ({ n, mu }: Optics): boolean => mu.re === 1 && mu.im === 0 && n.re >= 0;

/** r at `amplitude`, R at `power`, T two behind it, from z and kappa of both sides. */
function writePolarization(
  z1r: number,
  z1i: number,
  z2r: number,
  z2i: number,
  ar: number,
  ai: number,
  br: number,
  bi: number,
  out: Float64Array,
  amplitude: number,
  power: number,
): void {
  const ur = ar * z2r - ai * z2i;
  const ui = ar * z2i + ai * z2r;
  const vr = br * z1r - bi * z1i;
  const vi = br * z1i + bi * z1r;
  const pr = ur + vr;
  const pi = ui + vi;
  const over = 1 / (pr * pr + pi * pi);
  const gr = ur - vr;
  const gi = ui - vi;
  const re = (gr * pr + gi * pi) * over;
  const im = (gi * pr - gr * pi) * over;
  out[amplitude] = re;
  out[amplitude + 1] = im;
  out[power] = re * re + im * im;
  const incident = ar * z1r + ai * z1i;
  const across = 4 * (ar * ar + ai * ai) * (z1r * z1r + z1i * z1i) * (br * z2r + bi * z2i);
  out[power + 2] = (across * over) / incident;
}
