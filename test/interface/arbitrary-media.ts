/** Random media for property tests. */
import fc from 'fast-check';
import { type Optics, opticsFromIndex, opticsFromPermittivity } from '../../src/interface/optics.ts';
import { ONE } from '../../src/num/complex.ts';
import { evenly } from '../helpers/evenly.ts';

const between = evenly;

export const losslessDielectric: fc.Arbitrary<Optics> = between(1, 5).map((n) =>
  opticsFromIndex({ re: n, im: 0 }, ONE),
);

export const losslessMagnetic: fc.Arbitrary<Optics> = fc
  .tuple(between(0.5, 12), between(0.5, 6))
  .map(([eps, mu]) => opticsFromPermittivity({ re: eps, im: 0 }, { re: mu, im: 0 }));

export const absorbing: fc.Arbitrary<Optics> = fc
  .tuple(between(0.05, 6), between(1e-6, 10))
  .map(([n, k]) => opticsFromIndex({ re: n, im: k }, ONE));

export const passiveMagnetic: fc.Arbitrary<Optics> = fc
  .tuple(between(-8, 12), between(1e-6, 12), between(0.3, 6), between(0, 4))
  .map(([e1, e2, m1, m2]) => opticsFromPermittivity({ re: e1, im: e2 }, { re: m1, im: m2 }));

/** From normal to a hair before grazing, rad. */
export const incidence = between(0, Math.PI / 2 - 1e-6);
