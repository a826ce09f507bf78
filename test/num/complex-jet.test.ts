import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import * as C from '../../src/num/complex-jet.ts';
import type { Jet } from '../../src/num/jet.ts';
import * as J from '../../src/num/jet.ts';

const part = fc.double({ min: -2, max: 2, noNaN: true });
const jet = fc.tuple(part, part, part, part);
const any = fc.record({ re: jet, im: jet });
/** Value off the negative real axis and away from zero. */
const rightHalf = fc.record({
  re: fc.tuple(fc.double({ min: 0.3, max: 3, noNaN: true }), part, part, part),
  im: jet,
});

function close(a: C.ComplexJet, b: C.ComplexJet, tolerance = 1e-9): void {
  const compare = (x: Jet, y: Jet): void => {
    for (const i of [0, 1, 2, 3] as const)
      expect(Math.abs(x[i] - y[i])).toBeLessThanOrEqual(
        tolerance * Math.max(1, Math.abs(x[i]), Math.abs(y[i])),
      );
  };
  compare(a.re, b.re);
  compare(a.im, b.im);
}

describe('complex jet algebra', () => {
  it('is a field where it may divide', () => {
    fc.assert(
      fc.property(any, any, rightHalf, (a, b, d) => {
        close(C.mul(a, b), C.mul(b, a), 1e-14);
        close(C.mul(C.add(a, b), d), C.add(C.mul(a, d), C.mul(b, d)), 1e-12);
        close(C.div(C.mul(a, d), d), a, 1e-7);
      }),
    );
  });

  it('undoes squares by roots and logarithms by exponentials', () => {
    fc.assert(
      fc.property(rightHalf, (a) => {
        close(C.mul(C.sqrt(a), C.sqrt(a)), a);
        close(C.exp(C.log(a)), a, 1e-8);
        close(C.pow(a, 3), C.mul(a, C.mul(a, a)), 1e-7);
        close(C.pow(a, 0.5), C.sqrt(a), 1e-7);
        close(C.timesI(C.timesI(a)), C.scale(a, -1), 0);
      }),
    );
  });

  it('chooses the root that decays', () => {
    fc.assert(
      fc.property(any, (a) => {
        fc.pre(Math.hypot(a.re[0], a.im[0]) > 0.1);
        const s = C.sqrtDecaying(a);
        expect(s.im[0]).toBeGreaterThanOrEqual(0);
        if (s.im[0] === 0) expect(s.re[0]).toBeGreaterThan(0);
        close(C.mul(s, s), a, 1e-8);
      }),
    );
  });

  it('contains the real jets', () => {
    fc.assert(
      fc.property(jet, jet, (a, b) => {
        const product = C.mul(C.fromReal(a), C.fromReal(b));
        expect(product.re).toEqual(J.mul(a, b).map((x) => x - 0));
        expect(product.im.every((x) => x === 0)).toBe(true);
      }),
    );
  });
});
