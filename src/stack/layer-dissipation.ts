/**
 * Power dissipated inside one layer, from the fields at its lower face. Integrates
 *   -d Re(E H*)/d(k0 z) = Im Y |E|^2 + Im Z |H|^2
 * in closed form instead of taking the difference of two fluxes: a weak absorber keeps its digits and a lossless layer
 * gives zero exactly. Y and Z as in `stack-kernel.ts`; Im Y, Im Z >= 0 in passive media.
 * Source: Poynting's theorem for the tangential fields (Born & Wolf, Principles of Optics, 1.4 and 1.6).
 */
import type { Polarization } from './layered-path.ts';
import { FIELD_STRIDE, type StackKernel } from './stack-kernel.ts';
import { KAPPA, MEDIUM_STRIDE, Y_P, Y_S, Z_P, Z_S } from './stack-media.ts';

/**
 * Dissipation of layer j in units of Re(E H*), for the scaled fields of `propagate` and divided by exp(2 k0 Im kappa d):
 * times |a_j|^2 rescale_j^2 it is the true one for unit incident tangential E.
 */
export function layerDissipation(kernel: StackKernel, layer: number, polarization: Polarization): number {
  const { media, fields } = kernel;
  const m = (kernel.layerMedium[layer] as number) * MEDIUM_STRIDE;
  const s = polarization === 's';
  const atZ = m + (s ? Z_S : Z_P);
  const atY = m + (s ? Y_S : Y_P);
  const lossE = media[atY + 1] as number;
  const lossH = media[atZ + 1] as number;
  if (lossE === 0 && lossH === 0) return 0;

  const at = (layer + 1) * FIELD_STRIDE + (s ? 0 : 4);
  const Er = fields[at] as number;
  const Ei = fields[at + 1] as number;
  const Hr = fields[at + 2] as number;
  const Hi = fields[at + 3] as number;
  const Zr = media[atZ] as number;
  const Zi = media[atZ + 1] as number;
  const Yr = media[atY] as number;
  const Yi = media[atY + 1] as number;
  const kr = media[m + KAPPA] as number;
  const ki = media[m + KAPPA + 1] as number;
  const k2 = kr * kr + ki * ki;

  // Integrals over the layer of |cos|^2, |sin/kappa|^2, cos conj(sin/kappa) of k0 kappa (distance from the lower face).
  const x = kernel.k0d[layer] as number;
  const a = Math.abs(kr) * x;
  const b = ki * x;
  const shrink = Math.exp(-2 * b);
  const cc = (x / 2) * (shrunkSinhc(b) + shrink * sinc(2 * a));
  const ss = ((x / 2) * (shrunkSinhcLess1(b) + shrink * lessSinc(2 * a))) / k2;
  const sin = Math.sin(a);
  const sinh = -Math.expm1(-2 * b) / 2;
  const csRe = a === 0 ? 0 : ((x / 2) * shrink * sin * sin) / a;
  const csIm = b === 0 ? 0 : -((x / 2) * sinh * sinh) / b;
  // cos conj(sin)/conj(kappa); a carries |Re kappa|, and csRe is odd in it.
  const cr = kr < 0 ? -csRe : csRe;
  const gr = (cr * kr - csIm * ki) / k2;
  const gi = (csIm * kr + cr * ki) / k2;

  let dissipated = 0;
  if (lossE !== 0) dissipated += lossE * mean2(Er, Ei, Zr * Hr - Zi * Hi, Zr * Hi + Zi * Hr, cc, ss, gr, gi);
  if (lossH !== 0) dissipated += lossH * mean2(Hr, Hi, Yr * Er - Yi * Ei, Yr * Ei + Yi * Er, cc, ss, gr, gi);
  return dissipated;
}

/** Integral of |u cos - i v sin/kappa|^2. */
function mean2(
  ur: number,
  ui: number,
  vr: number,
  vi: number,
  cc: number,
  ss: number,
  gr: number,
  gi: number,
): number {
  // 2 Re(i u conj(v) g)
  const pr = ur * vr + ui * vi;
  const pi = ui * vr - ur * vi;
  const cross = -2 * (pr * gi + pi * gr);
  return (ur * ur + ui * ui) * cc + (vr * vr + vi * vi) * ss + cross;
}

const sinc = (x: number): number => (x === 0 ? 1 : Math.sin(x) / x);

/** 1 - sin(x)/x without cancellation. */
function lessSinc(x: number): number {
  if (Math.abs(x) > 0.5) return 1 - Math.sin(x) / x;
  const u = x * x;
  return (u / 6) * (1 - (u / 20) * (1 - (u / 42) * (1 - (u / 72) * (1 - (u / 110) * (1 - u / 156)))));
}

/** exp(-2 b) sinh(2 b)/(2 b) */
const shrunkSinhc = (b: number): number => (b === 0 ? 1 : -Math.expm1(-4 * b) / (4 * b));

/** exp(-2 b) (sinh(2 b)/(2 b) - 1) without cancellation. */
function shrunkSinhcLess1(b: number): number {
  if (b > 0.25) return shrunkSinhc(b) - Math.exp(-2 * b);
  const u = 4 * b * b;
  const series = (u / 6) * (1 + (u / 20) * (1 + (u / 42) * (1 + (u / 72) * (1 + (u / 110) * (1 + u / 156)))));
  return Math.exp(-2 * b) * series;
}
