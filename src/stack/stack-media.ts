/**
 * What the inner loop of layered paths needs to know about each distinct medium at one wave: normal wave vector and
 * admittances, as bare numbers in one typed array.
 *
 * kappa^2 is formed as (eps mu - eps0 mu0) + kappa0^2 from the medium of incidence: near grazing incidence eps mu - q^2
 * would cancel. Branch of kappa: Im >= 0; where Im = 0 Re >= 0, but Re <= 0 in a doubly negative medium, whose power would
 * otherwise flow backwards. Only incidence and exit depend on the branch.
 */
/** Numbers per distinct medium in `StackKernel.media`. */
export const MEDIUM_STRIDE = 16;
/** Offsets in one medium's record. */
export const EPS = 0;
export const MU = 2;
export const KAPPA2 = 4;
export const KAPPA = 6;
export const Z_S = 8;
export const Y_S = 10;
export const Z_P = 12;
export const Y_P = 14;

/** How a layer behaves; the real ones need no complex multiplications. */
export const COMPLEX = 0;
export const PROPAGATING = 1;
export const EVANESCENT = 2;
export const CRITICAL = 3;

/** The distinct media of a path; `incidence` and `exit` are among them. */
export interface StackMedia {
  readonly incidence: number;
  readonly exit: number;
  readonly media: Float64Array;
  readonly kind: Uint8Array;
}

export function setMedium(
  stack: StackMedia,
  index: number,
  epsRe: number,
  epsIm: number,
  muRe: number,
  muIm: number,
): void {
  const at = index * MEDIUM_STRIDE;
  stack.media[at + EPS] = epsRe;
  stack.media[at + EPS + 1] = epsIm;
  stack.media[at + MU] = muRe;
  stack.media[at + MU + 1] = muIm;
}

/** Normal wave vector and admittances of every medium, once the media and kappa0^2 of the incident wave are known. */
export function setIncidence(stack: StackMedia, kappa2Re: number, kappa2Im: number): void {
  const { media, kind } = stack;
  const from = stack.incidence * MEDIUM_STRIDE;
  const er = media[from + EPS] as number;
  const ei = media[from + EPS + 1] as number;
  const mr = media[from + MU] as number;
  const mi = media[from + MU + 1] as number;
  const fromRe = er * mr - ei * mi;
  const fromIm = er * mi + ei * mr;
  for (let m = 0; m < kind.length; m++) {
    const at = m * MEDIUM_STRIDE;
    const epsRe = media[at + EPS] as number;
    const epsIm = media[at + EPS + 1] as number;
    const muRe = media[at + MU] as number;
    const muIm = media[at + MU + 1] as number;
    const wr = epsRe * muRe - epsIm * muIm - fromRe + kappa2Re;
    const wi = epsRe * muIm + epsIm * muRe - fromIm + kappa2Im;
    // Square root with Im >= 0; the larger part first, so that a weak absorber keeps all digits of Im kappa.
    let kr: number;
    let ki: number;
    if (wi === 0) {
      kr = wr > 0 ? Math.sqrt(wr) : 0;
      ki = wr < 0 ? Math.sqrt(-wr) : 0;
      if (muRe < 0 && kr > 0) kr = -kr;
    } else {
      const size = Math.hypot(wr, wi);
      if (wr >= 0) {
        kr = Math.sqrt((size + wr) / 2);
        ki = wi / (2 * kr);
      } else {
        ki = Math.sqrt((size - wr) / 2);
        kr = wi / (2 * ki);
      }
      if (ki < 0) {
        kr = -kr;
        ki = -ki;
      }
    }
    const real = wi === 0 && epsIm === 0 && muIm === 0;
    // Below this |kappa|^2 the quotient sin/kappa would leave the range of doubles. Only real media come here: passive
    // complex eps and mu cannot have a real positive product.
    const critical = wr * wr + wi * wi < 1e-300;
    kind[m] = !real ? COMPLEX : critical ? CRITICAL : wr > 0 ? PROPAGATING : EVANESCENT;
    media[at + KAPPA2] = wr;
    media[at + KAPPA2 + 1] = wi;
    media[at + KAPPA] = kr;
    media[at + KAPPA + 1] = ki;
    media[at + Z_S] = muRe;
    media[at + Z_S + 1] = muIm;
    const overMu = 1 / (muRe * muRe + muIm * muIm);
    media[at + Y_S] = (wr * muRe + wi * muIm) * overMu;
    media[at + Y_S + 1] = real ? 0 : (wi * muRe - wr * muIm) * overMu;
    const overEps = 1 / (epsRe * epsRe + epsIm * epsIm);
    media[at + Z_P] = (wr * epsRe + wi * epsIm) * overEps;
    media[at + Z_P + 1] = real ? 0 : (wi * epsRe - wr * epsIm) * overEps;
    media[at + Y_P] = epsRe;
    media[at + Y_P + 1] = epsIm;
  }
}
