import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import * as J from '../../src/num/jet.ts';
import { evenly } from '../helpers/evenly.ts';

const part = evenly(-3, 3);
const jet = fc.tuple(part, part, part, part);
/** Value away from zero, so that quotients, roots and logarithms are well conditioned. */
const positive = fc.tuple(evenly(0.3, 4), part, part, part);

function close(a: J.Jet, b: J.Jet, tolerance = 1e-9): void {
  for (const i of [0, 1, 2, 3] as const) {
    expect(Math.abs(a[i] - b[i])).toBeLessThanOrEqual(
      tolerance * Math.max(1, Math.abs(a[i]), Math.abs(b[i])),
    );
  }
}

describe('jet algebra', () => {
  it('is a commutative ring', () => {
    fc.assert(
      fc.property(jet, jet, jet, (a, b, c) => {
        close(J.mul(a, b), J.mul(b, a), 1e-14);
        close(J.mul(J.mul(a, b), c), J.mul(a, J.mul(b, c)), 1e-12);
        close(J.mul(a, J.add(b, c)), J.add(J.mul(a, b), J.mul(a, c)), 1e-12);
        close(J.sub(J.add(a, b), b), a, 1e-14);
      }),
    );
  });

  it('undoes products by quotients, squares by roots and logarithms by exponentials', () => {
    fc.assert(
      fc.property(jet, positive, (a, b) => {
        close(J.div(J.mul(a, b), b), a, 1e-8);
        close(J.mul(J.sqrt(b), J.sqrt(b)), b);
        close(J.exp(J.log(b)), b);
        close(J.log(J.exp(a)), a, 1e-12);
        close(J.mul(J.reciprocal(b), b), J.constant(1), 1e-8);
      }),
    );
  });

  it('agrees on powers whichever way they are formed', () => {
    fc.assert(
      fc.property(positive, evenly(-3, 3), (a, p) => {
        close(J.pow(a, p), J.exp(J.scale(J.log(a), p)), 1e-7);
        close(J.pow(a, 3), J.mul(a, J.mul(a, a)));
        close(J.pow(a, -2), J.reciprocal(J.mul(a, a)), 1e-7);
        close(J.pow(a, 0.5), J.sqrt(a), 1e-7);
      }),
    );
  });

  it('evaluates polynomials as sums of powers', () => {
    fc.assert(
      fc.property(jet, fc.array(part, { maxLength: 7 }), (a, c) => {
        let sum = J.constant(0);
        let power = J.constant(1);
        for (const ci of c) {
          sum = J.add(sum, J.scale(power, ci));
          power = J.mul(power, a);
        }
        close(J.polynomial(c, a), sum, 1e-10);
      }),
    );
  });

  it('knows whole powers at zero', () => {
    expect(J.pow(J.variable(0), 2)).toEqual([0, 0, 1, 0]);
    expect(J.pow(J.variable(0), 3)).toEqual([0, 0, 0, 1]);
    expect(J.pow(J.variable(0), 0)).toEqual([1, 0, 0, 0]);
  });

  it('gives the derivatives known in closed form', () => {
    const x = 0.7;
    const e = J.exp(J.variable(x));
    for (const order of [0, 1, 2, 3] as const) expect(J.derivative(e, order)).toBeCloseTo(Math.exp(x), 14);
    const l = J.log(J.variable(x));
    expect(J.derivative(l, 1)).toBeCloseTo(1 / x, 14);
    expect(J.derivative(l, 2)).toBeCloseTo(-1 / x ** 2, 14);
    expect(J.derivative(l, 3)).toBeCloseTo(2 / x ** 3, 13);
    const s = J.sqrt(J.variable(x));
    expect(J.derivative(s, 3)).toBeCloseTo((3 / 8) * x ** -2.5, 14);
  });

  it('adds numbers, subtracts, negates and forms any order of derivative', () => {
    expect(J.shift([1, 2, 3, 4], 10)).toEqual([11, 2, 3, 4]);
    expect(J.sub([9, 7, 5, 3], [1, 2, 3, 4])).toEqual([8, 5, 2, -1]);
    expect(J.neg([1, -2, 3, -4])).toEqual([-1, 2, -3, 4]);
    expect(([0, 1, 2, 3] as const).map((order) => J.derivative([7, 5, 3, 2], order))).toEqual([7, 5, 6, 12]);
    expect(J.pow(J.variable(0), 1)).toEqual([0, 1, 0, 0]);
    expect(J.pow(J.variable(2), 4)).toEqual([16, 32, 24, 8]);
  });
});
