/**
 * Quantile of the standard normal distribution, to about 7 digits: rational approximations in three regions.
 * Source: M. J. Wichura, Algorithm AS 241 (PPND7), Applied Statistics 37, 477 (1988).
 */
export function normalQuantile(probability: number): number {
  const q = probability - 0.5;
  if (Math.abs(q) <= 0.425) {
    const r = 0.180625 - q * q;
    return (
      (q * (((59.10937472 * r + 159.29113202) * r + 50.434271938) * r + 3.3871327179)) /
      (((67.1875636 * r + 78.757757664) * r + 17.895169469) * r + 1)
    );
  }
  const tail = Math.min(probability, 1 - probability);
  if (!(tail > 0)) return q < 0 ? Number.NEGATIVE_INFINITY : Number.POSITIVE_INFINITY;
  const r = Math.sqrt(-Math.log(tail));
  const size =
    r <= 5
      ? (((0.17023821103 * (r - 1.6) + 1.3067284816) * (r - 1.6) + 2.75681539) * (r - 1.6) + 1.4234372777) /
        ((0.12021132975 * (r - 1.6) + 0.7370016425) * (r - 1.6) + 1)
      : (((0.017337203997 * (r - 5) + 0.42868294337) * (r - 5) + 3.081226386) * (r - 5) + 6.657905115) /
        ((0.012258202635 * (r - 5) + 0.24197894225) * (r - 5) + 1);
  return q < 0 ? -size : size;
}
