/**
 * The inner loop of layered paths: one wave through N layers, both polarizations at once, on bare numbers and typed
 * arrays that are allocated once and used for every wavelength.
 *
 * Method. In each layer the tangential fields obey E' = i k0 Z H, H' = i k0 Y E with
 *   s: Z = mu,          Y = kappa^2/mu        p: Z = kappa^2/eps,  Y = eps        kappa^2 = eps mu - q^2
 * so that a layer of thickness d maps the fields below to the fields above by
 *   E = c E - i Z g H,  H = c H - i Y g E,    c = cos(k0 kappa d),  g = sin(k0 kappa d)/kappa
 * (the characteristic matrix; Abeles; Born & Wolf, Principles of Optics, 1.6). Both c and g are even in kappa: no branch is
 * chosen inside a layer and nothing is lost at its critical angle. c and g are kept divided by exp(k0 Im kappa d), and
 * the fields by a power of ten when they leave the range of doubles, so that opaque layers neither overflow nor hide what
 * lies above them. E and H at every interface stay in `fields` for absorptance and field profile.
 *
 * Special cases: kappa = 0 in a layer (g = k0 d); real media take a path without complex multiplications.
 */
import {
  COMPLEX,
  EPS,
  EVANESCENT,
  KAPPA,
  MEDIUM_STRIDE,
  MU,
  PROPAGATING,
  type StackMedia,
  Y_P,
  Y_S,
  Z_P,
  Z_S,
} from './stack-media.ts';

/** Numbers per interface in `StackKernel.fields`: s E, s H, p E, p H, each re, im. */
export const FIELD_STRIDE = 8;

/** Offsets in `StackKernel.waves` (each re, im). */
export const R_S = 0;
/** Reflected over incident tangential E; r_p in the sign of Born & Wolf is its negative. */
export const R_P_TANGENTIAL = 2;
/** `fields` at interface 0 times this are the true tangential fields for unit incident tangential E. */
export const SCALE_S = 4;
export const SCALE_P = 6;
/** The same at the last interface. */
export const EXIT_SCALE_S = 8;
export const EXIT_SCALE_P = 10;

const TOO_LARGE = 1e120;
const TOO_SMALL = 1e-120;

export interface StackKernel extends StackMedia {
  readonly layerCount: number;
  /** Index into `media` of each layer, in the order the wave meets them. */
  readonly layerMedium: Uint16Array;
  readonly thickness_m: Float64Array;
  /** Interface j lies above layer j; the last one is the surface of the exit medium. Scaled, see `propagate`. */
  readonly fields: Float64Array;
  /** exp(-k0 Im kappa d) of each layer. */
  readonly decay: Float64Array;
  /** Powers of ten that kept `fields` in range, one for each layer. */
  readonly rescaleS: Float64Array;
  readonly rescaleP: Float64Array;
  readonly waves: Float64Array;
}

export function createStackKernel(
  mediumCount: number,
  layerMedium: ArrayLike<number>,
  thickness_m: ArrayLike<number>,
  incidence: number,
  exit: number,
): StackKernel {
  const layerCount = layerMedium.length;
  return {
    layerCount,
    layerMedium: Uint16Array.from(layerMedium),
    thickness_m: Float64Array.from(thickness_m),
    incidence,
    exit,
    media: new Float64Array(mediumCount * MEDIUM_STRIDE),
    kind: new Uint8Array(mediumCount),
    fields: new Float64Array((layerCount + 1) * FIELD_STRIDE),
    decay: new Float64Array(layerCount),
    rescaleS: new Float64Array(layerCount),
    rescaleP: new Float64Array(layerCount),
    waves: new Float64Array(12),
  };
}

/**
 * One wave of vacuum wave number k0 (rad/m) through the layers, from the exit medium up. Afterwards `fields` holds E, H at
 * every interface for an exit wave (1, kappa/mu) in s and (kappa/eps, 1) in p; with a_0 = SCALE the true fields for unit
 * incident tangential E are a_j times these, a_(j+1) = a_j decay_j rescale_j. `waves` holds r and the scales.
 */
export function propagate(kernel: StackKernel, k0_rad_per_m: number): void {
  const { media, kind, layerMedium, thickness_m, fields, decay, rescaleS, rescaleP, waves } = kernel;
  const n = kernel.layerCount;
  const exit = kernel.exit * MEDIUM_STRIDE;
  const xkr = media[exit + KAPPA] as number;
  const xki = media[exit + KAPPA + 1] as number;
  const xmr = media[exit + MU] as number;
  const xmi = media[exit + MU + 1] as number;
  const xer = media[exit + EPS] as number;
  const xei = media[exit + EPS + 1] as number;
  const overMu = 1 / (xmr * xmr + xmi * xmi);
  const overEps = 1 / (xer * xer + xei * xei);
  let sEr = 1;
  let sEi = 0;
  let sHr = (xkr * xmr + xki * xmi) * overMu;
  let sHi = (xki * xmr - xkr * xmi) * overMu;
  let pEr = (xkr * xer + xki * xei) * overEps;
  let pEi = (xki * xer - xkr * xei) * overEps;
  let pHr = 1;
  let pHi = 0;
  let at = n * FIELD_STRIDE;
  fields[at] = sEr;
  fields[at + 1] = sEi;
  fields[at + 2] = sHr;
  fields[at + 3] = sHi;
  fields[at + 4] = pEr;
  fields[at + 5] = pEi;
  fields[at + 6] = pHr;
  fields[at + 7] = pHi;
  let stepS = 1;
  let stepP = 1;

  for (let j = n - 1; j >= 0; j--) {
    const medium = layerMedium[j] as number;
    const m = medium * MEDIUM_STRIDE;
    const x = k0_rad_per_m * (thickness_m[j] as number);
    const layerKind = kind[medium];
    const kr = media[m + KAPPA] as number;
    const ki = media[m + KAPPA + 1] as number;
    let e = 1;
    if (layerKind !== COMPLEX) {
      let c = 1;
      let g = x;
      if (layerKind === PROPAGATING) {
        const phase = kr * x;
        c = Math.cos(phase);
        g = Math.sin(phase) / kr;
      } else if (layerKind === EVANESCENT) {
        e = Math.exp(-ki * x);
        const sinh = -Math.expm1(-2 * ki * x) / 2;
        c = 1 - sinh;
        g = sinh / ki;
      }
      const zs = (media[m + Z_S] as number) * g;
      const ys = (media[m + Y_S] as number) * g;
      const zp = (media[m + Z_P] as number) * g;
      const yp = (media[m + Y_P] as number) * g;
      const er = c * sEr + zs * sHi;
      const ei = c * sEi - zs * sHr;
      sHr = c * sHr + ys * sEi;
      sHi = c * sHi - ys * sEr;
      sEr = er;
      sEi = ei;
      const fr = c * pEr + zp * pHi;
      const fi = c * pEi - zp * pHr;
      pHr = c * pHr + yp * pEi;
      pHi = c * pHi - yp * pEr;
      pEr = fr;
      pEi = fi;
    } else {
      const a = kr * x;
      const b = ki * x;
      const sinh = -Math.expm1(-2 * b) / 2;
      const cosh = 1 - sinh;
      const sin = Math.sin(a);
      const cos = Math.cos(a);
      e = Math.exp(-b);
      const cr = cos * cosh;
      const ci = -sin * sinh;
      const overK = 1 / (kr * kr + ki * ki);
      const sr = sin * cosh;
      const si = cos * sinh;
      // -i g, so that the products below are plain complex ones.
      const gr = (si * kr - sr * ki) * overK;
      const gi = -(sr * kr + si * ki) * overK;
      let vr = media[m + Z_S] as number;
      let vi = media[m + Z_S + 1] as number;
      let zr = vr * gr - vi * gi;
      let zi = vr * gi + vi * gr;
      vr = media[m + Y_S] as number;
      vi = media[m + Y_S + 1] as number;
      let yr = vr * gr - vi * gi;
      let yi = vr * gi + vi * gr;
      const er = cr * sEr - ci * sEi + zr * sHr - zi * sHi;
      const ei = cr * sEi + ci * sEr + zr * sHi + zi * sHr;
      const hr = cr * sHr - ci * sHi + yr * sEr - yi * sEi;
      sHi = cr * sHi + ci * sHr + yr * sEi + yi * sEr;
      sHr = hr;
      sEr = er;
      sEi = ei;
      vr = media[m + Z_P] as number;
      vi = media[m + Z_P + 1] as number;
      zr = vr * gr - vi * gi;
      zi = vr * gi + vi * gr;
      vr = media[m + Y_P] as number;
      vi = media[m + Y_P + 1] as number;
      yr = vr * gr - vi * gi;
      yi = vr * gi + vi * gr;
      const fr = cr * pEr - ci * pEi + zr * pHr - zi * pHi;
      const fi = cr * pEi + ci * pEr + zr * pHi + zi * pHr;
      const ir = cr * pHr - ci * pHi + yr * pEr - yi * pEi;
      pHi = cr * pHi + ci * pHr + yr * pEi + yi * pEr;
      pHr = ir;
      pEr = fr;
      pEi = fi;
    }
    let us = 1;
    const sizeS = Math.abs(sEr) + Math.abs(sEi) + Math.abs(sHr) + Math.abs(sHi);
    if (sizeS > TOO_LARGE || sizeS < TOO_SMALL) {
      us = sizeS > TOO_LARGE ? TOO_SMALL : TOO_LARGE;
      sEr *= us;
      sEi *= us;
      sHr *= us;
      sHi *= us;
    }
    let up = 1;
    const sizeP = Math.abs(pEr) + Math.abs(pEi) + Math.abs(pHr) + Math.abs(pHi);
    if (sizeP > TOO_LARGE || sizeP < TOO_SMALL) {
      up = sizeP > TOO_LARGE ? TOO_SMALL : TOO_LARGE;
      pEr *= up;
      pEi *= up;
      pHr *= up;
      pHi *= up;
    }
    decay[j] = e;
    rescaleS[j] = us;
    rescaleP[j] = up;
    stepS *= e * us;
    stepP *= e * up;
    at = j * FIELD_STRIDE;
    fields[at] = sEr;
    fields[at + 1] = sEi;
    fields[at + 2] = sHr;
    fields[at + 3] = sHi;
    fields[at + 4] = pEr;
    fields[at + 5] = pEi;
    fields[at + 6] = pHr;
    fields[at + 7] = pHi;
  }

  // r = (y0 E - H)/(y0 E + H), scale = 2 y0/(y0 E + H); y0 = kappa0/mu0 (s), eps0/kappa0 (p), multiplied through.
  const from = kernel.incidence * MEDIUM_STRIDE;
  const kr = media[from + KAPPA] as number;
  const ki = media[from + KAPPA + 1] as number;
  enter(waves, R_S, kr, ki, media[from + MU] as number, media[from + MU + 1] as number, sEr, sEi, sHr, sHi);
  enter(
    waves,
    R_P_TANGENTIAL,
    media[from + EPS] as number,
    media[from + EPS + 1] as number,
    kr,
    ki,
    pEr,
    pEi,
    pHr,
    pHi,
  );
  waves[EXIT_SCALE_S] = (waves[SCALE_S] as number) * stepS;
  waves[EXIT_SCALE_S + 1] = (waves[SCALE_S + 1] as number) * stepS;
  waves[EXIT_SCALE_P] = (waves[SCALE_P] as number) * stepP;
  waves[EXIT_SCALE_P + 1] = (waves[SCALE_P + 1] as number) * stepP;
}

/** r = (u E - v H)/(u E + v H) at `at`, 2 u/(u E + v H) four places on. */
function enter(
  waves: Float64Array,
  at: number,
  ur: number,
  ui: number,
  vr: number,
  vi: number,
  Er: number,
  Ei: number,
  Hr: number,
  Hi: number,
): void {
  const er = ur * Er - ui * Ei;
  const ei = ur * Ei + ui * Er;
  const hr = vr * Hr - vi * Hi;
  const hi = vr * Hi + vi * Hr;
  const sr = er + hr;
  const si = ei + hi;
  const dr = er - hr;
  const di = ei - hi;
  const over = 1 / (sr * sr + si * si);
  waves[at] = (dr * sr + di * si) * over;
  waves[at + 1] = (di * sr - dr * si) * over;
  waves[at + 4] = 2 * (ur * sr + ui * si) * over;
  waves[at + 5] = 2 * (ui * sr - ur * si) * over;
}
