/**
 * Index of a mixture of two transparent liquids by the rule of Lorentz and Lorenz on volume fractions:
 *   L(n) = (n^2 - 1)/(n^2 + 2),   L = f L1 + (1 - f) L2
 * Sources: H. A. Lorentz, Ann. Phys. 245, 641 (1880); L. Lorenz, Ann. Phys. 247, 70 (1880). Volumes are those before mixing: what
 * a mixture shrinks is left out, so the estimate may be off by several 1e-3 (water with alcohols most).
 */
export const lorentzLorenz = (n: number): number => (n * n - 1) / (n * n + 2);

/** n of the refraction L. */
export const indexOfRefraction = (L: number): number => Math.sqrt((1 + 2 * L) / (1 - L));

/** `share`: volume fraction of the first, 0 to 1. */
export function mixtureIndex(n1: number, n2: number, share: number): number {
  return indexOfRefraction(share * lorentzLorenz(n1) + (1 - share) * lorentzLorenz(n2));
}

/** Volume fraction of the first liquid at which the mixture has the index wanted; null where it does not lie between the two. */
export function shareFor(n1: number, n2: number, wanted: number): number | null {
  const [L1, L2, L] = [lorentzLorenz(n1), lorentzLorenz(n2), lorentzLorenz(wanted)];
  const share = (L - L2) / (L1 - L2);
  // A pure liquid is a mixture too: rounding must not put it outside.
  const hair = 1e-12;
  return share >= -hair && share <= 1 + hair ? Math.min(1, Math.max(0, share)) : null;
}
