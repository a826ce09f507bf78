/** c0 + c1 x + c2 x^2 + ... by Horner's rule; coefficients start with the constant term, none give 0. */
export function polynomial(coefficients: readonly number[], x: number): number {
  let value = 0;
  for (let i = coefficients.length - 1; i >= 0; i--) value = value * x + coefficients[i]!;
  return value;
}
