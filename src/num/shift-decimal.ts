/**
 * value * 10^power by the decimal text: 20 um are 0.00002 m and 0.21 um are 2.1e-7 m, no neighbours of them. For published
 * numbers, which are decimals; no faster way to multiply.
 */
export function shiftDecimal(value: number, power: number): number {
  const [digits, exponent = '0'] = String(value).split('e');
  return Number(`${digits}e${Number(exponent) + power}`);
}
