import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Complex } from '../../src/num/complex.ts';
import * as N from '../../src/num/complex.ts';
import * as C from '../../src/num/complex-jet.ts';
import type { Jet } from '../../src/num/jet.ts';
import * as J from '../../src/num/jet.ts';
import { evenly } from '../helpers/evenly.ts';

const part = evenly(-2, 2);
const jet = fc.tuple(part, part, part, part);
const any = fc.record({ re: jet, im: jet });
/** Value off the negative real axis and away from zero. */
const rightHalf = fc.record({
  re: fc.tuple(evenly(0.3, 3), part, part, part),
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

  it('has the derivatives of functions known in closed form, along any straight line z + d x', () => {
    const z = { re: 0.4, im: -0.7 };
    const d = { re: 1.5, im: 0.5 };
    const line = C.complexJet([z.re, d.re, 0, 0], [z.im, d.im, 0, 0]);
    // Taylor coefficients of f(z + d x) are f^(k) d^k/k!.
    const expected = (...coefficients: Complex[]): C.ComplexJet => {
      let power: Complex = { re: 1, im: 0 };
      const parts = coefficients.map((f) => {
        const part = N.mul(f, power);
        power = N.mul(power, d);
        return part;
      });
      return {
        re: parts.map((part) => part.re) as unknown as Jet,
        im: parts.map((part) => part.im) as unknown as Jet,
      };
    };
    const e = N.exp(z);
    close(C.exp(line), expected(e, e, N.scale(e, 1 / 2), N.scale(e, 1 / 6)), 1e-13);
    const r = N.div(N.ONE, z);
    const r2 = N.mul(r, r);
    const r3 = N.mul(r2, r);
    close(C.reciprocal(line), expected(r, N.neg(r2), r3, N.neg(N.mul(r2, r2))), 1e-13);
    close(C.log(line), expected(N.log(z), r, N.scale(r2, -1 / 2), N.scale(r3, 1 / 3)), 1e-13);
    const root = N.sqrt(z);
    const f1 = N.scale(N.div(root, z), 1 / 2);
    close(
      C.sqrt(line),
      expected(root, f1, N.scale(N.mul(f1, r), -1 / 4), N.scale(N.mul(f1, r2), 1 / 8)),
      1e-13,
    );
  });

  it('forms the powers 0, 1 and 2 at zero too, where there is no logarithm', () => {
    const line = C.complexJet([0, 2, 0, 0], [0, 1, 0, 0]);
    close(C.pow(line, 0), C.constant(N.ONE), 0);
    close(C.pow(line, 1), line, 0);
    close(C.pow(line, 2), C.complexJet([0, 0, 3, 0], [0, 0, 4, 0]), 0);
  });

  it('adds, subtracts and multiplies by real numbers and real jets', () => {
    fc.assert(
      fc.property(any, any, jet, part, (a, b, j, s) => {
        close(C.sub(C.add(a, b), b), a, 1e-14);
        close(C.shift(a, s), C.add(a, C.constant({ re: s, im: 0 })), 0);
        close(C.scale(a, s), C.mul(a, C.constant({ re: s, im: 0 })), 1e-14);
        close(C.mulReal(a, j), C.mul(a, C.fromReal(j)), 1e-14);
        close(C.timesI(a), C.mul(a, C.constant({ re: 0, im: 1 })), 1e-14);
        for (const n of [0, 1, 2, 3] as const)
          expect(C.coefficient(a, n)).toEqual({ re: a.re[n], im: a.im[n] });
      }),
    );
  });
});
