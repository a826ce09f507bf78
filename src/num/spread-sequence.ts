/**
 * Points that fill the unit cube of any dimension evenly, the same ones every time: the additive recurrence whose steps are
 * powers of the root of x^(d+1) = x + 1 (for d = 1 the golden ratio). Sources: H. Weyl, Math. Ann. 77, 313 (1916); J. H. Halton,
 * Numer. Math. 2, 84 (1960) for the use of such sequences; the choice of steps is that of the generalized golden ratio.
 */
export function spreadSequence(dimension: number): (index: number) => Float64Array {
  let root = 1.5;
  for (let i = 0; i < 60; i++) root = (1 + root) ** (1 / (dimension + 1));
  const steps = Float64Array.from({ length: dimension }, (_, j) => root ** -(j + 1) % 1);
  return (index) => steps.map((step) => (0.5 + (index + 1) * step) % 1);
}
