import fc from 'fast-check';

/**
 * Numbers from `min` to `max`, most of them evenly spread. `fc.double` alone spreads evenly over the bit patterns: between 0 and 1 nearly
 * all it gives lie below 1e-10, so that angles are normal incidence and coefficients are zero, to all digits.
 */
export const evenly = (min: number, max: number): fc.Arbitrary<number> => {
  const steps = 2 ** 31 - 1;
  return fc.oneof(
    { weight: 4, arbitrary: fc.integer({ min: 0, max: steps }).map((i) => min + (max - min) * (i / steps)) },
    { weight: 1, arbitrary: fc.double({ min, max, noNaN: true }) },
  );
};
