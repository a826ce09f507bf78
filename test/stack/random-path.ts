/** Random passive paths for the property tests of layered paths. */
import fc from 'fast-check';
import type { Complex } from '../../src/num/complex.ts';
import type { Layer, LayeredPath, Substance } from '../../src/stack/layered-path.ts';

/** Uniform; `fc.double` is uniform in its bits and would make nearly every angle from 0 on a vanishing one. */
const between = (min: number, max: number): fc.Arbitrary<number> =>
  fc.integer({ min: 0, max: 2 ** 31 - 1 }).map((u) => min + ((max - min) * u) / (2 ** 31 - 1));

/** Log-uniform, so that weak absorbers and thin layers turn up as often as strong and thick ones. */
export const logarithmic = (min: number, max: number): fc.Arbitrary<number> =>
  between(Math.log(min), Math.log(max)).map(Math.exp);

const loss: fc.Arbitrary<number> = fc.oneof(fc.constant(0), logarithmic(1e-12, 30));
const real: fc.Arbitrary<number> = fc.oneof(
  { weight: 4, arbitrary: between(1, 16) },
  { weight: 1, arbitrary: between(-40, -0.5) },
  { weight: 1, arbitrary: between(0.05, 1) },
);
const one: Complex = { re: 1, im: 0 };

/** Dielectrics, metals, weak absorbers, magnetic and doubly negative media; all passive. */
export const substance: fc.Arbitrary<Substance> = fc.record({
  eps: fc.record({ re: real, im: loss }),
  mu: fc.oneof(
    { weight: 3, arbitrary: fc.constant(one) },
    { weight: 1, arbitrary: fc.record({ re: between(0.3, 4), im: loss }) },
    { weight: 1, arbitrary: fc.record({ re: between(-4, -0.3), im: loss }) },
  ),
});

export const dielectric: fc.Arbitrary<Substance> = between(1, 12).map((re) => ({
  eps: { re, im: 0 },
  mu: one,
}));

export const layer = (longest_m: number): fc.Arbitrary<Layer> =>
  fc
    .tuple(substance, fc.oneof(logarithmic(1e-10, 3e-6), logarithmic(1e-9, longest_m)))
    .map(([of, thickness_m]) => ({ ...of, thickness_m }));

export const path = (mostLayers: number, longest_m: number): fc.Arbitrary<LayeredPath> =>
  fc.record({
    incidence: dielectric,
    layers: fc.array(layer(longest_m), { maxLength: mostLayers, size: 'max' }),
    exit: substance,
  });

/** Few materials repeated, as real stacks are. */
export const losslessPath = (mostLayers: number, longest_m: number): fc.Arbitrary<LayeredPath> =>
  fc.record({
    incidence: dielectric,
    layers: fc.array(
      fc.tuple(dielectric, logarithmic(1e-9, longest_m)).map(([of, thickness_m]) => ({ ...of, thickness_m })),
      { maxLength: mostLayers, size: 'max' },
    ),
    exit: dielectric,
  });

export const wavelength_m: fc.Arbitrary<number> = logarithmic(2e-7, 1e-5);
export const angle_rad: fc.Arbitrary<number> = between(0, (89.9 * Math.PI) / 180);
export { between };
