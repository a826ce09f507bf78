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
  /** k0 d of each layer at the wave last propagated. */
  readonly k0d: Float64Array;
  /** Interface j lies above layer j; the last one is the surface of the exit medium. Scaled, see `propagate`. */
  readonly fields: Float64Array;
  /** exp(-k0 Im kappa d) of each layer. */
  readonly decay: Float64Array;
  /** Powers of ten that kept `fields` in range, one for each layer. */
  readonly rescaleS: Float64Array;
  readonly rescaleP: Float64Array;
  readonly waves: Float64Array;
  /** c and -i g of the complex layer in hand. */
  readonly turning: Float64Array;
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
    k0d: new Float64Array(layerCount),
    incidence,
    exit,
    media: new Float64Array(mediumCount * MEDIUM_STRIDE),
    kind: new Uint8Array(mediumCount),
    fields: new Float64Array((layerCount + 1) * FIELD_STRIDE),
    decay: new Float64Array(layerCount),
    rescaleS: new Float64Array(layerCount),
    rescaleP: new Float64Array(layerCount),
    waves: new Float64Array(12),
    turning: new Float64Array(4),
  };
}

/**
 * One wave of vacuum wave number k0 (rad/m) through the layers, from the exit medium up. Afterwards `fields` holds E, H at
 * every interface for an exit wave (1, kappa/mu) in s and (kappa/eps, 1) in p; with a_0 = SCALE the true fields for unit
 * incident tangential E are a_j times these, a_(j+1) = a_j decay_j rescale_j. `waves` holds r and the scales.
 */
export function propagate(kernel: StackKernel, k0_rad_per_m: number): void {
  startAtExit(kernel);
  const { decay, rescaleS, rescaleP, media, waves } = kernel;
  let j = kernel.layerCount - 1;
  while (j >= 0) {
    j = crossRealLayers(kernel, j, k0_rad_per_m);
    if (j >= 0) crossComplexLayer(kernel, j--, k0_rad_per_m);
  }
  let stepS = 1;
  let stepP = 1;
  for (let i = kernel.layerCount - 1; i >= 0; i--) {
    stepS *= (decay[i] as number) * (rescaleS[i] as number);
    stepP *= (decay[i] as number) * (rescaleP[i] as number);
  }
  // r = (y0 E - H)/(y0 E + H), scale = 2 y0/(y0 E + H); y0 = kappa0/mu0 (s), eps0/kappa0 (p), multiplied through.
  const from = kernel.incidence * MEDIUM_STRIDE;
  enter(waves, R_S, media, from + KAPPA, from + MU, kernel.fields, 0);
  enter(waves, R_P_TANGENTIAL, media, from + EPS, from + KAPPA, kernel.fields, 4);
  waves[EXIT_SCALE_S] = (waves[SCALE_S] as number) * stepS;
  waves[EXIT_SCALE_S + 1] = (waves[SCALE_S + 1] as number) * stepS;
  waves[EXIT_SCALE_P] = (waves[SCALE_P] as number) * stepP;
  waves[EXIT_SCALE_P + 1] = (waves[SCALE_P + 1] as number) * stepP;
}

/** E, H of the exit wave: (1, kappa/mu) in s, (kappa/eps, 1) in p. */
function startAtExit({ media, fields, exit, layerCount }: StackKernel): void {
  const x = exit * MEDIUM_STRIDE;
  const kr = media[x + KAPPA] as number;
  const ki = media[x + KAPPA + 1] as number;
  const mr = media[x + MU] as number;
  const mi = media[x + MU + 1] as number;
  const er = media[x + EPS] as number;
  const ei = media[x + EPS + 1] as number;
  const overMu = 1 / (mr * mr + mi * mi);
  const overEps = 1 / (er * er + ei * ei);
  const at = layerCount * FIELD_STRIDE;
  fields[at] = 1;
  fields[at + 1] = 0;
  fields[at + 2] = (kr * mr + ki * mi) * overMu;
  fields[at + 3] = (ki * mr - kr * mi) * overMu;
  fields[at + 4] = (kr * er + ki * ei) * overEps;
  fields[at + 5] = (ki * er - kr * ei) * overEps;
  fields[at + 6] = 1;
  fields[at + 7] = 0;
}

/**
 * Fields above the layers from `from` upwards that have real eps and mu: there c, g, Z and Y are real too. Stops at the first
 * complex layer and returns its number, -1 where there is none. The fields in hand stay in variables all the way.
 */
function crossRealLayers(kernel: StackKernel, from: number, k0_rad_per_m: number): number {
  const { media, fields, kind, layerMedium, thickness_m, k0d, decay, rescaleS, rescaleP } = kernel;
  let at = (from + 1) * FIELD_STRIDE;
  let sEr = fields[at] as number;
  let sEi = fields[at + 1] as number;
  let sHr = fields[at + 2] as number;
  let sHi = fields[at + 3] as number;
  let pEr = fields[at + 4] as number;
  let pEi = fields[at + 5] as number;
  let pHr = fields[at + 6] as number;
  let pHi = fields[at + 7] as number;
  let j = from;
  for (; j >= 0; j--) {
    const medium = layerMedium[j] as number;
    const how = kind[medium];
    if (how === COMPLEX) break;
    const m = medium * MEDIUM_STRIDE;
    const x = k0_rad_per_m * (thickness_m[j] as number);
    let e = 1;
    let c = 1;
    let g = x;
    if (how === PROPAGATING) {
      const k = media[m + KAPPA] as number;
      c = Math.cos(k * x);
      g = Math.sin(k * x) / k;
    } else if (how === EVANESCENT) {
      const k = media[m + KAPPA + 1] as number;
      e = Math.exp(-k * x);
      const sinh = -Math.expm1(-2 * k * x) / 2;
      c = 1 - sinh;
      g = sinh / k;
    }
    const zs = (media[m + Z_S] as number) * g;
    const ys = (media[m + Y_S] as number) * g;
    const zp = (media[m + Z_P] as number) * g;
    const yp = (media[m + Y_P] as number) * g;
    // The new E is stored last: the new H needs the old one.
    const nextSEr = c * sEr + zs * sHi;
    const nextSEi = c * sEi - zs * sHr;
    sHr = c * sHr + ys * sEi;
    sHi = c * sHi - ys * sEr;
    sEr = nextSEr;
    sEi = nextSEi;
    const nextPEr = c * pEr + zp * pHi;
    const nextPEi = c * pEi - zp * pHr;
    pHr = c * pHr + yp * pEi;
    pHi = c * pHi - yp * pEr;
    pEr = nextPEr;
    pEi = nextPEi;
    const sizeS = Math.abs(sEr) + Math.abs(sEi) + Math.abs(sHr) + Math.abs(sHi);
    const sizeP = Math.abs(pEr) + Math.abs(pEi) + Math.abs(pHr) + Math.abs(pHi);
    let factorS = 1;
    let factorP = 1;
    if (!(sizeS <= TOO_LARGE && sizeS >= TOO_SMALL && sizeP <= TOO_LARGE && sizeP >= TOO_SMALL)) {
      factorS = rescaling(sizeS);
      factorP = rescaling(sizeP);
      sEr *= factorS;
      sEi *= factorS;
      sHr *= factorS;
      sHi *= factorS;
      pEr *= factorP;
      pEi *= factorP;
      pHr *= factorP;
      pHi *= factorP;
    }
    k0d[j] = x;
    decay[j] = e;
    rescaleS[j] = factorS;
    rescaleP[j] = factorP;
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
  return j;
}

/** The same where eps or mu is complex. */
function crossComplexLayer(kernel: StackKernel, j: number, k0_rad_per_m: number): void {
  const { media, fields, turning } = kernel;
  const m = (kernel.layerMedium[j] as number) * MEDIUM_STRIDE;
  const x = k0_rad_per_m * (kernel.thickness_m[j] as number);
  const kr = media[m + KAPPA] as number;
  const ki = media[m + KAPPA + 1] as number;
  const sinh = -Math.expm1(-2 * ki * x) / 2;
  const cosh = 1 - sinh;
  const sin = Math.sin(kr * x);
  const cos = Math.cos(kr * x);
  const sr = sin * cosh;
  const si = cos * sinh;
  const overK = 1 / (kr * kr + ki * ki);
  turning[0] = cos * cosh;
  turning[1] = -sin * sinh;
  // -i g, so that what follows are plain complex products.
  turning[2] = (si * kr - sr * ki) * overK;
  turning[3] = -(sr * kr + si * ki) * overK;
  // Im kappa d = -ln decay; expm1 above has the accuracy near 0 that 1 - decay^2 would lose.
  kernel.decay[j] = Math.exp(-ki * x);
  kernel.k0d[j] = x;
  turn(kernel, j, 0, m + Z_S, m + Y_S);
  turn(kernel, j, 4, m + Z_P, m + Y_P);
  kernel.rescaleS[j] = keepInRange(fields, j * FIELD_STRIDE);
  kernel.rescaleP[j] = keepInRange(fields, j * FIELD_STRIDE + 4);
}

/** E = c E + Z g H, H = c H + Y g E for one polarization, with the layer's complex c and -i g in `turning`. */
function turn({ media, fields, turning }: StackKernel, j: number, side: number, Z: number, Y: number): void {
  const cr = turning[0] as number;
  const ci = turning[1] as number;
  const gr = turning[2] as number;
  const gi = turning[3] as number;
  const Zr = media[Z] as number;
  const Zi = media[Z + 1] as number;
  const Yr = media[Y] as number;
  const Yi = media[Y + 1] as number;
  const zr = Zr * gr - Zi * gi;
  const zi = Zr * gi + Zi * gr;
  const yr = Yr * gr - Yi * gi;
  const yi = Yr * gi + Yi * gr;
  const at = (j + 1) * FIELD_STRIDE + side;
  const Er = fields[at] as number;
  const Ei = fields[at + 1] as number;
  const Hr = fields[at + 2] as number;
  const Hi = fields[at + 3] as number;
  const to = j * FIELD_STRIDE + side;
  fields[to] = cr * Er - ci * Ei + zr * Hr - zi * Hi;
  fields[to + 1] = cr * Ei + ci * Er + zr * Hi + zi * Hr;
  fields[to + 2] = cr * Hr - ci * Hi + yr * Er - yi * Ei;
  fields[to + 3] = cr * Hi + ci * Hr + yr * Ei + yi * Er;
}

/** The factor that brings fields of this size back into the range of doubles, as a rule 1. */
function rescaling(size: number): number {
  if (size <= TOO_LARGE && size >= TOO_SMALL) return 1;
  return size > TOO_LARGE ? TOO_SMALL : TOO_LARGE;
}

/** Brings four fields back into range if they left it; returns the factor used. */
function keepInRange(fields: Float64Array, at: number): number {
  const factor = rescaling(
    Math.abs(fields[at] as number) +
      Math.abs(fields[at + 1] as number) +
      Math.abs(fields[at + 2] as number) +
      Math.abs(fields[at + 3] as number),
  );
  if (factor !== 1) for (let i = at; i < at + 4; i++) fields[i] = (fields[i] as number) * factor;
  return factor;
}

/** r = (u E - v H)/(u E + v H) at `to`, 2 u/(u E + v H) four places on; u, v, E, H complex numbers in the arrays. */
function enter(
  waves: Float64Array,
  to: number,
  media: Float64Array,
  u: number,
  v: number,
  fields: Float64Array,
  at: number,
): void {
  const ur = media[u] as number;
  const ui = media[u + 1] as number;
  const vr = media[v] as number;
  const vi = media[v + 1] as number;
  const Er = fields[at] as number;
  const Ei = fields[at + 1] as number;
  const Hr = fields[at + 2] as number;
  const Hi = fields[at + 3] as number;
  const er = ur * Er - ui * Ei;
  const ei = ur * Ei + ui * Er;
  const hr = vr * Hr - vi * Hi;
  const hi = vr * Hi + vi * Hr;
  const sr = er + hr;
  const si = ei + hi;
  const dr = er - hr;
  const di = ei - hi;
  const over = 1 / (sr * sr + si * si);
  waves[to] = (dr * sr + di * si) * over;
  waves[to + 1] = (di * sr - dr * si) * over;
  waves[to + 4] = 2 * (ur * sr + ui * si) * over;
  waves[to + 5] = 2 * (ui * sr - ur * si) * over;
}
